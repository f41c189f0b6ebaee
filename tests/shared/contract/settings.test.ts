import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exactLimits, USUAL_GEAR, usualGearFor } from '../../../shared/contract/limits';
import { numberOfSetting, SETTING_PATTERNS, SETTING_RANGES } from '../../../shared/contract/settingIn';
import { chosenMark, exactWithMark } from '../../../shared/contract/settingOut';
import { exactOf, exactSettings, type Reading } from '../../../shared/contract/settings';
import { settingsWithMarks } from '../../../shared/contract/settingsWithMarks';
import { markAt, nearestMark, residualStops, type Scale } from '../../../shared/math/marks';
import { powerMarkAt } from '../../../shared/math/powerMarks';
import { evenly } from '../../support/spread';

const SCALES: Scale[] = ['full', 'half', 'third'];
const reading = (scale: Scale = 'third', readAs: Reading['readAs'] = 'mark'): Reading => ({ scale, readAs });

describe('a setting as text', () => {
  it('is read as it stands on the camera', () => {
    const cases: ['aperture' | 'shutter' | 'power', string, number][] = [
      ['aperture', 'f/5.6', 5.6],
      ['aperture', 'F5.6', 5.6],
      ['aperture', ' f/.95 ', 0.95],
      ['shutter', '1/125', 0.008],
      ['shutter', '1/125 s', 0.008],
      ['shutter', '2s', 2],
      ['shutter', '0.5', 0.5],
      ['shutter', '.5 s', 0.5],
      ['shutter', '1/2.5', 0.4],
      ['shutter', '10/4', 2.5],
      ['power', '1/16', 0.0625],
      ['power', '1/16 + 1/3', 2 ** (-11 / 3)],
    ];
    for (const [kind, text, number] of cases)
      expect(numberOfSetting(kind, text), text).toBeCloseTo(number, 12);
  });

  it('says nothing where it says something else', () => {
    const cases: ['aperture' | 'shutter' | 'iso' | 'power', string][] = [
      ['aperture', '5.6'],
      ['aperture', 'f/'],
      ['aperture', 'f/-2'],
      ['aperture', 'f/1e3'],
      ['aperture', 'ff/2'],
      ['aperture', 'f/5.6x'],
      ['aperture', `f/${'9'.repeat(400)}`],
      ['shutter', '1/0'],
      ['shutter', '0/0'],
      ['shutter', '1/-2'],
      ['shutter', '1/2/3'],
      ['shutter', '2 min'],
      ['shutter', '2S'],
      ['shutter', ''],
      ['shutter', ' '],
      ['shutter', '1 / 125'],
      ['iso', '400'],
      ['iso', 'ISO 400'],
      ['power', '0.5'],
      ['power', '1/0'],
      ['power', '1/1+2/3'],
    ];
    for (const [kind, text] of cases) expect(numberOfSetting(kind, text), `${kind} "${text}"`).toBeNaN();
  });

  it('matches the documented pattern exactly where it can be read, but for zero below the line', () => {
    const pieces = fc.constantFrom('f', 'F', '/', '1', '25', '.', '0', 's', ' ', '+', '1/3', '-', 'e', '\n');
    const text = fc.array(pieces, { maxLength: 7 }).map((parts) => parts.join(''));
    fc.assert(
      fc.property(
        fc.constantFrom('aperture' as const, 'shutter' as const, 'power' as const),
        text,
        (kind, given) => {
          const isRead = !Number.isNaN(numberOfSetting(kind, given));
          const isMatch = new RegExp(SETTING_PATTERNS[kind] ?? '$^', 'u').test(given);
          if (isRead) expect(isMatch, given).toBe(true);
          else if (isMatch)
            expect(given).toMatch(kind === 'power' ? /\/\s*[01.]|\+/ : /\/0*(\.0*)?( ?s)?\s*$/);
        },
      ),
      { numRuns: 3000 },
    );
  });

  it('is judged without delay however long it is', () => {
    const before = performance.now();
    for (const long of [
      '1'.repeat(300_000),
      ' '.repeat(300_000),
      `1/${'1'.repeat(300_000)}x`,
      `f/${'.'.repeat(300_000)}`,
    ])
      for (const kind of ['aperture', 'shutter', 'power'] as const) numberOfSetting(kind, long);
    expect(performance.now() - before).toBeLessThan(1000);
  });
});

