import fc from 'fast-check';

const STEPS = 2 ** 31 - 1;

/** Shares from 0 to 1, evenly. `fc.double` spreads over the doubles there are, nearly all of which are close to 0. */
const share = fc.oneof(
  { weight: 8, arbitrary: fc.integer({ min: 0, max: STEPS }).map((n) => n / STEPS) },
  { weight: 1, arbitrary: fc.constantFrom(0, 1) },
);

/** Numbers spread evenly over a range, its ends among them. */
export const evenly = (low: number, high: number) =>
  share.map((part) => Math.min(high, Math.max(low, low + part * (high - low))));

/** Numbers over 0 spread evenly in ratio, so that each octave gets its share, the ends among them. */
export const inRatio = (low: number, high: number) =>
  share.map((part) => {
    if (part === 0) return low;
    return part === 1 ? high : Math.min(high, Math.max(low, low * (high / low) ** part));
  });
