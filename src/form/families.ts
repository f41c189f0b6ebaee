import { checkParamsOf, type Schema } from './schemaNode';

/**
 * Fields of one object that belong together: `solve` when all but one are given and the one left empty is the
 * answer, `alternatives` when the thing is said in one of several ways, `optional` when it may be left out as well.
 */
export interface Family {
  readonly kind: 'solve' | 'alternatives' | 'optional';
  readonly names: readonly string[];
  /**
   * Of `solve`: what is given or left empty as one, mostly a single field, or several ways to say the same. Of the
   * others: the ways, each with the fields that it takes together.
   */
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

/** The sets of fields that meet every "exactly one of" once: a field may stand in several, as a ratio does for both its parts. */
function waysOf(rules: readonly Rule[]): string[][] {
  const [rule, ...others] = rules;
  if (!rule) return [[]];
  return rule.fields.flatMap((name) => {
    const left = others.filter(({ fields }) => !fields.includes(name));
    const taken = rules.filter((one) => one.fields.includes(name)).flatMap(({ fields }) => fields);
    const open = left.map((one) => ({
      ...one,
      fields: one.fields.filter((field) => !taken.includes(field)),
    }));
    return waysOf(open).map((way) => [name, ...way]);
  });
}

function solveFamilies(rules: readonly Rule[]): Family[] {
  return rules.flatMap(({ fault, count, fields }) => {
    const slots = slotsOf(fields, rules);
    const isOneLess = fault === 'exactly' && count > 1 && count === slots.length - 1;
    return isOneLess ? [{ kind: 'solve' as const, names: fields, slots }] : [];
  });
}

/** Rules that share a field say one thing between them. */
function joined(rules: readonly Rule[]): Rule[][] {
  const sets: Rule[][] = [];
  for (const rule of rules) {
    const touching = sets.filter((set) =>
      set.some(({ fields }) => fields.some((name) => rule.fields.includes(name))),
    );
    for (const set of touching) sets.splice(sets.indexOf(set), 1);
    sets.push([...touching.flat(), rule]);
  }
  return sets;
}

function alternativeFamilies(rules: readonly Rule[]): Family[] {
  const exact = rules.filter(({ fault, count }) => fault === 'exactly' && count === 1);
  return joined(exact).map((set) => ({
    kind: 'alternatives',
    names: [...new Set(set.flatMap(({ fields }) => fields))],
    slots: waysOf(set),
  }));
}

function optionalFamilies(rules: readonly Rule[]): Family[] {
  return rules
    .filter(({ fault }) => fault === 'at_most_one')
    .map(({ fields }) => ({ kind: 'optional', names: fields, slots: fields.map((name) => [name]) }));
}

/** The families among an object's fields, as its schema's checks describe them; a field stands in the first that has it. */
export function familiesOf(schema: Schema): Family[] {
  const rules = checkParamsOf(schema).filter(isRule);
  const all = [...solveFamilies(rules), ...alternativeFamilies(rules), ...optionalFamilies(rules)];
  return all.filter(
    ({ names }, i) => !all.slice(0, i).some((earlier) => earlier.names.some((name) => names.includes(name))),
  );
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

/** The fields that are folded away: the advanced ones, but none whose family has one that is not. */
export function foldedFields<F extends { readonly name: string; readonly advanced?: boolean }>(
  fields: readonly F[],
  families: readonly Family[],
): F[] {
  return fields.filter(({ name, advanced }) => {
    const family = families.find(({ names }) => names.includes(name));
    const ownFamily = fields.filter((other) => family?.names.includes(other.name));
    return advanced && ownFamily.every((other) => other.advanced);
  });
}
