import { describe, expect, it } from 'vitest';
import { filtersDensity } from '../../../shared/calculators/filters/density';
import { sceneEv100 } from '../../../shared/math/exposure';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

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
