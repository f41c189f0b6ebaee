import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { duskLadder } from '../../../../shared/math/ladder/duskLadder';
import type { DuskLadder } from '../../../../shared/math/ladder/ladderTypes';
import { nearestMark, stepsPerStop } from '../../../../shared/math/marks';
import {
  aims,
  clear,
  eveningMs,
  evenings,
  evOfRung,
  frameOf,
  inputOf,
  plans,
  truthOf,
} from '../../../support/ladderInputs';
import { within } from '../../../support/within';

const MINUTE_MS = 60_000;

/** Whether the ladder can follow the light at an instant. */
function isInReach({ turningPoints }: DuskLadder, atMs: number): boolean {
  const last = turningPoints.filter((point) => point.code === 'out_of_reach' && point.atMs <= atMs).at(-1);
  return !last || last.isLeft;
}

describe('a dusk ladder', () => {
  it('knows a made-up evening at every rung to 0.15 stop, from two frames', () => {
    fc.assert(
      fc.property(evenings, (evening) => {
        const { rungs } = duskLadder(inputOf(evening));
        const truth = truthOf(evening);
        for (const rung of rungs) within(rung.sceneEv100, truth(rung.atMs), 0.15, 'scene');
      }),
      { numRuns: 50 },
    );
  });

  it('knows it from one frame where the lamps are told, and where there are none', () => {
    fc.assert(
      fc.property(evenings, fc.double({ min: -9, max: -1, noNaN: true }), (evening, altitudeDeg) => {
        const frame = frameOf(evening, eveningMs(evening.place, evening.sunsetMs, altitudeDeg));
        const floor = evening.floorEv100 ?? undefined;
        const { rungs } = duskLadder({ ...inputOf(evening), frames: [frame], lampFloorEv100: floor });
        const truth = truthOf(evening);
        // A frame in which lamps outshine the sky a hundredfold tells too little of the sky.
        fc.pre(floor === undefined || truth(frame.atMs) - floor > 0.01);
        for (const rung of rungs) within(rung.sceneEv100, truth(rung.atMs), 0.15, 'scene');
      }),
      { numRuns: 50 },
    );
  });

  it('joins its rungs without gaps from start to end', () => {
    fc.assert(
      fc.property(evenings, plans, aims, (evening, somePlan, someAim) => {
        const input = { ...inputOf(evening), plan: somePlan, aim: someAim };
        const { rungs } = duskLadder(input);
        expect(rungs[0]?.atMs).toBe(input.fromMs);
        expect(rungs.at(-1)?.untilMs).toBe(input.toMs);
        rungs.forEach((rung, index) => {
          expect(rung.untilMs).toBeGreaterThan(rung.atMs);
          if (index > 0) expect(rung.atMs).toBe(rungs[index - 1]?.untilMs);
        });
      }),
      { numRuns: 50 },
    );
  });

  it('keeps the background within half a step of its aim at every minute, while the limits allow', () => {
    fc.assert(
      fc.property(evenings, plans, aims, (evening, somePlan, someAim) => {
        const ladder = duskLadder({ ...inputOf(evening), plan: somePlan, aim: someAim });
        const truth = truthOf(evening);
        const half = 0.5 / stepsPerStop(somePlan.scale);
        const wrong: string[] = [];
        for (const rung of ladder.rungs) {
          for (let atMs = rung.atMs; atMs < rung.untilMs; atMs += MINUTE_MS) {
            if (!isInReach(ladder, atMs)) continue;
            const error = truth(atMs) - evOfRung(rung, somePlan.ndStops) - someAim.backgroundStops;
            // 0.01 for the model's own error, and whole seconds beyond 30 s are up to 0.02 stop off their place.
            const room = half + 0.01 + (rung.shutterS > 32 ? 0.02 : 0);
            if (Math.abs(error) > room) wrong.push(`${error} at ${atMs}`);
          }
          within(
            rung.errorStops,
            rung.sceneEv100 - evOfRung(rung, somePlan.ndStops) - someAim.backgroundStops,
            1e-9,
            'error',
          );
        }
        expect(wrong).toEqual([]);
      }),
      { numRuns: 50 },
    );
  });

  it('never goes beyond a limit, and only the limits put it out of reach', () => {
    fc.assert(
      fc.property(evenings, plans, aims, (evening, somePlan, someAim) => {
        const { rungs, turningPoints } = duskLadder({ ...inputOf(evening), plan: somePlan, aim: someAim });
        for (const { aperture, shutterS, iso } of rungs) {
          expect(shutterS).toBeLessThanOrEqual(somePlan.slowestShutterS * (1 + 1e-8));
          expect(iso).toBeLessThanOrEqual(somePlan.isoMax * (1 + 1e-8));
          expect(aperture).toBeGreaterThanOrEqual(somePlan.apertureMin * (1 - 1e-8));
        }
        const isOut = turningPoints.some(({ code }) => code === 'out_of_reach');
        const last = rungs.at(-1);
        if (!isOut || !last) return;
        // The last rung is the darkest that the order allows: each kind that may give way is at its end.
        const step = 2 ** (1 / stepsPerStop(somePlan.scale)) * (1 + 1e-8);
        if (somePlan.order.includes('shutter'))
          expect(last.shutterS * Math.max(step, 1.03)).toBeGreaterThan(somePlan.slowestShutterS);
        if (somePlan.order.includes('iso')) expect(last.iso * step).toBeGreaterThan(somePlan.isoMax);
        if (somePlan.order.includes('aperture'))
          expect(last.aperture / Math.sqrt(step)).toBeLessThan(somePlan.apertureMin);
      }),
      { numRuns: 50 },
    );
  });

  it('only ever gives way while the light only falls', () => {
    fc.assert(
      fc.property(evenings, plans, aims, (evening, somePlan, someAim) => {
        const input = inputOf(evening);
        const codes = duskLadder(input).notes.map(({ code }) => code);
        fc.pre(!codes.includes('moon_counts'));
        const { rungs } = duskLadder({ ...input, plan: somePlan, aim: someAim });
        rungs.forEach((rung, index) => {
          const before = rungs[index - 1];
          if (!before) return;
          expect(evOfRung(rung)).toBeLessThan(evOfRung(before));
          expect(rung.shutterS).toBeGreaterThanOrEqual(before.shutterS);
          expect(rung.iso).toBeGreaterThanOrEqual(before.iso);
          expect(rung.aperture).toBeLessThanOrEqual(before.aperture);
        });
      }),
      { numRuns: 50 },
    );
  });

  it('for an aim one stop darker has the settings of a scene one stop brighter, at the same instants', () => {
    fc.assert(
      fc.property(evenings, plans, aims, (evening, somePlan, someAim) => {
        const input = { ...inputOf(evening), plan: somePlan, aim: someAim };
        const brighter = {
          ...input,
          frames: input.frames.map((frame) => ({ ...frame, offsetStops: frame.offsetStops + 1 })),
        };
        const darkerAim = { ...someAim, backgroundStops: someAim.backgroundStops - 1 };
        const a = duskLadder({ ...input, aim: darkerAim }).rungs;
        const b = duskLadder(brighter).rungs;
        expect(a.length).toBe(b.length);
        a.forEach((rung, index) => {
          const other = b[index];
          within(rung.atMs, other?.atMs ?? NaN, 50, 'instant');
          expect([rung.aperture, rung.shutterS, rung.iso]).toEqual([
            other?.aperture,
            other?.shutterS,
            other?.iso,
          ]);
        });
      }),
      { numRuns: 50 },
    );
  });

  it('recomputed from one of its own rungs agrees with itself', () => {
    fc.assert(
      fc.property(evenings, plans, aims, fc.nat(), (evening, somePlan, someAim, pick) => {
        const input = { ...inputOf(evening), plan: somePlan, aim: someAim };
        const whole = duskLadder(input);
        const start = pick % whole.rungs.length;
        const rung = whole.rungs[start];
        if (!rung) throw new Error('a ladder without rungs');
        fc.pre(isInReach(whole, rung.atMs));
        // Where something else gives way before the shutter, the frame's shutter is the one that is kept: a rung from
        // before the light came down to it would keep its own.
        const base = nearestMark('shutter', somePlan.scale, input.frames[0]?.shutterS ?? NaN).exact;
        fc.pre(somePlan.order[0] === 'shutter' || rung.shutterS > base * 0.99);
        const again = duskLadder({
          ...input,
          frames: [
            {
              ...rung,
              ndStops: somePlan.ndStops,
              offsetStops: rung.errorStops + someAim.backgroundStops,
            },
          ],
          lampFloorEv100: whole.model.lampFloorEv100 ?? undefined,
          fromMs: rung.atMs,
        });
        fc.pre(whole.model.lampFloorEv100 === null || rung.sceneEv100 - whole.model.lampFloorEv100 > 0.02);
        const rest = whole.rungs.slice(start);
        expect(Math.abs(again.rungs.length - rest.length)).toBeLessThanOrEqual(1);
        for (const expected of rest.slice(1)) {
          const same = again.rungs.find(
            ({ aperture, shutterS, iso }) =>
              aperture === expected.aperture && shutterS === expected.shutterS && iso === expected.iso,
          );
          within(same?.atMs ?? NaN, expected.atMs, 1000, 'instant');
        }
      }),
      { numRuns: 50 },
    );
  });

  it('says how early or late a change may be: by as much as the light takes for the spread', () => {
    const { rungs, model } = duskLadder({
      ...inputOf(clear),
      frames: [frameOf(clear, clear.sunsetMs + 20 * MINUTE_MS)],
    });
    expect(model.spreadStops).toBe(0.5);
    expect(rungs[0]).toMatchObject({ earlyS: null, lateS: null });
    const truth = truthOf(clear);
    for (const rung of rungs.slice(1)) {
      const { earlyS, lateS, atMs } = rung;
      if (earlyS === null || lateS === null) throw new Error('beyond two hours');
      within(truth(atMs - earlyS * 1000) - truth(atMs), 0.5, 0.01, 'early');
      within(truth(atMs) - truth(atMs + lateS * 1000), 0.5, 0.01, 'late');
    }
  });
});

