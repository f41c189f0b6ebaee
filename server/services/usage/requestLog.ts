import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import type { LoggedCall } from './UsageRecorder';

export interface LogQuestion {
  readonly keyId: string;
  /** Where the page before ended: a row, and a line in it. */
  readonly before: { readonly row: string; readonly line: number } | null;
  readonly statusClass: number | null;
  readonly calculator: string | null;
}

export interface LogLine extends LoggedCall {
  readonly row: string;
  readonly line: number;
}

const PAGE = 50;

const SELECT = `
SELECT l.id::text AS row, t.line::int AS line, t.call
FROM request_log l, jsonb_array_elements(l.calls) WITH ORDINALITY t (call, line)
WHERE l.key_id = $1 AND ($2::bigint IS NULL OR l.id <= $2::bigint AND (l.id, t.line) < ($2::bigint, $3::bigint))
  AND ($4::int IS NULL OR (t.call ->> 'status')::int / 100 = $4::int)
  AND ($5::text IS NULL OR t.call ->> 'calculator' = $5::text)
ORDER BY l.id DESC, t.line DESC LIMIT ${PAGE + 1}`;

/** A page of a key's recent calls, the latest first. */
export async function requestLog(
  database: ConsoleDatabase,
  { keyId, before, statusClass, calculator }: LogQuestion,
): Promise<{ lines: LogLine[]; hasMore: boolean }> {
  const rows = await database.rows<{ row: string; line: number; call: LoggedCall }>(SELECT, [
    keyId,
    before?.row ?? null,
    before?.line ?? null,
    statusClass,
    calculator,
  ]);
  const lines = rows.slice(0, PAGE).map(({ row, line, call }) => ({ ...call, row, line }));
  return { lines, hasMore: rows.length > PAGE };
}
