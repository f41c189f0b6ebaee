/**
 * A cap as it is typed; nothing is none. What is no number goes out as it stands, so that the service says what is
 * wrong with it: JSON would turn it into none at all.
 */
export function readCap(text: string): number | null {
  const bare = text.replace(/[\s,]/g, '');
  if (bare === '') return null;
  const cap = Number(bare);
  return Number.isFinite(cap) ? cap : (bare as unknown as number);
}

/** The end of a day as its date is typed, in the reader's own zone; null for none. */
export function readExpiry(date: string): string | null {
  if (date === '') return null;
  const end = new Date(`${date}T23:59:59`);
  return Number.isNaN(end.getTime()) ? date : end.toISOString();
}

/** The date to show in a date field for a moment. */
export function shownDate(iso: string | null): string {
  if (iso === null) return '';
  const at = new Date(iso);
  const two = (value: number) => String(value).padStart(2, '0');
  return `${at.getFullYear()}-${two(at.getMonth() + 1)}-${two(at.getDate())}`;
}
