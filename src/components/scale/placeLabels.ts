export interface LabelToPlace {
  readonly id: string;
  readonly xPx: number;
  readonly text: string;
}

export interface PlacedLabel extends LabelToPlace {
  /** 0 is nearest to the axis. */
  readonly lane: number;
  /** The left edge of the text. */
  readonly leftPx: number;
  readonly textPx: number;
}

/** Mean advance of the typeface, in ems, with a little to spare; measured over the console's own labels. */
const ADVANCE_EM = 0.55;

/** About how wide a text comes out. */
export function textWidthPx(text: string, sizePx: number): number {
  return text.length * ADVANCE_EM * sizePx;
}

/**
 * Lays labels out in lanes so that none covers another or leaves the drawing. Earlier ones in the list get the
 * nearer lanes; those for which `maxLanes` have no room are left out.
 */
export function placeLabels(
  labels: readonly LabelToPlace[],
  {
    widthPx,
    sizePx,
    gapPx = 10,
    maxLanes = 3,
  }: { widthPx: number; sizePx: number; gapPx?: number; maxLanes?: number },
): PlacedLabel[] {
  const lanes: PlacedLabel[][] = Array.from({ length: maxLanes }, () => []);
  for (const label of labels) {
    const textPx = textWidthPx(label.text, sizePx);
    const leftPx = Math.max(0, Math.min(widthPx - textPx, label.xPx - textPx / 2));
    const lane = lanes.findIndex((taken) =>
      taken.every(
        (other) => leftPx >= other.leftPx + other.textPx + gapPx || leftPx + textPx + gapPx <= other.leftPx,
      ),
    );
    if (lane >= 0) lanes[lane]?.push({ ...label, lane, leftPx, textPx });
  }
  return lanes.flat();
}
