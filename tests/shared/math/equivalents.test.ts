import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  equivalentRows,
  exposurePosition,
  reachablePosition,
  type EquivalentRow,
  type KeptSetting,
  type SettingLimits,
} from '../../../shared/math/equivalents';
import { sceneEv100 } from '../../../shared/math/exposure';
import { exactAt, markAt, nearestMark, stepsPerStop, type Scale } from '../../../shared/math/marks';
import { inRatio } from '../../support/spread';

const WHOLE: SettingLimits = {
  apertureMin: 0.5,
  apertureMax: 256,
  shutterFastestS: 1e-6,
  shutterSlowestS: 86_400,
  isoMin: 1,
  isoMax: 10_000_000,
};

const anyScale = fc.constantFrom<Scale>('full', 'half', 'third');
/** Limits of one kind; every other time they leave all of it, so that there are rows to look at. */
const range = (low: number, high: number) =>
  fc.oneof(
    fc.constant([low, high] as const),
    fc
      .tuple(inRatio(low, high), inRatio(low, high))
      .map(([a, b]) => [Math.min(a, b), Math.max(a, b)] as const),
  );
const anyLimits: fc.Arbitrary<SettingLimits> = fc
  .tuple(range(0.5, 256), range(1e-6, 86_400), range(1, 1e7))
  .map(([aperture, shutter, iso]) => ({
    apertureMin: aperture[0],
    apertureMax: aperture[1],
    shutterFastestS: shutter[0],
    shutterSlowestS: shutter[1],
    isoMin: iso[0],
    isoMax: iso[1],
  }));

const labels = (row: EquivalentRow) => `${row.aperture.label} ${row.shutter.label} ISO ${row.iso.label}`;
const between = (value: number, low: number, high: number) =>
  value >= low * (1 - 1e-9) && value <= high * (1 + 1e-9);

/** Times that can be set: the marks up to 30 s, whole seconds beyond. */
const isTime = (exact: number) => exact <= 32 * (1 + 1e-12) || Number.isInteger(exact);

/** Tries every aperture, time and speed there is, by their values alone. */
function bruteForce(ev100: number, scale: Scale, limits: SettingLimits, keep: KeptSetting | null): string[] {
  const n = stepsPerStop(scale);
  const found: string[] = [];
  for (let a = -3 * n; a <= 17 * n; a++)
    for (let s = -7 * n; s <= 17 * n; s++)
      for (let t = -17 * n; t <= 20 * n; t++) {
        if (keep && { aperture: a, iso: s, shutter: t }[keep.kind] !== keep.position) continue;
        const [aperture, time, iso] = [
          exactAt('aperture', scale, a),
          exactAt('shutter', scale, t),
          exactAt('iso', scale, s),
        ];
        if (Math.abs(sceneEv100(aperture, time, iso) - ev100) > 1e-7 || !isTime(time)) continue;
        if (!between(aperture, limits.apertureMin, limits.apertureMax)) continue;
        if (!between(time, limits.shutterFastestS, limits.shutterSlowestS)) continue;
        if (!between(iso, limits.isoMin, limits.isoMax)) continue;
        const mark = (kind: 'aperture' | 'shutter' | 'iso', p: number) => markAt(kind, scale, p).label;
        found.push(`${mark('aperture', a)} ${mark('shutter', t)} ISO ${mark('iso', s)}`);
      }
  return found;
}

const anyKeep = (scale: Scale): fc.Arbitrary<KeptSetting | null> => {
  const n = stepsPerStop(scale);
  return fc.oneof(
    fc.constant(null),
    fc.record({ kind: fc.constant('aperture' as const), position: fc.integer({ min: -2 * n, max: 16 * n }) }),
    fc.record({ kind: fc.constant('shutter' as const), position: fc.integer({ min: -5 * n, max: 19 * n }) }),
    fc.record({ kind: fc.constant('iso' as const), position: fc.integer({ min: -6 * n, max: 16 * n }) }),
  );
};
const anyCase = anyScale.chain((scale) =>
  fc.tuple(
    fc.constant(scale),
    fc.integer({ min: -8 * stepsPerStop(scale), max: 18 * stepsPerStop(scale) }),
    anyLimits,
    anyKeep(scale),
  ),
);

