import { describe, expect, it } from 'vitest';
import { exposureValue } from '../../../shared/calculators/exposure/value';
import { askCalculator, faultsIn, placesOf } from '../../support/askCalculator';

const ask = (input: object) => askCalculator(exposureValue, input).result;

describe('exposure/value', () => {
  it('takes marks for the exact values behind them, unless every number is to mean itself', () => {
    // f/16 with 1/125 taken literally is 14.966, by the marks 15 (project handbook, section 0; derivation).
    const sunny = { aperture: 16, shutter: '1/125' };
    expect(ask(sunny).ev100).toBeCloseTo(15, 12);
    expect(ask({ ...sunny, readAs: 'exact' }).ev100).toBeCloseTo(Math.log2(256 * 125), 12);
    expect(ask({ aperture: 'f/1.2', shutter: 1 }).ev).toBeCloseTo(2 / 3, 12);
    expect(ask({ aperture: 'f/1.2', shutter: 1, scale: 'half' }).ev).toBeCloseTo(0.5, 12);
  });

  it('adds the filter to the scene, not to the settings', () => {
    const { ev, ev100, apex } = ask({ aperture: 8, shutter: '1/125', iso: 200, ndStops: 3 });
    expect([ev, ev100, apex.ev, apex.bv]).toEqual([13, 15, 13, 10]);
  });

  it('gives luminance and illuminance by the constants named, and names them', () => {
    const given = { aperture: 8, shutter: 1, reflectedK: 14, incidentC: 340 };
    // EV 6 with K 14 is 8.96 cd/m², with C 340 it is 217.6 lx (project handbook, section 1.5; L = 2^EV·K/100).
    expect(ask(given)).toMatchObject({ reflectedK: 14, incidentC: 340 });
    expect(ask(given).luminanceCdM2).toBeCloseTo(8.96, 12);
    expect(ask(given).illuminanceLux).toBeCloseTo(217.6, 10);
  });

  it('says how it understood the settings, with what the nearest marks would change', () => {
    const { settings } = ask({ aperture: 5.9, shutter: 50, iso: 110, scale: 'full', ndStops: 1 });
    expect(settings.aperture.mark).toBe('f/5.6');
    expect(settings.aperture.residualStops).toBeCloseTo(2 * Math.log2(5.9 / Math.sqrt(32)), 12);
    expect(settings.shutter).toEqual({ exact: 50, mark: '50s', residualStops: 0 });
    expect(settings.iso.mark).toBe('100');
    expect(settings.ndStops).toBe(1);
  });

  it('takes ISO 100 and no filter where nothing is said', () => {
    expect(ask({ aperture: 1, shutter: 1 })).toMatchObject({
      ev100: 0,
      luminanceCdM2: 0.125,
      illuminanceLux: 2.5,
    });
    expect(placesOf(faultsIn(exposureValue, {}))).toEqual(['/aperture missing', '/shutter missing']);
  });
});
