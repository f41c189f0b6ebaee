import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exposureSolve } from '../../../shared/calculators/exposure/solve';
import { sceneEv100 } from '../../../shared/math/exposure';
import { SCENE_CODES, SCENES } from '../../../shared/math/scenes';
import table from '../../reference/scene-settings.json';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { eachRow } from '../../support/eachRow';
import { evenly, inRatio } from '../../support/spread';

const ask = (input: object) => askCalculator(exposureSolve, input);
const solve = (input: object) => ask(input).result;

describe('exposure/solve', () => {
  it('finds the missing one so that the picture comes out as bright as wanted, whatever the light is given in', () => {
    const lights = [{ ev100: 5 }, { luminanceCdM2: 4 }, { illuminanceLux: 80 }];
    const known = { aperture: 5.9, shutter: 0.021, iso: 730 };
    for (const light of lights)
      for (const unknown of ['aperture', 'shutter', 'iso'] as const) {
        const { [unknown]: _, ...two } = known;
        const result = solve({ ...light, ...two, brightnessStops: -1.5, ndStops: 2 });
        expect(result.unknown).toBe(unknown);
        const settings = sceneEv100(result.aperture.exact, result.shutter.exact, result.iso.exact, 2);
        // Brightness is the scene less the settings: a scene of EV 5 comes out 1.5 stops darker.
        expect(5 - settings).toBeCloseTo(-1.5, 9);
      }
  });

  it('says how bright the picture comes out with the marks set', () => {
    const scales = fc.constantFrom('full', 'half', 'third');
    fc.assert(
      fc.property(
        evenly(-3, 14),
        evenly(-2, 2),
        inRatio(1, 20),
        inRatio(100, 6400),
        scales,
        (ev100, wanted, aperture, iso, scale) => {
          const {
            aperture: a,
            shutter: t,
            iso: s,
            brightnessAtMarkStops,
          } = solve({ ev100, brightnessStops: wanted, aperture, iso, scale });
          const residual = a.residualStops + t.residualStops + s.residualStops;
          expect(brightnessAtMarkStops).toBeCloseTo(wanted + residual, 9);
          // Forward again, from the settings that the marks stand for.
          const set = sceneEv100(
            a.exact * 2 ** (-a.residualStops / 2),
            t.exact * 2 ** t.residualStops,
            s.exact * 2 ** s.residualStops,
          );
          expect(ev100 - set).toBeCloseTo(brightnessAtMarkStops, 9);
        },
      ),
    );
  });

  it('rounds no setting that is given on its mark', () => {
    const { shutter, brightnessAtMarkStops } = solve({ ev100: 13.1, aperture: 'f/8', iso: 100 });
    expect(shutter.mark).toBe('1/125');
    expect(brightnessAtMarkStops).toBeCloseTo(0.1, 9);
  });

  it('takes the middle of a scene, and says so', () => {
    eachRow(table, 9, ({ code, iso, aperture, shutterS }, where) => {
      const { result, notes } = ask({ scene: code, iso, aperture, readAs: 'exact' });
      expect(Math.abs(result.shutter.exact / shutterS - 1), where).toBeLessThanOrEqual(table.tolerance);
      expect(codesOf(notes), where).toContain('scene_middle_used');
    });
    const say = (scene: string) => ask({ scene, aperture: 4, iso: 400 }).notes[0]?.message;
    expect(say('home')).toBe(
      '“Rooms at home” covers EV 5 to 7 at ISO 100; the middle, 6, was used. A meter knows better.',
    );
    expect(say('sunny')).toMatch(/ stands for EV 15 at ISO 100\. /);
    expect(say('land_full_moon')).toContain('EV −3 to −2 at ISO 100; the middle, −2.5,');
    for (const code of SCENE_CODES)
      expect(solve({ scene: code, aperture: 4, iso: 400 }).unknown).toBe('shutter');
    expect(SCENE_CODES.length).toBe(SCENES.length);
  });

  it('notes where the solved setting lies outside usual gear, and not where it stands on the edge', () => {
    const notes = (input: object) => codesOf(ask(input).notes);
    expect(notes({ ev100: 15, aperture: 8, iso: 100 })).toEqual([]);
    // f/16 at ISO 100 needs 1/8192 s, the mark 1/8000, at EV 21; a third more is 1/10000.
    expect(notes({ ev100: 21, aperture: 16, iso: 100 })).toEqual([]);
    expect(notes({ ev100: 21 + 1 / 3, aperture: 16, iso: 100 })).toEqual(['shutter_outside_usual_gear']);
    // f/8 at ISO 100 needs 32 s, the mark 30 s, at EV 1; a third less is 40 s.
    expect(notes({ ev100: 1, aperture: 8, iso: 100 })).toEqual([]);
    expect(notes({ ev100: 1 - 1 / 3, aperture: 8, iso: 100 })).toEqual(['shutter_outside_usual_gear']);
    expect(notes({ ev100: 0, shutter: 1, iso: 100 })).toEqual([]);
    expect(notes({ ev100: -1 / 3, shutter: 1, iso: 100 })).toEqual(['aperture_outside_usual_gear']);
    expect(notes({ ev100: 10, shutter: 1, iso: 100 })).toEqual([]);
    expect(notes({ ev100: 10 + 1 / 3, shutter: 1, iso: 100 })).toEqual(['aperture_outside_usual_gear']);
    expect(notes({ ev100: 1, aperture: 1, shutter: 1 })).toEqual([]);
    expect(notes({ ev100: 1 + 1 / 3, aperture: 1, shutter: 1 })).toEqual(['iso_outside_usual_gear']);
    expect(notes({ ev100: -10, aperture: 1, shutter: 1 })).toEqual([]);
    expect(notes({ ev100: -10 - 1 / 3, aperture: 1, shutter: 1 })).toEqual(['iso_outside_usual_gear']);
  });

  it('says nothing about what the caller chose to use', () => {
    expect(codesOf(ask({ ev100: 12, aperture: 'f/64', iso: 100 }).notes)).toEqual([]);
    expect(codesOf(ask({ ev100: -6, shutter: 600, iso: 400 }).notes)).toEqual([]);
  });

  it('gives very long times in seconds, and even what no one can set as numbers', () => {
    expect(solve({ ev100: -6, aperture: 'f/4', iso: 100 }).shutter).toMatchObject({
      exact: 1024,
      mark: '1024s',
    });
    const worst = ask({ ev100: -30, brightnessStops: 60, ndStops: 40, aperture: 256, iso: 1 });
    expect(Number.isFinite(worst.result.shutter.exact)).toBe(true);
    expect(codesOf(worst.notes)).toEqual(['shutter_outside_usual_gear']);
    const other = ask({ ev100: -30, brightnessStops: 60, ndStops: 40, shutter: 1e-6, iso: 1 });
    expect(other.result.aperture.exact).toBeGreaterThan(0);
    expect(other.result.aperture.mark).toMatch(/^f\/\d/);
  });

  it('wants one light and two settings, and tells both faults at once', () => {
    expect(placesOf(faultsIn(exposureSolve, {})).sort()).toEqual(['/aperture exactly', '/ev100 exactly']);
    const all = { ev100: 1, luminanceCdM2: 1, aperture: 8, shutter: 1, iso: 100 };
    expect(placesOf(faultsIn(exposureSolve, all)).sort()).toEqual(['/iso exactly', '/luminanceCdM2 exactly']);
    expect(placesOf(faultsIn(exposureSolve, { scene: 'sunn', aperture: 8, iso: 100 }))).toEqual([
      '/scene not_a_choice',
    ]);
  });
});
