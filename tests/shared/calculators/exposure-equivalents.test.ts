import { describe, expect, it } from 'vitest';
import { exposureEquivalents } from '../../../shared/calculators/exposure/equivalents';
import { sceneEv100 } from '../../../shared/math/exposure';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

const ask = (input: object) => askCalculator(exposureEquivalents, input);
const rowsOf = (input: object) =>
  ask(input).result.rows.map(({ aperture, shutter, iso }) => `${aperture.mark} ${shutter.mark} ${iso.mark}`);

const sunny = { aperture: 'f/8', shutter: '1/500', iso: 100 };
const limits = {
  apertureMin: 2,
  apertureMax: 16,
  shutterFastest: '1/4000',
  shutterSlowest: '1/30',
  isoMin: 100,
  isoMax: 400,
};

describe('exposure/equivalents', () => {
  it('keeps the ISO where nothing is said', () => {
    expect(rowsOf({ ...sunny, limits, scale: 'full' })).toEqual([
      'f/2.8 1/4000 100',
      'f/4 1/2000 100',
      'f/5.6 1/1000 100',
      'f/8 1/500 100',
      'f/11 1/250 100',
      'f/16 1/125 100',
    ]);
  });

  it('keeps the aperture, or the shutter, or nothing, as asked', () => {
    const given = { ...sunny, limits, scale: 'full' };
    expect(rowsOf({ ...given, keep: 'aperture' })).toEqual([
      'f/8 1/500 100',
      'f/8 1/1000 200',
      'f/8 1/2000 400',
    ]);
    expect(rowsOf({ ...given, keep: 'shutter' })).toEqual([
      'f/8 1/500 100',
      'f/11 1/500 200',
      'f/16 1/500 400',
    ]);
    const all = rowsOf({ ...given, keep: 'none' });
    expect(all.length).toBe(6 + 5 + 4);
    for (const keep of ['iso', 'aperture', 'shutter'])
      for (const row of rowsOf({ ...given, keep })) expect(all).toContain(row);
  });

  it('gives rows of exactly one exposure, on marks, without a note where the settings are on marks', () => {
    const { result, notes } = ask({ ...sunny, limits, keep: 'none' });
    expect(result.ev100).toBe(15);
    // ISO 100 to 400 is s = 0 to 6 thirds; 1/4000 or slower leaves apertures a = 9 + s to 24: Σ(16 − s) = 91.
    expect(result.rows.length).toBe(91);
    for (const { aperture, shutter, iso } of result.rows) {
      expect(sceneEv100(aperture.exact, shutter.exact, iso.exact)).toBeCloseTo(15, 9);
      expect([aperture, shutter, iso].map(({ residualStops }) => residualStops)).toEqual([0, 0, 0]);
    }
    expect(notes).toEqual([]);
  });

  it('says where usual gear stood in for limits, until all six are given', () => {
    expect(codesOf(ask(sunny).notes)).toEqual(['usual_gear_limits']);
    const { isoMax: _, ...five } = limits;
    expect(codesOf(ask({ ...sunny, limits: five }).notes)).toEqual(['usual_gear_limits']);
    expect(codesOf(ask({ ...sunny, limits: { ...limits, isoMax: undefined } }).notes)).toEqual([
      'usual_gear_limits',
    ]);
  });

  it('moves an exposure between steps to the nearer one, and says by how much and which way', () => {
    // 1/400 s is brighter than the nearest full stop of 1/512 s, so the rows come out darker.
    const brighter = ask({ ...sunny, shutter: '1/400', limits, scale: 'full', readAs: 'exact' });
    expect(codesOf(brighter.notes)).toEqual(['exposure_moved_to_step']);
    const moved = Math.log2(512 / 400);
    expect(brighter.result.ev100).toBeCloseTo(15 - moved, 9);
    for (const { aperture, shutter, iso } of brighter.result.rows)
      expect(sceneEv100(aperture.exact, shutter.exact, iso.exact)).toBeCloseTo(15, 9);
    expect(brighter.notes[0]?.message).toContain(`${Number(moved.toPrecision(2))} stops darker`);
    const darker = ask({ ...sunny, shutter: '1/600', limits, scale: 'full', readAs: 'exact' });
    expect(darker.notes[0]?.message).toContain(
      `${Number(Math.log2(600 / 512).toPrecision(2))} stops brighter`,
    );
  });

  it('lists settings outside usual gear where they are the caller’s own', () => {
    expect(rowsOf({ aperture: 'f/64', shutter: 8, iso: 25 })).toContain('f/64 8s 25');
    expect(rowsOf({ aperture: 0.95, shutter: '1/16000', iso: 40, readAs: 'exact' }).length).toBeGreaterThan(
      10,
    );
  });

  it('keeps a time of whole seconds as it is, and gives no exposure that is not the same', () => {
    const { result, notes } = ask({
      aperture: 'f/8',
      shutter: 90,
      iso: 100,
      keep: 'shutter',
      limits: { isoMax: 400 },
    });
    expect(codesOf(notes)).toEqual(['usual_gear_limits']);
    expect(result.rows.map(({ shutter }) => shutter.mark)).toEqual(Array(result.rows.length).fill('90s'));
    expect(result.rows.map(({ aperture }) => aperture.mark)).toContain('f/16');
    for (const { aperture, shutter, iso } of result.rows)
      expect(sceneEv100(aperture.exact, shutter.exact, iso.exact)).toBeCloseTo(result.ev100, 9);
  });

  it('moves an exposure of 60 s to the marks’ 64 s where the time is free', () => {
    const { notes, result } = ask({
      aperture: 'f/8',
      shutter: 60,
      iso: 100,
      keep: 'iso',
      limits: { shutterSlowest: 3600 },
    });
    expect(codesOf(notes)).toEqual(['usual_gear_limits', 'exposure_moved_to_step']);
    expect(notes[1]?.message).toContain('0.093 stops brighter');
    expect(result.rows.map(({ shutter }) => shutter.mark)).toEqual(
      expect.arrayContaining(['64s', '30s', '256s']),
    );
  });

  it('says so where nothing is left', () => {
    const { result, notes } = ask({ ...sunny, limits: { isoMin: 200, isoMax: 400 } });
    expect(result.rows).toEqual([]);
    expect(codesOf(notes)).toEqual(['usual_gear_limits', 'no_equivalents']);
  });

  it('reads limits as it reads settings: a mark stands for the value behind it', () => {
    const given = { aperture: 'f/8', shutter: '1/60', iso: 100, scale: 'full' };
    expect(rowsOf({ ...given, limits: { apertureMin: 8, apertureMax: 11 } })).toEqual([
      'f/8 1/60 100',
      'f/11 1/30 100',
    ]);
    expect(rowsOf({ ...given, readAs: 'exact', limits: { apertureMin: 8, apertureMax: 11 } })).toEqual([
      'f/8 1/60 100',
    ]);
  });

  it('refuses crossed limits by what they mean', () => {
    const crossed = { shutterFastest: '1/125', shutterSlowest: 0.0079 };
    expect(faultsIn(exposureEquivalents, { ...sunny, limits: crossed })).toEqual([]);
    expect(placesOf(faultsIn(exposureEquivalents, { ...sunny, limits: crossed, readAs: 'exact' }))).toEqual([
      '/limits/shutterSlowest limits_crossed',
    ]);
  });
});
