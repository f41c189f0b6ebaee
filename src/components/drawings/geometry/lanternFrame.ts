import { encodeSrgb, linearOfStops } from '../../../../shared/math/srgb';
import { rowKey, sweptRow, type Patch, type SweptScene } from './sweptLight';

/** One light on the subject: how bright it alone makes the pale stripes, and how far they move while it lasts. */
export interface LanternLight {
  /** Stops from a middle tone. */
  readonly stops: number;
  /** Pixels of the picture, ≥ 0. */
  readonly blurPx: number;
}

/** What the picture at 100 % is made of. */
export interface LanternView {
  readonly flash: LanternLight | null;
  readonly ambient: LanternLight | null;
  /** How bright the ground behind comes out, stops from a middle tone; null where nothing is known of it. */
  readonly backgroundStops: number | null;
  /** How far everything that the ambient light draws is smeared by the hand, pixels. */
  readonly shakePx: number;
  /** Width of the details that one looks at: the stripes, pixels. */
  readonly detailPx: number;
}

/** Lamps behind, unsmeared, against a middle tone: over the clipping point, as lamps in a picture are. */
export const LAMP_STOPS = 4;
/** Dark stripes under pale ones. */
export const STRIPE_STOPS = 3;
const LAMP_PX = 4;
const STRIPES = 7;
/** Stripes that can be told apart and leave room for a trail. */
const STRIPE_LIMITS = { leastPx: 4, mostPx: 24 };
/** Lamps by the share of the picture's width and height at which they stand. */
const LAMP_PLACES = [
  [0.06, 0.3],
  [0.17, 0.62],
  [0.5, 0.2],
  [0.68, 0.5],
  [0.82, 0.28],
  [0.94, 0.66],
] as const;

/** How wide the stripes are drawn: as wide as the detail, within what can be seen. */
export function stripePx(detailPx: number): number {
  return Math.round(Math.min(STRIPE_LIMITS.mostPx, Math.max(STRIPE_LIMITS.leastPx, detailPx)));
}

interface Size {
  readonly widthPx: number;
  readonly heightPx: number;
}

/** The striped lantern on its pole, lit to a brightness; it stands left, so that its trail has room. */
export function lanternPatches(detailPx: number, stops: number, { widthPx, heightPx }: Size): Patch[] {
  const stripe = stripePx(detailPx);
  const bodyPx = STRIPES * stripe;
  const left = Math.round(widthPx * 0.28 - bodyPx / 2);
  const top = Math.round(heightPx * 0.2);
  const bottom = Math.round(heightPx * 0.7);
  const [pale, dark] = [linearOfStops(stops), linearOfStops(stops - STRIPE_STOPS)];
  const stripes = Array.from({ length: STRIPES }, (_, i) => ({
    leftPx: left + i * stripe,
    rightPx: left + (i + 1) * stripe,
    topPx: top,
    bottomPx: bottom,
    light: i % 2 === 0 ? pale : dark,
  }));
  const poleLeft = left + Math.round((bodyPx - stripe) / 2);
  const pole = { leftPx: poleLeft, rightPx: poleLeft + stripe, topPx: bottom, bottomPx: heightPx * 2 };
  return [...stripes, { ...pole, light: dark }];
}

function lampPatches({ widthPx, heightPx }: Size): Patch[] {
  return LAMP_PLACES.map(([across, down]) => {
    const [left, top] = [Math.round(across * widthPx), Math.round(down * heightPx)];
    const light = linearOfStops(LAMP_STOPS);
    return { leftPx: left, rightPx: left + LAMP_PX, topPx: top, bottomPx: top + LAMP_PX, light };
  });
}

const NOTHING = { subject: [], trailPx: 0, lamps: [], ground: 0, shakePx: 0 };

/** What the flash draws: the subject alone, at once, as the shutter opens. */
function flashScene(view: LanternView, size: Size): SweptScene {
  if (!view.flash) return NOTHING;
  const subject = lanternPatches(view.detailPx, view.flash.stops, size);
  return { ...NOTHING, subject, trailPx: view.flash.blurPx };
}

/** What the ambient light draws: the subject as it moves on, the ground and its lamps, all of it shaken. */
function ambientScene(view: LanternView, size: Size): SweptScene {
  if (!view.ambient) return NOTHING;
  return {
    subject: lanternPatches(view.detailPx, view.ambient.stops, size),
    trailPx: view.ambient.blurPx,
    lamps: lampPatches(size),
    ground: view.backgroundStops === null ? 0 : linearOfStops(view.backgroundStops),
    shakePx: view.shakePx,
  };
}

/** Steps of the table below: fine enough that a step is under a tenth of a grey value even in the darkest tones. */
const TABLE_STEPS = 65_535;
/** sRGB's greys by linear light; a power for each pixel would take longer than a frame. */
const greys = Uint8ClampedArray.from(
  { length: TABLE_STEPS + 1 },
  (_, step) => 255 * encodeSrgb(step / TABLE_STEPS),
);

/** Both lights of a row added in linear light, then encoded. */
function rowTones(scenes: readonly SweptScene[], y: number, widthPx: number): Uint8ClampedArray {
  const rows = scenes.map((scene) => sweptRow(scene, y, widthPx));
  const tones = new Uint8ClampedArray(widthPx);
  for (let x = 0; x < widthPx; x++) {
    let light = 0;
    for (const row of rows) light += row[x] ?? 0;
    tones[x] = greys[Math.round(Math.min(1, light) * TABLE_STEPS)] ?? 0;
  }
  return tones;
}

/** The picture as grey values of sRGB, 0 to 255, row by row; rows that see the same are worked out once. */
export function lanternTones(view: LanternView, size: Size): Uint8ClampedArray {
  const { widthPx, heightPx } = size;
  const scenes = [flashScene(view, size), ambientScene(view, size)];
  const tones = new Uint8ClampedArray(widthPx * heightPx);
  const known = new Map<string, Uint8ClampedArray>();
  for (let y = 0; y < heightPx; y++) {
    const key = scenes.map((scene) => rowKey(scene, y)).join('/');
    const row = known.get(key) ?? rowTones(scenes, y, widthPx);
    known.set(key, row);
    tones.set(row, y * widthPx);
  }
  return tones;
}
