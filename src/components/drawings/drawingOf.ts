import { defineAsyncComponent, type Component } from 'vue';

/** What is drawn beside an answer, and which parts of the answer it shows so well that no table need repeat them. */
export interface Drawing {
  readonly component: Component;
  readonly covers: readonly string[];
  /** The example that shows most, where that is not the first one. */
  readonly start?: number;
}

const exposure = defineAsyncComponent(() => import('./ExposureDrawing.vue'));

const drawings: Readonly<Record<string, Drawing>> = {
  'exposure/value': { component: exposure, covers: [] },
  'exposure/solve': { component: exposure, covers: [] },
  'exposure/equivalents': {
    component: defineAsyncComponent(() => import('./EquivalentsDrawing.vue')),
    covers: ['rows'],
  },
  'exposure/difference': {
    component: defineAsyncComponent(() => import('./DifferenceDrawing.vue')),
    covers: [],
  },
  'flash/motion': {
    component: defineAsyncComponent(() => import('./MotionDrawing.vue')),
    covers: [],
    start: 1,
  },
  'light/convert': { component: defineAsyncComponent(() => import('./LightDrawing.vue')), covers: [] },
};

/** The drawing of a calculator, if it has one. */
export function drawingOf(id: string): Drawing | undefined {
  return drawings[id];
}
