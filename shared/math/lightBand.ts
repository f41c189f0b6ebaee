import { BLUE_HOUR, GOLDEN_HOUR, type BandLimits } from './sunBands';
import { ASTRONOMICAL_DEG, CIVIL_DEG, NAUTICAL_DEG, SUNRISE_DEG } from './sunAltitudes';

export type LightBandName = 'day' | 'civilTwilight' | 'nauticalTwilight' | 'astronomicalTwilight' | 'night';

/** What the light is called at an instant: by the sun's altitude, and by photographers' habit where they have a name. */
export interface LightBand {
  readonly twilight: LightBandName;
  readonly hour: 'goldenHour' | 'blueHour' | null;
}

/**
 * The bands in which an altitude lies.
 *
 * @param sunAltitudeDeg h of the sun's centre without refraction, degrees
 * @param goldenHour limits, lower one included
 * @param blueHour limits, lower one included
 * @returns the names
 * @example lightBand(-5) // { twilight: 'civilTwilight', hour: 'blueHour' }
 * @source twilights: USNO; golden and blue hour: common practice
 */
export function lightBand(
  sunAltitudeDeg: number,
  goldenHour: BandLimits = GOLDEN_HOUR,
  blueHour: BandLimits = BLUE_HOUR,
): LightBand {
  const isIn = ({ fromDeg, toDeg }: BandLimits): boolean =>
    sunAltitudeDeg >= fromDeg && sunAltitudeDeg < toDeg;
  return {
    twilight: twilightOf(sunAltitudeDeg),
    hour: isIn(goldenHour) ? 'goldenHour' : isIn(blueHour) ? 'blueHour' : null,
  };
}

function twilightOf(altitudeDeg: number): LightBandName {
  if (altitudeDeg >= SUNRISE_DEG) return 'day';
  if (altitudeDeg >= CIVIL_DEG) return 'civilTwilight';
  if (altitudeDeg >= NAUTICAL_DEG) return 'nauticalTwilight';
  return altitudeDeg >= ASTRONOMICAL_DEG ? 'astronomicalTwilight' : 'night';
}
