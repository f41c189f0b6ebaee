import { ConnectionError, DatabaseError } from 'sequelize';

/** PostgreSQL's classes of a server that goes, comes or is too slow (manual, appendix A). */
const AWAY = /^(57P0\d|57014|08\w{3}|53300)$/;

const codeOf = (error: DatabaseError) => (error.original as { code?: string } | null)?.code ?? '';

/** Whether a failure means that the database can't be reached, rather than that we asked something wrong. */
export function isDatabaseAway(error: unknown): boolean {
  if (error instanceof ConnectionError) return true;
  if (!(error instanceof Error)) return false;
  if (error instanceof DatabaseError && AWAY.test(codeOf(error))) return true;
  return /Connection terminated|Query read timeout|timeout exceeded when trying to connect/.test(
    error.message,
  );
}

/** A failure as the log may have it: a database's own error carries the statement and its values. */
export function withoutSecrets(error: unknown): Error {
  if (!(error instanceof Error)) return new Error('something that is no error was thrown');
  const plain = new Error(
    error instanceof DatabaseError ? `the database refused a statement (${codeOf(error)})` : error.message,
  );
  plain.name = error.name;
  plain.stack = (error.stack ?? '')
    .split('\n')
    .filter((line) => /^\s+at /.test(line))
    .join('\n');
  return plain;
}
