import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  apexOf,
  ev100OfIlluminance,
  ev100OfLuminance,
  exposureDifference,
  exposureValue,
  illuminanceOfEv100,
  luminanceOfEv100,
  sceneEv100,
  solveSetting,
  type ExactSettings,
  type UnknownSetting,
} from '../../../shared/math/exposure';
import {
  exactOfMarking,
  markAt,
  nearestMark,
  numberOfLabel,
  type MarkedKind,
} from '../../../shared/math/marks';
import speeds from '../../reference/apex-speeds.json';
import pairs from '../../reference/exif-apex-pairs.json';
import table from '../../reference/exposure-value-table.json';
import values from '../../reference/exposure-values.json';
import luminances from '../../reference/sunny-luminances.json';
import { eachRow } from '../../support/eachRow';
import { evenly, inRatio } from '../../support/spread';
import { within } from '../../support/within';

const anyAperture = inRatio(0.5, 256);
const anyShutter = inRatio(1e-6, 86_400);
const anyIso = inRatio(1, 1e7);
const anyNd = evenly(0, 40);
const anyEv100 = evenly(-30, 40);
const anySettings: fc.Arbitrary<ExactSettings> = fc.record({
  aperture: anyAperture,
  shutterS: anyShutter,
  iso: anyIso,
  ndStops: anyNd,
});

const evOf = ({ aperture, shutterS, iso, ndStops }: ExactSettings) =>
  sceneEv100(aperture, shutterS, iso, ndStops);

describe('exposure values', () => {
  it('are the published ones', () => {
    eachRow(values, 13, ({ aperture, shutterS, iso, ev, ev100 }, where) => {
      within(exposureValue(aperture, shutterS), ev, values.tolerance, where);
      within(sceneEv100(aperture, shutterS, iso), ev100, values.tolerance, where);
      within(apexOf(aperture, shutterS, iso).ev, ev, values.tolerance, where);
    });
  });

  it('give every cell of the classic table: the time that is set for an exposure value and an f-number', () => {
    let cells = 0;
    eachRow(table, 23, ({ ev, times }, where) => {
      const entries = Object.entries(times);
      expect(entries.length).toBe(13);
      entries.forEach(([label, time], fullStop) => {
        // One cell, EV 16 at f/1, is empty in the table.
        if (time === '') {
          expect([ev, label]).toEqual([16, 'f/1']);
          return;
        }
        const aperture = markAt('aperture', 'full', fullStop);
        expect(aperture.label.replace('1.0', '1'), where).toBe(label);
        const shutterS = solveSetting('shutter', ev, { aperture: aperture.exact, shutterS: 1, iso: 100 });
        within(exposureValue(aperture.exact, shutterS), ev, 1e-9, where);
        cells += 1;
        if (time.endsWith(' m')) {
          // Minutes are the markings' doubled thirty seconds, of 32 s each: 1 m is 64 s.
          expect(shutterS / 64, `${where} ${label}`).toBeCloseTo(Number(time.slice(0, -2)), 9);
          return;
        }
        const shown = time === '1/2' ? '0.5s' : time.startsWith('1/') ? time : `${time}s`;
        expect(nearestMark('shutter', 'full', shutterS).label, `${where} ${label}`).toBe(shown);
      });
    });
    expect(cells).toBe(23 * 13 - 1);
  });

  it('are Exif’s for its marks of f-number, time and speed', () => {
    eachRow(pairs, 36, ({ kind, mark, value }, where) => {
      const exact = exactOfMarking(kind as MarkedKind, 'full', numberOfLabel(mark));
      const { av, tv, sv } = apexOf(
        kind === 'aperture' ? exact : 1,
        kind === 'shutter' ? exact : 1,
        kind === 'iso' ? exact : 100,
      );
      within(kind === 'aperture' ? av : kind === 'shutter' ? tv : sv, value, pairs.tolerance, where);
    });
  });

  it('take ISO 100 as speed value 5', () => {
    eachRow(speeds, 8, ({ iso, sv }, where) => within(apexOf(1, 1, iso).sv, sv, speeds.tolerance, where));
  });

  it('suit the luminances that settings are for, whose light on the film is the same', () => {
    eachRow(luminances, 2, ({ aperture, shutterS, iso, luminanceCdM2, focalPlaneLuxS }, where) => {
      const luminance = luminanceOfEv100(sceneEv100(aperture, shutterS, iso));
      within(luminance / luminanceCdM2, 1, luminances.tolerance, where);
      // H = q·L·t/N² with q 0.65 (ISO 12232, second-hand).
      within((0.65 * luminance * shutterS) / aperture ** 2 / focalPlaneLuxS, 1, luminances.tolerance, where);
    });
  });

  it('have a sunny sixteen at the mark 1/100 of EV 14⅔', () => {
    const shutterS = exactOfMarking('shutter', 'third', 1 / 100);
    expect(sceneEv100(16, shutterS, 100)).toBeCloseTo(14 + 2 / 3, 12);
  });
});

