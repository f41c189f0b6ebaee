import { formatNumber } from '../../../text/formatQuantity';

/** A stretch of values from one edge of a drawing to the other; falling where more is to the left or below. */
export type Range = readonly [from: number, to: number];

/** Where a value stands between two edges. */
export function placeOn([from, to]: Range, [startPx, endPx]: Range, value: number): number {
  return startPx + ((value - from) / (to - from)) * (endPx - startPx);
}

export interface PlotTick {
  readonly value: number;
  readonly label: string;
}

/** Round numbers along an axis, about so many of them, each with its words. */
export function roundTicks(
  [from, to]: Range,
  about: number,
  read: (value: number) => string = formatNumber,
): PlotTick[] {
  const rough = (to - from) / about;
  if (!(rough > 0) || !Number.isFinite(rough)) return [];
  const ten = 10 ** Math.floor(Math.log10(rough));
  const step = ([1, 2, 5, 10].find((size) => size * ten >= rough) ?? 10) * ten;
  const first = Math.ceil(from / step - 1e-9);
  const count = Math.floor(to / step + 1e-9) - first + 1;
  return Array.from({ length: Math.max(0, count) }, (_, i) => {
    const value = (first + i) * step;
    return { value, label: read(Number(value.toPrecision(9))) };
  });
}

export interface PlotPoint {
  readonly x: number;
  readonly y: number;
}

/** Points at even distances along a curve. */
export function pointsOf(curve: (x: number) => number, [from, to]: Range, count = 160): PlotPoint[] {
  return Array.from({ length: count + 1 }, (_, i) => {
    const x = from + ((to - from) * i) / count;
    return { x, y: curve(x) };
  });
}

/** A curve in a drawing's own pixels. */
export function pathOf(
  points: readonly PlotPoint[],
  place: { readonly x: (value: number) => number; readonly y: (value: number) => number },
): string {
  return points
    .map(({ x, y }, i) => `${i === 0 ? 'M' : 'L'}${place.x(x).toFixed(1)} ${place.y(y).toFixed(1)}`)
    .join('');
}
