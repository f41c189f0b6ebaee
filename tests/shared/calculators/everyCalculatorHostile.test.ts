import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { loadCalculators } from '../../../shared/calculators';
import { answerFor, parseInput } from '../../../shared/contract/defineCalculator';
import type { Field } from '../../../shared/contract/field';
import { isFiniteThroughout } from '../../support/closeTo';

const calculators = await loadCalculators();
const now = new Date('2026-06-21T18:00:00Z');

/** Values that have broken parsers before, as JSON says them. */
const HOSTILE_TEXTS = [
  'null',
  'true',
  '""',
  '" "',
  '[]',
  '{}',
  '[[]]',
  '[null]',
  '1e999',
  '-1e999',
  '-0',
  '1e-320',
  '"1/0"',
  '"\\u0000"',
  '"\\ud800"',
  '"__proto__"',
  '{"__proto__":{"isAdmin":true}}',
  '{"constructor":{"prototype":{}}}',
  '{"length":{"valueOf":1,"toString":1}}',
  '{"length":5,"0":1}',
  '{"toString":1,"valueOf":1}',
  `"${'9'.repeat(50_000)}"`,
  `"1/${'1'.repeat(50_000)}x"`,
  `${'['.repeat(5_000)}${']'.repeat(5_000)}`,
  `[${Array(2_000).fill('{}').join()}]`,
];

/** The value with its text, to be named where it breaks something. */
const HOSTILE = HOSTILE_TEXTS.map((text): [unknown, string] => [JSON.parse(text), text.slice(0, 100)]);

/** Every field with the body that leads to it; lists and groups are entered. */
function places(
  fields: readonly Field[],
  wrap: (value: object) => object = (value) => value,
): ((value: unknown) => object)[] {
  return fields.flatMap((field) => {
    const here = (value: unknown) => wrap({ [field.name]: value });
    const inner = field.fields ?? field.item?.fields ?? [];
    const isList = field.kind === 'list' || field.kind === 'oneOrMany';
    return [here, ...places(inner, (value) => here(isList ? [value] : value))];
  });
}

describe.each(calculators.map((calculator) => [calculator.id, calculator] as const))(
  '%s',
  (_, calculator) => {
    const isHarmless = (body: unknown) => {
      const parsed = parseInput(calculator, body);
      if ('input' in parsed) return isFiniteThroughout(answerFor(calculator, parsed.input, { now }));
      return (
        parsed.faults.length > 0 &&
        parsed.faults.every(
          ({ detail, code }) => detail.length < 1000 && /[.?]$/.test(detail) && /^[a-z_]+$/.test(code),
        )
      );
    };

    it('refuses hostile values at every place in words, or computes with them', () => {
      let tried = 0;
      for (const [body, text] of HOSTILE) expect(isHarmless(body), text).toBe(true);
      places(calculator.fields).forEach((place, i) => {
        for (const [value, text] of HOSTILE) {
          expect(isHarmless(place(value)), `place ${i}: ${text}`).toBe(true);
          tried += 1;
        }
      });
      expect(tried).toBe(places(calculator.fields).length * HOSTILE.length);
    });

    it('refuses any JSON whose names are its own', () => {
      const names = fc.constantFrom(...calculator.fields.map(({ name }) => name), 'surprise');
      fc.assert(
        fc.property(fc.dictionary(names, fc.jsonValue({ maxDepth: 3 })), (body) => {
          expect(isHarmless(body), JSON.stringify(body).slice(0, 300)).toBe(true);
        }),
        { numRuns: 100 },
      );
    });

    it('leaves the language’s own objects as they are', () => {
      expect(({} as Record<string, unknown>).isAdmin).toBeUndefined();
    });
  },
);
