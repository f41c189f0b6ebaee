import type { z } from 'zod';

const BESIDE_VALUES: unknown[] = ['exactly', 'at_most_one', 'contradiction'];

function isBesideValues(issue: z.core.$ZodRawIssue): boolean {
  if (issue.code === 'unrecognized_keys') return true;
  const params = issue.params as { fault?: string } | undefined;
  return issue.code === 'custom' && BESIDE_VALUES.includes(params?.fault);
}

/**
 * Whether the values that a check between fields reads are well formed, so that it may run. Left alone, zod
 * skips such a check after any fault, and a request would be told its faults in instalments.
 * @param reads top-level fields that the check reads; none named: all of them
 */
export function wellFormed(reads: readonly string[] = []) {
  return ({ issues }: { readonly issues: readonly z.core.$ZodRawIssue[] }): boolean =>
    issues.every((issue) => {
      if (isBesideValues(issue)) return true;
      const first = issue.path?.[0];
      return reads.length > 0 && first !== undefined && !reads.includes(String(first));
    });
}
