import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  exactAt,
  exactOfMarking,
  markAt,
  nearestMark,
  positionOf,
  residualStops,
  stepsPerStop,
  type MarkedKind,
  type Scale,
} from '../../../shared/math/marks';
import { digitsOf } from '../../support/digitsOf';
import { inRatio } from '../../support/spread';

const KINDS: MarkedKind[] = ['aperture', 'shutter', 'iso'];
const SCALES: Scale[] = ['full', 'half', 'third'];
const RANGES: Record<MarkedKind, [number, number]> = {
  aperture: [0.5, 256],
  shutter: [1e-6, 86_400],
  iso: [1, 10_000_000],
};

const anyKind = fc.constantFrom(...KINDS);
const anyScale = fc.constantFrom(...SCALES);
const anyExact = (kind: MarkedKind) => inRatio(...RANGES[kind]);
const anySetting = fc
  .tuple(anyKind, anyScale)
  .chain(([kind, scale]) => fc.tuple(fc.constant(kind), fc.constant(scale), anyExact(kind)));

/** Every position whose exact value lies in a kind's range. */
function positionsOf(kind: MarkedKind, scale: Scale): number[] {
  const ends = RANGES[kind].map((end) => positionOf(kind, scale, end));
  const [first, last] = [Math.ceil(Math.min(...ends) - 1e-9), Math.floor(Math.max(...ends) + 1e-9)];
  return Array.from({ length: last - first + 1 }, (_, i) => first + i);
}

describe('what is no mark', () => {
  it('means itself: trade variants, other scales, and anything between', () => {
    const cases: [MarkedKind, Scale, number][] = [
      ['aperture', 'third', 1.3],
      ['aperture', 'third', 6.4],
      ['aperture', 'third', 28],
      ['aperture', 'third', 12.5],
      ['aperture', 'third', 1.7],
      ['aperture', 'half', 1.8],
      ['aperture', 'full', 3.5],
      ['shutter', 'third', 3],
      ['shutter', 'third', 0.63],
      ['shutter', 'third', 1 / 12],
      ['shutter', 'third', 1 / 3],
      ['shutter', 'half', 1 / 40],
      ['iso', 'third', 12.5],
      ['iso', 'third', 63],
      ['iso', 'third', 12_500],
      ['iso', 'full', 125],
    ];
    for (const [kind, scale, value] of cases)
      expect(exactOfMarking(kind, scale, value), `${kind} ${value} on ${scale}`).toBe(value);
  });

  it('begins a millionth beside a mark, and a mark reaches as far', () => {
    expect(exactOfMarking('aperture', 'third', 5.6 * (1 + 0.9e-6))).toBe(exactAt('aperture', 'third', 15));
    expect(exactOfMarking('aperture', 'third', 5.6 * (1 + 1.1e-6))).toBe(5.6 * (1 + 1.1e-6));
    expect(exactOfMarking('shutter', 'third', 30)).toBe(32);
    expect(exactOfMarking('shutter', 'third', 30.001)).toBe(30.001);
    expect(exactOfMarking('shutter', 'third', 60)).toBe(60);
    expect(exactOfMarking('shutter', 'third', 0.008)).toBe(1 / 128);
  });

  it('stays what it is where it is nonsense, so that the caller’s own check speaks', () => {
    for (const value of [0, -0, -4, Number.NaN, Infinity, -Infinity, Number.MIN_VALUE, Number.MAX_VALUE])
      for (const kind of KINDS)
        for (const scale of SCALES) expect(exactOfMarking(kind, scale, value)).toBe(value);
  });
});

describe('every mark of every kind and scale', () => {
  it('leads from its label to its value and back, and no two share a label', () => {
    let checked = 0;
    for (const kind of KINDS)
      for (const scale of SCALES) {
        const seen = new Set<string>();
        for (const position of positionsOf(kind, scale)) {
          const mark = markAt(kind, scale, position);
          expect(seen.has(mark.label), mark.label).toBe(false);
          seen.add(mark.label);
          expect(exactOfMarking(kind, scale, digitsOf(mark.label)), `${scale} ${mark.label}`).toBe(
            mark.exact,
          );
          expect(nearestMark(kind, scale, mark.exact), mark.label).toEqual(mark);
          checked += 1;
        }
      }
    // Av −2 to 16, Tv −16.4 to 19.9, log2(S/100) −6.6 to 16.6, counted in full, half and third stops.
    expect(checked).toBe(19 + 37 + 55 + (36 + 72 + 109) + (23 + 47 + 69));
  });

  it('has a label within half a step of its value, so that nobody sets the next one', () => {
    for (const kind of KINDS)
      for (const scale of SCALES)
        for (const position of positionsOf(kind, scale)) {
          const { label, exact } = markAt(kind, scale, position);
          const off = Math.abs(residualStops(kind, exact, digitsOf(label)));
          expect(off, `${scale} ${label}`).toBeLessThan(0.5 / stepsPerStop(scale));
        }
  });

  it('has whole seconds beyond 30 s, each of them a mark of its own', () => {
    fc.assert(
      fc.property(fc.integer({ min: 33, max: 86_400 }), anyScale, (seconds, scale) => {
        const mark = nearestMark('shutter', scale, exactOfMarking('shutter', scale, seconds));
        expect(mark).toMatchObject({ label: `${seconds}s`, exact: seconds });
        expect(exactAt('shutter', scale, mark.position) / seconds).toBeCloseTo(1, 12);
      }),
    );
  });
});

