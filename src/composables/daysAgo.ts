import { clock } from './clock';

const DAY_MS = 86_400_000;

/** The day of UTC so many days before this one, YYYY-MM-DD. */
export function daysAgo(days: number): string {
  return new Date(clock.now().getTime() - days * DAY_MS).toISOString().slice(0, 10);
}
