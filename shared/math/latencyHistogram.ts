/** Buckets of a latency histogram: upper bounds of 0.1 ms · 2^(i/2), the last one open. */
export const LATENCY_BUCKETS = 36;
const FIRST_MS = 0.1;

/**
 * The bucket that a duration falls into.
 * @param ms milliseconds ≥ 0
 * @returns 0 up to LATENCY_BUCKETS − 1; 0.1 ms and less is 0, 1 ms is 7. Derivation: i = ⌈2·log2(ms/0.1)⌉.
 */
export function latencyBucket(ms: number): number {
  if (ms <= FIRST_MS) return 0;
  return Math.min(LATENCY_BUCKETS - 1, Math.ceil(2 * Math.log2(ms / FIRST_MS)));
}

/** Upper bound of a bucket in milliseconds: 0.1·2^(i/2). Example: bucket 2 ends at 0.2 ms. */
function bucketEndMs(bucket: number): number {
  return FIRST_MS * 2 ** (bucket / 2);
}

/**
 * A percentile of a histogram, by interpolation in ratio inside the bucket that holds it.
 * @param counts calls a bucket
 * @param share 0 to 1, for example 0.95
 * @returns milliseconds, or null for an empty histogram. All in one bucket: a point inside it. Derivation.
 */
export function percentileMs(counts: readonly number[], share: number): number | null {
  const total = counts.reduce((sum, count) => sum + count, 0);
  if (total === 0) return null;
  const wanted = share * total;
  let before = 0;
  for (const [bucket, count] of counts.entries()) {
    if (count > 0 && before + count >= wanted)
      return bucketEndMs(bucket - 1) * Math.SQRT2 ** Math.max(0, (wanted - before) / count);
    before += count;
  }
  return bucketEndMs(counts.length - 1);
}
