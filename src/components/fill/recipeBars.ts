import { formatStops } from '../../text/formatQuantity';
import type { FillRecipeOut } from './fillAnswer';

/** Part of a bar: light that is there anyway, or light from the flashes. */
export interface BarPart {
  readonly fromStops: number;
  readonly toStops: number;
  readonly isFlash: boolean;
}

/** One quantity of a recipe on the scale of stops from a middle tone. */
export interface RecipeBar {
  readonly code: 'background' | 'ambient' | 'flash' | 'sum';
  readonly letter: string;
  readonly title: string;
  /** null where there is no such light */
  readonly stops: number | null;
  readonly parts: readonly BarPart[];
  /** where it was wished, if it was */
  readonly aimStops: number | null;
}

/** The stretch of stops that bars stand in; what lies lower has no bar, what lies higher is cut off. */
export const BAR_SPAN = { fromStops: -6, toStops: 3 } as const;

const FLOOR = -1000;

/** Background, ambient light on the subject, flash on it, and their sum with what the flash adds on top. */
export function recipeBars(
  { outcome }: Pick<FillRecipeOut, 'outcome'>,
  aim: { readonly backgroundStops: number; readonly subjectStops: number },
): RecipeBar[] {
  const { backgroundStops, subjectAmbientStops, subjectFlashStops, subjectStops } = outcome;
  const upTo = (toStops: number, isFlash: boolean): BarPart => ({ fromStops: FLOOR, toStops, isFlash });
  const flash = subjectFlashStops === null ? [] : [upTo(subjectFlashStops, true)];
  const added = { fromStops: subjectAmbientStops, toStops: subjectStops, isFlash: true };
  return [
    {
      code: 'background',
      letter: 'B',
      title: 'background',
      stops: backgroundStops,
      parts: [upTo(backgroundStops, false)],
      aimStops: aim.backgroundStops,
    },
    {
      code: 'ambient',
      letter: 'A',
      title: 'ambient light on the subject',
      stops: subjectAmbientStops,
      parts: [upTo(subjectAmbientStops, false)],
      aimStops: null,
    },
    {
      code: 'flash',
      letter: 'F',
      title: 'flash on the subject',
      stops: subjectFlashStops,
      parts: flash,
      aimStops: null,
    },
    {
      code: 'sum',
      letter: 'S',
      title: 'subject in sum',
      stops: subjectStops,
      parts: [upTo(subjectAmbientStops, false), ...(flash.length > 0 ? [added] : [])],
      aimStops: aim.subjectStops,
    },
  ];
}

/** A stretch of pixels from the top, inside the drawing; null where nothing of it is to be seen. */
export function stretchOf(part: BarPart, heightPx: number): { topPx: number; heightPx: number } | null {
  const y = (stops: number) => yOf(stops, heightPx);
  const [top, bottom] = [y(part.toStops), y(part.fromStops)];
  return bottom - top > 0 ? { topPx: top, heightPx: bottom - top } : null;
}

/** Where a value stands, pixels from the top, held within the drawing. */
export function yOf(stops: number, heightPx: number): number {
  const { fromStops, toStops } = BAR_SPAN;
  const held = Math.min(toStops, Math.max(fromStops, stops));
  return ((toStops - held) / (toStops - fromStops)) * heightPx;
}

/** The bars in words. */
export function barsText(bars: readonly RecipeBar[]): string {
  return bars
    .map(({ title, stops }) => `${title} ${stops === null ? 'none' : formatStops(stops)}`)
    .join(', ');
}
