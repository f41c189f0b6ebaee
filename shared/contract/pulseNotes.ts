import { isLowerBound, type FlashControl } from '../math/flashDuration';
import type { FlashPulse } from '../math/flashPulse';
import { note, type Remark } from './answer';

/** What is to be said about a pulse that a request describes. */
export function pulseNotes(
  given: { readonly control: FlashControl; readonly ratio?: number },
  power: number,
  pulse: FlashPulse,
): Remark[] {
  const notes: Remark[] = [];
  if (given.control === 'decay' && power < 1) notes.push(note('power_ignored'));
  if (given.control === 'cutoff' && given.ratio !== undefined) notes.push(note('ratio_ignored'));
  if (given.control !== 'cutoff' && given.ratio === undefined) notes.push(note('ratio_assumed'));
  if (pulse.riseS > 0) notes.push(note('rise_added', { riseUs: pulse.riseS * 1e6 }));
  if (isLowerBound(given.control, power)) notes.push(note('duration_only_measurable'));
  return notes;
}
