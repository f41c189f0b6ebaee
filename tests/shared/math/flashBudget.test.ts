import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  chargesNeeded,
  framesLeft,
  framesPerCharge,
  paceOf,
  recycleAtS,
} from '../../../shared/math/flashBudget';

const pops = fc.integer({ min: 1, max: 100_000 });
const power = fc.double({ min: 1e-4, max: 1, noNaN: true });

/** Plays a series frame by frame: energy 1 when full, p for each pop, an even flow in between. */
function playedBurst(recycleFullS: number, p: number, fps: number, most: number): number {
  let energy = 1;
  for (let frame = 1; frame <= most; frame++) {
    if (energy < p * (1 - 1e-9)) return frame - 1;
    energy = Math.min(1, energy - p + 1 / (fps * recycleFullS));
  }
  return most;
}

describe('frames from a charge', () => {
  it('go up as the power goes down', () => {
    expect(framesPerCharge(200, 1)).toBe(200);
    expect(framesPerCharge(200, 1 / 4)).toBe(800);
    // 200/0.2 is 1,000 and not a rounding error below it; so is any power that divides the charge.
    expect(framesPerCharge(200, 0.2)).toBe(1000);
    for (let n = 1; n <= 300; n++) expect(framesPerCharge(7, 1 / n)).toBe(7 * n);
    expect(framesPerCharge(0.5, 1)).toBe(0);
  });

  it('never use more than the charge, and one more would', () => {
    fc.assert(
      fc.property(pops, power, (full, p) => {
        const frames = framesPerCharge(full, p);
        expect(frames * p).toBeLessThanOrEqual(full * (1 + 1e-8));
        expect((frames + 1) * p).toBeGreaterThan(full);
      }),
    );
  });

  it('are covered by exactly as many charges as it takes', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), pops, (frames, each) => {
        const charges = chargesNeeded(frames, each) ?? NaN;
        expect(charges * each).toBeGreaterThanOrEqual(frames);
        expect((charges - 1) * each).toBeLessThan(frames);
      }),
    );
    expect(chargesNeeded(0, 0)).toBe(0);
    expect(chargesNeeded(1, 0)).toBeNull();
  });
});

describe('frames left', () => {
  it('and frames done are what the charges hold', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), pops, (frames, each) => {
        const charges = chargesNeeded(frames, each) ?? NaN;
        expect(framesLeft(frames, each, charges) + frames).toBe(charges * each);
        expect(framesLeft(frames, each, charges)).toBeLessThan(each);
      }),
    );
    expect(framesLeft(0, 800, 0)).toBe(800);
    expect(framesLeft(3, 0, null)).toBe(0);
  });
});

describe('recycling', () => {
  it('goes with power', () => {
    expect(recycleAtS(2, 1 / 8)).toBe(0.25);
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 100, noNaN: true }), power, (full, p) => {
        expect(recycleAtS(full, p / 2)).toBeLessThan(recycleAtS(full, p));
        expect(recycleAtS(full, 1)).toBe(full);
      }),
    );
  });

  it('keeps up exactly while it is no longer than the time between frames', () => {
    expect(paceOf(2, 1 / 8, 4)).toEqual({ keepsUp: true, burstFrames: null });
    expect(paceOf(2, 1 / 8, 4.01).keepsUp).toBe(false);
    // By hand: 1/16 comes back between frames at 8 a second, 1/16 is lost; 14 losses leave 1/8 for the 15th frame.
    expect(paceOf(2, 1 / 8, 8)).toEqual({ keepsUp: false, burstFrames: 15 });
    expect(paceOf(2, 1, 1)).toEqual({ keepsUp: false, burstFrames: 1 });
  });

  it('has the burst that playing it frame by frame has', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 20, noNaN: true }),
        fc.double({ min: 0.01, max: 1, noNaN: true }),
        fc.double({ min: 0.1, max: 30, noNaN: true }),
        (full, p, fps) => {
          const { keepsUp, burstFrames } = paceOf(full, p, fps);
          const played = playedBurst(full, p, fps, 3000);
          if (keepsUp || (burstFrames ?? 0) >= 3000) expect(played).toBe(3000);
          else
            expect(Math.abs(played - (burstFrames ?? NaN))).toBeLessThanOrEqual(
              burstFrames === played ? 0 : 1,
            );
        },
      ),
    );
  });

  it('refuses numbers outside the domain', () => {
    for (const bad of [0, -1, NaN]) {
      expect(() => recycleAtS(bad, 1)).toThrow(/recycleFullS/);
      expect(() => recycleAtS(1, bad)).toThrow(/power/);
      expect(() => framesPerCharge(bad, 1)).toThrow(/fullPowerPops/);
      expect(() => paceOf(1, 1, bad)).toThrow(/fps/);
    }
    expect(() => chargesNeeded(-1, 1)).toThrow(/frames/);
  });
});
