import { z } from 'zod';
import {
  nearestMark,
  residualStops,
  type Mark,
  type MarkedKind,
  type Rounding,
  type Scale,
} from '../math/marks';
import { nearestPowerMark } from '../math/powerMarks';

/** A setting in an answer: the exact value, the mark to set, and what the mark adds or takes in stops. */
export const settingOut = (title: string) =>
  z
    .strictObject({
      exact: z.number().meta({ description: 'exact value, in the setting’s own unit' }),
      mark: z.string().meta({ description: 'the marking to set, as on the camera' }),
      residualStops: z.number().meta({
        unit: 'stops',
        description: 'how much brighter (+) or darker (−) the picture gets with the mark set',
      }),
    })
    .meta({ title });

export type SettingOut = z.output<ReturnType<typeof settingOut>>;

/** An exact value with the mark that comes nearest, or the one on the safe side of a limit. */
export function exactWithMark(
  kind: MarkedKind | 'power',
  scale: Scale,
  exact: number,
  rounding: Rounding = 'nearest',
): SettingOut {
  const mark =
    kind === 'power' ? nearestPowerMark(scale, exact, rounding) : nearestMark(kind, scale, exact, rounding);
  return { exact, mark: mark.label, residualStops: residualStops(kind, exact, mark.exact) };
}

/** A mark that was chosen: the exact value is the one behind it. */
export function chosenMark(mark: Pick<Mark, 'label' | 'exact'>): SettingOut {
  return { exact: mark.exact, mark: mark.label, residualStops: 0 };
}
