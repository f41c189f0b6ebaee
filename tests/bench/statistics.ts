/** The value below which a share of the values lies. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  const value = sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))];
  if (value === undefined) throw new Error('nothing was measured');
  return value;
}

export function median(values: readonly number[]): number {
  return quantile(values, 0.5);
}

/** A median with the quartiles around it, to tell how noisy the machine was. */
export function spread(values: readonly number[], digits: number): string {
  const [low, middle, high] = [0.25, 0.5, 0.75].map((share) => quantile(values, share).toFixed(digits));
  return `${middle} (quartiles ${low} to ${high})`;
}
