import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { flashDaylight } from '../../../shared/calculators/flash/daylight';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { isFiniteThroughout } from '../../support/closeTo';

const ask = (body: unknown) => askCalculator(flashDaylight, body);
const places = (body: unknown) => placesOf(faultsIn(flashDaylight, body));

const sunny = {
  background: { ev100: 15 },
  subjectAmbient: { belowBackgroundStops: 2 },
  aperture: 'f/2',
  iso: 100,
  syncSpeed: '1/200',
  flash: { guideNumberM: 40, distanceM: 2 },
};
const wayOf = (body: unknown, way: string) => {
  const found = ask(body).result.ways.find((candidate) => candidate.way === way);
  if (!found) throw new Error(`no way ${way}`);
  return found;
};

describe('flash/daylight, worked question', () => {
  it('wide open at f/2 in sun with sync 1/200: filter or high-speed sync, does the flash reach, what is not known?', () => {
    // 1/200 on the dial is 2^(−23/3) = 1/203.2 s. f/2 there at ISO 100 is EV 2 + 7.667 = 9.667; the sun is 15, so
    // 5.333 stops are too much. Filter: 5.33 stops. High-speed sync: 1/203.2·2^(−5.333) = 1/8192 s, the mark 1/8000.
    // The subject's shade is 2 stops under: the flash adds log2(1 − 1/4) = −0.415.
    // Full power: 2·log2(40/(2·2)) = 6.644. Behind the filter 6.644 − 5.333 = 1.311, in reserve 1.311 + 0.415 = 1.726.
    // In high-speed sync: log2((1/300 + 1/8192)·8192) = 4.823 lost, 6.644 − 4.823 + 0.415 = 2.236 in reserve, and
    // 1.5 stops less where the loss beyond the model is at its worst: 0.736. The filter's 1.726 lies between.
    const { result, notes } = ask(sunny);
    expect(result.conflictStops).toBeCloseTo(5.333, 3);
    expect(result.asWanted).toBeNull();
    expect(result.ways.map(({ way }) => way)).toEqual(['smallerAperture', 'neutralDensity', 'highSpeedSync']);

    const filter = wayOf(sunny, 'neutralDensity');
    expect(filter.settings).toMatchObject({ aperture: { mark: 'f/2' }, shutter: { mark: '1/200' } });
    expect(filter.settings.ndStops).toBeCloseTo(5.333, 3);
    expect(filter.reserveStops).toBeCloseTo(1.726, 3);
    expect(filter.withinPower).toBe(true);
    expect(filter.power?.exact).toBeCloseTo(2 ** -1.7256, 4);

    const highSpeed = wayOf(sunny, 'highSpeedSync');
    expect(highSpeed.settings).toMatchObject({
      aperture: { mark: 'f/2' },
      shutter: { mark: '1/8000' },
      ndStops: 0,
    });
    expect(highSpeed.reserveStops).toBeCloseTo(2.236, 3);
    expect(highSpeed.reserveRange?.highStops).toBeCloseTo(2.236, 3);
    expect(highSpeed.reserveRange?.lowStops).toBeCloseTo(0.736, 3);

    expect(result.better).toBeNull();
    expect(codesOf(notes)).toEqual(['hss_loss_unmeasured', 'hss_and_filter_overlap']);
    expect(notes[0]?.message).toMatch(/1\.5 stops.*\+0\.74 and \+2\.24/);
    expect(wayOf(sunny, 'smallerAperture').settings.aperture.mark).toBe('f/13');
  });
});

