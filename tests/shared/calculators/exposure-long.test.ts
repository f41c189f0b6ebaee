import { describe, expect, it } from 'vitest';
import { exposureLong } from '../../../shared/calculators/exposure/long';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

const pair = (meteredS: number, correctedS: number) => ({ meteredS, correctedS });

describe('exposure/long', () => {
  it('answers the same by the exponent and by a table of that film', () => {
    const table = [pair(2, 2 ** 1.31), pair(30, 30 ** 1.31)];
    for (const meteredS of [0.3, 1, 1.5, 10, 400]) {
      const byTable = askCalculator(exposureLong, { meteredS, table }).result;
      const byExponent = askCalculator(exposureLong, { meteredS, exponent: 1.31 }).result;
      expect(byTable.correctedS / byExponent.correctedS).toBeCloseTo(1, 9);
      expect(byTable.addedStops).toBeCloseTo(byExponent.addedStops, 9);
    }
  });

  it('wants exactly one of exponent and table', () => {
    expect(placesOf(faultsIn(exposureLong, { meteredS: 10 }))).toEqual(['/exponent exactly']);
    const both = { meteredS: 10, exponent: 1.3, table: [pair(10, 20)] };
    expect(placesOf(faultsIn(exposureLong, both))).toEqual(['/table exactly']);
  });

  it('refuses an empty table, and one that is too long', () => {
    expect(placesOf(faultsIn(exposureLong, { meteredS: 10, table: [] }))).toEqual(['/table too_few_items']);
    const table = Array.from({ length: 51 }, (_, i) => pair(i + 1, i + 2));
    expect(placesOf(faultsIn(exposureLong, { meteredS: 10, table }))).toEqual(['/table too_many_items']);
  });

  it('takes a table of one pair as a point of a power law, and says so', () => {
    // Through (1 s, 1 s) and (10 s, 20 s): the exponent is log 20/log 10 = 1.30103, and 20^1.30103 = 49.2898.
    const answer = askCalculator(exposureLong, { meteredS: 20, table: [pair(10, 20)] });
    expect(answer.result.correctedS).toBeCloseTo(20 ** Math.log10(20), 9);
    expect(codesOf(answer.notes)).toContain('reciprocity_of_one_pair');
    expect(codesOf(answer.notes)).toContain('reciprocity_extrapolated');
  });

  it('points at the number of a table that does not rise', () => {
    const places = (table: unknown) => placesOf(faultsIn(exposureLong, { meteredS: 10, table }));
    expect(places([pair(2, 3), pair(2, 4)])).toEqual(['/table/1/meteredS pairs_not_rising']);
    expect(places([pair(2, 9), pair(4, 9)])).toEqual(['/table/1/correctedS pairs_not_rising']);
    expect(places([pair(2, 3), pair(8, 9), pair(4, 12)])).toEqual(['/table/2/meteredS pairs_not_rising']);
    expect(places([pair(2, 1)])).toEqual(['/table/0/correctedS pair_shortens']);
  });

  it('tells a fault of the table beside faults elsewhere', () => {
    const places = placesOf(faultsIn(exposureLong, { meteredS: -1, table: [pair(2, 1)] }));
    expect(places).toEqual(['/meteredS out_of_range', '/table/0/correctedS pair_shortens']);
  });

  it('warns beyond 1,000 s, and beyond the last pair of a table', () => {
    const notes = (input: object) => codesOf(askCalculator(exposureLong, input).notes);
    expect(notes({ meteredS: 1000, exponent: 1.3 })).not.toContain('reciprocity_extrapolated');
    expect(notes({ meteredS: 1001, exponent: 1.3 })).toContain('reciprocity_extrapolated');
    expect(notes({ meteredS: 60, table: [pair(2, 3), pair(60, 200)] })).not.toContain(
      'reciprocity_extrapolated',
    );
    expect(notes({ meteredS: 61, table: [pair(2, 3), pair(60, 200)] })).toContain('reciprocity_extrapolated');
    // Up to a second nothing is extrapolated: films keep to reciprocity there.
    expect(notes({ meteredS: 0.5, table: [pair(0.1, 0.1)] })).not.toContain('reciprocity_extrapolated');
  });

  it('says what it assumed below the first pair, and that sensors need none of this', () => {
    const answer = askCalculator(exposureLong, { meteredS: 1.5, table: [pair(2, 3), pair(60, 200)] });
    expect(codesOf(answer.notes)).toEqual([
      'reciprocity_is_for_film',
      'reciprocity_joined_to_break',
      'reciprocity_shifts_colour',
    ]);
  });

  it('reads metered seconds as they are, 30 s as 30 s and not as the mark’s 32 s', () => {
    const { result } = askCalculator(exposureLong, { meteredS: 30, exponent: 1 });
    expect(result.correctedS).toBe(30);
    expect(result.correctedShutter.mark).toBe('30s');
  });
});
