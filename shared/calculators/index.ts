import type { AnyCalculator } from '../contract/defineCalculator';

/** One line a calculator. The server loads all at its start, the browser one at a time. */
export interface CalculatorEntry {
  readonly id: string;
  readonly title: string;
  readonly load: () => Promise<AnyCalculator>;
}

// prettier-ignore
export const calculatorList: readonly CalculatorEntry[] = [
  { id: 'exposure/value', title: 'Exposure value of settings', load: async () => (await import('./exposure/value')).exposureValue },
  { id: 'exposure/solve', title: 'Missing setting', load: async () => (await import('./exposure/solve')).exposureSolve },
  { id: 'exposure/equivalents', title: 'Equivalent settings', load: async () => (await import('./exposure/equivalents')).exposureEquivalents },
  { id: 'exposure/difference', title: 'Difference of two settings', load: async () => (await import('./exposure/difference')).exposureDifference },
  { id: 'exposure/long', title: 'Long exposure on film', load: async () => (await import('./exposure/long')).exposureLong },
  { id: 'exposure/handheld', title: 'Hand-held limit', load: async () => (await import('./exposure/handheld')).exposureHandheld },
  { id: 'exposure/depth', title: 'Depth of field', load: async () => (await import('./exposure/depth')).exposureDepth },
  { id: 'light/convert', title: 'Light in three units', load: async () => (await import('./light/convert')).lightConvert },
  { id: 'light/scenes', title: 'Scenes and their light', load: async () => (await import('./light/scenes')).lightScenes },
  { id: 'light/add', title: 'Adding light', load: async () => (await import('./light/add')).lightAdd },
  { id: 'light/ratio', title: 'Key to fill', load: async () => (await import('./light/ratio')).lightRatio },
  { id: 'light/flicker', title: 'Mains flicker', load: async () => (await import('./light/flicker')).lightFlicker },
  { id: 'filters/density', title: 'Neutral density', load: async () => (await import('./filters/density')).filtersDensity },
  { id: 'filters/gel', title: 'Gel for a light', load: async () => (await import('./filters/gel')).filtersGel },
  { id: 'flash/exposure', title: 'Flash exposure', load: async () => (await import('./flash/exposure')).flashExposure },
  { id: 'flash/measured', title: 'Guide number from a test frame', load: async () => (await import('./flash/measured')).flashMeasured },
  { id: 'flash/falloff', title: 'Falloff of a light', load: async () => (await import('./flash/falloff')).flashFalloff },
  { id: 'flash/duration', title: 'Flash duration', load: async () => (await import('./flash/duration')).flashDuration },
  { id: 'flash/motion', title: 'Motion, ghost and shake', load: async () => (await import('./flash/motion')).flashMotion },
  { id: 'flash/daylight', title: 'Wide aperture in daylight', load: async () => (await import('./flash/daylight')).flashDaylight },
  { id: 'flash/budget', title: 'Battery and recycling', load: async () => (await import('./flash/budget')).flashBudget },
  { id: 'twilight/day', title: 'Light of a day', load: async () => (await import('./twilight/day')).twilightDay },
  { id: 'twilight/at', title: 'Light at a moment', load: async () => (await import('./twilight/at')).twilightAt },
  { id: 'twilight/ladder', title: 'Dusk ladder', load: async () => (await import('./twilight/ladder')).twilightLadder },
  { id: 'fill/recipes', title: 'Recipes for flash and ambient light', load: async () => (await import('./fill/recipes')).fillRecipes },
  { id: 'fill/check', title: 'Outcome of given settings', load: async () => (await import('./fill/check')).fillCheck },
];

/** Loads every calculator, in the list's order. */
export function loadCalculators(): Promise<AnyCalculator[]> {
  return Promise.all(calculatorList.map((entry) => entry.load()));
}
