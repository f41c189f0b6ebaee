import type { Span } from '../scale/lightScale';

/** The parts of a difference, one after the other, each beginning where the one before ended. */
export function differenceSpans(
  parts: readonly { readonly title: string; readonly stops: number }[],
): Span[] {
  let reached = 0;
  return parts
    .filter(({ stops }) => stops !== 0)
    .map(({ title, stops }) => {
      const fromStops = reached;
      reached += stops;
      return { id: title, title, label: title, fromStops, toStops: reached, isLit: stops > 0 };
    });
}
