const MINUS = '−';
/** Made once: making one takes far longer than using it. */
const figures = new Intl.NumberFormat('en-US', { maximumSignificantDigits: 6 });

/** A number as a person reads it: up to six significant digits, thousands apart, a minus instead of a hyphen. */
export function readable(value: number): string {
  if (!Number.isFinite(value)) return exactly(value);
  const short = Number(value.toPrecision(6));
  const size = Math.abs(short);
  if (size === 0) return '0';
  const text = size < 1e-6 || size >= 1e12 ? size.toExponential().replace('e+', 'e') : figures.format(size);
  return short < 0 ? MINUS + text : text;
}

/** A number with every digit that was given, so that 256.0000001 is not told as 256. */
function exactly(value: number): string {
  if (Number.isNaN(value)) return 'not a number';
  if (!Number.isFinite(value)) return value > 0 ? 'infinity' : `${MINUS}infinity`;
  const text = String(Math.abs(value)).replace('e+', 'e');
  return value < 0 ? MINUS + text : text;
}

/** A number with its unit: "1 stop", "−1.5 stops", "0.5 m"; no unit, no space. */
export function amount(value: number, unit?: string): string {
  return withUnit(readable(value), unit);
}

/** A number as text with its unit, which is singular after one. */
export function withUnit(number: string, unit?: string): string {
  if (!unit) return number;
  const isOne = number === '1' || number === `${MINUS}1`;
  return `${number} ${isOne && unit === 'stops' ? 'stop' : unit}`;
}

/** A time in seconds, as a fraction where a person would say it so: "1/250 s", "0.0043 s", "2 s". */
export function seconds(value: number): string {
  const under = Math.round(1 / value);
  const isFraction = value > 0 && value < 0.3 && Math.abs(under * value - 1) < 1e-6;
  return isFraction ? `1/${under} s` : amount(value, 's');
}

/** Stops with sign and one or two decimals: "+1.5", "−0.33"; plain "0" where nothing is left of them. */
export function signedStops(value: number): string {
  const text = Number(Math.abs(value).toFixed(2)).toString();
  if (text === '0') return text;
  return value < 0 ? MINUS + text : `+${text}`;
}

/** Text short enough for a sentence, never cut within a character. */
export function shortened(text: string, most = 60): string {
  if (text.length <= most) return text;
  return `${text.slice(0, most - 1).replace(/[\uD800-\uDBFF]$/, '')}…`;
}

/** What was given, short enough for a sentence. Groups and lists are named, not spelt out. */
export function quoted(value: unknown): string {
  if (typeof value === 'string') return JSON.stringify(shortened(value));
  if (typeof value === 'number') return exactly(value);
  if (Array.isArray(value)) return value.length === 0 ? 'an empty list' : 'a list';
  return typeof value === 'object' && value !== null ? 'an object' : shortened(String(value));
}

/** "a", "a or b", "a, b or c". */
export function listed(items: readonly string[], word: 'or' | 'and' = 'or'): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} ${word} ${items[items.length - 1]}`;
}

/** "1 item", "3 items". */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${readable(count)} ${count === 1 ? one : many}`;
}
