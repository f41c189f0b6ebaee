import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { asList, oneOrMany } from '../../../shared/contract/oneOrMany';
import { number } from '../../../shared/contract/quantities';
import { faultsIn, inShort } from '../../support/trial';

const flash = z.strictObject({
  guideNumberM: number({ title: 'Guide number', unit: 'm', min: 1, max: 100 }),
  lossStops: number({ title: 'Loss', unit: 'stops', min: 0, max: 10 }).default(0),
});
const schema = z.strictObject({ flashes: oneOrMany(flash, 3, { title: 'Flashes' }) });

describe('one or many', () => {
  it('takes one value or a list, and fills in the defaults of each', () => {
    expect(schema.parse({ flashes: { guideNumberM: 36 } })).toEqual({
      flashes: { guideNumberM: 36, lossStops: 0 },
    });
    expect(schema.parse({ flashes: [{ guideNumberM: 36 }, { guideNumberM: 20, lossStops: 1 }] })).toEqual({
      flashes: [
        { guideNumberM: 36, lossStops: 0 },
        { guideNumberM: 20, lossStops: 1 },
      ],
    });
  });

  it('names the item that a fault stands in', () => {
    expect(inShort(faultsIn(schema, { flashes: { guideNumberM: 0 } }))).toEqual([
      '/flashes/guideNumberM out_of_range',
    ]);
    expect(inShort(faultsIn(schema, { flashes: [{ guideNumberM: 5 }, { guideNumber: 5 }] }))).toEqual([
      '/flashes/1/guideNumberM missing',
      '/flashes/1/guideNumber unknown_field',
    ]);
    expect(faultsIn(schema, { flashes: { guideNumber: 5, guideNumberM: 5 } })[0]?.detail).toBe(
      '"guideNumber" is not a field here; did you mean “guideNumberM”?',
    );
  });

  it('has a longest list, no empty one, and is missed where it is missing', () => {
    const many = (length: number) => ({ flashes: Array(length).fill({ guideNumberM: 5 }) });
    expect(faultsIn(schema, many(3))).toEqual([]);
    expect(inShort(faultsIn(schema, many(4)))).toEqual(['/flashes too_many_items']);
    expect(inShort(faultsIn(schema, many(0)))).toEqual(['/flashes too_few_items']);
    expect(inShort(faultsIn(schema, {}))).toEqual(['/flashes missing']);
    expect(inShort(faultsIn(schema, { flashes: [[]] }))).toEqual(['/flashes/0 wrong_type']);
  });

  it('is a list wherever it is used', () => {
    expect(asList(5)).toEqual([5]);
    expect(asList([5, 6])).toEqual([5, 6]);
  });
});
