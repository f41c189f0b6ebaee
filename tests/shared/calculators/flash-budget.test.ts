import { describe, expect, it } from 'vitest';
import { flashBudget } from '../../../shared/calculators/flash/budget';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { isFiniteThroughout } from '../../support/closeTo';

const ask = (body: unknown) => askCalculator(flashBudget, body);
const plan = { fullPowerPops: 200, power: '1/4', frames: 500 };

describe('flash/budget', () => {
  it('counts frames, batteries and what is left', () => {
    // 200/(1/4) = 800 from a battery: 500 leave 300; 900 need two, which leave 700.
    expect(ask(plan).result).toEqual({ framesPerBattery: 800, batteriesNeeded: 1, framesLeft: 300 });
    expect(ask({ ...plan, frames: 900 }).result).toEqual({
      framesPerBattery: 800,
      batteriesNeeded: 2,
      framesLeft: 700,
    });
    expect(ask({ ...plan, frames: 0 }).result).toEqual({
      framesPerBattery: 800,
      batteriesNeeded: 0,
      framesLeft: 800,
    });
  });

  it('counts a third-stop mark as its exact power', () => {
    // 1/4+1/3 is 2^(−5/3) = 0.315: 200/0.315 = 634.96.
    expect(ask({ ...plan, power: '1/4+1/3' }).result.framesPerBattery).toBe(634);
  });

  it('says whether the flash keeps up, and for how long it does', () => {
    const at = (fps: number) => ask({ ...plan, recycleFullS: 2, fps });
    // 2 s·1/4 = 0.5 s: two frames a second for ever; at three, 1/4 − 1/6 is lost each time: (3/4)/(1/12) + 1 = 10.
    expect(at(2).result).toMatchObject({ recycleS: 0.5, fastestFps: 2, keepsUp: true, burstFrames: null });
    expect(at(3).result).toMatchObject({ keepsUp: false, burstFrames: 10 });
    expect(at(3).notes.find(({ code }) => code === 'flash_too_slow')?.message).toMatch(/frame 11/);
    expect(Object.keys(ask({ ...plan, recycleFullS: 2 }).result)).not.toContain('keepsUp');
  });

  it('warns of flicker from three flashes a second, and of batteries in the wet', () => {
    const cautions = (fps: number) => codesOf(ask({ ...plan, recycleFullS: 2, fps }).cautions);
    expect(cautions(2.9)).toEqual(['electricity_and_water']);
    expect(cautions(3)).toEqual(['electricity_and_water', 'flash_and_eyes']);
  });

  it('says so when a charge is not enough for a frame', () => {
    const { result, notes } = ask({ fullPowerPops: 0.5, power: 1, frames: 3 });
    expect(result).toEqual({ framesPerBattery: 0, batteriesNeeded: null, framesLeft: 0 });
    expect(codesOf(notes)).toContain('charge_too_small');
  });

  it('can’t judge a frame rate without a recycle time', () => {
    expect(placesOf(faultsIn(flashBudget, { ...plan, fps: 3 }))).toEqual(['/recycleFullS needed_together']);
  });

  it('stays finite at the corners of its ranges', () => {
    for (const fullPowerPops of [0.1, 1e6])
      for (const power of [1.0001e-9, 1])
        for (const frames of [0, 10_000_000])
          for (const recycleFullS of [0.001, 3600])
            for (const fps of [0.001, 1000])
              expect(isFiniteThroughout(ask({ fullPowerPops, power, frames, recycleFullS, fps }))).toBe(true);
  });
});
