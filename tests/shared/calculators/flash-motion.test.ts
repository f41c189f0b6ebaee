import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { flashDuration } from '../../../shared/calculators/flash/duration';
import { flashMotion } from '../../../shared/calculators/flash/motion';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { isFiniteThroughout } from '../../support/closeTo';

const ask = (body: unknown) => askCalculator(flashMotion, body);
const places = (body: unknown) => placesOf(faultsIn(flashMotion, body));

const juggler = { subject: { speedMS: 6 }, distanceM: 4, focalLengthMm: 85, pixelPitchUm: 6 };
const swaying = { subject: { speedMS: 0.05 }, distanceM: 3, focalLengthMm: 50, pixelPitchUm: 6 };
const flash = { t05S: 0.001, control: 'cutoff', power: '1/8', brightnessStops: 0 };
const dusk = { shutter: '1/8', subjectBrightnessStops: -3 };

describe('flash/motion, worked questions', () => {
  it('how long may a flash last for a juggler’s hand at 6 m/s, 85 mm, 4 m, 6 µm: to a pixel and to 28.8 µm?', () => {
    // m = 85/(4000 − 85) = 0.021711; the image moves at 6·0.021711 = 0.13027 m/s = 130,268 µm/s.
    // 6 µm/130,268 = 46.06 µs (1/21,711 s); 28.8 µm/130,268 = 221.1 µs (1/4,523 s).
    const { result } = ask({ ...juggler, tolerance: { circleOfConfusionUm: 28.8 } });
    expect(result.magnification).toBeCloseTo(0.021711, 6);
    expect((result.flashForOnePixelS ?? NaN) * 1e6).toBeCloseTo(46.06, 2);
    expect((result.flashForFrozenS ?? NaN) * 1e6).toBeCloseTo(221.1, 1);
    expect(result.tolerancePx).toBeCloseTo(4.8, 9);
    // The mark is on the safe side: never longer than what freezes.
    expect(result.shutterForFrozen?.mark).toBe('1/5000');
    expect(result.shutterForFrozen?.residualStops).toBeLessThan(0);
  });

  it('how strong is the ghost if the ambient light is three stops under the flash at 1/8 s?', () => {
    // Swaying by 5 cm/s, 50 mm from 3 m: m = 50/2950 = 0.016949; 0.05·0.125·0.016949 = 105.9 µm = 17.66 px.
    // Spread over 10 px of detail: D = 3 + log2(1 + 1.766) = 4.47, between 3 and 6: faint. Ambient is 1/(1 + 8).
    const { result } = ask({ ...swaying, flash, ambient: dusk });
    expect(result.ghost?.stopsBelowFlash).toBe(3);
    expect(result.ghost?.trailPx).toBeCloseTo(17.66, 2);
    expect(result.ghost?.visibility).toBe('faint');
    expect(result.ghost?.ambientShare).toBeCloseTo(1 / 9, 9);
    // Standing still there is no trail and no ghost, however bright the ambient light.
    const still = { ...swaying, subject: { speedMS: 0 }, flash, ambient: dusk };
    expect(ask(still).result.ghost?.visibility).toBe('none');
    // At the same brightness the same sway dominates the picture: D = 1.47 is clear; a stop over: 0.47.
    const bright = (stops: number) =>
      ask({ ...swaying, flash, ambient: { ...dusk, subjectBrightnessStops: stops } }).result.ghost
        ?.visibility;
    expect([bright(0), bright(1), bright(2), bright(-5)]).toEqual(['clear', 'clear', 'dominant', 'none']);
  });
});

