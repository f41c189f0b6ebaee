import { expect } from 'vitest';

/**
 * Runs a check over every row of a published table and asserts how many were run, so that a shortened table can't
 * pass unnoticed.
 */
export function eachRow<Row>(
  table: { readonly rows: readonly Row[] },
  count: number,
  check: (row: Row, where: string) => void,
): void {
  let checked = 0;
  for (const row of table.rows) {
    check(row, JSON.stringify(row));
    checked += 1;
  }
  expect(checked, 'rows checked').toBe(count);
}
