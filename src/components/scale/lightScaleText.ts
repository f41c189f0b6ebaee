import { formatStops } from '../../text/formatQuantity';
import type { Peg, Span } from './lightScale';

/** The scale in words, for those who do not see it. */
export function lightScaleText(pegs: readonly Peg[], spans: readonly Span[], unit: string): string {
  const standing = pegs.map((peg) => `${peg.title} at ${formatStops(peg.stops)}`);
  const stretching = spans.map(
    (span) =>
      `${span.title}, ${span.isLit ? 'lit' : 'unlit'}, from ${formatStops(span.fromStops)} to ${formatStops(span.toStops)}`,
  );
  return `In ${unit}, more light to the right: ${[...standing, ...stretching].join('; ')}.`;
}
