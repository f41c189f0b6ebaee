/** One step of the schema; `sql` runs in a transaction of its own and is never edited once released. */
export interface Migration {
  readonly name: string;
  readonly sql: string;
}
