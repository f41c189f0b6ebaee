import type { z } from 'zod';
import { faults as sentences, wanted } from '../text';
import type { Field } from './field';
import { givenOf } from './exactlyOne';
import { closest } from './closest';

/** One fault in a request: where, a stable code, and a sentence that says what is allowed. */
export interface Fault {
  readonly pointer: string;
  readonly code: string;
  readonly detail: string;
}

type Issue = z.core.$ZodIssue;
type Path = readonly PropertyKey[];
/** So many unknown names get a suggestion; in a body of thousands nobody reads them, and each costs time. */
const MOST_SUGGESTIONS = 20;

type Params = { fault?: string; code?: string; fields?: readonly string[]; count?: number };

/** A JSON Pointer (RFC 6901) of a path. */
export function pointerOf(path: Path): string {
  return path.map((part) => `/${String(part).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('');
}

function valueAt(input: unknown, path: Path): unknown {
  return path.reduce<unknown>(
    (value, part) =>
      typeof value === 'object' && value !== null && Object.hasOwn(value, part)
        ? (value as Record<PropertyKey, unknown>)[part]
        : undefined,
    input,
  );
}

/** The field that a path leads to; numbers step into a list's item. */
function fieldAt(fields: readonly Field[], path: Path): Field | undefined {
  let level: readonly Field[] = fields;
  let found: Field | undefined;
  for (const part of path) {
    found = typeof part === 'number' ? found?.item : level.find((field) => field.name === part);
    if (found?.kind === 'oneOrMany' && typeof part !== 'number') level = found.item?.fields ?? [];
    else level = found?.fields ?? [];
  }
  return found;
}

function wantedBy(field: Field): string {
  if (field.kind === 'setting') return wanted[field.setting ?? 'iso']();
  if (field.kind === 'number') return wanted.number({ unit: field.unit, isInteger: field.isInteger });
  if (field.kind === 'choice') return wanted.choice({ choices: field.choices ?? [] });
  if (field.kind === 'oneOrMany')
    return `${field.item ? wantedBy(field.item) : 'a value'}, or a list of such`;
  return field.format ? wanted[field.format]() : wanted[field.kind]();
}

function nameOf(field: Field | undefined, path: Path): string {
  const last = path[path.length - 1];
  if (typeof last === 'number') return `Item ${last + 1}`;
  return field?.title ?? (last === undefined ? 'The body' : String(last));
}

/** The field that a lone value of a one-or-many field is judged by. */
const scalarOf = (field: Field | undefined) => (field?.kind === 'oneOrMany' ? field.item : field);

function outOfRange(issue: Issue, field: Field | undefined, title: string, given: unknown): string {
  const scalar = scalarOf(field);
  const bound = issue as { minimum?: number; maximum?: number };
  return sentences.out_of_range({
    title,
    given,
    minimum: scalar?.minimum ?? bound.minimum,
    maximum: scalar?.maximum ?? bound.maximum,
    isAbove: scalar?.minimumIsExcluded,
    unit: scalar?.unit,
  });
}

function ofSize(issue: Issue, field: Field | undefined, title: string, given: unknown): [string, string] {
  const { origin } = issue as { origin?: string };
  if (origin !== 'array' && origin !== 'string')
    return ['out_of_range', outOfRange(issue, field, title, given)];
  const length = (given as ArrayLike<unknown>).length;
  const isText = origin === 'string';
  if (issue.code === 'too_small') {
    const code = isText ? 'too_short' : 'too_few_items';
    return [code, sentences[code]({ title, minimum: Number(issue.minimum), given: length })];
  }
  const code = isText ? 'too_long' : 'too_many_items';
  const maximum = Number((issue as { maximum?: number }).maximum);
  return [code, sentences[code]({ title, maximum, given: length })];
}

function ofCustom(issue: Issue, field: Field | undefined, title: string, given: unknown): [string, string] {
  const { fault = 'not_valid', code } = ((issue as { params?: Params }).params ?? {}) as Params;
  if (fault === 'contradiction') return [code ?? fault, issue.message];
  if (fault === 'missing') return [fault, sentences.missing({ title, allowed: field && wantedBy(field) })];
  if (fault === 'out_of_range') return [fault, outOfRange(issue, field, title, given)];
  if ((fault === 'not_a_setting' || fault === 'wrong_type') && field)
    return [fault, sentences[fault]({ title, given, wanted: wantedBy(field) })];
  return ['not_valid', sentences.not_valid({ title, given })];
}

/** JSON's 1e999 is read as infinity: a number, and out of every range. */
const isInfinite = (given: unknown) => given === Infinity || given === -Infinity;

function explain(issue: Issue, field: Field | undefined, title: string, given: unknown): [string, string] {
  if (given === undefined && issue.code !== 'custom')
    return ['missing', sentences.missing({ title, allowed: field && wantedBy(field) })];
  const allowed = field ? wantedBy(field) : wanted.group();
  switch (issue.code) {
    case 'invalid_type':
      if (isInfinite(given)) return ['out_of_range', outOfRange(issue, field, title, given)];
      return ['wrong_type', sentences.wrong_type({ title, given, wanted: allowed })];
    case 'invalid_format':
      return ['wrong_format', sentences.wrong_format({ title, given, wanted: allowed })];
    case 'too_small':
    case 'too_big':
      return ofSize(issue, field, title, given);
    case 'invalid_value':
      return ['not_a_choice', sentences.not_a_choice({ title, given, choices: issue.values.map(String) })];
    case 'custom':
      return ofCustom(issue, field, title, given);
    default:
      return ['not_valid', sentences.not_valid({ title, given })];
  }
}

/** An unknown name is told with the known name that comes nearest. */
function unknownFields(issue: Issue & { keys: string[] }, fields: readonly Field[], path: Path): Fault[] {
  const known =
    (path.length ? (fieldAt(fields, path)?.fields ?? fieldAt(fields, path)?.item?.fields) : fields) ?? [];
  const names = known.map((field) => field.name);
  return issue.keys.map((key, i) => ({
    pointer: pointerOf([...path, key]),
    code: 'unknown_field',
    detail: sentences.unknown_field({
      field: key,
      suggestion: i < MOST_SUGGESTIONS ? closest(key, names) : undefined,
      known: names,
    }),
  }));
}

/** Too few alternatives are told at the first, too many at each one after the allowed number. */
function ofAlternatives(params: Params, input: unknown, path: Path): Fault[] {
  const { fields = [], count = 1, fault = 'exactly' } = params;
  const object = valueAt(input, path);
  const given = givenOf(typeof object === 'object' && object !== null ? object : {}, fields);
  const blamed =
    given.length > count ? given.slice(count) : fields.filter((f) => !given.includes(f)).slice(0, 1);
  const detail =
    fault === 'exactly'
      ? sentences.exactly({ fields, count, given })
      : sentences.at_most_one({ fields, given });
  return blamed.map((field) => ({ pointer: pointerOf([...path, field]), code: `${fault}`, detail }));
}

/** All faults of a request as people read them, each once, in the order in which the schema found them. */
export function faultsOf(issues: readonly Issue[], fields: readonly Field[], input: unknown): Fault[] {
  const all = issues.flatMap((issue) => {
    if (issue.code === 'unrecognized_keys') return unknownFields(issue, fields, issue.path);
    const params = (issue as { params?: Params }).params;
    if (params?.fault === 'exactly' || params?.fault === 'at_most_one')
      return ofAlternatives(params, input, issue.path);
    const field = fieldAt(fields, issue.path);
    const [code, detail] = explain(issue, field, nameOf(field, issue.path), valueAt(input, issue.path));
    return [{ pointer: pointerOf(issue.path), code, detail }];
  });
  // A whole number beyond what a double holds is told twice by the schema.
  return [...new Map(all.map((fault) => [`${fault.pointer} ${fault.code} ${fault.detail}`, fault])).values()];
}
