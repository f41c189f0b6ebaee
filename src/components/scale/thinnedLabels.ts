import { textWidthPx } from './placeLabels';

export interface RulerLabel {
  readonly text: string;
  readonly xPx: number;
  readonly isFullStop: boolean;
}

/**
 * The labels that stand under a ruler: of full stops only, at one even distance (every, every second, every third
 * stop …), the closest at which none touches its neighbour.
 */
export function thinnedLabels(
  labels: readonly RulerLabel[],
  { widthPx, sizePx, gapPx = 10 }: { widthPx: number; sizePx: number; gapPx?: number },
): (RulerLabel & { leftPx: number })[] {
  const full = labels
    .filter(({ isFullStop }) => isFullStop)
    .map((label) => {
      const width = textWidthPx(label.text, sizePx);
      const leftPx = Math.max(0, Math.min(widthPx - width, label.xPx - width / 2));
      return { ...label, leftPx, rightPx: leftPx + width };
    });
  for (let every = 1; every <= full.length; every++) {
    const kept = full.filter((_, i) => i % every === 0);
    const touch = kept.some((label, i) => i > 0 && label.leftPx < (kept[i - 1]?.rightPx ?? 0) + gapPx);
    if (!touch) return kept;
  }
  return [];
}
