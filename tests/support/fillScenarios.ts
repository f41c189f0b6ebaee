import type { FillFlash, FillWish, FlashRole } from '../../shared/math/fill/fillTypes';
import { exactAt } from '../../shared/math/marks';

/** A repeatable source of numbers from 0 to 1 (the usual 32-bit mixing generator, from memory). */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

export interface ScenarioOptions {
  /** marks of aperture, ISO and shutter that the camera has */
  readonly marks: readonly [number, number, number];
  readonly roles: readonly FlashRole[];
  /** powers of each flash */
  readonly powers: number;
  readonly isMovable?: boolean;
}

/** A request over reduced gear, such that every combination of it can be gone through. */
export function fillScenario(seed: number, options: ScenarioOptions): FillWish {
  const random = seeded(seed);
  const between = (low: number, high: number) => low + (high - low) * random();
  const whole = (low: number, high: number) => Math.floor(between(low, high + 1));
  const one = <T>(...items: T[]): T => items[whole(0, items.length - 1)] as T;
  const scale = one('third', 'third', 'half', 'full');
  const steps = { third: 3, half: 2, full: 1 }[scale];
  const [apertures, isos, shutters] = options.marks;
  const apertureFrom = whole(1, 4) * steps;
  const isoFrom = whole(-1, 3) * steps;
  const shutterFrom = whole(2, 7) * steps;
  const powerStepStops = one(1 / 3, 0.5, 1);
  const backgroundEv100 = between(0, 16);
  const flash = (role: FlashRole, i: number): FillFlash => {
    const nearM = between(1, 6);
    return {
      name: `${role} ${i}`,
      role,
      guideNumberM: between(12, 60),
      minPower: 2 ** -(powerStepStops * (options.powers - 1)) * 0.999,
      powerStepStops,
      nearM,
      farM: options.isMovable && random() < 0.6 ? nearM * between(1, 3) : nearM,
      lossStops: one(0, 0, 1.3),
      t05S: one(null, null, 0.001, 0.004),
      control: one('decay', 'cutoff', 'voltage'),
      recycleFullS: one(null, 2),
    };
  };
  const syncStep = shutterFrom + whole(0, shutters - 1);
  return {
    scene: {
      backgroundEv100,
      subjectEv100: backgroundEv100 - between(-1, 5),
      rimEv100: null,
    },
    aim: {
      backgroundStops: one(0, -0.5, -1, between(-2, 1)),
      subjectStops: one(0, 0, between(-1, 1)),
      ratio: one(null, between(1.5, 9)),
      rimStops: one(null, between(-2, 2)),
    },
    camera: {
      scale,
      apertureMin: exactAt('aperture', scale, apertureFrom),
      apertureMax: exactAt('aperture', scale, apertureFrom + apertures - 1),
      isoMin: exactAt('iso', scale, isoFrom),
      isoMax: exactAt('iso', scale, isoFrom + isos - 1),
      shutterSlowestS: exactAt('shutter', scale, shutterFrom),
      shutterFastestS: exactAt('shutter', scale, shutterFrom + shutters - 1),
      syncSpeedS: exactAt('shutter', scale, syncStep),
      highSpeedSync:
        random() < 0.4
          ? { curtainS: Math.min(1 / 300, exactAt('shutter', scale, syncStep)), extraLossStops: one(0, 0.7) }
          : null,
      shutCurtainS: one(0, 0, 0.001),
      ndStops: one([], [3], [2, 6.64]),
    },
    flashes: options.roles.map(flash),
    motion: {
      view: one(null, { focalLengthMm: 50, distanceM: 4, pitchUm: 6, cropFactor: 1 }),
      subject: one(null, { speedMS: 3, directionDeg: 0 }),
      handheld: one(null, { stabilisationStops: 1 }),
    },
    prefer: one(null, null, 'shallowFocus', 'deepFocus', 'lowIso', 'frozen', 'battery'),
    count: 5,
  };
}
