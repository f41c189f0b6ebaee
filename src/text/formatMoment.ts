/** A moment in the reader's own zone, which it names: 1 Dec 2026, 10:20 UTC; with seconds where they matter. */
export function formatMoment(iso: string | null, hasSeconds = false): string {
  if (iso === null) return '—';
  return new Intl.DateTimeFormat('en-GB', {
    year: 'numeric',
    month: 'short',
    day: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    ...(hasSeconds && { second: '2-digit' as const }),
    timeZoneName: 'short',
  }).format(new Date(iso));
}

/** A day in the reader's own zone. */
export function formatDay(iso: string | null): string {
  if (iso === null) return '—';
  return new Intl.DateTimeFormat('en-GB', { year: 'numeric', month: 'short', day: 'numeric' }).format(
    new Date(iso),
  );
}
