/** A number as a person reads it: up to six significant digits, thousands apart. */
export function readable(value: number): string {
  if (!Number.isFinite(value)) return String(value);
  const size = Math.abs(value);
  if (size !== 0 && (size < 1e-4 || size >= 1e9)) return value.toExponential().replace('e+', 'e');
  return Number(value.toPrecision(6)).toLocaleString('en-US', { maximumSignificantDigits: 6 });
}

/** Stops with sign and one or two decimals: "+1.5", "−0.33". */
export function signedStops(value: number): string {
  const text = Number(Math.abs(value).toFixed(2)).toString();
  return value < 0 ? `−${text}` : `+${text}`;
}

/** What was given, short enough for a sentence. */
export function quoted(value: unknown): string {
  const text = typeof value === 'string' ? `"${value}"` : (JSON.stringify(value) ?? String(value));
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}

/** "a", "a or b", "a, b or c". */
export function listed(items: readonly string[], word: 'or' | 'and' = 'or'): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} ${word} ${items[items.length - 1]}`;
}
