import { formatNumber } from './formatQuantity';

/** Sums of calls that have something in common. */
export interface Sums {
  readonly calls: number;
  readonly units: number;
  readonly refused: number;
  readonly failed: number;
  readonly p50Ms: number | null;
  readonly p95Ms: number | null;
}

export interface UsageRow extends Sums {
  readonly name: string;
  readonly to?: string;
}

const STATUS_CLASSES: Readonly<Record<number, string>> = {
  2: '2xx and 304, answered',
  3: '3xx',
  4: '4xx, refused',
  5: '5xx, our fault',
};

export const statusClassText = (statusClass: number): string =>
  STATUS_CLASSES[statusClass] ?? `${statusClass}xx`;

/** Milliseconds to as many digits as matter. */
export function formatMs(ms: number | null): string {
  if (ms === null) return '—';
  if (ms >= 100) return formatNumber(Math.round(ms));
  return formatNumber(Number(ms.toPrecision(2)));
}

/** A cell that no spreadsheet takes for a formula. */
function cell(value: string | number): string {
  const text = typeof value === 'string' && /^[=+\-@\t\r]/.test(value) ? `'${value}` : String(value);
  return /[",\n\r]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** Tables of usage as one comma-separated text (RFC 4180). */
export function usageCsv(tables: readonly { by: string; rows: readonly UsageRow[] }[]): string {
  const head = ['by', 'name', 'calls', 'units', 'refused', 'failed', 'p50_ms', 'p95_ms'];
  const lines = tables.flatMap(({ by, rows }) =>
    rows.map(({ name, calls, units, refused, failed, p50Ms, p95Ms }) => [
      by,
      name,
      calls,
      units,
      refused,
      failed,
      p50Ms?.toFixed(3) ?? '',
      p95Ms?.toFixed(3) ?? '',
    ]),
  );
  return [head, ...lines].map((line) => `${line.map(cell).join(',')}\r\n`).join('');
}
