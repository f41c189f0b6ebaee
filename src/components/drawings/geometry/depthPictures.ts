import type { z } from 'zod';
import type { exposureDepth } from '../../../../shared/calculators/exposure/depth';
import { formatQuantity } from '../../../text/formatQuantity';
import type { Peg } from '../../scale/lightScale';
import { spanAround } from '../../scale/scaleFrame';
import { distanceAxis } from './axes';
import type { PicturesOf } from './scalePicture';

type Input = z.output<typeof exposureDepth.input>;
type Result = z.output<typeof exposureDepth.output>;

/** What is sharp along the way from the lens. */
export const depthPictures: PicturesOf = (given, answer, measure) => {
  const { distanceM, backgroundM } = given as Input;
  const { nearM, farM, totalM, hyperfocalM } = answer as Result;
  const { at, read } = distanceAxis(measure);
  const pegs: Peg[] = [
    { id: 'focus', title: 'Focus', stops: at(distanceM), kind: 'camera' },
    { id: 'hyperfocal', title: 'Hyperfocal', stops: at(hyperfocalM), kind: 'later' },
  ];
  if (backgroundM !== undefined)
    pegs.push({ id: 'background', title: 'Background', stops: at(backgroundM), kind: 'lamps' });
  const known = [...pegs.map(({ stops }) => stops), at(nearM), ...(farM === null ? [] : [at(farM)])];
  const span = spanAround(known, 8, 1);
  const metres = (value: number) => formatQuantity(value, 'm', measure);
  const label = totalM === null ? 'sharp without end' : `sharp over ${metres(totalM)}`;
  return [
    {
      title: 'What is sharp',
      unit: 'distance from the lens, each step twice as far',
      ...span,
      at,
      read,
      towards: 'farther to the right',
      parts: 1,
      pegs,
      spans: [
        {
          id: 'sharp',
          title: 'sharp',
          label,
          fromStops: at(nearM),
          toStops: farM === null ? span.toStops : at(farM),
          isLit: true,
          words: `sharp from ${metres(nearM)} to ${farM === null ? 'infinity' : metres(farM)}`,
        },
      ],
      caption: 'Filled is sharp. Focused at the hyperfocal distance, everything from half of it on is.',
    },
  ];
};
