import { describe, expect, it } from 'vitest';
import { flashDuration } from '../../../shared/calculators/flash/duration';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { isFiniteThroughout } from '../../support/closeTo';

const ask = (body: unknown) => askCalculator(flashDuration, body);
const places = (body: unknown) => placesOf(faultsIn(flashDuration, body));

describe('flash/duration', () => {
  it('turns either duration into the other by the exponential, and into a shutter', () => {
    // ln 10/ln 2 = 3.3219: t0.5 of 1 ms is t0.1 of 3.3219 ms, between 1/250 and 1/320 (1/322.5 s).
    const { result } = ask({ t05S: 0.001, control: 'decay' });
    expect(result.t01S).toBeCloseTo(0.0033219, 7);
    expect(result.equivalentShutter.mark).toBe('1/320');
    expect(ask({ t01S: result.t01S, control: 'decay' }).result.t05S).toBeCloseTo(0.001, 12);
    expect(result).toMatchObject({ onlyMeasurable: false });
    expect([result.shareInsideT05, result.shareInsideT01]).toEqual(
      [0.5, 0.9].map((n) => expect.closeTo(n, 12)),
    );
  });

  it('keeps a measured ratio, whose shares lie between those of an exponential and a box', () => {
    const { result, notes } = ask({ t05S: 0.001, control: 'decay', ratio: 2 });
    expect(result.t01S).toBeCloseTo(0.002, 12);
    expect(result.ratio).toBeCloseTo(2, 9);
    expect(result.shareInsideT05).toBeGreaterThan(0.5);
    expect(result.shareInsideT05).toBeLessThan(1);
    expect(notes).toEqual([]);
  });

  it('ignores the power of a whole discharge, and says so', () => {
    const at = (power: unknown) => ask({ t05S: 0.001, control: 'decay', power });
    expect(at('1/8').result).toEqual(at(1).result);
    expect(codesOf(at('1/8').notes)).toContain('power_ignored');
    expect(codesOf(at(1).notes)).not.toContain('power_ignored');
  });

  it('shortens a pulse that is cut off, with the rise only below 1/16', () => {
    const at = (power: unknown, extra = {}) => ask({ t05S: 0.001, control: 'cutoff', power, ...extra });
    // τ = 1 ms/ln 2 = 1.4427 ms; −τ·ln(1 − 1/8) = 0.19264 ms; at 1/32: 45.80 µs + 12 µs.
    expect(at('1/8').result.t01S).toBeCloseTo(0.00019264, 7);
    expect(at('1/16').notes).toEqual([]);
    expect(at('1/32').result.t05S).toBeCloseTo(0.0000578, 7);
    expect(codesOf(at('1/32').notes)).toEqual(['rise_added']);
    expect(at('1/32', { riseFloorS: 0 }).result.t05S).toBeCloseTo(0.0000458, 7);
    expect(codesOf(at('1/8', { ratio: 2.5 }).notes)).toEqual(['ratio_ignored']);
  });

  it('does not pretend to know a flash that is controlled by voltage', () => {
    const { result, notes } = ask({ t01S: 0.0025, control: 'voltage', power: '1/4' });
    expect(result.onlyMeasurable).toBe(true);
    expect(result.t01S).toBeCloseTo(0.0025, 12);
    expect(codesOf(notes)).toContain('duration_only_measurable');
    expect(ask({ t01S: 0.0025, control: 'voltage' }).result.onlyMeasurable).toBe(false);
  });

  it('tells what a shutter clips only where there is one', () => {
    expect(Object.keys(ask({ t05S: 0.001, control: 'decay' }).result)).not.toContain('clippedStops');
    // Open for 2 ms of a pulse with t0.5 = 1 ms: 1 − 2^−2 = 0.75, −0.415 stops.
    const leaf = ask({ t05S: 0.001, control: 'decay', shutter: 0.002, readAs: 'exact' });
    expect(leaf.result.shareThroughShutter).toBeCloseTo(0.75, 9);
    expect(leaf.result.clippedStops).toBeCloseTo(-0.415, 3);
    expect(codesOf(leaf.notes)).toContain('pulse_clipped');
    const curtained = { t05S: 0.001, control: 'decay', shutter: 0.004, curtainS: 0.002, readAs: 'exact' };
    expect(ask(curtained).result.clippedStops).toBeCloseTo(-0.415, 3);
  });

  it('refuses a shutter that is never wholly open, and durations that are none or two', () => {
    const slit = { t05S: 0.001, control: 'decay', shutter: '1/1000', curtainS: 0.0033 };
    expect(places(slit)).toEqual(['/curtainS frame_never_open']);
    expect(places({ control: 'decay' })).toEqual(['/t05S exactly']);
    expect(places({ control: 'decay', t05S: 0.001, t01S: 0.003 })).toEqual(['/t01S exactly']);
    expect(places({ t05S: 0.001 })).toEqual(['/control missing']);
  });

  it('stays finite at the corners of its ranges', () => {
    for (const seconds of [1e-8, 10])
      for (const control of ['decay', 'cutoff', 'voltage'])
        for (const power of [1.0001e-9, 0.5, 1])
          for (const ratio of [1, 1.0000001, 3, 20, undefined])
            for (const riseFloorS of [0, 0.01])
              for (const [shutter, curtainS] of [
                [1e-6, 0],
                [1e-6, 0.99999999e-6],
                [86_400, 1],
              ] as const) {
                const answer = ask({
                  t01S: seconds,
                  control,
                  power,
                  ratio,
                  riseFloorS,
                  shutter,
                  curtainS,
                  readAs: 'exact',
                });
                expect(
                  isFiniteThroughout(answer),
                  JSON.stringify([seconds, control, power, ratio, riseFloorS, shutter]),
                ).toBe(true);
                expect(answer.result.clippedStops).toBeLessThanOrEqual(0);
              }
  });
});
