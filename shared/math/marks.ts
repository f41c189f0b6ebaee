import { ANY, inDomain, SMALLEST } from './domain';
import { HALVES, SLOWEST_MARKED_S, THIRDS, type LabelRun, type MarkedKind, type Scale } from './markTables';

export type { MarkedKind, Scale } from './markTables';

/** A marking: what a person reads, the exact value that stands behind it, and its position on the scale. */
export interface Mark {
  readonly label: string;
  readonly exact: number;
  /** Whole steps, but for times of whole seconds beyond the slowest marking, which lie where they lie. */
  readonly position: number;
}

export type Rounding = 'nearest' | 'floor' | 'ceil';

const STEPS: Record<Scale, number> = { full: 1, half: 2, third: 3 };

/** Markings are recognised when a value lies within this share of the number on the dial. */
const SAME_MARK = 1e-6;

/** Positions this close to a whole number are on the mark; covers rounding of log2 and pow. */
const ON_POSITION = 1e-9;

/** Steps of a scale in one stop: 1, 2 or 3. */
export function stepsPerStop(scale: Scale): number {
  return STEPS[scale];
}

/**
 * Position of an exact value on a scale, in steps: Av·n, Tv·n or log2(S/100)·n with n steps a stop.
 * Grows with a smaller aperture, a shorter time, a higher speed. Values > 0; not rounded.
 * Example: positionOf('aperture', 'third', 4√2) = 15. Derivation from the definitions of Av and Tv.
 */
export function positionOf(kind: MarkedKind, scale: Scale, exact: number): number {
  const n = STEPS[scale];
  if (kind === 'aperture') return 2 * Math.log2(exact) * n;
  return kind === 'shutter' ? -Math.log2(exact) * n : Math.log2(exact / 100) * n;
}

/**
 * Exact value at a position: N = 2^(p/2n), t = 2^(−p/n) s, S = 100·2^(p/n).
 * Example: exactAt('shutter', 'third', 21) = 1/128 s. Source: ISO 516 for time (exact reference values
 * are powers of two), the definition of the stop for the others.
 */
export function exactAt(kind: MarkedKind, scale: Scale, position: number): number {
  const stops = position / STEPS[scale];
  if (kind === 'aperture') return 2 ** (stops / 2);
  return kind === 'shutter' ? 2 ** -stops : 100 * 2 ** stops;
}

/** The number on the dial as a number: "1/125" is 0.008, "5.6" is 5.6. */
export function numberOfLabel(label: string): number {
  return label.startsWith('1/') ? 1 / Number(label.slice(2)) : Number(label);
}

/** Positions of one octave: the labels repeat, doubled or halved, beyond the tables' ends. */
function octave(kind: MarkedKind, run: 'thirds' | 'halves'): number {
  const perStop = run === 'thirds' ? 3 : 2;
  return kind === 'aperture' ? 2 * perStop : perStop;
}

function scaled(label: string, factor: number): string {
  if (label.startsWith('1/')) return `1/${Number(label.slice(2)) * factor}`;
  return String(Number((Number(label) * factor).toPrecision(6)));
}

function labelInRun(kind: MarkedKind, run: LabelRun, which: 'thirds' | 'halves', position: number): string {
  const span = octave(kind, which);
  const last = run.from + (run.labels.length - 1) * run.step;
  const above = Math.max(0, Math.ceil((position - last) / span));
  const below = Math.max(0, Math.ceil((run.from - position) / span));
  // The smallest f-numbers have two digits in the tables too (f/0.85); halving f/1.1 would give f/0.55
  // for 0.561, so below the tables the exact value is named to two digits.
  if (below > 0 && kind === 'aperture') {
    return String(Number((2 ** (position / span)).toPrecision(2)));
  }
  const label = run.labels[(position + (below - above) * span - run.from) / run.step] ?? '';
  return above + below === 0 ? label : scaled(label, 2 ** (above - below));
}

/** The label at a whole position of a scale, without the "f/" or the "s". */
function plainLabel(kind: MarkedKind, scale: Scale, position: number): string {
  if (scale === 'half' && position % 2 !== 0) return labelInRun(kind, HALVES[kind], 'halves', position);
  const third = scale === 'third' ? position : (position * 3) / STEPS[scale];
  return labelInRun(kind, THIRDS[kind], 'thirds', third);
}

function dressed(kind: MarkedKind, plain: string): string {
  if (kind === 'aperture') return `f/${plain}`;
  return kind === 'shutter' && !plain.startsWith('1/') ? `${plain}s` : plain;
}

