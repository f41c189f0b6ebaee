import { z } from 'zod';
import type { DaylightWay } from '../math/daylightWays';
import { exposureDifference, type ExactSettings } from '../math/exposure';
import { costs } from '../text';

type CostCode = keyof typeof costs;

/** Costs smaller than this are rounding, not costs. */
const SMALLEST_COST_STOPS = 1e-9;

/** What a way costs, by stable code, in stops where it has an amount. */
export const costOut = () =>
  z.strictObject({
    code: z.string().meta({ description: 'stable, for programs' }),
    stops: z.number().nullable().meta({ title: 'Amount', unit: 'stops', description: 'null without one' }),
    message: z.string().meta({ description: 'a sentence, for people' }),
  });

export type CostOut = z.output<ReturnType<typeof costOut>>;

/** A cost with its sentence. */
export const cost = (code: CostCode, stops: number | null = null): CostOut => ({
  code,
  stops,
  message: costs[code](stops ?? 0),
});

/**
 * What a way out costs against the wanted aperture at the sync speed.
 * @param wanted the aperture and sync speed that were asked for
 * @param settings what the way sets instead
 * @param highSpeedLossStops what high-speed sync takes from the flash
 */
export function costsOfWay(
  way: DaylightWay,
  wanted: { readonly aperture: number; readonly syncSpeedS: number },
  settings: ExactSettings,
  highSpeedLossStops: number,
): CostOut[] {
  if (way === 'highSpeedSync')
    return [
      cost('flash_loses_by_spreading', highSpeedLossStops),
      cost('no_freezing_pulse'),
      cost('more_heat'),
    ];
  const { iso, ndStops } = settings;
  const from = { aperture: wanted.aperture, shutterS: wanted.syncSpeedS, iso, ndStops: 0 };
  const { byApertureStops, byShutterStops } = exposureDifference(from, settings);
  const closed = -byApertureStops;
  if (way === 'smallerAperture')
    return [cost('focus_deepens', closed), cost('flash_loses_by_aperture', closed)];
  const filter = [cost('flash_loses_by_filter', ndStops), cost('finder_darkens', ndStops)];
  if (closed > SMALLEST_COST_STOPS) filter.push(cost('filter_too_weak', closed));
  if (byShutterStops > SMALLEST_COST_STOPS) filter.push(cost('filter_stronger_than_needed', byShutterStops));
  return filter;
}
