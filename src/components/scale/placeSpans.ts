import type { Span } from './lightScale';
import { lanesOf } from './lanesOf';
import { textWidthPx } from './placeLabels';

const LANE_PX = 24;
const BAR_PX = 18;
const LINE_PX = 20;
const GAP_PX = 8;

export interface PlacedSpan {
  readonly span: Span;
  readonly leftPx: number;
  readonly widthPx: number;
  readonly topPx: number;
  readonly heightPx: number;
  readonly words: {
    readonly xPx: number;
    readonly baselinePx: number;
    readonly anchor: 'start' | 'end';
    /** On a line of their own above the stretch, since there is no room beside it. */
    readonly isAbove: boolean;
  };
}

interface Drawing {
  /** Where a place on the axis lies, px. */
  readonly at: (stops: number) => number;
  readonly widthPx: number;
  readonly sizePx: number;
  readonly topPx: number;
}

/** To the right of its stretch where that leaves room, else to the left, else above it. */
function wordsBeside({ label = '' }: Span, [leftPx, rightPx]: [number, number], drawing: Drawing) {
  const textPx = textWidthPx(label, drawing.sizePx);
  if (label === '' || rightPx + GAP_PX + textPx <= drawing.widthPx)
    return { xPx: rightPx + GAP_PX, anchor: 'start', isAbove: false } as const;
  if (leftPx - GAP_PX - textPx >= 0) return { xPx: leftPx - GAP_PX, anchor: 'end', isAbove: false } as const;
  const xPx = Math.max(0, Math.min(leftPx, drawing.widthPx - textPx));
  return { xPx, anchor: 'start', isAbove: true } as const;
}

/** Lays stretches and their words out in lanes, one under the other, so that no words lie on a stretch. */
export function placeSpans(
  spans: readonly Span[],
  drawing: Drawing,
): { readonly placed: readonly PlacedSpan[]; readonly bottomPx: number } {
  const lanes = lanesOf(spans);
  const sides = spans.map(({ fromStops, toStops }): [number, number] => {
    const ends = [drawing.at(fromStops), drawing.at(toStops)];
    return [Math.min(...ends), Math.max(...ends)];
  });
  const words = spans.map((span, i) => wordsBeside(span, sides[i] ?? [0, 0], drawing));
  const hasLine = (lane: number) => words.some(({ isAbove }, i) => isAbove && lanes[i] === lane);
  const tops: number[] = [drawing.topPx];
  for (let lane = 0; lane <= Math.max(-1, ...lanes); lane += 1)
    tops.push((tops[lane] ?? 0) + LANE_PX + (hasLine(lane) ? LINE_PX : 0));
  const placed = spans.map((span, i): PlacedSpan => {
    const lane = lanes[i] ?? 0;
    const [leftPx, rightPx] = sides[i] ?? [0, 0];
    const top = tops[lane] ?? 0;
    const topPx = top + (hasLine(lane) ? LINE_PX : 0);
    const beside = words[i] ?? { xPx: 0, anchor: 'start' as const, isAbove: false };
    const baselinePx = beside.isAbove ? topPx - 7 : topPx + 14;
    const widthPx = Math.max(2, rightPx - leftPx);
    return { span, leftPx, widthPx, topPx, heightPx: BAR_PX, words: { ...beside, baselinePx } };
  });
  return { placed, bottomPx: tops.at(-1) ?? drawing.topPx };
}
