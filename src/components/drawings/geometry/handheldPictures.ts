import type { z } from 'zod';
import type { exposureHandheld } from '../../../../shared/calculators/exposure/handheld';
import { formatNumber, formatStops } from '../../../text/formatQuantity';
import type { Peg, Span } from '../../scale/lightScale';
import { spanAround } from '../../scale/scaleFrame';
import { plainAxis, timeAxis } from './axes';
import type { PicturesOf, ScalePicture } from './scalePicture';

type Input = z.output<typeof exposureHandheld.input>;
type Result = z.output<typeof exposureHandheld.output>;

/** The circle that the rule of thumb implies, µm; see shared/math/handheld. */
const CIRCLE_UM = 30;

function limitPicture({ stabilisationStops }: Input, { slowestShutter, stopsOver }: Result): ScalePicture {
  const limit = timeAxis.at(slowestShutter.exact);
  const pegs: Peg[] = [{ id: 'limit', title: 'Limit', stops: limit, kind: 'camera' }];
  const spans: Span[] = [];
  if (stabilisationStops > 0) {
    const label = `stabilisation ${formatStops(stabilisationStops)}`;
    spans.push({
      id: 'gain',
      title: label,
      label,
      fromStops: limit - stabilisationStops,
      toStops: limit,
      isLit: true,
    });
  }
  if (stopsOver !== undefined) {
    const shutter = limit + stopsOver;
    const over = stopsOver > 0;
    const label = `${formatStops(Math.abs(stopsOver))} ${over ? 'over the limit' : 'in hand'}`;
    pegs.push({ id: 'shutter', title: 'Shutter', stops: shutter, kind: 'subject' });
    spans.push({
      id: 'room',
      title: label,
      label,
      fromStops: Math.min(limit, shutter),
      toStops: Math.max(limit, shutter),
      isLit: !over,
    });
  }
  return {
    title: 'The shutter against the hand-held limit',
    unit: 'exposure time, each step twice as long',
    ...spanAround([...pegs.map(({ stops }) => stops), ...spans.map(({ fromStops }) => fromStops), -8, 0], 9),
    ...timeAxis,
    pegs,
    spans,
    caption: 'Filled is room, hatched is too much. Each step to the right is one stop more light.',
  };
}

function streakPicture(blurUm: number): ScalePicture {
  const axis = plainAxis(Math.max(CIRCLE_UM, blurUm), 'µm');
  const label = (name: string, um: number) => `${name}, ${formatNumber(um)} µm`;
  const streak = (id: string, title: string, um: number, isLit: boolean): Span => ({
    id,
    title,
    label: title,
    fromStops: 0,
    toStops: axis.at(um),
    isLit,
  });
  return {
    title: 'How far a lamp streaks',
    unit: 'length on the sensor',
    fromStops: 0,
    ...axis,
    towards: 'longer to the right',
    parts: 1,
    pegs: [],
    spans: [
      streak('sharp', label('still sharp', CIRCLE_UM), CIRCLE_UM, true),
      streak('blur', label('a lamp’s streak', blurUm), blurUm, false),
    ],
    caption:
      'The streak of a point of light by the turning hand, against the circle that the rule takes for sharp.',
  };
}

/** The limit on the dial of times, and the streak of a lamp in true proportion. */
export const handheldPictures: PicturesOf = (input, result) => {
  const answer = result as Result;
  const limit = limitPicture(input as Input, answer);
  return answer.blurUm === undefined ? [limit] : [limit, streakPicture(answer.blurUm)];
};
