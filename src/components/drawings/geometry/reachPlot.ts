import { spanAround } from '../../scale/scaleFrame';
import { distanceAxis } from './axes';
import type { LengthUnit } from '../../../text/lengthUnit';
import type { PlotPoint, Range } from './plotFrame';

/** Brightness over distance for one power, a straight line where distances double from step to step. */
export interface PowerLine {
  /** Stops below full power. */
  readonly belowFull: number;
  readonly from: PlotPoint;
  readonly to: PlotPoint;
}

export interface ReachPlot {
  readonly across: Range;
  readonly up: Range;
  readonly powers: readonly PowerLine[];
  readonly own: PowerLine;
  readonly subject: PlotPoint;
  /** How far full power gives the brightness wanted. */
  readonly reachM: number;
}

/** Full power and seven steps down, to 1/128, the least that many flashes have. */
const POWER_STEPS = 8;

/** A small light loses two stops each time the distance doubles (inverse square). */
export function reachPlot(
  {
    distanceM,
    brightnessStops,
    reserveStops,
  }: Readonly<Record<'distanceM' | 'brightnessStops' | 'reserveStops', number>>,
  measure: LengthUnit,
): ReachPlot {
  const { at } = distanceAxis(measure);
  const subject = { x: at(distanceM), y: brightnessStops };
  const reachM = distanceM * 2 ** (reserveStops / 2);
  const { fromStops, toStops } = spanAround([subject.x, at(reachM)], 4, 1);
  const up: Range = [Math.floor(brightnessStops) - 4, Math.ceil(brightnessStops) + 4];
  const line = (belowFull: number): PowerLine => {
    const y = (x: number) => brightnessStops + reserveStops - belowFull - 2 * (x - subject.x);
    return { belowFull, from: { x: fromStops, y: y(fromStops) }, to: { x: toStops, y: y(toStops) } };
  };
  return {
    across: [fromStops, toStops],
    up,
    powers: Array.from({ length: POWER_STEPS }, (_, i) => line(i)),
    own: line(reserveStops),
    subject,
    reachM,
  };
}
