import type { z } from 'zod';
import type { flashDuration } from '../../../../shared/calculators/flash/duration';
import { measuredDuration } from '../../../../shared/contract/flashIn';
import { exactOf } from '../../../../shared/contract/settings';
import { flashPulse } from '../../../../shared/math/flashDuration';
import { intensityAt } from '../../../../shared/math/flashPulse';
import { pointsOf, type PlotPoint } from './plotFrame';

type Input = z.output<typeof flashDuration.input>;
type Result = z.output<typeof flashDuration.output>;

/** The pulse over time: intensity as a share of the peak, and the stretch for which the whole frame is open. */
export interface PulsePlot {
  readonly endS: number;
  readonly points: readonly PlotPoint[];
  readonly t05S: number;
  readonly t01S: number;
  /** null where no shutter was given */
  readonly openS: number | null;
  /** The part of the pulse that the closing shutter keeps out; empty where it keeps out nothing that can be seen. */
  readonly clipped: readonly PlotPoint[];
}

/** A little more than t0.1, so that its mark stands inside; a shutter beyond twice of it would only squeeze the pulse. */
const AFTER_T01 = 1.6;
const MOST_OF_SHUTTER = 2.2;

export function pulsePlot(given: Input, { t05S, t01S }: Result): PulsePlot {
  const power = exactOf('power', given.power, given);
  const pulse = flashPulse(measuredDuration(given), { ...given, power });
  const openS =
    given.shutter === undefined ? null : exactOf('shutter', given.shutter, given) - given.curtainS;
  const endS = Math.max(t01S * AFTER_T01, Math.min((openS ?? 0) * 1.1, t01S * MOST_OF_SHUTTER));
  const at = (timeS: number) => intensityAt(pulse, timeS);
  return {
    endS,
    points: pointsOf(at, [0, endS]),
    t05S,
    t01S,
    openS,
    clipped: openS !== null && openS < endS ? pointsOf(at, [openS, endS]) : [],
  };
}
