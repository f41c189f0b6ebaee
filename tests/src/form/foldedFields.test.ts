import { expect, it } from 'vitest';
import { foldedFields } from '../../../src/form/families';

it('advanced fields are folded away, but not from a family that has others', () => {
  const fields = [
    { name: 'horizon' },
    { name: 'skyline', advanced: true },
    { name: 'eyeHeight', advanced: true },
    { name: 'ratio', advanced: true },
    { name: 'rise', advanced: true },
  ];
  const family = (...names: string[]) =>
    ({ kind: 'optional', names, slots: names.map((name) => [name]) }) as const;
  const folded = foldedFields(fields, [family('horizon', 'skyline'), family('ratio', 'rise')]);
  expect(folded.map(({ name }) => name)).toEqual(['eyeHeight', 'ratio', 'rise']);
});