describe('an absurd ladder', () => {
  it('is still finite and soon done, at any place and time, with any frame', () => {
    const absurd = fc.record({
      latitude: fc.oneof(fc.double({ min: -90, max: 90, noNaN: true }), fc.constantFrom(-90, 90, 66.6)),
      longitude: fc.double({ min: -180, max: 180, noNaN: true }),
      atMs: fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2100, 0, 1) }),
      shutterS: fc.constantFrom(1e-6, 1 / 60, 86_400),
      aperture: fc.constantFrom(0.5, 8, 256),
      iso: fc.constantFrom(1, 100, 1e7),
      offsetStops: fc.constantFrom(-20, 0, 20),
      again: fc.boolean(),
    });
    fc.assert(
      fc.property(absurd, plans, aims, ({ latitude, longitude, again, ...frame }, somePlan, someAim) => {
        const first = { ...frame, ndStops: 0 };
        const second = { ...first, atMs: first.atMs + 30 * MINUTE_MS, offsetStops: 3 };
        const { rungs, model } = duskLadder({
          place: { latitude, longitude },
          frames: again ? [first, second] : [first],
          aim: someAim,
          plan: somePlan,
        });
        expect(rungs.length).toBeGreaterThan(0);
        expect(rungs.length).toBeLessThan(2000);
        for (const { power: _power, earlyS, lateS, ...numbers } of rungs) {
          for (const [name, value] of Object.entries(numbers))
            expect(Number.isFinite(value), name).toBe(true);
          expect(earlyS === null || (earlyS >= 0 && Number.isFinite(earlyS))).toBe(true);
          expect(lateS === null || (lateS >= 0 && Number.isFinite(lateS))).toBe(true);
        }
        expect(Number.isFinite(model.skyOffsetStops)).toBe(true);
      }),
      { numRuns: 50 },
    );
  });

  it('is refused without a frame, or when it ends before it starts', () => {
    const input = inputOf(clear);
    expect(() => duskLadder({ ...input, frames: [] })).toThrow(RangeError);
    expect(() => duskLadder({ ...input, toMs: input.fromMs })).toThrow(RangeError);
  });
});