describe('properties of exposure', () => {
  it('a filter, a higher speed and a scene’s EV balance as the signs of the interface say', () => {
    fc.assert(
      fc.property(anySettings, anyNd, (settings, more) => {
        const ev100 = evOf(settings);
        expect(evOf({ ...settings, ndStops: settings.ndStops + more })).toBeCloseTo(ev100 + more, 9);
        expect(evOf({ ...settings, iso: settings.iso * 2 })).toBeCloseTo(ev100 - 1, 9);
        expect(evOf({ ...settings, shutterS: settings.shutterS * 2 })).toBeCloseTo(ev100 - 1, 9);
        expect(evOf({ ...settings, aperture: settings.aperture * 2 })).toBeCloseTo(ev100 + 2, 9);
      }),
    );
  });

  it('light in three units leads from one to the next and back', () => {
    const constant = inRatio(1, 5000);
    fc.assert(
      fc.property(anyEv100, constant, constant, (ev100, k, c) => {
        expect(ev100OfLuminance(luminanceOfEv100(ev100, k), k)).toBeCloseTo(ev100, 9);
        expect(ev100OfIlluminance(illuminanceOfEv100(ev100, c), c)).toBeCloseTo(ev100, 9);
        expect(luminanceOfEv100(ev100, k) / illuminanceOfEv100(ev100, c)).toBeCloseTo(k / c, 9);
      }),
    );
  });

  it('a solved setting brings back the exposure that it was solved for', () => {
    const unknowns: UnknownSetting[] = ['aperture', 'shutter', 'iso'];
    fc.assert(
      fc.property(fc.constantFrom(...unknowns), anyEv100, anySettings, (unknown, ev100, known) => {
        const solved = solveSetting(unknown, ev100, known);
        const all = { ...known, [unknown === 'shutter' ? 'shutterS' : unknown]: solved };
        expect(sceneEv100(all.aperture, all.shutterS, all.iso)).toBeCloseTo(ev100, 9);
      }),
    );
  });

  it('the APEX values add up, and the brightness value is log2(L/4) at K 12.5', () => {
    fc.assert(
      fc.property(anySettings, (settings) => {
        const { aperture, shutterS, iso, ndStops } = settings;
        const { av, tv, sv, bv, ev } = apexOf(aperture, shutterS, iso, ndStops);
        expect(av + tv).toBeCloseTo(ev, 9);
        expect(bv + sv).toBeCloseTo(ev + ndStops, 9);
        expect(bv).toBeCloseTo(Math.log2(luminanceOfEv100(evOf(settings)) / 4), 9);
      }),
    );
  });

  it('differences add, turn round with the order, and are the difference of the exposures', () => {
    fc.assert(
      fc.property(anySettings, anySettings, anySettings, (a, b, c) => {
        const ab = exposureDifference(a, b);
        expect(ab.stops).toBeCloseTo(evOf(a) - evOf(b), 9);
        expect(ab.stops + exposureDifference(b, c).stops).toBeCloseTo(exposureDifference(a, c).stops, 9);
        expect(exposureDifference(b, a).stops).toBeCloseTo(-ab.stops, 9);
        expect(ab.byApertureStops + ab.byShutterStops + ab.byIsoStops + ab.byNdStops).toBeCloseTo(
          ab.stops,
          9,
        );
        expect(exposureDifference(a, a).stops).toBe(0);
      }),
    );
  });

  it('the ends of every range stay finite, in every combination', () => {
    let combinations = 0;
    for (const aperture of [0.5, 256])
      for (const shutterS of [1e-6, 86_400])
        for (const iso of [1, 1e7])
          for (const ndStops of [0, 40]) {
            const ev100 = sceneEv100(aperture, shutterS, iso, ndStops);
            const numbers = [
              ...Object.values(apexOf(aperture, shutterS, iso, ndStops)),
              luminanceOfEv100(ev100, 100),
              illuminanceOfEv100(ev100, 5000),
              ...(['aperture', 'shutter', 'iso'] as const).flatMap((unknown) =>
                [-130, 140].map((wanted) => solveSetting(unknown, wanted, { aperture, shutterS, iso })),
              ),
            ];
            for (const number of numbers) expect(Number.isFinite(number)).toBe(true);
            combinations += 1;
          }
    expect(combinations).toBe(16);
  });

  it('one second at f/1 and ISO 100 is plain zero, without a sign', () => {
    const { av, tv, ev } = apexOf(1, 1, 100);
    for (const zero of [av, tv, ev, exposureValue(1, 1), sceneEv100(1, 1, 100)]) expect(zero).toBe(0);
  });
});

describe('outside their domain', () => {
  const settings: ExactSettings = { aperture: 8, shutterS: 1, iso: 100, ndStops: 0 };
  const bad = [0, -1, Number.NaN, Infinity];

  it('settings and light are refused loudly', () => {
    for (const value of bad) {
      expect(() => exposureValue(value, 1)).toThrow(RangeError);
      expect(() => exposureValue(8, value)).toThrow(RangeError);
      expect(() => sceneEv100(8, 1, value)).toThrow(RangeError);
      expect(() => apexOf(8, 1, value)).toThrow(RangeError);
      expect(() => ev100OfLuminance(value)).toThrow(RangeError);
      expect(() => ev100OfIlluminance(value)).toThrow(RangeError);
      expect(() => luminanceOfEv100(0, value)).toThrow(RangeError);
      expect(() => illuminanceOfEv100(0, value)).toThrow(RangeError);
      expect(() => exposureDifference(settings, { ...settings, iso: value })).toThrow(RangeError);
      expect(() => solveSetting('shutter', 0, { ...settings, aperture: value })).toThrow(RangeError);
    }
  });

  it('stops that are no number, or beyond all light, are too', () => {
    for (const value of [Number.NaN, Infinity, -Infinity, 1001]) {
      expect(() => luminanceOfEv100(value)).toThrow(RangeError);
      expect(() => sceneEv100(8, 1, 100, value)).toThrow(RangeError);
      expect(() => solveSetting('iso', value, settings)).toThrow(RangeError);
    }
  });

  it('the unknown of a solution may be anything, since it is not read', () => {
    expect(solveSetting('iso', 13, { aperture: 8, shutterS: 1 / 128, iso: Number.NaN })).toBeCloseTo(100, 9);
  });
});