describe('equivalent settings', () => {
  it('are all of exactly one exposure, within the limits, with what is kept', () => {
    let rowsSeen = 0;
    fc.assert(
      fc.property(anyCase, ([scale, exposure, limits, keep]) => {
        const rows = equivalentRows(exposure, scale, limits, keep);
        const isRight = (row: EquivalentRow) => {
          const { aperture, shutter, iso } = row;
          const ev100 = sceneEv100(aperture.exact, shutter.exact, iso.exact);
          return (
            Math.abs(ev100 - exposure / stepsPerStop(scale)) < 1e-9 &&
            between(aperture.exact, limits.apertureMin, limits.apertureMax) &&
            between(shutter.exact, limits.shutterFastestS, limits.shutterSlowestS) &&
            between(iso.exact, limits.isoMin, limits.isoMax) &&
            (keep === null || row[keep.kind].position === keep.position)
          );
        };
        expect(rows.filter((row) => !isRight(row)).map(labels)).toEqual([]);
        rowsSeen += rows.length;
      }),
      { numRuns: 300 },
    );
    expect(rowsSeen).toBeGreaterThan(1000);
  });

  it('are complete, each once: a search over all positions finds the same', () => {
    fc.assert(
      fc.property(anyCase, ([scale, exposure, limits, keep]) => {
        const rows = equivalentRows(exposure, scale, limits, keep).map(labels);
        expect(rows).toEqual(bruteForce(exposure / stepsPerStop(scale), scale, limits, keep));
      }),
      { numRuns: 25 },
    );
  });

  it('come in order of aperture, then speed', () => {
    fc.assert(
      fc.property(anyCase, ([scale, exposure, limits, keep]) => {
        const rows = equivalentRows(exposure, scale, limits, keep);
        rows.slice(1).forEach(({ aperture, iso }, i) => {
          const before = rows[i] as EquivalentRow;
          const isLater =
            aperture.exact > before.aperture.exact ||
            (aperture.exact === before.aperture.exact && iso.exact > before.iso.exact);
          expect(isLater, labels(before)).toBe(true);
        });
      }),
    );
  });

  it('reach limits that stand on a mark', () => {
    const limits = { ...WHOLE, apertureMin: Math.SQRT2, apertureMax: 2 ** 2.5, isoMin: 100, isoMax: 100 };
    const rows = equivalentRows(15, 'full', limits, null).map((row) => row.aperture.label);
    expect(rows).toEqual(['f/1.4', 'f/2', 'f/2.8', 'f/4', 'f/5.6']);
  });

  it('keep a time of whole seconds as it is, and still agree exactly', () => {
    const kept = nearestMark('shutter', 'third', 90);
    const keep: KeptSetting = { kind: 'shutter', position: kept.position };
    const ev100 = sceneEv100(8, 90, 100);
    const step = reachablePosition(exposurePosition(ev100, 'third'), keep);
    expect(step / 3).toBeCloseTo(ev100, 9);
    const rows = equivalentRows(step, 'third', { ...WHOLE, isoMin: 50, isoMax: 200 }, keep);
    expect(rows.map(labels)).toContain('f/8 90s ISO 100');
    expect(rows.length).toBe(7);
    for (const { aperture, shutter, iso } of rows) {
      expect(shutter.label).toBe('90s');
      expect(sceneEv100(aperture.exact, shutter.exact, iso.exact)).toBeCloseTo(ev100, 9);
    }
  });

  it('beyond 30 s hold only times that whole seconds give exactly', () => {
    const limits = { ...WHOLE, isoMin: 100, isoMax: 100 };
    const times = equivalentRows(0, 'third', limits, null).map((row) => row.shutter.label);
    expect(times).toContain('25s');
    expect(times).toContain('64s');
    expect(times).not.toContain('40s');
    expect(times).not.toContain('51s');
  });

  it('are none where the limits leave none, and are never too many to give', () => {
    expect(equivalentRows(100, 'third', { ...WHOLE, isoMin: 100, isoMax: 50 }, null)).toEqual([]);
    expect(equivalentRows(10_000, 'third', WHOLE, null)).toEqual([]);
    const all = equivalentRows(39, 'third', WHOLE, null);
    expect(all.length).toBeGreaterThan(2000);
    expect(all.length).toBeLessThanOrEqual(55 * 69);
  });

  it('refuse limits that are no settings, which would never end', () => {
    for (const value of [0, -1, Number.NaN, Infinity])
      for (const name of Object.keys(WHOLE))
        expect(() => equivalentRows(39, 'third', { ...WHOLE, [name]: value }, null), name).toThrow(
          RangeError,
        );
  });

  it('round an exposure between two steps to the nearer one', () => {
    expect(reachablePosition(38.6, null)).toBe(39);
    expect(reachablePosition(38.4, { kind: 'iso', position: 2 })).toBe(38);
    expect(reachablePosition(38.6, { kind: 'shutter', position: -18.2 })).toBeCloseTo(38.8, 12);
  });
});
