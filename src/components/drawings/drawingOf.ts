import { defineAsyncComponent, h, type Component } from 'vue';
import type { PicturesOf } from './geometry/scalePicture';

/** What is drawn beside an answer, and which parts of the answer it shows so well that no table need repeat them. */
export interface Drawing {
  readonly component: Component;
  readonly covers: readonly string[];
  /** The example that shows most, where that is not the first one. */
  readonly start?: number;
}

type Load = () => Promise<Component | { default: Component }>;

const drawn = (load: Load, more: Partial<Omit<Drawing, 'component'>> = {}): Drawing => ({
  component: defineAsyncComponent(load as () => Promise<Component>),
  covers: [],
  ...more,
});

/** A drawing on the ruled scale, whose geometry comes with the page that shows it. */
const onScale = (load: () => Promise<PicturesOf>, more?: Partial<Omit<Drawing, 'component'>>): Drawing =>
  drawn(async () => {
    const [picturesOf, { default: ScaleDrawing }] = await Promise.all([load(), import('./ScaleDrawing.vue')]);
    return () => h(ScaleDrawing, { picturesOf });
  }, more);

const light = drawn(() => import('./LightDrawing.vue'));
const exposure = drawn(() => import('./ExposureDrawing.vue'));
const fill = drawn(() => import('./FillDrawing.vue'));

// prettier-ignore
const drawings: Readonly<Record<string, Drawing>> = {
  'exposure/value': exposure,
  'exposure/solve': exposure,
  'exposure/equivalents': drawn(() => import('./EquivalentsDrawing.vue'), { covers: ['rows'] }),
  'exposure/difference': drawn(() => import('./DifferenceDrawing.vue')),
  'exposure/long': onScale(async () => (await import('./geometry/longPictures')).longPictures),
  'exposure/handheld': onScale(async () => (await import('./geometry/handheldPictures')).handheldPictures, { start: 2 }),
  'exposure/depth': drawn(() => import('./DepthDrawing.vue')),
  'light/convert': light,
  'light/scenes': onScale(async () => (await import('./geometry/lightPictures')).scenePictures),
  'light/add': onScale(async () => (await import('./geometry/lightPictures')).addPictures),
  'light/ratio': onScale(async () => (await import('./geometry/lightPictures')).ratioPictures),
  'light/flicker': drawn(() => import('./FlickerDrawing.vue')),
  'filters/density': onScale(async () => (await import('./geometry/filterPictures')).filterPictures, { start: 2 }),
  'filters/gel': onScale(async () => (await import('./geometry/gelPictures')).gelPictures),
  'flash/exposure': drawn(() => import('./ReachDrawing.vue')),
  'flash/measured': onScale(async () => (await import('./geometry/flashPictures')).measuredPictures, { start: 1 }),
  'flash/falloff': drawn(() => import('./FalloffDrawing.vue')),
  'flash/duration': drawn(() => import('./PulseDrawing.vue')),
  'flash/motion': drawn(() => import('./MotionDrawing.vue'), { start: 1 }),
  'flash/daylight': onScale(async () => (await import('./geometry/flashPictures')).daylightPictures),
  'flash/budget': drawn(() => import('./BudgetDrawing.vue')),
  'twilight/day': drawn(() => import('./TwilightDayDrawing.vue')),
  'twilight/at': light,
  'twilight/ladder': drawn(() => import('./TwilightLadderDrawing.vue')),
  'fill/recipes': fill,
  'fill/check': fill,
};

/** The drawing of a calculator, if it has one. */
export function drawingOf(id: string): Drawing | undefined {
  return drawings[id];
}
