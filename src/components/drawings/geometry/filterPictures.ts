import type { z } from 'zod';
import type { filtersDensity } from '../../../../shared/calculators/filters/density';
import { stopsOfFilter } from '../../../../shared/contract/filterIn';
import { formatNumber, formatSignedStops } from '../../../text/formatQuantity';
import { spanAround } from '../../scale/scaleFrame';
import { differenceSpans } from '../differenceSpans';
import type { PicturesOf } from './scalePicture';

type Input = z.output<typeof filtersDensity.input>;
type Result = z.output<typeof filtersDensity.output>;
type Filter = NonNullable<Input['stack']>[number];

/** A filter as it was said. */
function nameOf({ density, factor, polariserDeg }: Filter): string {
  if (density !== undefined) return `density ${formatNumber(density)}`;
  if (factor !== undefined) return `factor ${formatNumber(factor)}`;
  return polariserDeg === undefined ? 'filter' : `polarisers at ${formatNumber(polariserDeg)}°`;
}

/** What each filter of the stack takes from what the one before let through. */
export const filterPictures: PicturesOf = (given, answer) => {
  const input = given as Input;
  const { stops } = answer as Result;
  const parts = (input.stack ?? [input]).map((filter, i) => {
    const taken = -stopsOfFilter(filter);
    return { title: `${i + 1}: ${nameOf(filter)} ${formatSignedStops(taken)}`, stops: taken };
  });
  return [
    {
      title: 'What the filters take',
      unit: 'stops from the light without a filter',
      ...spanAround([0, -stops], 9, 1),
      pegs: [
        { id: 'without', title: 'Without', stops: 0, kind: 'light' },
        { id: 'through', title: 'Through', stops: -stops, kind: 'camera' },
      ],
      spans: differenceSpans(parts),
      caption: 'Each hatched bar is a filter; it begins where the one before it ends, since stops add.',
    },
  ];
};