describe('reading a setting', () => {
  it('takes every mark of its scale for the exact value behind it, as text and as a number', () => {
    let marks = 0;
    for (const scale of SCALES) {
      const n = { full: 1, half: 2, third: 3 }[scale];
      for (let p = -n; p <= 12 * n; p++) {
        const aperture = markAt('aperture', scale, p);
        expect(exactOf('aperture', aperture.label, reading(scale))).toBe(aperture.exact);
        expect(exactOf('aperture', Number(aperture.label.slice(2)), reading(scale))).toBe(aperture.exact);
        const iso = markAt('iso', scale, p);
        expect(exactOf('iso', Number(iso.label), reading(scale))).toBe(iso.exact);
        const power = powerMarkAt(scale, p + n);
        expect(exactOf('power', power.label, reading(scale))).toBeCloseTo(power.exact, 15);
        marks += 3;
      }
      for (let p = -5 * n; p <= 15 * n; p++) {
        const shutter = markAt('shutter', scale, p);
        expect(exactOf('shutter', shutter.label, reading(scale))).toBe(shutter.exact);
        marks += 1;
      }
    }
    expect(marks).toBe((14 + 27 + 40) * 3 + 21 + 41 + 61);
  });

  it('takes every number for itself where it is to be exact', () => {
    for (const scale of SCALES) {
      expect(exactOf('aperture', 'f/5.6', reading(scale, 'exact'))).toBe(5.6);
      expect(exactOf('shutter', '1/125', reading(scale, 'exact'))).toBe(0.008);
      expect(exactOf('shutter', 30, reading(scale, 'exact'))).toBe(30);
      expect(exactOf('iso', 125, reading(scale, 'exact'))).toBe(125);
    }
  });

  it('takes power for what it says, since its marks are exact', () => {
    expect(exactOf('power', 0.3, reading('full'))).toBe(0.3);
    expect(exactOf('power', '1/16', reading('full', 'exact'))).toBe(1 / 16);
  });

  it('goes by the scale of the request', () => {
    expect(exactOf('aperture', 'f/1.2', reading('third'))).toBeCloseTo(2 ** (1 / 3), 12);
    expect(exactOf('aperture', 'f/1.2', reading('half'))).toBeCloseTo(2 ** (1 / 4), 12);
    expect(exactOf('aperture', 'f/1.2', reading('full'))).toBe(1.2);
  });

  it('reaches all settings of an object, and the limits', () => {
    const given = { aperture: 'f/1.2', shutter: '1/10', iso: 1000, ndStops: 1.5 };
    expect(exactSettings(given, reading('third', 'exact'))).toEqual({
      aperture: 1.2,
      shutterS: 0.1,
      iso: 1000,
      ndStops: 1.5,
    });
    const exact = exactSettings(given, reading('half'));
    expect(exact.aperture).toBeCloseTo(2 ** 0.25, 12);
    expect(exact.shutterS).toBeCloseTo(2 ** -3.5, 12);
    expect(exact.iso).toBe(1000);
    const limits = exactLimits(
      { apertureMin: 'f/1.2', shutterSlowest: '1/10', isoMax: 1000 },
      reading('third'),
    );
    expect(limits.apertureMin).toBeCloseTo(2 ** (1 / 3), 12);
    expect(limits.shutterSlowestS).toBeCloseTo(2 ** (-10 / 3), 12);
    expect(limits.isoMax).toBeCloseTo(100 * 2 ** (10 / 3), 9);
    expect(limits).toMatchObject({ apertureMax: 32, shutterFastestS: 1 / 8192, isoMin: 50 });
  });
});

