import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { flashExposure } from '../../../shared/calculators/flash/exposure';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { isFiniteThroughout } from '../../support/closeTo';

const ask = (body: unknown) => askCalculator(flashExposure, body);
const places = (body: unknown) => placesOf(faultsIn(flashExposure, body));

const plain = { guideNumberM: 24, distanceM: 3, aperture: 8, iso: 100, power: 1 };
const without = (name: keyof typeof plain) => ({ ...plain, [name]: undefined });

describe('flash/exposure, worked questions', () => {
  it('guide number 50 through a softbox of 1.5 stops, 3 m, ISO 200, quarter power: which aperture?', () => {
    // 50·√2 (ISO 200) = 70.71; ·√¼ = 35.36; ·2^(−1.5/2) = 21.02; / 3 m = f/7.007. The mark f/7.1 is 2^(17/6) =
    // 7.127, darker by 2·log2(7.127/7.007) = 0.049.
    const { result } = ask({ guideNumberM: 50, lossStops: 1.5, distanceM: 3, iso: 200, power: '1/4' });
    expect(result.unknown).toBe('aperture');
    expect(result.aperture.exact).toBeCloseTo(7.007, 3);
    expect(result.aperture.mark).toBe('f/7.1');
    expect(result.brightnessStops).toBe(0);
    expect(result.brightnessAtMarkStops).toBeCloseTo(-0.049, 3);
    expect(result).toMatchObject({ withinPower: true, shortByStops: 0, reserveStops: 2, whatHelps: null });
  });

  it('two guns of 36 and 22', () => {
    // √(36² + 22²) = √1780 = 42.19; at 5 m f/8.438. The shortcut 58/√2 = 41.0 would be a tenth of a stop less.
    const { result, notes } = ask({ guideNumberM: [36, 22], distanceM: 5, iso: 100, power: 1 });
    expect(result.guideNumberM).toBeCloseTo(42.19, 2);
    expect(result.aperture.exact).toBeCloseTo(8.438, 3);
    expect(codesOf(notes)).toContain('guns_aimed_alike');
  });
});

describe('flash/exposure', () => {
  it('solves each of the five from the other four', () => {
    // f/8 at 3 m is guide number 24: each one left out must come back.
    expect(ask(without('guideNumberM')).result.guideNumberM).toBeCloseTo(24, 9);
    expect(ask(without('distanceM')).result.distanceM).toBeCloseTo(3, 9);
    expect(ask(without('aperture')).result.aperture.exact).toBeCloseTo(8, 9);
    expect(ask(without('iso')).result.iso).toMatchObject({ mark: '100' });
    expect(ask(without('power')).result.power).toMatchObject({ mark: '1/1' });
  });

  it('is told apart as unknown by name', () => {
    for (const name of Object.keys(plain) as (keyof typeof plain)[])
      expect(ask(without(name)).result.unknown).toBe(name);
  });

  it('says by how much it falls short and what would help, each of which does', () => {
    // 24/(8·3) is a middle tone; 1.5 stops of loss leave it 1.5 stops short: 3 m·2^(−0.75) = 1.784 m.
    const short = { ...without('power'), lossStops: 1.5 };
    const { result, notes } = ask(short);
    expect(result.withinPower).toBe(false);
    expect(result.shortByStops).toBeCloseTo(1.5, 9);
    expect(result.power.exact).toBeCloseTo(2 ** 1.5, 9);
    expect(result.power.mark).toBe('1/1');
    expect(result.brightnessAtMarkStops).toBeCloseTo(-1.5, 9);
    const help = result.whatHelps;
    expect(help?.distanceM).toBeCloseTo(1.784, 3);
    expect(help?.heads).toBeCloseTo(2.828, 3);
    expect(help?.lessLossStops).toBeCloseTo(1.5, 9);
    expect(notes.find(({ code }) => code === 'flash_too_weak')?.message).toMatch(
      /1\.5 stops short.*1\.78 m.*3 equal/,
    );
    const again = [
      { ...short, distanceM: help?.distanceM },
      { ...short, heads: 3 },
      { ...short, lossStops: 0 },
      { ...short, aperture: help?.aperture.mark },
      { ...short, iso: Number(help?.iso.mark) },
    ];
    for (const body of again) expect(ask(body).result.withinPower, JSON.stringify(body)).toBe(true);
  });

  it('does not offer to take away loss that is not there', () => {
    const { result, notes } = ask({ ...without('power'), distanceM: 6, lossStops: 0.5 });
    expect(result.whatHelps?.lessLossStops).toBeNull();
    expect(notes[0]?.message).not.toMatch(/less loss/);
  });

  it('counts two pops at half power, two heads at half power and one pop at full power alike', () => {
    const at = (extra: object) => ask({ ...without('aperture'), ...extra }).result.aperture.exact;
    expect(at({ power: '1/2', pops: 2 })).toBeCloseTo(8, 9);
    expect(at({ power: '1/2', heads: 2 })).toBeCloseTo(8, 9);
    expect(codesOf(ask({ ...without('aperture'), pops: 2 }).notes)).toContain('pops_need_still_subject');
    expect(codesOf(ask({ ...without('aperture'), heads: 2 }).notes)).not.toContain('pops_need_still_subject');
  });

  it('takes filter, close-up and wish into account', () => {
    const at = (extra: object) => ask({ ...without('aperture'), ...extra }).result.aperture.exact;
    expect(at({ ndStops: 2 })).toBeCloseTo(4, 9);
    // Life size takes two stops.
    expect(at({ magnification: 1 })).toBeCloseTo(4, 9);
    // One stop brighter than a middle tone: one stop wider.
    expect(at({ brightnessStops: 1 })).toBeCloseTo(8 / Math.SQRT2, 9);
  });

  it('works from energy: 400 W·s at 40 lm·s/Ws bare is guide number 22.57', () => {
    // √(400·40/(4π)·100/250) = 22.57 (project handbook, section 5.2).
    const body = { energyWs: 400, efficacyLmSPerWs: 40, distanceM: 2, iso: 100, power: 1 };
    const { result, notes } = ask(body);
    expect(result.guideNumberM).toBeCloseTo(22.57, 2);
    expect(result.unknown).toBe('aperture');
    expect(codesOf(notes)).toContain('guide_number_from_energy');
    expect(ask({ ...body, incidentC: 330 }).result.guideNumberM).toBeCloseTo(22.57 * Math.sqrt(250 / 330), 2);
  });
});

