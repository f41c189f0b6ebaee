import { checkParamsOf, type Schema } from './schemaNode';

/**
 * Fields of one object that belong together: `solve` when all but one are given and the one left empty is the
 * answer, `alternatives` when one of them says the thing, `optional` when at most one does.
 */
export interface Family {
  readonly kind: 'solve' | 'alternatives' | 'optional';
  readonly names: readonly string[];
  /** What is given or left empty as one: mostly a single field, or several ways to say the same. */
  readonly slots: readonly (readonly string[])[];
}

interface Rule {
  readonly fault: 'exactly' | 'at_most_one';
  readonly count: number;
  readonly fields: readonly string[];
}

function isRule(params: unknown): params is Rule {
  const fault = (params as Partial<Rule> | undefined)?.fault;
  return fault === 'exactly' || fault === 'at_most_one';
}

/** Fields of which at most one may be given fill one slot together. */
function slotsOf(fields: readonly string[], rules: readonly Rule[]): string[][] {
  const shared = rules.filter(
    ({ fault, fields: some }) => fault === 'at_most_one' && some.every((name) => fields.includes(name)),
  );
  return fields.flatMap((name) => {
    const ways = shared.find(({ fields: some }) => some.includes(name))?.fields;
    if (!ways) return [[name]];
    return fields.find((one) => ways.includes(one)) === name
      ? [fields.filter((one) => ways.includes(one))]
      : [];
  });
}

function familyOf({ fault, count, fields }: Rule, rules: readonly Rule[]): Family[] {
  const single = fields.map((name) => [name]);
  if (fault === 'at_most_one') return [{ kind: 'optional', names: fields, slots: single }];
  const slots = slotsOf(fields, rules);
  if (count > 1 && count === slots.length - 1) return [{ kind: 'solve', names: fields, slots }];
  return count === 1 ? [{ kind: 'alternatives', names: fields, slots: single }] : [];
}

/** The families among an object's fields, as its schema's checks describe them; none lies inside another. */
export function familiesOf(schema: Schema): Family[] {
  const rules = checkParamsOf(schema).filter(isRule);
  const families = rules.flatMap((rule) => familyOf(rule, rules));
  const isInside = (one: Family) =>
    families.some(
      (other) =>
        other !== one &&
        other.names.length > one.names.length &&
        one.names.every((n) => other.names.includes(n)),
    );
  return families.filter((family) => !isInside(family));
}

/** What stands in a form: single fields, and families at the place of their first member. */
export type FormPart<F> = { readonly field: F } | { readonly family: Family; readonly fields: readonly F[] };

/** Puts the fields of a family together, at the place of the first one; everything else keeps its order. */
export function partsOf<F extends { readonly name: string }>(
  fields: readonly F[],
  families: readonly Family[],
): FormPart<F>[] {
  return fields.flatMap((field): FormPart<F>[] => {
    const family = families.find(({ names }) => names.includes(field.name));
    if (!family) return [{ field }];
    const members = fields.filter(({ name }) => family.names.includes(name));
    return members[0] === field ? [{ family, fields: members }] : [];
  });
}