describe('flash/daylight', () => {
  it('names the better way once the loss is measured', () => {
    const measured = (extraLossStops: number) => ({ ...sunny, highSpeedSync: { extraLossStops } });
    // The filter leaves 1.726, high-speed sync 2.236 less what was measured.
    expect(ask(measured(0.3)).result.better).toBe('highSpeedSync');
    expect(ask(measured(0.8)).result.better).toBe('neutralDensity');
    expect(ask(measured(0.8)).notes).toEqual([]);
    expect(wayOf(measured(0.8), 'highSpeedSync')).not.toHaveProperty('reserveRange');
  });

  it('names the filter without a measurement where even no extra loss can’t win', () => {
    // A curtain as slow as the sync speed: the train loses more than the filter takes, whatever the gear.
    const slow = ask({ ...sunny, highSpeedSync: { curtainS: 1 / 204 } });
    expect(slow.result.better).toBe('neutralDensity');
    expect(codesOf(slow.notes)).toEqual(['hss_loss_unmeasured']);
  });

  it('says where the reach itself is not known', () => {
    // Two stops less light: the filter is short, high-speed sync between +0.24 and −1.26.
    const weak = { ...sunny, flash: { guideNumberM: 20, distanceM: 2 } };
    const highSpeed = wayOf(weak, 'highSpeedSync');
    expect(highSpeed.withinPower).toBe(true);
    expect(highSpeed.costs.find(({ code }) => code === 'reach_not_known')?.stops).toBeCloseTo(1.264, 3);
    expect(wayOf(weak, 'neutralDensity')).toMatchObject({ withinPower: false, power: { mark: '1/1' } });
    expect(codesOf(ask(weak).notes)).not.toContain('flash_outshone');
  });

  it('where no way reaches, offers what helps and neither aperture, ISO nor filter', () => {
    const hopeless = { ...sunny, flash: { guideNumberM: 10, distanceM: 2, lossStops: 1 } };
    const note = ask(hopeless).notes.find(({ code }) => code === 'flash_outshone');
    // 40 → 10 is four stops, one of loss: 2.236 − 5 = −2.764 at best; 2 m·2^(−1.382) = 0.767 m.
    expect(note?.message).toMatch(/2\.76 stops short.*0\.767 m, 7 equal heads/);
    expect(note?.message).not.toMatch(/less loss/);
    const { whatHelps } = wayOf(hopeless, 'neutralDensity');
    expect(Object.keys(whatHelps ?? {})).toEqual(['distanceM', 'heads', 'lessLossStops']);
    const nearer = { ...hopeless, flash: { ...hopeless.flash, distanceM: whatHelps?.distanceM } };
    expect(wayOf(nearer, 'neutralDensity').reserveStops).toBeCloseTo(0, 9);
  });

  it('names no better way where the filter does not keep the aperture either', () => {
    const weak = ask({ ...sunny, ndStops: [3] });
    expect(weak.result.better).toBeNull();
    expect(codesOf(weak.notes)).toEqual(['hss_loss_unmeasured']);
  });

  it('tells the room under the sync speed that a wider aperture or a higher ISO could use', () => {
    // f/8 and ISO 100 at EV 9 is 1/8 s, 4.67 stops slower than 1/203 s.
    const late = {
      ...sunny,
      background: { ev100: 9 },
      aperture: 'f/8',
      flash: { guideNumberM: 4, distanceM: 2 },
    };
    const note = ask(late).notes.find(({ code }) => code === 'flash_outshone');
    expect(note?.message).toMatch(/helps by up to 4\.67 stops/);
    const wider = ask({ ...late, aperture: 'f/2' }).result.asWanted;
    expect(wider?.reserveStops).toBeCloseTo((ask(late).result.asWanted?.reserveStops ?? NaN) + 4, 9);
  });

  it('takes one of the filters at hand, and moves shutter or aperture by the rest', () => {
    const strong = wayOf({ ...sunny, ndStops: [3, 10, 6] }, 'neutralDensity');
    expect(strong.settings.ndStops).toBe(6);
    expect(strong.settings.shutter.mark).toBe('1/125');
    expect(codesOf(strong.costs)).toContain('filter_stronger_than_needed');
    // Only 3 stops: 2.333 stops are left to the aperture, f/2·2^1.167 = f/4.49.
    const weak = wayOf({ ...sunny, ndStops: [0, 3] }, 'neutralDensity');
    expect(weak.settings).toMatchObject({
      ndStops: 3,
      aperture: { mark: 'f/4.5' },
      shutter: { mark: '1/200' },
    });
    expect(codesOf(weak.costs)).toContain('filter_too_weak');
  });

  it('tells the depth of field of each way where the view is known', () => {
    const seen = { ...sunny, view: { focalLengthMm: 85, distanceM: 3 } };
    const wide = wayOf(seen, 'neutralDensity').depth;
    const deep = wayOf(seen, 'smallerAperture').depth;
    // Thin lens: 2·N·c·d²/f² = 2·2·0.02884·3000²/85² = 144 mm near f/2; 4 % less with the exact form.
    expect(wide?.totalM).toBeCloseTo(0.14, 2);
    expect(deep?.totalM).toBeGreaterThan(6 * (wide?.totalM ?? NaN));
    expect(wayOf(sunny, 'neutralDensity')).not.toHaveProperty('depth');
    const crop = wayOf({ ...seen, view: { ...seen.view, cropFactor: 1.5 } }, 'neutralDensity').depth;
    expect((wide?.totalM ?? NaN) / (crop?.totalM ?? NaN)).toBeCloseTo(1.5, 2);
  });

  it('needs no way out where the aperture fits, and gives the settings as wanted', () => {
    const later = { ...sunny, background: { ev100: 9 }, subjectAmbient: { ev100: 7.5 }, aperture: 'f/2.8' };
    const { result, notes } = ask(later);
    expect(result.conflictStops).toBeLessThanOrEqual(0);
    expect(result.ways).toEqual([]);
    expect(result.better).toBeNull();
    expect(result.asWanted?.withinPower).toBe(true);
    expect(codesOf(notes)).toEqual(['aperture_needs_no_way_out']);
  });

  it('sends nobody to a flash where the ambient light is too bright already', () => {
    const bright = { ...sunny, subjectAmbient: { belowBackgroundStops: -1 } };
    const { result, notes } = ask(bright);
    for (const { power, reserveStops, withinPower } of result.ways)
      expect({ power, reserveStops, withinPower }).toEqual({
        power: null,
        reserveStops: null,
        withinPower: false,
      });
    expect(notes.find(({ code }) => code === 'ambient_too_bright')?.message).toMatch(/1 stop brighter/);
    const even = ask({ ...sunny, subjectAmbient: { belowBackgroundStops: 0 } });
    expect(codesOf(even.notes)).toContain('no_flash_needed');
    expect(even.result.ways.every(({ withinPower }) => withinPower)).toBe(true);
  });

  it('cautions against the sun only in sunlight', () => {
    expect(codesOf(ask(sunny).cautions)).toContain('sun_and_optics');
    expect(codesOf(ask({ ...sunny, background: { ev100: 12 } }).cautions)).not.toContain('sun_and_optics');
  });
});

