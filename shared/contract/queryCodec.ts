import type { Field } from './field';

/** Values as they stand in a query: dotted names, text. */
export type QueryPairs = readonly (readonly [name: string, value: string])[];

const NUMBER = /^[+-]?(\d+(\.\d*)?|\.\d+)([eE][+-]?\d+)?$/;
const INDEX = /^\d{1,4}$/;
const UNSAFE = new Set(['__proto__', 'constructor', 'prototype']);

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

/**
 * Reads query pairs into a calculator's input: `limits.isoMax=800` is { limits: { isoMax: 800 } },
 * `parts.0.stops=1` is { parts: [{ stops: 1 }] }. Values keep their text where it does not fit the field,
 * so that the schema's message says what was wrong.
 */
export function decodeQuery(pairs: QueryPairs, fields: readonly Field[]): Record<string, unknown> {
  const root: Record<string, unknown> = {};
  for (const [name, text] of pairs) {
    const parts = name.split('.');
    if (parts.some((part) => UNSAFE.has(part))) continue;
    let level: Record<string, unknown> = root;
    let field: Field | undefined;
    let known = fields;
    parts.forEach((part, i) => {
      field = childOf(field, known, part);
      known = field?.fields ?? field?.item?.fields ?? [];
      if (i === parts.length - 1) {
        level[part] = decodeScalar(text, field);
        return;
      }
      const next = parts[i + 1] ?? '';
      const held = level[part];
      if (typeof held !== 'object' || held === null) level[part] = INDEX.test(next) ? [] : {};
      level = level[part] as Record<string, unknown>;
    });
  }
  return root;
}

/** Writes an input as query pairs; the inverse of `decodeQuery` for anything a schema lets through. */
export function encodeQuery(input: unknown, prefix = ''): [string, string][] {
  if (input === undefined || input === null) return [];
  if (typeof input !== 'object') return [[prefix, String(input)]];
  return Object.entries(input).flatMap(([key, value]) =>
    encodeQuery(value, prefix === '' ? key : `${prefix}.${key}`),
  );
}
