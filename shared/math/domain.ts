/** Any finite number, as an upper bound; −ANY as a lower one. */
export const ANY = Number.MAX_VALUE;
/** The smallest number above 0, as a lower bound. */
export const SMALLEST = Number.MIN_VALUE;

/**
 * Guards a function's domain, so that bad input fails loudly instead of travelling on as NaN.
 * @param what names the value in the message
 * @param value the value to look at
 * @param lowest smallest value allowed
 * @param highest largest value allowed
 * @returns the value itself. Throws RangeError when it is NaN or outside the bounds.
 * Example: inDomain('aperture', 8, SMALLEST, ANY) is 8.
 */
export function inDomain(what: string, value: number, lowest: number, highest: number): number {
  if (value >= lowest && value <= highest) return value;
  throw new RangeError(`${what} is ${value}, but must lie between ${lowest} and ${highest}`);
}
