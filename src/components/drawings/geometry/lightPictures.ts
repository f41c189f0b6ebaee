import type { z } from 'zod';
import type { lightAdd } from '../../../../shared/calculators/light/add';
import type { lightRatio } from '../../../../shared/calculators/light/ratio';
import type { lightScenes } from '../../../../shared/calculators/light/scenes';
import { addStops } from '../../../../shared/math/mixing';
import { formatNumber, formatSignedStops } from '../../../text/formatQuantity';
import { lightLandmarks } from '../../scale/landmarks';
import type { Peg, Span } from '../../scale/lightScale';
import { spanAround } from '../../scale/scaleFrame';
import type { PicturesOf } from './scalePicture';

/** So many lights have a name and a lane each; more of them share one. */
const NAMED = 8;

type Sum = z.output<typeof lightAdd.output>;

/** What each light adds to the sum of those before it: the same light adds the less the more there is already. */
export const addPictures: PicturesOf = (_, answer) => {
  const { parts, ev100, stops } = answer as Sum;
  const alone = parts.map((part) => part.stops ?? part.ev100 ?? 0);
  const isNamed = parts.length <= NAMED;
  const spans = alone.slice(1).map((_light, i): Span => {
    const [before, after] = [addStops(alone.slice(0, i + 1)), addStops(alone.slice(0, i + 2))];
    const title = `light ${i + 2} adds ${formatSignedStops(after - before)}`;
    return {
      id: String(i),
      title,
      label: isNamed ? title : undefined,
      fromStops: before,
      toStops: after,
      isLit: true,
    };
  });
  const pegs: Peg[] = [
    { id: 'sum', title: 'Sum', stops: ev100 ?? stops ?? 0, kind: 'light' },
    ...parts.map(({ share }, i): Peg => ({
      id: `part${i}`,
      title: `${i + 1} (${formatNumber(Number((share * 100).toPrecision(3)))} %)`,
      stops: alone[i] ?? 0,
      kind: 'lamps',
      isUnlabelled: !isNamed,
    })),
  ];
  return [
    {
      title: 'Lights that add up',
      unit: ev100 === undefined ? 'stops from the common reference' : 'EV at ISO 100',
      ...spanAround([...alone, ev100 ?? stops ?? 0], 8, 1),
      pegs,
      spans,
      landmarks: ev100 === undefined ? [] : lightLandmarks,
      caption: 'Each bar begins at the sum of the lights before it. Beside a number, its share of the sum.',
    },
  ];
};

type Ratio = z.output<typeof lightRatio.output>;

/** Key and fill alone, and the lit side of the face, on which both fall. */
export const ratioPictures: PicturesOf = (_, answer) => {
  const { differenceStops, litOverShadowStops, ratio } = answer as Ratio;
  const label = `lit over shadow side ${formatSignedStops(litOverShadowStops)}`;
  const adds = `fill adds ${formatSignedStops(litOverShadowStops - differenceStops)}`;
  return [
    {
      title: `Key and fill at ${formatNumber(ratio)}:1`,
      unit: 'stops from the fill',
      ...spanAround([0, differenceStops, litOverShadowStops], 8, 1),
      pegs: [
        { id: 'fill', title: 'Fill, shadow side', stops: 0, kind: 'lamps' },
        { id: 'key', title: 'Key alone', stops: differenceStops, kind: 'flash' },
        { id: 'lit', title: 'Lit side', stops: litOverShadowStops, kind: 'light' },
      ],
      spans: [
        { id: 'sides', title: label, label, fromStops: 0, toStops: litOverShadowStops, isLit: false },
        {
          id: 'adds',
          title: adds,
          label: adds,
          fromStops: differenceStops,
          toStops: litOverShadowStops,
          isLit: true,
        },
      ],
      caption:
        'The fill falls on both sides: the shadow side has it alone, the lit side has it on top of the key.',
    },
  ];
};

type Scenes = z.output<typeof lightScenes.output>;

/** Every scene's range, one under the other. */
export const scenePictures: PicturesOf = (_, answer) => {
  const { scenes } = answer as Scenes;
  return [
    {
      title: 'Scenes and their light',
      unit: 'EV at ISO 100',
      ...spanAround(
        scenes.flatMap(({ ev100Low, ev100High }) => [ev100Low, ev100High]),
        8,
        1,
      ),
      pegs: [],
      spans: scenes.map(({ code, title, ev100Low, ev100High }) => ({
        id: code,
        title,
        label: title,
        fromStops: ev100Low,
        toStops: ev100High,
        isLit: true,
      })),
      caption:
        'From the least to the most light that each kind of scene usually has; a line where it is one value.',
    },
  ];
};