describe('flash/exposure in high-speed sync', () => {
  const fast = { ...without('aperture'), highSpeedSync: { shutter: '1/2000' } };

  it('loses what the energy model says, and asks for a measurement', () => {
    // 1/2000 on the dial is 1/2048 s; the curtain is taken as 1/300 s: log2((1/300 + 1/2048)·2048) = 2.968.
    const { result, notes } = ask(fast);
    expect(result.highSpeedLossStops).toBeCloseTo(2.968, 3);
    expect(result.aperture.exact).toBeCloseTo(8 * 2 ** (-2.968 / 2), 2);
    expect(codesOf(notes)).toEqual(['hss_as_continuous', 'hss_loss_unmeasured']);
  });

  it('adds a measured extra loss and then asks for nothing', () => {
    const measured = ask({ ...fast, highSpeedSync: { shutter: '1/2000', extraLossStops: 0.7 } });
    expect(measured.result.highSpeedLossStops).toBeCloseTo(2.968 + 0.7, 3);
    expect(codesOf(measured.notes)).toEqual(['hss_as_continuous']);
  });

  it('loses nothing at or under the sync speed, and says so', () => {
    for (const shutter of ['1/250', '1/60']) {
      const { result, notes } = ask({ ...fast, highSpeedSync: { shutter, extraLossStops: 1 } });
      expect(result.highSpeedLossStops).toBe(0);
      expect(result.aperture.exact).toBeCloseTo(8, 9);
      expect(codesOf(notes)).toEqual(['hss_not_needed']);
    }
  });

  it('takes the sync speed for a curtain that would be slower than it', () => {
    // Sync 1/1000 (1/1024 s) is faster than 1/300 s: loss log2((1/1024 + 1/2048)·2048) = log2 3.
    const { result } = ask({ ...fast, highSpeedSync: { shutter: '1/2000', syncSpeed: '1/1000' } });
    expect(result.highSpeedLossStops).toBeCloseTo(Math.log2(3), 9);
  });

  it('refuses a curtain that is slower than the sync speed, but not one that equals its mark as read', () => {
    const withCurtain = (curtainS: number) => ({ ...fast, highSpeedSync: { shutter: '1/2000', curtainS } });
    expect(places(withCurtain(1 / 250))).toEqual([]);
    expect(places(withCurtain(0.00401))).toEqual(['/highSpeedSync/curtainS curtain_slower_than_sync']);
    const [fault] = faultsIn(flashExposure, withCurtain(0.00401));
    expect(fault?.detail).toMatch(/1\/250 s.*0\.00401 s/);
  });
});