describe('flash/daylight, what is refused', () => {
  it('a curtain slower than the sync speed, a view inside the lens, the subject’s light said twice', () => {
    expect(places({ ...sunny, highSpeedSync: { curtainS: 0.0051 } })).toEqual([
      '/highSpeedSync/curtainS curtain_slower_than_sync',
    ]);
    expect(places({ ...sunny, view: { focalLengthMm: 85, distanceM: 0.08 } })).toEqual([
      '/view/distanceM focus_inside_lens',
    ]);
    expect(places({ ...sunny, subjectAmbient: { ev100: 12, belowBackgroundStops: 2 } })).toEqual([
      '/subjectAmbient/belowBackgroundStops exactly',
    ]);
    expect(places({ ...sunny, subjectAmbient: {} })).toEqual(['/subjectAmbient/ev100 exactly']);
    expect(places({ ...sunny, flash: { guideNumberM: 0, distanceM: 2 } })).toEqual([
      '/flash/guideNumberM out_of_range',
    ]);
  });
});

describe('flash/daylight at the corners of its ranges', () => {
  it('stays finite', () => {
    const of = (...values: unknown[]) => fc.constantFrom(...values);
    const body = fc.record({
      background: of({ ev100: -30 }, { ev100: 40 }),
      subjectAmbient: of(
        { belowBackgroundStops: -60 },
        { belowBackgroundStops: 60 },
        { ev100: 40 },
        { ev100: 5 },
      ),
      aperture: of(0.5, 256),
      iso: of(1, 1e7),
      syncSpeed: of(1e-6, '1/200', 86_400),
      flash: fc.record({ guideNumberM: of(0.01, 10_000), distanceM: of(0.01, 10_000), lossStops: of(0, 40) }),
      aim: of({ backgroundStops: -60, subjectStops: 60 }, { backgroundStops: 60, subjectStops: -60 }, {}),
      ndStops: of([0], [40], [0, 3, 6], undefined),
      highSpeedSync: of({}, { curtainS: 1e-6, extraLossStops: 10 }, { curtainS: 0 }),
      view: of(undefined, { focalLengthMm: 1, distanceM: 10_000 }, { focalLengthMm: 5000, distanceM: 5.001 }),
      readAs: of('mark', 'exact'),
    });
    fc.assert(
      fc.property(body, (given) => {
        const answer = ask(given);
        expect(isFiniteThroughout(answer)).toBe(true);
        expect(flashDaylight.output.safeParse(answer.result).success).toBe(true);
      }),
      { numRuns: 500 },
    );
  });
});