describe('the nearest mark', () => {
  it('is off by half a step at most, with the sign of what the picture gains', () => {
    fc.assert(
      fc.property(anySetting, ([kind, scale, exact]) => {
        const mark = nearestMark(kind, scale, exact);
        const residual = residualStops(kind, exact, mark.exact);
        expect(Math.abs(residual)).toBeLessThanOrEqual(0.5 / stepsPerStop(scale) + 1e-9);
        const isBrighter = kind === 'aperture' ? mark.exact < exact : mark.exact > exact;
        if (Math.abs(residual) > 1e-9) expect(residual > 0).toBe(isBrighter);
      }),
      { numRuns: 1000 },
    );
  });

  it('is never farther than its neighbours', () => {
    fc.assert(
      fc.property(anySetting, ([kind, scale, exact]) => {
        const { position, exact: set } = nearestMark(kind, scale, exact);
        if (kind === 'shutter' && set > 32) return;
        const off = (at: number) => Math.abs(positionOf(kind, scale, exact) - at);
        expect(off(position)).toBeLessThanOrEqual(Math.min(off(position - 1), off(position + 1)) + 1e-9);
      }),
    );
  });

  it('rounds up to less light through the lens, or a higher speed, and down to the opposite', () => {
    fc.assert(
      fc.property(anySetting, ([kind, scale, exact]) => {
        const up = nearestMark(kind, scale, exact, 'ceil').exact;
        const down = nearestMark(kind, scale, exact, 'floor').exact;
        const [least, most] = kind === 'shutter' ? [up, down] : [down, up];
        expect(least).toBeLessThanOrEqual(exact * (1 + 1e-9));
        expect(most).toBeGreaterThanOrEqual(exact * (1 - 1e-9));
        const gap = Math.abs(residualStops(kind, up, down));
        if (exact < 16 || kind !== 'shutter') expect(gap).toBeLessThanOrEqual(1 / stepsPerStop(scale) + 1e-9);
      }),
      { numRuns: 1000 },
    );
  });

  it('gives an exact half to the smaller aperture, the shorter time, the higher speed', () => {
    expect(nearestMark('aperture', 'full', 2 ** 0.25).label).toBe('f/1.4');
    expect(nearestMark('shutter', 'full', 2 ** -0.5).label).toBe('0.5s');
    expect(nearestMark('iso', 'full', 100 * Math.SQRT2).label).toBe('200');
    expect(nearestMark('shutter', 'third', 45.5).label).toBe('45s');
  });

  it('joins 30 s and the seconds beyond without a gap', () => {
    for (const scale of SCALES) {
      expect(nearestMark('shutter', scale, 32).label).toBe('30s');
      expect(nearestMark('shutter', scale, 32.4).label).toBe('30s');
      expect(nearestMark('shutter', scale, 32.6).label).toBe('33s');
      expect(nearestMark('shutter', scale, 32.6, 'ceil').label).toBe('30s');
      expect(nearestMark('shutter', scale, 32.4, 'floor').label).toBe('33s');
      expect(nearestMark('shutter', scale, 60 * (1 - 1e-12), 'ceil').label).toBe('60s');
      expect(nearestMark('shutter', scale, 64, 'ceil').exact).toBe(64);
    }
    expect(nearestMark('shutter', 'third', 40.3174735966, 'floor').label).toBe('41s');
  });

  it('refuses what has no logarithm, and a position between two marks', () => {
    for (const exact of [0, -1, Number.NaN, Infinity])
      for (const kind of KINDS) expect(() => nearestMark(kind, 'third', exact)).toThrow(RangeError);
    expect(() => markAt('aperture', 'third', 0.5)).toThrow(RangeError);
    expect(() => markAt('shutter', 'third', Number.NaN)).toThrow(RangeError);
    expect(() => markAt('iso', 'full', 1e6)).toThrow(RangeError);
  });

  it('has a name even for what no camera offers', () => {
    for (const kind of KINDS)
      for (const exact of [1e-30, 1e-12, 1e12, 1e30]) {
        const { label, exact: set } = nearestMark(kind, 'third', exact);
        expect(label).toMatch(/\d/);
        expect(label).not.toMatch(/NaN|Infinity|undefined/);
        expect(Number.isFinite(set)).toBe(true);
      }
  });
});

it('positions and exact values are inverse to each other', () => {
  fc.assert(
    fc.property(anySetting, ([kind, scale, exact]) => {
      expect(exactAt(kind, scale, positionOf(kind, scale, exact)) / exact).toBeCloseTo(1, 12);
    }),
  );
});

it('beyond the tables labels double or halve with the value', () => {
  // Common practice, no source; f/90 is the next full stop in the project handbook, section 2.2.
  expect(markAt('aperture', 'full', 13).label).toBe('f/90');
  expect(markAt('aperture', 'full', 14).label).toBe('f/128');
  expect(markAt('aperture', 'third', 40).label).toBe('f/102');
  expect(markAt('aperture', 'half', 25).label).toBe('f/76');
  expect(markAt('aperture', 'full', -2).label).toBe('f/0.5');
  expect(markAt('shutter', 'full', 16).label).toBe('1/64000');
  expect(markAt('shutter', 'half', 31).label).toBe('1/48000');
  expect(markAt('iso', 'full', 11).label).toBe('204800');
  expect(markAt('iso', 'third', -12).label).toBe('6');
});
