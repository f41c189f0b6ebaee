import { formatStops } from '../../text/formatQuantity';
import type { Peg, Span } from './lightScale';

/** How an axis is spoken of. */
export interface AxisWords {
  readonly unit: string;
  readonly towards?: string;
  readonly read?: (place: number) => string;
}

/** The scale in words, for those who do not see it. */
export function lightScaleText(
  pegs: readonly Peg[],
  spans: readonly Span[],
  { unit, towards = 'more light to the right', read = formatStops }: AxisWords,
): string {
  const standing = pegs.map((peg) => `${peg.title} at ${read(peg.stops)}`);
  const stretching = spans.map(
    (span) =>
      span.words ??
      `${span.title}, ${span.isLit ? 'lit' : 'unlit'}, from ${read(span.fromStops)} to ${read(span.toStops)}`,
  );
  return `In ${unit}, ${towards}: ${[...standing, ...stretching].join('; ')}.`;
}
