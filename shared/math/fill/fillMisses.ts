import type { FillAim, FillMisses, FillOutcome } from './fillTypes';

/** A ratio or a rim that is not there at all counts as missed by this much, and no miss of them as more. */
export const ABSENT_STOPS = 10;

type Lit = Pick<FillOutcome, 'backgroundStops' | 'subjectStops' | 'ratio' | 'rimStops'>;

/** Room for rounding where a miss stands on a whole part. */
const ON_COUNT = 1e-6;

/**
 * How far each part that is wished for comes out from the aim: what it is minus what was wished, in stops; for the
 * ratio log2 of is over wished, which is how much the lit side stands too far above the shadow.
 *
 * @param lit how the frame comes out
 * @param aim what was wished
 * @returns stops, + is too bright or too contrasty
 * @example background at −0.1 for an aim of 0: −0.1
 * @source definition
 */
export function missesOf(lit: Lit, aim: FillAim): FillMisses {
  return {
    backgroundStops: lit.backgroundStops - aim.backgroundStops,
    subjectStops: lit.subjectStops - aim.subjectStops,
    ...(aim.ratio === null
      ? {}
      : { ratioStops: lit.ratio === null ? null : Math.log2(lit.ratio) - Math.log2(aim.ratio) }),
    ...(aim.rimStops === null
      ? {}
      : { rimStops: lit.rimStops === null ? null : lit.rimStops - aim.rimStops }),
  };
}

const extra = (stops: number | null) =>
  stops === null ? ABSENT_STOPS : Math.min(ABSENT_STOPS, Math.abs(stops));

/** The misses without their signs, those of parts that are wished for; a part left out of `parts` does not count. */
export function sizesOf(misses: FillMisses, parts = { ratio: true, rim: true }): number[] {
  const { backgroundStops, subjectStops, ratioStops, rimStops } = misses;
  const sizes = [Math.abs(backgroundStops), Math.abs(subjectStops)];
  if (ratioStops !== undefined && parts.ratio) sizes.push(extra(ratioStops));
  if (rimStops !== undefined && parts.rim) sizes.push(extra(rimStops));
  return sizes;
}

/** Misses are counted in parts of a stop this small: half a step of any scale is a whole number of them. */
const PARTS_A_STOP = 120;

/**
 * A miss in whole parts of 1/120 stop, rounded up; no meter and no shutter tells less apart.
 * @example countOf(1 / 6) // 20, half a step of thirds
 */
export function countOf(stops: number): number {
  return Math.max(0, Math.ceil(PARTS_A_STOP * Math.abs(stops) - ON_COUNT));
}

/** What an absent part counts. */
export const ABSENT_COUNT = countOf(ABSENT_STOPS);

/** The largest miss of so many parts, stops; the inverse of {@link countOf}. */
export function mostAt(count: number): number {
  return (count + ON_COUNT) / PARTS_A_STOP;
}

/** Two to this is still a finite number beside light of any strength. */
const MOST_STOPS = 500;
const factors = Array.from({ length: ABSENT_COUNT + 1 }, (_, count) => 2 ** mostAt(count));

/** The factor of light that so many parts of a miss are, which is asked for again and again. */
export function factorAt(count: number): number {
  return factors[count] ?? 2 ** Math.min(mostAt(count), MOST_STOPS);
}