describe('flash/motion', () => {
  it('judges the flash by the t0.1 that flash/duration gives', () => {
    const { result } = ask({ ...juggler, flash });
    const { t01S } = askCalculator(flashDuration, { t05S: 0.001, control: 'cutoff', power: '1/8' }).result;
    expect(result.flash?.t01S).toBe(t01S);
    // 6 m/s for 192.6 µs is 1.156 mm at the subject, 25.1 µm on the sensor, 4.18 px.
    expect(result.flash?.blurMmAtSubject).toBeCloseTo(1.156, 3);
    expect(result.flash?.blurPx).toBeCloseTo(4.18, 2);
    expect(result.flash?.frozen).toBe(false);
    expect(ask({ ...juggler, flash, tolerance: { px: 5 } }).result.flash?.frozen).toBe(true);
  });

  it('takes a flash of exactly the longest time as frozen', () => {
    const longest = ask(juggler).result.flashForFrozenS ?? NaN;
    const at = (t01S: number) =>
      ask({ ...juggler, flash: { t01S, brightnessStops: 0 } }).result.flash?.frozen;
    expect(at(longest)).toBe(true);
    expect(at(longest * 1.001)).toBe(false);
  });

  it('takes the pixel pitch, or the sensor’s width and pixels', () => {
    const { pixelPitchUm, ...rest } = juggler;
    const bySensor = ask({ ...rest, sensorWidthMm: 36, imageWidthPx: 6000 }).result;
    expect(bySensor.flashForFrozenS).toBeCloseTo(
      ask({ ...rest, pixelPitchUm }).result.flashForFrozenS ?? NaN,
      12,
    );
  });

  it('has no longest flash along the axis, and says what happens there', () => {
    const along = { ...juggler, subject: { speedMS: 9, directionDeg: 90 }, flash };
    const { result, notes } = ask(along);
    expect(result).toMatchObject({ flashForFrozenS: null, flashForOnePixelS: null, shutterForFrozen: null });
    expect(result.flash).toMatchObject({ blurPx: 0, frozen: true });
    expect(codesOf(notes)).toContain('movement_along_axis');
    // Standing still has no longest flash either, but is no movement along the axis.
    expect(codesOf(ask({ ...juggler, subject: { speedMS: 0 } }).notes)).not.toContain('movement_along_axis');
  });

  it('shows a bright background through the moving edge', () => {
    // Trail 17.66 px over 10 px of detail leaves the background open for 17.66/27.66 of the time: −0.647 stops.
    const body = { ...swaying, flash, ambient: { ...dusk, backgroundBrightnessStops: 1 } };
    expect(ask(body).result.ghost?.throughStops).toBeCloseTo(1 - 0.647, 3);
    expect(ask({ ...swaying, flash, ambient: dusk }).result.ghost).not.toHaveProperty('throughStops');
    expect(ask({ ...body, subject: { speedMS: 0 } }).result.ghost).not.toHaveProperty('throughStops');
  });

  it('knows shake by the same hands as the hand-held limit', () => {
    // 50 mm for 1/8 s at 0.03 rad/s: 187.5 µm = 31.25 px; the limit is 1/50 s. Three stops of stabilisation: an eighth.
    const at = (support: object) => ask({ ...swaying, ambient: dusk, support }).result.shake;
    expect(at({ kind: 'handheld' })).toMatchObject({ withinLimit: false, slowestShutter: { mark: '1/50' } });
    expect(at({ kind: 'handheld' })?.blurPx).toBeCloseTo(31.25, 9);
    expect(at({ kind: 'handheld', stabilisationStops: 3 })).toMatchObject({ withinLimit: true });
    expect(at({ kind: 'handheld', stabilisationStops: 3 })?.blurPx).toBeCloseTo(31.25 / 8, 9);
    expect(at({ kind: 'tripod' })).toEqual({ blurPx: 0, blurUm: 0, withinLimit: true, slowestShutter: null });
  });

  it('asks for the shutter where only the hand is known', () => {
    const { result, notes } = ask({ ...juggler, support: { kind: 'handheld' } });
    expect(result).not.toHaveProperty('shake');
    expect(codesOf(notes)).toEqual(['shake_needs_shutter']);
  });

  it('leaves out what it was not told, and cautions only with a flash', () => {
    const bare = ask(juggler);
    for (const part of ['flash', 'ambient', 'shake', 'ghost']) expect(bare.result).not.toHaveProperty(part);
    expect(bare.cautions).toEqual([]);
    expect(codesOf(ask({ ...juggler, flash }).cautions)).toEqual(['flash_and_eyes']);
    expect(ask({ ...juggler, ambient: dusk }).result).not.toHaveProperty('ghost');
  });
});

describe('flash/motion, what is refused', () => {
  it('a subject within the focal length', () => {
    for (const distanceM of [0.085, 0.05])
      expect(places({ ...juggler, distanceM })).toEqual(['/distanceM focus_inside_lens']);
  });

  it('a pitch said twice or half, a tolerance or a duration said twice', () => {
    const { pixelPitchUm, ...rest } = juggler;
    expect(places(rest)).toEqual(['/pixelPitchUm exactly']);
    expect(places({ ...rest, sensorWidthMm: 36 })).toEqual(['/imageWidthPx needed_together']);
    expect(places({ ...rest, pixelPitchUm, sensorWidthMm: 36, imageWidthPx: 6000 })).toEqual([
      '/sensorWidthMm exactly',
    ]);
    expect(places({ ...juggler, tolerance: { px: 1, circleOfConfusionUm: 30 } })).toEqual([
      '/tolerance/circleOfConfusionUm at_most_one',
    ]);
    expect(places({ ...juggler, flash: { ...flash, t01S: 0.003 } })).toEqual(['/flash/t01S exactly']);
    expect(places({ ...juggler, flash: { brightnessStops: 0 } })).toEqual(['/flash/t05S exactly']);
  });
});

describe('flash/motion at the corners of its ranges', () => {
  it('stays finite', () => {
    const of = (...values: unknown[]) => fc.constantFrom(...values);
    const body = fc.record({
      subject: fc.record({ speedMS: of(0, 5e-324, 1e-9, 100_000), directionDeg: of(0, 89.999999, 90, -360) }),
      distanceM: of(5.0000001, 10_000),
      focalLengthMm: of(1, 5000),
      pixelPitchUm: of(0.01, 1000),
      flash: fc.record({
        t01S: of(1e-8, 10),
        control: of('decay', 'cutoff', 'voltage'),
        power: of(1.0001e-9, 1),
        brightnessStops: of(-60, 60),
      }),
      ambient: fc.record({
        shutter: of(1e-6, 86_400),
        subjectBrightnessStops: of(-60, 60),
        backgroundBrightnessStops: of(-60, 60),
      }),
      support: fc.record({
        kind: of('tripod', 'handheld'),
        cropFactor: of(0.1, 20),
        stabilisationStops: of(0, 12),
      }),
      tolerance: of({ px: 0.01 }, { circleOfConfusionUm: 10_000 }, {}),
      detailPx: of(0.1, 100_000),
    });
    fc.assert(
      fc.property(body, (given) => {
        const answer = ask(given);
        expect(isFiniteThroughout(answer)).toBe(true);
        expect(flashMotion.output.safeParse(answer.result).success).toBe(true);
      }),
      { numRuns: 400 },
    );
  });
});
