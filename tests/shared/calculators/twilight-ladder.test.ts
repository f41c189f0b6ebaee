import { describe, expect, it } from 'vitest';
import { twilightAt } from '../../../shared/calculators/twilight/at';
import { twilightLadder } from '../../../shared/calculators/twilight/ladder';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

const place = { latitude: 51.5074, longitude: -0.1278 };
const frame = { at: '2026-10-04T18:45:00+01:00', aperture: 'f/4', shutter: '1/60', iso: 400 };
const plain = {
  ...place,
  testFrame: frame,
  hold: { aperture: 'f/4', iso: 400 },
  limits: { shutterSlowest: '1/15', isoMax: 3200, apertureMin: 'f/2' },
  to: '2026-10-04T19:15:00+01:00',
};
const ask = (extra: object = {}) => askCalculator(twilightLadder, { ...plain, ...extra });
const places = (extra: object) => placesOf(faultsIn(twilightLadder, { ...plain, ...extra }));

/** What a camera would meter: a scene of known truth, so many stops over the sky, with lamps of a known EV. */
function truthAt(at: string, offsetStops: number, lampsEv: number | null): number {
  const sky = askCalculator(twilightAt, { ...place, at }).result.ev100 + offsetStops;
  return lampsEv === null ? sky : Math.log2(2 ** sky + 2 ** lampsEv);
}

/** A frame of that scene: f/4 at ISO 400 and 1 s suits EV 2; what it differs by is how it came out. */
const frameOf = (at: string, ev100: number) => ({
  at,
  aperture: 'f/4',
  shutter: '1s',
  iso: 400,
  offsetStops: ev100 - 2,
});

