import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { filtersDensity } from '../../../shared/calculators/filters/density';
import { sceneEv100 } from '../../../shared/math/exposure';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { isFiniteThroughout } from '../../support/closeTo';

const settings = { aperture: 'f/4', shutter: '1/60', iso: 400 };

describe('filters/density', () => {
  it('says the same filter alike, however it was given', () => {
    const ways = [
      { stops: 3 },
      { factor: 8 },
      { density: 3 * Math.log10(2) },
      { stack: [{ stops: 1 }, { factor: 4 }] },
      { stack: [{ polariserDeg: 60 }, { polariserDeg: 45 }] },
    ];
    for (const way of ways) {
      const { stops, density, factor, transmittance } = askCalculator(filtersDensity, way).result;
      expect(stops).toBeCloseTo(3, 12);
      expect(density).toBeCloseTo(0.90309, 5);
      expect(factor).toBeCloseTo(8, 9);
      expect(transmittance).toBeCloseTo(0.125, 12);
    }
  });

  it('keeps the exposure, whichever setting moves, and filters that are there already', () => {
    const before = sceneEv100(4, 1 / 64, 400, 2);
    for (const move of ['shutter', 'iso', 'aperture']) {
      const input = { stops: 4, settings: { ...settings, ndStops: 2 }, move };
      const after = askCalculator(filtersDensity, input).result.settings;
      expect(after?.ndStops).toBe(6);
      const { aperture, shutter, iso, ndStops } = after ?? ({} as never);
      expect(sceneEv100(aperture.exact, shutter.exact, iso.exact, ndStops)).toBeCloseTo(before, 9);
      const moved = Object.entries({ aperture: 4, shutter: 1 / 64, iso: 400 }).filter(
        ([name, was]) => after?.[name as 'iso'].exact !== was,
      );
      expect(moved.map(([name]) => name)).toEqual([move]);
    }
  });

  it('answers with finite numbers for every filter and every setting, and keeps the exposure', () => {
    const span = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    const filter = fc.oneof(
      fc.record({ stops: span(0, 40) }),
      fc.record({ density: span(0, 12) }),
      fc.record({ factor: span(0, Math.log(1e12)).map((n) => Math.min(1e12, Math.exp(n))) }),
      fc.record({ polariserDeg: span(0, 89) }),
    );
    const way = fc.oneof(
      filter,
      fc
        .record({ stack: fc.array(filter, { minLength: 1, maxLength: 10 }) })
        .filter((input) => faultsIn(filtersDensity, input).length === 0),
    );
    const camera = fc.record({ aperture: span(0.5, 256), shutter: span(1e-6, 86_400), iso: span(1, 1e7) });
    const move = fc.constantFrom('shutter', 'iso', 'aperture');
    fc.assert(
      fc.property(way, camera, move, fc.constantFrom('full', 'half', 'third'), (given, set, moves, scale) => {
        const input = { ...given, settings: set, move: moves, scale, readAs: 'exact' };
        const answer = askCalculator(filtersDensity, input);
        expect(isFiniteThroughout(answer)).toBe(true);
        const { aperture, shutter, iso, ndStops } = answer.result.settings ?? ({} as never);
        const before = sceneEv100(set.aperture, set.shutter, set.iso);
        expect(sceneEv100(aperture.exact, shutter.exact, iso.exact, ndStops)).toBeCloseTo(before, 8);
      }),
    );
  });

  it('tells ND 3.0 from ten stops, and only where a density was given', () => {
    const notes = (input: object) => codesOf(askCalculator(filtersDensity, input).notes);
    expect(notes({ density: 3 })).toEqual(['density_near_whole_stops']);
    expect(notes({ density: 2 })).toEqual([]);
    expect(notes({ density: 0 })).toEqual([]);
    expect(notes({ factor: 1000 })).toEqual([]);
  });

  it('warns of the sun from 13 stops on', () => {
    const cautions = (stops: number) => codesOf(askCalculator(filtersDensity, { stops }).cautions);
    expect(cautions(12.9)).toEqual([]);
    expect(cautions(13)).toEqual(['sun_and_optics']);
  });

  it('says what a corrected time beyond a second and beyond usual gear asks for', () => {
    const answer = askCalculator(filtersDensity, { stops: 16, settings });
    expect(answer.result.settings?.shutter.exact).toBe(1024);
    expect(codesOf(answer.notes)).toEqual(['film_needs_more_time', 'shutter_outside_usual_gear']);
    const opened = askCalculator(filtersDensity, { stops: 8, settings, move: 'aperture' });
    expect(codesOf(opened.notes)).toEqual(['aperture_outside_usual_gear']);
  });

  it('wants exactly one way, in each filter of a stack too', () => {
    const places = (input: object) => placesOf(faultsIn(filtersDensity, input));
    expect(places({})).toEqual(['/stops exactly']);
    expect(places({ stops: 3, stack: [{ stops: 1 }] })).toEqual(['/stack exactly']);
    expect(places({ stack: [{ stops: 1 }, {}] })).toEqual(['/stack/1/stops exactly']);
    expect(places({ stack: [{ stops: 1, factor: 2 }] })).toEqual(['/stack/0/factor exactly']);
    expect(places({ stack: [] })).toEqual(['/stack too_few_items']);
  });

  it('refuses a stack that nothing gets through, and polarisers that close', () => {
    const faults = faultsIn(filtersDensity, { stack: [{ stops: 25 }, { density: 5 }] });
    expect(placesOf(faults)).toEqual(['/stack stack_too_dense']);
    expect(faults[0]?.detail).toMatch(/41\.6.*40/);
    expect(placesOf(faultsIn(filtersDensity, { polariserDeg: 90 }))).toEqual(['/polariserDeg out_of_range']);
  });
});
