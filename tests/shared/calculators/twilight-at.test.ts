import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { twilightAt } from '../../../shared/calculators/twilight/at';
import { twilightDay } from '../../../shared/calculators/twilight/day';
import anchors from '../../reference/twilight-anchors.json';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { isFiniteThroughout } from '../../support/closeTo';
import { eachRow } from '../../support/eachRow';

const london = { latitude: 51.5074, longitude: -0.1278 };
const ask = (body: object) => askCalculator(twilightAt, body);

describe('twilight/at', () => {
  it('has the light that the meteorological glossary gives at sunset and at the end of each twilight', () => {
    const { events } = askCalculator(twilightDay, { ...london, date: '2026-10-04' }).result;
    const ends = ['sunset', 'civilDusk', 'nauticalDusk', 'astronomicalDusk'];
    eachRow(anchors, 4, ({ fromLux, toLux }, where) => {
      const end = ends.shift();
      const at = events.find(({ name }) => name === end)?.at ?? '';
      const { illuminanceLux } = ask({ ...london, at }).result;
      expect(illuminanceLux, where).toBeGreaterThan(fromLux * 0.98);
      expect(illuminanceLux, where).toBeLessThan(toLux * 1.02);
    });
  });

  it('tells EV by incident light: E·S/C, by hand 100·lux/250', () => {
    const { illuminanceLux, ev100 } = ask({ ...london, at: '2026-06-21T21:30:00+01:00' }).result;
    expect(ev100).toBeCloseTo(Math.log2((illuminanceLux * 100) / 250), 9);
    const dome = ask({ ...london, at: '2026-06-21T21:30:00+01:00', incidentC: 330 }).result;
    expect(dome.ev100).toBeCloseTo(ev100 - Math.log2(330 / 250), 9);
  });

  it('falls as fast as it says: a minute on, the difference is the rate', () => {
    const first = ask({ ...london, at: '2026-10-04T18:50:00+01:00' }).result;
    const later = ask({ ...london, at: '2026-10-04T18:51:00+01:00' }).result;
    expect(first.ev100 - later.ev100).toBeCloseTo(first.fallStopsPerMinute, 1);
    expect(first.fallStopsPerMinute).toBeGreaterThan(0.1);
  });

  it('names the band, rises at dawn, and notes where the model ends', () => {
    const dawn = ask({ ...london, at: '2026-10-04T06:50:00+01:00' }).result;
    expect(dawn.band).toEqual({ twilight: 'civilTwilight', hour: 'goldenHour' });
    expect(dawn.fallStopsPerMinute).toBeLessThan(0);
    const night = ask({ ...london, at: '2026-12-24T00:00:00Z' });
    expect(night.result.band).toEqual({ twilight: 'night', hour: null });
    expect(codesOf(night.notes)).toContain('sky_model_clamped');
  });

  it('says the instant in the place’s own time, whatever offset it came with', () => {
    expect(ask({ ...london, at: '2026-06-21T20:30:00Z' }).result.at).toBe('2026-06-21T21:30:00+01:00');
  });

  it('refuses an instant without offset, one that is none, and years beyond', () => {
    const places = (at: string) => placesOf(faultsIn(twilightAt, { ...london, at }));
    expect(places('2026-06-21T21:30:00')).toEqual(['/at wrong_format']);
    expect(places('2026-02-30T21:30:00Z')).toEqual(['/at wrong_format']);
    expect(places('1600-01-01T00:00:00Z')).toEqual(['/at year_out_of_range']);
  });

  it('is finite everywhere at all times', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -90, max: 90, noNaN: true }),
        fc.double({ min: -180, max: 180, noNaN: true }),
        fc.integer({ min: Date.UTC(1900, 0, 2), max: Date.UTC(2199, 11, 30) }),
        (latitude, longitude, ms) => {
          const at = new Date(Math.floor(ms / 1000) * 1000).toISOString();
          return isFiniteThroughout(ask({ latitude, longitude, at, timeZone: 'UTC' }).result);
        },
      ),
      { numRuns: 200 },
    );
  });
});
