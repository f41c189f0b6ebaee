import fc from 'fast-check';
import { sceneEv100 } from '../../shared/math/exposure';
import { instantOf, solarDay } from '../../shared/math/solarDay';
import { dayCrossings } from '../../shared/math/dayCrossings';
import { combinedEv100 } from '../../shared/math/ladder/sceneModel';
import { naturalLight } from '../../shared/math/ladder/naturalLight';
import type { LadderFrame, LadderInput, Rung } from '../../shared/math/ladder/ladderTypes';
import type { Giving } from '../../shared/math/ladder/staircase';
import { markAt } from '../../shared/math/marks';
import type { Place } from '../../shared/math/sunSite';

/** A made-up evening whose truth is known. */
export interface Evening {
  readonly place: Place;
  readonly sunsetMs: number;
  readonly offsetStops: number;
  readonly floorEv100: number | null;
}

const HOUR_MS = 3_600_000;

/** The evening's scene, EV100, at an instant from an hour before sunset until five hours after. */
export function truthOf({ place, sunsetMs, offsetStops, floorEv100 }: Evening): (atMs: number) => number {
  const light = naturalLight(place, sunsetMs - HOUR_MS, sunsetMs + 5 * HOUR_MS);
  return (atMs) => combinedEv100(light.ev100At(atMs), offsetStops, floorEv100);
}

/** A frame that meters the evening exactly: f/4, ISO 100 and a shutter on a third-stop mark, the rest as its offset. */
export function frameOf(evening: Evening, atMs: number): LadderFrame {
  const scene = truthOf(evening)(atMs);
  const { exact: shutterS } = markAt('shutter', 'third', Math.round(3 * (scene - 4)));
  return { atMs, aperture: 4, shutterS, iso: 100, ndStops: 0, offsetStops: scene - 4 + Math.log2(shutterS) };
}

/** When the sun stands at an altitude in the evening of a day; NaN where it does not. */
export function eveningMs(place: Place, nearMs: number, altitudeDeg: number): number {
  const day = solarDay(place, nearMs);
  const { evening } = dayCrossings(day, altitudeDeg);
  return typeof evening === 'number' ? instantOf(day, evening) : NaN;
}

/** Evenings up to 55 degrees, all the year, in which the sun goes below −10 degrees. */
export const evenings: fc.Arbitrary<Evening> = fc
  .record({
    latitude: fc.double({ min: -55, max: 55, noNaN: true }),
    longitude: fc.double({ min: -180, max: 180, noNaN: true }),
    day: fc.integer({ min: 0, max: 3650 }),
    offsetStops: fc.double({ min: -2.9, max: 2.9, noNaN: true }),
    floorEv100: fc.option(fc.double({ min: -6, max: 5, noNaN: true })),
  })
  .map(({ latitude, longitude, day, ...rest }) => {
    const place = { latitude, longitude };
    const nearMs = Date.UTC(2024, 0, 1) + day * 24 * HOUR_MS;
    return { place, sunsetMs: eveningMs(place, nearMs, -50 / 60), nearMs, ...rest };
  })
  .filter(({ place, nearMs }) => Number.isFinite(eveningMs(place, nearMs, -10)));

const ORDERS: readonly (readonly Giving[])[] = [
  ['shutter', 'aperture', 'iso'],
  ['shutter', 'iso', 'aperture'],
  ['iso', 'shutter', 'aperture'],
  ['aperture', 'iso', 'shutter'],
  ['shutter'],
  ['iso'],
];

/** What is held, limits and order: some on marks, some between them. */
export const plans: fc.Arbitrary<LadderInput['plan']> = fc
  .record({
    scale: fc.constantFrom('full' as const, 'half' as const, 'third' as const),
    holdAperture: fc.oneof(
      fc.constantFrom(2, 4, 4 * Math.SQRT2, 8),
      fc.double({ min: 2, max: 16, noNaN: true }),
    ),
    holdIso: fc.oneof(fc.constantFrom(100, 200, 400), fc.double({ min: 50, max: 800, noNaN: true })),
    ndStops: fc.constantFrom(0, 0, 3),
    slowestShutterS: fc.oneof(
      fc.constantFrom(1 / 64, 1 / 8, 2, 30),
      fc.double({ min: 0.01, max: 300, noNaN: true }),
    ),
    isoShare: fc.constantFrom(1, 2, 16, 64),
    apertureShare: fc.constantFrom(1, 1.3, 2),
    order: fc.constantFrom(...ORDERS),
  })
  .map(({ isoShare, apertureShare, ...plan }) => ({
    ...plan,
    isoMax: plan.holdIso * isoShare,
    apertureMin: plan.holdAperture / apertureShare,
  }));

export const aims = fc.record({
  backgroundStops: fc.double({ min: -3, max: 2, noNaN: true }),
  subjectStops: fc.double({ min: -1, max: 1, noNaN: true }),
});

/** Wide limits, so that everything gives way before it ends. */
export const widePlan: LadderInput['plan'] = {
  scale: 'third',
  holdAperture: 4,
  holdIso: 100,
  ndStops: 0,
  order: ['shutter', 'aperture', 'iso'],
  slowestShutterS: 1 / 8,
  isoMax: 6400,
  apertureMin: 2,
};

export const middleTone = { backgroundStops: 0, subjectStops: 0 };

/** The ladder from two frames at −2 and −8 degrees, asked for from −1 to −10 degrees. */
export function inputOf(evening: Evening): LadderInput {
  const at = (altitudeDeg: number) => eveningMs(evening.place, evening.sunsetMs, altitudeDeg);
  return {
    place: evening.place,
    frames: [frameOf(evening, at(-2)), frameOf(evening, at(-8))],
    aim: middleTone,
    plan: widePlan,
    fromMs: at(-1),
    toMs: at(-10),
  };
}

/** EV100 that a rung is set for. */
export function evOfRung(rung: Rung, ndStops = 0): number {
  return sceneEv100(rung.aperture, rung.shutterS, rung.iso, ndStops);
}

/** Munich, 21 June 2026: a scene one stop over a middle tone under horizontal light, no lamps. */
export const munich = { latitude: 48.1, longitude: 11.5 };
export const clear: Evening = {
  place: munich,
  sunsetMs: eveningMs(munich, Date.UTC(2026, 5, 21, 12), -50 / 60),
  offsetStops: 1,
  floorEv100: null,
};
