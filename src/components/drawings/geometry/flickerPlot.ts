import { pointsOf, type PlotPoint, type Range } from './plotFrame';

/** A frame's exposure on the ripple: when it is open, and the mean light that it gets. */
export interface FlickerWindow {
  readonly fromCycles: number;
  readonly toCycles: number;
  readonly mean: number;
}

/** A lamp's light over cycles of its ripple, its mean being 1, and the brightest and the darkest frame. */
export interface FlickerPlot {
  readonly across: Range;
  readonly points: readonly PlotPoint[];
  readonly brightest: FlickerWindow;
  readonly darkest: FlickerWindow;
}

const MOST_CYCLES = 12;

/**
 * The mean of 1 + m·cos(2πτ) over c cycles around a peak is 1 + m·sin(πc)/(πc); where that sine is negative, the
 * brightest frame is the one around a trough.
 */
export function flickerPlot(cycles: number, residual: number, depth: number): FlickerPlot {
  const end = Math.min(MOST_CYCLES, Math.max(3, Math.ceil(cycles) + 2));
  const isPeakBright = Math.sin(Math.PI * (cycles % 2)) >= 0;
  const peak = Math.max(1, Math.round(end / 2));
  const around = (middle: number, mean: number): FlickerWindow => ({
    fromCycles: middle - cycles / 2,
    toCycles: middle + cycles / 2,
    mean,
  });
  const [bright, dark] = isPeakBright ? [peak, peak - 0.5] : [peak - 0.5, peak];
  return {
    across: [0, end],
    points: pointsOf((place) => 1 + depth * Math.cos(2 * Math.PI * place), [0, end], 40 * end),
    brightest: around(bright, 1 + depth * residual),
    darkest: around(dark, 1 - depth * residual),
  };
}
