import { describe, expect, it } from 'vitest';
import { exposureDepth } from '../../../shared/calculators/exposure/depth';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

const scene = { focalLengthMm: 50, aperture: 'f/8', distanceM: 5 };

describe('exposure/depth', () => {
  it('refuses a focus within the focal length, and takes the next one', () => {
    const faults = faultsIn(exposureDepth, { ...scene, distanceM: 0.05 });
    expect(placesOf(faults)).toEqual(['/distanceM focus_inside_lens']);
    expect(faults[0]?.detail).toMatch(/50 mm.*0\.05 m/);
    expect(placesOf(faultsIn(exposureDepth, { ...scene, focalLengthMm: 800, distanceM: 0.5 }))).toEqual([
      '/distanceM focus_inside_lens',
    ]);
    const { result } = askCalculator(exposureDepth, { ...scene, distanceM: 0.051 });
    expect(result.nearM).toBeLessThan(0.051);
    expect(result.farM).toBeGreaterThan(0.051);
  });

  it('holds at every focal length just above the focus it refuses', () => {
    for (let focalLengthMm = 10; focalLengthMm <= 5000; focalLengthMm += 7) {
      const distanceM = focalLengthMm / 1000 + 1e-6;
      const { result } = askCalculator(exposureDepth, { ...scene, focalLengthMm, distanceM });
      expect(Number.isFinite(result.backgroundBlurUm)).toBe(true);
    }
  });

  it('wants both sides of the sensor, unless a circle of confusion is given', () => {
    expect(placesOf(faultsIn(exposureDepth, { ...scene, sensorWidthMm: 36 }))).toEqual([
      '/sensorHeightMm sensor_side_missing',
    ]);
    expect(placesOf(faultsIn(exposureDepth, { ...scene, sensorHeightMm: 24 }))).toEqual([
      '/sensorWidthMm sensor_side_missing',
    ]);
    const given = { ...scene, circleOfConfusionUm: 30, sensorWidthMm: 36 };
    expect(askCalculator(exposureDepth, given).result.circleOfConfusionUm).toBe(30);
  });

  it('takes 36 × 24 mm where nothing says otherwise, and says so', () => {
    const bare = askCalculator(exposureDepth, scene);
    const named = askCalculator(exposureDepth, { ...scene, sensorWidthMm: 36, sensorHeightMm: 24 });
    expect(codesOf(bare.notes)).toContain('circle_assumed');
    expect(codesOf(named.notes)).not.toContain('circle_assumed');
    expect(bare.result.circleOfConfusionUm).toBe(named.result.circleOfConfusionUm);
    expect(bare.result.backgroundBlurShare).toBeNull();
    expect(named.result.backgroundBlurShare).toBeCloseTo(named.result.backgroundBlurUm / 36_000, 12);
  });

  it('ends at null from the hyperfocal distance on, near at half of it', () => {
    const { hyperfocalM } = askCalculator(exposureDepth, scene).result;
    const there = askCalculator(exposureDepth, { ...scene, distanceM: hyperfocalM }).result;
    expect([there.farM, there.totalM]).toEqual([null, null]);
    expect(there.nearM).toBeCloseTo(hyperfocalM / 2, 9);
    expect(
      askCalculator(exposureDepth, { ...scene, distanceM: hyperfocalM * 0.99 }).result.farM,
    ).not.toBeNull();
  });

  it('counts a background nearer than the focus as a foreground, even nearer than the focal length', () => {
    const near = askCalculator(exposureDepth, { ...scene, backgroundM: 2.5 });
    expect(codesOf(near.notes)).toContain('background_in_front');
    // |2.5 − 5|/2.5 = 1: as large as the disc of a point at infinity.
    expect(near.result.backgroundBlurUm).toBeCloseTo(
      askCalculator(exposureDepth, scene).result.backgroundBlurUm,
      9,
    );
    const inside = askCalculator(exposureDepth, { ...scene, backgroundM: 0.01 });
    expect(inside.result.backgroundBlurUm).toBeGreaterThan(near.result.backgroundBlurUm);
  });

  it('says where diffraction is wider than the circle, and where the focus is close', () => {
    const notes = (input: object) => codesOf(askCalculator(exposureDepth, { ...scene, ...input }).notes);
    expect(notes({ aperture: 'f/32' })).toContain('diffraction_over_circle');
    expect(notes({ aperture: 'f/16' })).not.toContain('diffraction_over_circle');
    expect(notes({ distanceM: 0.99 })).toContain('close_up_lens_matters');
    expect(notes({ distanceM: 1 })).not.toContain('close_up_lens_matters');
  });
});
