import { MOST_FILTERS, MOST_FLASHES } from '../../shared/contract/fillFields';
import { seeded } from './fillScenarios';

/** The dusk portrait of the bench: three flashes, three filters, third stops. */
export const threeFlashes = {
  background: { ev100: 8.3 },
  subjectAmbient: { belowBackgroundStops: 2 },
  aim: { backgroundStops: -0.5, ratio: 3, rimStops: 0 },
  camera: {
    apertureMin: 'f/1.8',
    apertureMax: 'f/16',
    isoMin: 100,
    isoMax: 12_800,
    shutterSlowest: '1s',
    shutterFastest: '1/8000',
    syncSpeed: '1/250',
    highSpeedSync: {},
    ndStops: [3, 6, 10],
  },
  flashes: [
    { name: 'octabox', role: 'key', guideNumberM: 40, minPower: '1/128', distanceM: 2.5, lossStops: 1.5 },
    { name: 'umbrella', role: 'fill', guideNumberM: 36, minPower: '1/128', distanceM: 3, lossStops: 1 },
    { name: 'strip', role: 'rim', guideNumberM: 36, minPower: '1/128', distanceM: 2.5 },
  ],
  view: { focalLengthMm: 50, distanceM: 3, pixelPitchUm: 6 },
  support: { kind: 'handheld', stabilisationStops: 2 },
} as const;

/** A request that is as large and as awkward as the schema allows, or nearly so. */
export function hostileFill(seed: number): unknown {
  const random = seeded(seed);
  const between = (low: number, high: number) => low + (high - low) * random();
  const one = <T>(...items: readonly T[]): T => items[Math.floor(random() * items.length)] as T;
  const wide = random() < 0.7;
  const flash = (i: number) => ({
    name: `flash ${i}`,
    role: one('key', 'key', 'fill', 'rim'),
    guideNumberM: 10 ** between(-1, 3),
    minPower: one(1, 0.5, 1 / 128, 1 / 512, 1 / 8191),
    powerStep: one(0.1, 1 / 3, 0.5, 1, 3),
    ...(random() < 0.5 ? { distanceM: 10 ** between(-1, 2) } : spanOf(10 ** between(-1, 2), between(1, 4))),
    lossStops: one(0, between(0, 6)),
    ...(random() < 0.4 ? { t05S: 10 ** between(-5, 0) } : {}),
    control: one('decay', 'cutoff', 'voltage'),
    recycleFullS: between(0, 10),
  });
  const spanOf = (minM: number, factor: number) => ({ minM, maxM: minM * factor });
  return {
    background: { ev100: between(-8, 20) },
    subjectAmbient: { belowBackgroundStops: between(-3, 8) },
    aim: {
      backgroundStops: between(-3, 2),
      subjectStops: between(-3, 3),
      ...(random() < 0.7 ? { ratio: between(1.05, 30) } : {}),
      ...(random() < 0.7 ? { rimStops: between(-6, 4) } : {}),
    },
    camera: {
      apertureMin: wide ? 0.5 : between(1, 4),
      apertureMax: wide ? 256 : between(4, 22),
      isoMin: wide ? 1 : between(50, 400),
      isoMax: wide ? 10_000_000 : between(400, 102_400),
      shutterSlowest: wide ? 86_400 : between(0.1, 30),
      shutterFastest: wide ? 1e-6 : 1 / between(500, 8000),
      syncSpeed: one<string | number>('1/60', '1/250', '1/250', 1e-5, 60),
      ...(random() < 0.5 ? { highSpeedSync: {} } : {}),
      ndStops: Array.from({ length: Math.floor(random() * (MOST_FILTERS + 1)) }, () => between(0, 20)),
    },
    flashes: Array.from({ length: Math.floor(random() * (MOST_FLASHES + 1)) }, (_, i) => flash(i)),
    ...(random() < 0.5 ? { view: { focalLengthMm: 50, distanceM: 3 }, support: { kind: 'handheld' } } : {}),
    ...(random() < 0.5 ? { subject: { speedMS: 3 } } : {}),
    ...(random() < 0.7 ? { prefer: one('shallowFocus', 'deepFocus', 'lowIso', 'frozen', 'battery') } : {}),
    scale: one('third', 'third', 'half', 'full'),
    count: 10,
  };
}