describe('flash/exposure, what is refused', () => {
  it('names the first missing one where more than one is left out', () => {
    expect(places({ guideNumberM: 24, iso: 100 })).toEqual(['/distanceM exactly']);
    expect(places({})).toEqual(['/distanceM exactly']);
  });

  it('names what is too much where nothing is left out', () => {
    expect(places(plain)).toEqual(['/guideNumberM exactly']);
  });

  it('wants energy and efficacy together, and not a guide number too', () => {
    const base = { distanceM: 2, iso: 100, power: 1 };
    expect(places({ ...base, energyWs: 400 })).toEqual(['/efficacyLmSPerWs needed_together']);
    expect(places({ ...base, aperture: 8, efficacyLmSPerWs: 40 })).toEqual(['/energyWs needed_together']);
    expect(
      places({ distanceM: 2, iso: 100, guideNumberM: 24, energyWs: 400, efficacyLmSPerWs: 40 }),
    ).toContain('/energyWs at_most_one');
  });

  it('points into the list of guns', () => {
    expect(places({ ...without('aperture'), guideNumberM: [36, 0] })).toEqual([
      '/guideNumberM/1 out_of_range',
    ]);
  });

  it('tells all faults at once', () => {
    const found = places({ guideNumberM: 24, distanceM: -1, iso: 0, lossStops: 99 });
    expect(found).toEqual(
      expect.arrayContaining(['/distanceM out_of_range', '/iso out_of_range', '/lossStops out_of_range']),
    );
  });
});

describe('flash/exposure beyond usual gear', () => {
  it('says so for aperture, ISO, power, guide number and distance', () => {
    const codes = (body: object) => codesOf(ask(body).notes);
    expect(codes({ ...without('aperture'), distanceM: 100 })).toContain('aperture_outside_usual_gear');
    expect(codes({ ...without('iso'), distanceM: 1000 })).toContain('iso_outside_usual_gear');
    expect(codes({ ...without('power'), distanceM: 0.1 })).toEqual(
      expect.arrayContaining(['power_below_usual', 'flash_very_near']),
    );
    expect(codes({ ...without('guideNumberM'), distanceM: 50 })).toContain('guide_number_outside_usual');
    expect(codes({ ...without('distanceM') })).toEqual([]);
  });

  it('stays finite at the corners of all ranges, whichever is solved', () => {
    const corners = {
      guideNumberM: [0.01, 10_000],
      distanceM: [0.01, 10_000],
      aperture: [0.5, 256],
      iso: [1, 1e7],
      power: [1.0001e-9, 1],
      lossStops: [0, 40],
      ndStops: [0, 40],
      magnification: [0, 100],
      brightnessStops: [-60, 60],
      pops: [1, 1000],
      heads: [1, 1000],
    };
    const body = fc.record(
      Object.fromEntries(Object.entries(corners).map(([name, values]) => [name, fc.constantFrom(...values)])),
    );
    const sync = fc.option(
      fc.record({
        shutter: fc.constantFrom(1e-6, 0.001, 86_400),
        syncSpeed: fc.constantFrom(1e-6, 0.004, 86_400),
        extraLossStops: fc.constantFrom(0, 10),
      }),
      { nil: undefined },
    );
    const unknowns = fc.constantFrom('guideNumberM', 'distanceM', 'aperture', 'iso', 'power');
    fc.assert(
      fc.property(
        body,
        sync,
        unknowns,
        fc.constantFrom('mark', 'exact'),
        (given, highSpeedSync, unknown, readAs) => {
          const answer = ask({ ...given, highSpeedSync, readAs, [unknown]: undefined });
          expect(isFiniteThroughout(answer)).toBe(true);
          expect(flashExposure.output.safeParse(answer.result).success).toBe(true);
        },
      ),
      { numRuns: 500 },
    );
  });
});
