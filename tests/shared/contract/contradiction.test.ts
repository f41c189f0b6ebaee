import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { contradiction } from '../../../shared/contract/contradiction';
import { crossedLimits } from '../../../shared/contract/crossedLimits';
import { exactlyOne } from '../../../shared/contract/exactlyOne';
import { limitsIn } from '../../../shared/contract/limits';
import { number } from '../../../shared/contract/quantities';
import { readingFields } from '../../../shared/contract/settings';
import { faultsIn, inShort } from '../../support/trial';

const metres = (title: string) => number({ title, unit: 'm', min: 0, max: 100 });
const span = () =>
  z.strictObject({ nearM: metres('Near'), farM: metres('Far'), other: metres('Other').optional() });
type Span = ReturnType<typeof span>;
const isReversed = ({ nearM, farM }: z.output<Span>) => farM < nearM;
const params = ({ nearM, farM }: z.output<Span>) => ({ nearM, farM });

describe('a fault between fields', () => {
  const schema = contradiction<Span, 'far_before_near'>(
    'far_before_near',
    ['farM'],
    isReversed,
    params,
  )(span());
  const narrow = contradiction<Span, 'far_before_near'>('far_before_near', ['farM'], isReversed, params, [
    'nearM',
    'farM',
  ])(span());

  it('is told at the field to blame, in its own sentence', () => {
    const [fault, ...more] = faultsIn(schema, { nearM: 5, farM: 2 });
    expect(fault).toMatchObject({ pointer: '/farM', code: 'far_before_near' });
    expect(fault?.detail).toMatch(/5 m.*2 m/);
    expect(more).toEqual([]);
    expect(faultsIn(schema, { nearM: 2, farM: 5 })).toEqual([]);
  });

  it('is told beside unknown names and alternatives, which say nothing about its values', () => {
    expect(inShort(faultsIn(schema, { nearM: 5, farM: 2, extra: 1 })).sort()).toEqual([
      '/extra unknown_field',
      '/farM far_before_near',
    ]);
    const alternatives = exactlyOne('other')(span()) as Span;
    const both = contradiction<Span, 'far_before_near'>(
      'far_before_near',
      ['farM'],
      isReversed,
      params,
    )(alternatives);
    expect(inShort(faultsIn(both, { nearM: 5, farM: 2 })).sort()).toEqual([
      '/farM far_before_near',
      '/other exactly',
    ]);
  });

  it('waits until what it reads is well formed', () => {
    expect(inShort(faultsIn(schema, { nearM: 5, farM: 'x' }))).toEqual(['/farM wrong_type']);
    expect(inShort(faultsIn(schema, { nearM: 5, farM: 2, other: 'x' }))).toEqual(['/other wrong_type']);
    expect(inShort(faultsIn(narrow, { nearM: 5, farM: 2, other: 'x' })).sort()).toEqual([
      '/farM far_before_near',
      '/other wrong_type',
    ]);
    expect(inShort(faultsIn(narrow, { nearM: 5, farM: -2, other: 'x' })).sort()).toEqual([
      '/farM out_of_range',
      '/other wrong_type',
    ]);
    expect(inShort(faultsIn(narrow, null))).toEqual([' wrong_type']);
  });
});

describe('crossed limits', () => {
  const schema = crossedLimits(
    z.strictObject({ limits: limitsIn().optional(), other: metres('Other').optional(), ...readingFields }),
  );
  const short = (limits: object, more: object = {}) => inShort(faultsIn(schema, { limits, ...more }));

  it('are told at the upper one, each pair by itself, with what was given', () => {
    const faults = faultsIn(schema, {
      limits: {
        apertureMin: 'f/8',
        apertureMax: 'f/4',
        shutterFastest: '1s',
        shutterSlowest: '1/60',
        isoMin: 800,
        isoMax: 100,
      },
    });
    expect(inShort(faults)).toEqual([
      '/limits/apertureMax limits_crossed',
      '/limits/shutterSlowest limits_crossed',
      '/limits/isoMax limits_crossed',
    ]);
    expect(faults[0]?.detail).toBe(
      'apertureMax must not lie below apertureMin; "f/8" and "f/4" leave nothing between them.',
    );
  });

  it('may touch, and one alone crosses nothing', () => {
    expect(short({ apertureMin: 'f/4', apertureMax: 4, isoMin: 100, isoMax: 100 })).toEqual([]);
    expect(short({ isoMin: 10_000_000 })).toEqual([]);
    expect(faultsIn(schema, {})).toEqual([]);
  });

  it('compare what the marks mean, not their digits', () => {
    // "1/125" is 1/128 s, which is shorter than the 0.0079 s that its digits, 0.008, exceed.
    const times = { shutterFastest: '1/125', shutterSlowest: 0.0079 };
    expect(short(times)).toEqual([]);
    expect(short(times, { readAs: 'exact' })).toEqual(['/limits/shutterSlowest limits_crossed']);
    // f/1.2 is 1.26 on thirds, so 1.25 lies below it; on halves it is 1.19.
    const apertures = { apertureMin: 'f/1.2', apertureMax: 1.25 };
    expect(short(apertures)).toEqual(['/limits/apertureMax limits_crossed']);
    expect(short(apertures, { scale: 'half' })).toEqual([]);
    expect(short(apertures, { readAs: 'exact' })).toEqual([]);
  });

  it('are told beside faults elsewhere, and wait for their own fields', () => {
    const crossed = { isoMin: 800, isoMax: 100 };
    expect(short(crossed, { other: -1 }).sort()).toEqual([
      '/limits/isoMax limits_crossed',
      '/other out_of_range',
    ]);
    expect(short({ ...crossed, apertureMin: 'wide' })).toEqual(['/limits/apertureMin not_a_setting']);
    expect(short(crossed, { scale: 'fifth' })).toEqual(['/scale not_a_choice']);
    expect(short({ ...crossed, isoLow: 1 }).sort()).toEqual([
      '/limits/isoLow unknown_field',
      '/limits/isoMax limits_crossed',
    ]);
  });
});