describe('usual gear', () => {
  const mark = (kind: 'aperture' | 'shutter' | 'iso', exact: number) => nearestMark(kind, 'third', exact);

  it('is widened by settings that lie outside it, and not by others', () => {
    const inside = { aperture: mark('aperture', 8), shutter: mark('shutter', 1), iso: mark('iso', 100) };
    expect(usualGearFor(inside)).toEqual(USUAL_GEAR);
    const outside = { aperture: mark('aperture', 64), shutter: mark('shutter', 90), iso: mark('iso', 25) };
    expect(usualGearFor(outside)).toEqual({
      ...USUAL_GEAR,
      apertureMax: 64,
      shutterSlowestS: 90,
      isoMin: 25,
    });
  });
});

describe('a setting in an answer', () => {
  it('says what setting the mark adds to the picture or takes from it', () => {
    const cases = [
      exactWithMark('aperture', 'full', 5),
      exactWithMark('shutter', 'full', 1 / 100),
      exactWithMark('iso', 'full', 110),
      exactWithMark('power', 'full', 0.3),
    ];
    expect(cases.map(({ mark }) => mark)).toEqual(['f/5.6', '1/125', '100', '1/4']);
    // f/5 to 4√2: 2·log2(5/4√2); 1/100 to 1/128; 110 to 100; 0.3 to 0.25: log2 of the ratio (derivation).
    const residuals = [
      2 * Math.log2(5 / Math.sqrt(32)),
      Math.log2(100 / 128),
      Math.log2(100 / 110),
      Math.log2(0.25 / 0.3),
    ];
    cases.forEach(({ residualStops: residual }, i) => expect(residual).toBeCloseTo(residuals[i] ?? NaN, 12));
    for (const { residualStops: residual } of cases) expect(residual).toBeLessThan(0);
  });

  it('rounds a limit to the side that was asked for', () => {
    expect(exactWithMark('shutter', 'third', 1 / 55, 'ceil').mark).toBe('1/60');
    expect(exactWithMark('shutter', 'third', 1 / 55, 'floor').mark).toBe('1/50');
    expect(exactWithMark('power', 'third', 0.3, 'floor').mark).toBe('1/4');
    expect(exactWithMark('power', 'third', 0.3, 'ceil').mark).toBe('1/4+1/3');
  });

  it('has no residual where the mark was chosen', () => {
    expect(chosenMark(markAt('shutter', 'third', 21))).toEqual({
      exact: 1 / 128,
      mark: '1/125',
      residualStops: 0,
    });
  });

  it('gives all settings at once', () => {
    const out = settingsWithMarks({ aperture: 8, shutterS: 60, iso: 100, ndStops: 3 }, 'third');
    expect(out).toEqual({
      aperture: { exact: 8, mark: 'f/8', residualStops: 0 },
      shutter: { exact: 60, mark: '60s', residualStops: 0 },
      iso: { exact: 100, mark: '100', residualStops: 0 },
      ndStops: 3,
    });
  });

  it('stays within half a step over the whole of every range', () => {
    const kinds = ['aperture', 'shutter', 'iso'] as const;
    fc.assert(
      fc.property(
        fc.constantFrom(...kinds),
        fc.constantFrom(...SCALES),
        evenly(0, 1),
        (kind, scale, share) => {
          const [low, high] = SETTING_RANGES[kind];
          const exact = low * (high / low) ** share;
          const { residualStops: residual } = exactWithMark(kind, scale, exact);
          expect(Math.abs(residual)).toBeLessThanOrEqual(0.5 / { full: 1, half: 2, third: 3 }[scale] + 1e-9);
          expect(residual).toBeCloseTo(residualStops(kind, exact, nearestMark(kind, scale, exact).exact), 12);
        },
      ),
    );
  });
});
