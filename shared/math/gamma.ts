import { inDomain } from './domain';

/** Coefficients of Lanczos's approximation for g = 7 and nine terms, as textbooks print them (from memory). */
const G = 7;
const TERMS = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
  12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
];

/**
 * The gamma function of 1 + a, which is a! for whole a.
 *
 * Γ(1 + a) = √(2π)·(a + g + 1/2)^(a + 1/2)·e^−(a + g + 1/2)·A(a), A(a) = c0 + Σ ci/(a + i)
 *
 * @param a dimensionless, 0 to 140
 * @returns Γ(1 + a), dimensionless, to about 14 digits
 * @throws RangeError when the value is outside its domain
 * @example gammaOnePlus(4) // 24
 * @source Lanczos's approximation; the coefficients are checked against factorials and Γ(1/2) = √π
 */
export function gammaOnePlus(a: number): number {
  inDomain('a', a, 0, 140);
  let sum = TERMS[0] ?? 0;
  for (let i = 1; i < TERMS.length; i++) sum += (TERMS[i] ?? 0) / (a + i);
  const t = a + G + 0.5;
  return Math.sqrt(2 * Math.PI) * t ** (a + 0.5) * Math.exp(-t) * sum;
}
