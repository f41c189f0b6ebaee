import { nearestMark } from '../../../../shared/math/marks';
import { formatNumber } from '../../../text/formatQuantity';
import { lengthOf, unitShown, type LengthUnit } from '../../../text/lengthUnit';

/** An axis whose places are not stops themselves: where a value stands on it, and how a place is read. */
export interface Axis {
  readonly at: (value: number) => number;
  readonly read: (place: number) => string;
}

/** Places on the dial beyond which no length or time in an answer lies; keeps infinities on the axis. */
const FAR = 60;
const held = (place: number) => Math.min(FAR, Math.max(-FAR, place));

/** Distances, each step twice as far: two stops of a small light. */
export function distanceAxis(measure: LengthUnit): Axis {
  return {
    at: (metres) => held(Math.log2(lengthOf(metres, measure))),
    read: (place) => `${formatNumber(2 ** place)} ${unitShown('m', measure)}`,
  };
}

/** Exposure times, each step twice as long: one stop. */
export const timeAxis: Axis = {
  at: (seconds) => held(Math.log2(seconds)),
  read: (place) => nearestMark('shutter', 'third', 2 ** place).label,
};

/** Plain numbers from 0 up to a most, in steps of a round size. */
export function plainAxis(most: number, unit: string): Axis & { readonly toStops: number } {
  const step = most > 0 && Number.isFinite(most) ? 10 ** Math.floor(Math.log10(most / 2)) : 1;
  return {
    at: (value) => value / step,
    read: (place) => `${formatNumber(place * step)}${unit ? ` ${unit}` : ''}`,
    toStops: Math.max(1, Math.ceil((most / step) * 1.05)),
  };
}
