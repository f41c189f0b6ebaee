import type { z } from 'zod';
import type { exposureLong } from '../../../../shared/calculators/exposure/long';
import { RECIPROCITY_BREAK_S } from '../../../../shared/math/reciprocity';
import { formatNumber, formatSignedStops } from '../../../text/formatQuantity';
import { spanAround } from '../../scale/scaleFrame';
import { timeAxis } from './axes';
import type { PicturesOf } from './scalePicture';

type Input = z.output<typeof exposureLong.input>;
type Result = z.output<typeof exposureLong.output>;

/** The metered time and the time to expose on the dial of times, with what the film takes between them. */
export const longPictures: PicturesOf = (given, answer) => {
  const { meteredS } = given as Input;
  const { correctedS, addedStops } = answer as Result;
  const { at } = timeAxis;
  const label = `the film takes ${formatSignedStops(addedStops)}`;
  return [
    {
      title: 'What the film adds',
      unit: 'exposure time, each step twice as long',
      ...spanAround([at(meteredS), at(correctedS), -2, 6], 9, 1),
      // Seconds as they are: film is timed by a clock, not by a dial.
      read: (place) => `${formatNumber(2 ** place)} s`,
      pegs: [
        { id: 'metered', title: 'Metered', stops: at(meteredS), kind: 'light' },
        { id: 'corrected', title: 'To expose', stops: at(correctedS), kind: 'camera' },
      ],
      spans:
        addedStops === 0
          ? []
          : [
              {
                id: 'added',
                title: label,
                label,
                fromStops: at(meteredS),
                toStops: at(correctedS),
                isLit: false,
              },
            ],
      landmarks: [{ title: 'from here on film slows', stops: at(RECIPROCITY_BREAK_S) }],
      caption: 'Hatched is the time that only makes up for the film.',
    },
  ];
};