/** Whole seconds on the wanted side; a count that is whole but for rounding errors stays as it is. */
function wholeSeconds(exact: number, rounding: Rounding): number {
  const near = Math.round(exact);
  if (Math.abs(exact - near) <= ON_POSITION * exact) return near;
  if (rounding === 'nearest') return Math.ceil(exact - 0.5);
  return rounding === 'ceil' ? Math.floor(exact) : Math.ceil(exact);
}

/** Times beyond the slowest marking are counted in seconds, so each whole second is a mark of its own. */
function secondsMark(scale: Scale, exact: number, rounding: Rounding): Mark {
  const whole = Math.max(SLOWEST_MARKED_S, wholeSeconds(exact, rounding));
  const position = positionOf('shutter', scale, whole);
  const label = whole === SLOWEST_MARKED_S ? plainLabel('shutter', scale, position) : String(whole);
  return { label: dressed('shutter', label), exact: whole, position };
}

/**
 * The marking at a whole position of a scale.
 * @param position whole steps; a time slower than 30 s is given as the nearest whole seconds
 * @returns the mark. Throws RangeError when the position is not whole or its value is no finite number over 0.
 * Example: markAt('aperture', 'third', 15) is f/5.6, exact 4√2.
 * Source: the tables' sources; beyond their ends labels double or halve with the value ("f/90", "1/64000").
 */
export function markAt(kind: MarkedKind, scale: Scale, position: number): Mark {
  if (!Number.isInteger(position)) throw new RangeError(`position is ${position}, but must be whole`);
  const exact = inDomain(kind, exactAt(kind, scale, position), SMALLEST, ANY);
  if (kind === 'shutter' && exact > SLOWEST_MARKED_S) return secondsMark(scale, exact, 'nearest');
  // Rounding and signs make −0 of the scale's origin, which is the same place.
  const at = position === 0 ? 0 : position;
  return { label: dressed(kind, plainLabel(kind, scale, at)), exact, position: at };
}

/**
 * The marking to set for an exact value.
 * @param exact f-number, seconds or ISO speed, > 0
 * @param rounding nearest (an exact half goes to the smaller aperture, shorter time, higher speed),
 *   `ceil` (never a larger aperture, longer time, lower speed than asked) or `floor` (the other way)
 * @returns the mark; over 32 s (the mark 30 s) the whole seconds. Throws RangeError when exact is not over 0.
 * Example: nearestMark('shutter', 'third', 1/128) is 1/125; 45.2 s is "45s".
 * Source: derivation; the tie is a modelling choice.
 */
export function nearestMark(
  kind: MarkedKind,
  scale: Scale,
  exact: number,
  rounding: Rounding = 'nearest',
): Mark {
  const position = positionOf(kind, scale, inDomain(kind, exact, SMALLEST, ANY));
  if (kind === 'shutter' && exact > SLOWEST_MARKED_S) return secondsMark(scale, exact, rounding);
  const whole = Math.round(position);
  if (Math.abs(position - whole) < ON_POSITION) return markAt(kind, scale, whole);
  if (rounding === 'nearest') return markAt(kind, scale, Math.floor(position + 0.5 + ON_POSITION));
  return markAt(kind, scale, rounding === 'ceil' ? Math.ceil(position) : Math.floor(position));
}

/**
 * The exact value behind a number read off a dial, or the number itself where it is no marking of the scale.
 * Example: exactOfMarking('aperture', 'third', 1.2) = 2^(1/3), on the half-stop scale 2^(1/4).
 * Times over 30 s always mean themselves. Source: ISO 516 and trade practice, see the tables.
 */
export function exactOfMarking(kind: MarkedKind, scale: Scale, value: number): number {
  if (kind === 'shutter' && value > 30 * (1 + SAME_MARK)) return value;
  const position = Math.round(positionOf(kind, scale, value));
  if (!Number.isFinite(position)) return value;
  const marking = numberOfLabel(plainLabel(kind, scale, position));
  const isMarking = Number.isFinite(marking) && Math.abs(value - marking) <= SAME_MARK * marking;
  return isMarking ? exactAt(kind, scale, position) : value;
}

/**
 * How much brighter (+) or darker (−) the picture gets with the value `set` instead of `wanted`, in stops.
 * Aperture: 2·log2(wanted/set); time and speed: log2(set/wanted). Derivation from H ∝ t·S/N².
 */
export function residualStops(kind: MarkedKind | 'power', wanted: number, set: number): number {
  return kind === 'aperture' ? 2 * Math.log2(wanted / set) : Math.log2(set / wanted);
}
