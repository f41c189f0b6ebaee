import { lengthOf, unitShown, type LengthUnit } from './lengthUnit';

/** Figures that are shown; more would say more than any light meter knows. */
const FIGURES = 4;

const plain = new Intl.NumberFormat('en-US', { maximumSignificantDigits: FIGURES });

/** A number as people read it: four figures, a true minus, thousands apart, powers of ten at the extremes. */
export function formatNumber(value: number): string {
  const size = Math.abs(value);
  if (size !== 0 && (size < 1e-4 || size >= 1e9)) {
    const [mantissa = '', exponent = ''] = value.toExponential(FIGURES - 1).split('e');
    return `${withMinus(String(Number(mantissa)))}·10${superscript(Number(exponent))}`;
  }
  return withMinus(plain.format(value));
}

/** Stops to two decimals without a plus, as positions on a scale are read. */
export function formatStops(value: number): string {
  const rounded = Number(value.toFixed(2));
  return withMinus(String(rounded === 0 ? 0 : rounded));
}

/** Stops as a difference: the sign always stands, none on zero. */
export function formatSignedStops(value: number): string {
  const text = formatStops(value);
  return text === '0' || text.startsWith('−') ? text : `+${text}`;
}

/** A number with the precision and the space that its unit asks for; metres as the reader measures. */
export function formatQuantity(value: number, unit?: string, measure: LengthUnit = 'metres'): string {
  if (unit === 'stops') return formatStops(value);
  if (unit === 's') return formatTime(value);
  if (unit === 'm') return `${formatNumber(lengthOf(value, measure))} ${unitShown(unit, measure)}`;
  const text = formatNumber(value);
  if (!unit) return text;
  return unit === '°' || unit === '%' ? `${text}${unit === '%' ? ' %' : unit}` : `${text} ${unit}`;
}

const HOUR_S = 3600;

/** Whole seconds as hours, minutes and seconds, as far as there are some. */
function hoursText(seconds: number): string {
  const whole = Math.round(seconds);
  const parts = [Math.floor(whole / HOUR_S), Math.floor((whole % HOUR_S) / 60), whole % 60];
  return parts
    .flatMap((part, i) => (part > 0 ? [`${formatNumber(part)} ${'h min s'.split(' ')[i]}`] : []))
    .join(' ');
}

/** Times of an hour and more in hours; short ones in milli- or microseconds, so that nobody counts zeros. */
function formatTime(seconds: number): string {
  const size = Math.abs(seconds);
  if (size >= HOUR_S) return `${seconds < 0 ? '−' : ''}${hoursText(size)}`;
  if (size === 0 || size >= 0.1) return `${formatNumber(seconds)} s`;
  return size >= 0.001 ? `${formatNumber(seconds * 1e3)} ms` : `${formatNumber(seconds * 1e6)} µs`;
}

function withMinus(text: string): string {
  return text.replace('-', '−');
}

function superscript(exponent: number): string {
  return [...String(exponent)].map((digit) => (digit === '-' ? '⁻' : '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(digit)])).join('');
}
