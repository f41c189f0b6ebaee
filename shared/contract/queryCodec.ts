import type { Field } from './field';

/** Values as they stand in a query: dotted names, text. */
export type QueryPairs = readonly (readonly [name: string, value: string])[];

const NUMBER = /^[+-]?(\d+(\.\d*)?|\.\d+)([eE][+-]?\d+)?$/;
const INDEX = /^(0|[1-9]\d{0,3})$/;

/** No input nests deeper; a longer name is left whole, so that it is told as an unknown field. */
const DEEPEST = 8;

/** A group or list under construction. Without a prototype, so that no name means more than itself. */
type Branch = Record<string, unknown>;
const branch = (): Branch => Object.create(null) as Branch;
const isBranch = (value: unknown): value is Branch => typeof value === 'object' && value !== null;

/** Text becomes a number only where the field takes one and the text is one; nothing is guessed. */
function decodeScalar(text: string, field: Field | undefined): unknown {
  const kind = field?.kind === 'oneOrMany' ? field.item?.kind : field?.kind;
  if (kind === 'number' || kind === 'setting') return NUMBER.test(text) ? Number(text) : text;
  if (kind === 'boolean' && (text === 'true' || text === 'false')) return text === 'true';
  return text;
}

function childOf(field: Field | undefined, fields: readonly Field[], part: string): Field | undefined {
  if (INDEX.test(part)) return field?.item;
  return fields.find((candidate) => candidate.name === part);
}

/** Puts a value in its place. Where a name is both a value and a group, the value stays, to be told as a fault. */
function place(root: Branch, parts: readonly string[], text: string, fields: readonly Field[]): void {
  let level = root;
  let field: Field | undefined;
  let known = fields;
  parts.forEach((part, i) => {
    field = childOf(field, known, part);
    known = field?.fields ?? field?.item?.fields ?? [];
    if (i === parts.length - 1) {
      level[part] = decodeScalar(text, field);
      return;
    }
    const held = level[part] ?? branch();
    level[part] = held;
    // A value in the way takes no more parts; what follows falls into a branch that nobody keeps.
    level = isBranch(held) ? held : branch();
  });
}

/** Branches whose names count from 0 without a gap become lists; in any other order they stay as they are. */
function settled(held: Branch, field?: Field): unknown {
  const names = Object.keys(held);
  const known = field?.fields ?? field?.item?.fields ?? [];
  for (const name of names) {
    const inner = held[name];
    if (isBranch(inner)) held[name] = settled(inner, childOf(field, known, name));
  }
  const isList = field?.kind !== 'group' && names.every((_, i) => String(i) in held);
  return isList ? names.map((_, i) => held[String(i)]) : held;
}

/**
 * Reads query pairs into a calculator's input: `limits.isoMax=800` is { limits: { isoMax: 800 } },
 * `parts.0.stops=1` is { parts: [{ stops: 1 }] }. Values keep their text where it does not fit the field,
 * so that the schema's message says what was wrong; names that mean nothing are kept, so that it names them.
 */
export function decodeQuery(pairs: QueryPairs, fields: readonly Field[]): Record<string, unknown> {
  const root = branch();
  for (const [name, text] of pairs) {
    const parts = name.split('.', DEEPEST + 1);
    place(root, parts.length > DEEPEST ? [name] : parts, text, fields);
  }
  for (const [name, inner] of Object.entries(root))
    if (isBranch(inner))
      root[name] = settled(
        inner,
        fields.find((field) => field.name === name),
      );
  return root;
}

/**
 * Writes an input as query pairs; the inverse of `decodeQuery` for anything a schema lets through, but for
 * groups and lists that hold nothing, which a query can't say.
 */
export function encodeQuery(input: unknown, prefix = ''): [string, string][] {
  if (input === undefined || input === null) return [];
  if (typeof input !== 'object') return [[prefix, String(input as string | number | boolean)]];
  return Object.entries(input).flatMap(([key, value]) =>
    encodeQuery(value, prefix === '' ? key : `${prefix}.${key}`),
  );
}
