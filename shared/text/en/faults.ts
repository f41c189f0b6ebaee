import { counted, listed, quoted, readable, withUnit } from './format';

interface Named {
  readonly title: string;
}

interface Allowed {
  readonly minimum?: number;
  readonly maximum?: number;
  readonly isAbove?: boolean;
  readonly unit?: string;
}

const NUMBERS = ['none', 'one', 'two', 'three', 'four', 'five'];
const inWords = (count: number) => NUMBERS[count] ?? readable(count);

/** What is allowed, in units: "from 0.5 to 256", "above 0 and at most 1", "at least 1 m". */
function allowed({ minimum, maximum, isAbove, unit }: Allowed): string {
  const low = minimum === undefined ? '' : readable(minimum);
  const high = maximum === undefined ? '' : withUnit(readable(maximum), unit);
  if (low && high) return isAbove ? `above ${low} and at most ${high}` : `from ${low} to ${high}`;
  if (low) return `${isAbove ? 'above' : 'at least'} ${withUnit(low, unit)}`;
  return high ? `at most ${high}` : 'a number within reach';
}

/** What was given as the object of a sentence: text is called so, since "400" and 400 look alike. */
const told = (given: unknown) => (typeof given === 'string' ? `the text ${quoted(given)}` : quoted(given));

/** Numbers carry the field's unit; text has its own. */
const measured = (given: unknown, unit?: string) =>
  typeof given === 'number' && Number.isFinite(given) ? withUnit(quoted(given), unit) : quoted(given);

const were = (given: readonly string[]) =>
  given.length === 0
    ? 'none was given'
    : `${listed(given, 'and')} ${given.length === 1 ? 'was' : 'were'} given`;

/** Sentences for faults in a request, by code. They say what was given and what is allowed. */
export const faults = {
  missing: (p: Named & { allowed?: string }) =>
    `${p.title} is missing${p.allowed ? `; give ${p.allowed}` : ''}.`,
  wrong_type: (p: Named & { given: unknown; wanted: string }) =>
    `${p.title} takes ${p.wanted}; ${told(p.given)} was given.`,
  not_a_setting: (p: Named & { given: unknown; wanted: string }) =>
    `${p.title} takes ${p.wanted}; ${quoted(p.given)} can’t be read as that.`,
  wrong_format: (p: Named & { given: unknown; wanted: string }) =>
    `${p.title} takes ${p.wanted}; ${quoted(p.given)} can’t be read as that.`,
  out_of_range: (p: Named & Allowed & { given: unknown }) =>
    `${p.title} must be ${allowed(p)}, not ${measured(p.given, p.unit)}.`,
  not_a_choice: (p: Named & { given: unknown; choices: readonly string[] }) =>
    `${p.title} is one of ${listed(p.choices)}; ${quoted(p.given)} was given.`,
  unknown_field: (p: { field: string; suggestion?: string; known: readonly string[] }) => {
    const start = `${quoted(p.field)} is not a field here`;
    if (p.suggestion) return `${start}; did you mean “${p.suggestion}”?`;
    if (p.known.length === 0) return `${start}; there are none.`;
    return `${start}; ${p.known.length === 1 ? 'the only one is' : 'there are'} ${listed(p.known, 'and')}.`;
  },
  exactly: (p: { fields: readonly string[]; count: number; given: readonly string[] }) =>
    `Give exactly ${inWords(p.count)} of ${listed(p.fields, 'and')}; ${were(p.given)}.`,
  at_most_one: (p: { fields: readonly string[]; given: readonly string[] }) =>
    `Give at most one of ${listed(p.fields, 'and')}; ${were(p.given)}.`,
  too_few_items: (p: Named & { minimum: number; given: number }) =>
    `${p.title} takes at least ${counted(p.minimum, 'item')}; ${readable(p.given)} ${p.given === 1 ? 'was' : 'were'} given.`,
  too_many_items: (p: Named & { maximum: number; given: number }) =>
    `${p.title} takes at most ${counted(p.maximum, 'item')}; ${readable(p.given)} were given.`,
  too_short: (p: Named & { minimum: number; given: number }) =>
    `${p.title} takes at least ${counted(p.minimum, 'character')}; ${readable(p.given)} ${p.given === 1 ? 'was' : 'were'} given.`,
  too_long: (p: Named & { maximum: number; given: number }) =>
    `${p.title} takes at most ${counted(p.maximum, 'character')}; ${readable(p.given)} were given.`,
  not_valid: (p: Named & { given: unknown }) => `${p.title} can’t be read; ${told(p.given)} was given.`,
} as const;

/** Rules between fields as the documents state them, before anything was given. */
export const rules = {
  exactly: (p: { fields: readonly string[]; count: number }) =>
    `Give exactly ${inWords(p.count)} of ${listed(p.fields, 'and')}.`,
  at_most_one: (p: { fields: readonly string[] }) => `Give at most one of ${listed(p.fields, 'and')}.`,
} as const;

/** Words for what a field takes, by its kind. */
export const wanted = {
  number: (p: { unit?: string; isInteger?: boolean }) =>
    `${p.isInteger ? 'a whole number' : 'a number'}${p.unit ? ` in ${p.unit}` : ''}`,
  aperture: () => 'a number such as 5.6, or text such as "f/5.6"',
  shutter: () => 'seconds as a number such as 0.5, or text such as "1/125" or "2s"',
  iso: () => 'a number such as 400',
  power: () => 'a fraction of full power such as 0.25, or text such as "1/16" or "1/16+1/3"',
  text: () => 'text',
  datetime: () => 'a time with its offset such as "2026-06-21T21:30:00+02:00"',
  date: () => 'a date such as "2026-06-21"',
  boolean: () => 'true or false',
  choice: (p: { choices: readonly string[] }) => `one of ${listed(p.choices)}`,
  group: () => 'an object with named fields',
  list: () => 'a list',
} as const;