describe('twilight/ladder', () => {
  it.each([
    ['no lamps, from one frame', -1.5, null, ['2026-10-04T18:40:00+01:00']],
    ['lamps of EV 3, from two frames', 1, 3, ['2026-10-04T18:40:00+01:00', '2026-10-04T19:30:00+01:00']],
    ['weak lamps, from two frames', 2, 0, ['2026-10-04T18:45:00+01:00', '2026-10-04T19:45:00+01:00']],
  ] as const)(
    'finds an evening of known truth again to 0.15 stop at every rung: %s',
    (_, offset, lamps, when) => {
      const [first = '', second] = when;
      const { rungs } = ask({
        testFrame: frameOf(first, truthAt(first, offset, lamps)),
        ...(second && { secondFrame: frameOf(second, truthAt(second, offset, lamps)) }),
        to: '2026-10-04T19:45:00+01:00',
      }).result;
      expect(rungs.length).toBeGreaterThan(8);
      for (const { at, sceneEv100 } of rungs)
        expect(Math.abs(sceneEv100 - truthAt(at, offset, lamps)), at).toBeLessThan(0.15);
    },
  );

  it('starts with the frame’s own settings, which make the frame', () => {
    const [first] = ask().result.rungs;
    expect([first?.aperture.mark, first?.shutter.mark, first?.iso.mark]).toEqual(['f/4', '1/60', '400']);
    // f/4, 1/60 (1/64) and ISO 400: 4 + 6 − 2 = EV 8.
    expect(first?.sceneEv100).toBeCloseTo(8, 6);
  });

  it('joins rungs without gaps, in the place’s time, to the end that is asked for', () => {
    const { rungs, timeZone } = ask().result;
    expect(timeZone).toBe('Europe/London');
    for (const [i, rung] of rungs.entries()) expect(rung.until).toBe(rungs[i + 1]?.at ?? plain.to);
  });

  it('lets what is asked to give way first give way first', () => {
    const second = (order: string[]) => ask({ order }).result.rungs[1];
    expect(second(['iso'])?.iso.mark).toBe('500');
    expect(second(['aperture', 'iso'])?.aperture.mark).toBe('f/3.5');
    expect(second(['shutter'])?.shutter.mark).toBe('1/50');
  });

  it('carries the flash’s power only where the subject’s own light is told', () => {
    const flash = { guideNumberM: 36, distanceM: 3, lossStops: 1.5, minPower: '1/2048', syncSpeed: '1/200' };
    expect(ask({ flash }).result.rungs[0]?.power).toBeUndefined();
    const { rungs } = ask({ flash, subjectBelowBackgroundStops: 1 }).result;
    // Half of the subject's light is its own, so the flash gives the other half: 36/3 = f/12 less 1.5 stops is
    // f/7.14 at ISO 100, f/14.3 at ISO 400; to f/4 that is 3.67 stops too much, and one more: 1/32 + 1/3.
    expect(rungs[0]?.power?.mark).toBe('1/32+1/3');
    // A stop of aperture or ISO asks a stop less of the flash.
    const last = rungs[rungs.length - 1];
    const opened = Math.log2(((4 / (last?.aperture.exact ?? 4)) ** 2 * (last?.iso.exact ?? 400)) / 400);
    expect(Math.log2((rungs[0]?.power?.exact ?? 0) / (last?.power?.exact ?? 1))).toBeCloseTo(opened, 0);
  });

  it('rises at dawn', () => {
    const dawn = { ...frame, at: '2026-10-04T06:35:00+01:00' };
    const { rungs } = ask({ testFrame: dawn, to: '2026-10-04T07:05:00+01:00' }).result;
    expect(rungs[rungs.length - 1]?.sceneEv100).toBeGreaterThan(rungs[0]?.sceneEv100 ?? 99);
  });

  it('notes each case that would mislead', () => {
    const notes = (extra: object) => codesOf(ask(extra).notes);
    expect(notes({})).toContain('lamps_unknown');
    const close = { ...frame, at: '2026-10-04T18:50:00+01:00', shutter: '1/50' };
    expect(notes({ secondFrame: close })).toContain('lamps_undetermined');
    const brighter = { ...frame, at: '2026-10-04T19:00:00+01:00', shutter: '1/125' };
    expect(notes({ secondFrame: brighter })).toContain('lamps_came_on');
    const early = { ...frame, at: '2026-10-04T17:45:00+01:00' };
    expect(notes({ testFrame: early })).toContain('frame_before_sunset');
    expect(notes({ testFrame: { ...frame, shutter: '1/2000' } })).toContain('check_clock');
    expect(notes({ lampFloorEv100: 9 })).toContain('frame_below_lamps');
    // A full moon on 26 September 2026, two hours after sunset.
    const moonlit = { ...frame, at: '2026-09-26T19:00:00+01:00', shutter: '1/60' };
    expect(notes({ testFrame: moonlit, to: '2026-09-26T21:00:00+01:00' })).toContain('moon_counts');
  });

  it('refuses what can’t be, at its place', () => {
    expect(places({ latitude: 91 })).toEqual(['/latitude out_of_range']);
    expect(places({ testFrame: { ...frame, at: '2026-02-30T18:00:00Z' } })).toEqual([
      '/testFrame/at wrong_format',
    ]);
    expect(places({ timeZone: 'Mars/Olympus' })).toEqual(['/timeZone time_zone_unknown']);
    expect(places({ secondFrame: { ...frame, at: '2026-10-06T18:45:00+01:00' } })).toEqual([
      '/secondFrame/at frames_too_far_apart',
    ]);
    expect(places({ from: '2026-10-02T18:45:00+01:00' })).toEqual(['/from ladder_far_from_frames']);
    expect(places({ to: frame.at })).toEqual(['/to ladder_ends_before_start']);
    expect(places({ hold: { aperture: 'f/1.4', iso: 400 } })).toEqual(['/hold/aperture hold_beyond_limit']);
    expect(places({ hold: { aperture: 'f/4', iso: 6400 } })).toEqual(['/hold/iso hold_beyond_limit']);
    const flash = { guideNumberM: 36, distanceM: 3, minPower: '1/128', syncSpeed: '1/4' };
    expect(places({ flash })).toEqual(['/limits/shutterSlowest sync_leaves_no_shutter']);
    expect(places({ subjectBelowBackgroundStops: 1 })).toEqual(['/flash subject_without_flash']);
    expect(places({ order: ['iso', 'iso'] })).toEqual(['/order/1 gives_way_twice']);
    const lamps = { onAt: '2026-10-04T19:00:00+01:00', offAt: '2026-10-04T18:00:00+01:00' };
    expect(places({ lamps })).toEqual(['/lamps/offAt lamps_off_before_on']);
  });
});
