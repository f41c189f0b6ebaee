import type { z } from 'zod';
import type { filtersGel } from '../../../../shared/calculators/filters/gel';
import { miredOf } from '../../../../shared/math/mired';
import { formatNumber, formatSignedStops } from '../../../text/formatQuantity';
import type { Peg, Span } from '../../scale/lightScale';
import { spanAround } from '../../scale/scaleFrame';
import type { PicturesOf } from './scalePicture';

type Input = z.output<typeof filtersGel.input>;
type Result = z.output<typeof filtersGel.output>;

/** Ten mired make a step of the axis. */
const STEP_MIRED = 10;
/** Temperatures by which the mired get a meaning; their names are the numbers themselves. */
const KELVINS = [3200, 5500, 10_000, 2000, 4000];

const kelvin = (value: number) => `${formatNumber(value)} K`;
const at = (mired: number) => mired / STEP_MIRED;

/** The bare light, what the gel is to make of it, and how far the sheets carry it. */
export const gelPictures: PicturesOf = (given, answer) => {
  const { sourceK } = given as Input;
  const { miredShift, resultK, nearest, whiteBalanceK } = answer as Result;
  const source = at(miredOf(sourceK));
  const pegs: Peg[] = [
    { id: 'source', title: `Bare ${kelvin(sourceK)},`, stops: source, kind: 'flash' },
    { id: 'result', title: `Wanted ${kelvin(resultK)},`, stops: at(miredOf(resultK)), kind: 'light' },
    {
      id: 'balance',
      title: `White balance ${kelvin(whiteBalanceK)},`,
      stops: at(miredOf(whiteBalanceK)),
      kind: 'camera',
    },
  ];
  const bar = (id: string, label: string, title: string, mired: number, isLit: boolean): Span => ({
    id,
    title: `${title} ${formatSignedStops(mired)}`,
    label: `${label} ${formatSignedStops(mired)}`,
    fromStops: source,
    toStops: source + at(mired),
    isLit,
  });
  const spans = [
    bar('wanted', 'wanted', 'wanted', miredShift, false),
    ...nearest.map(({ series, sheets, miredShift: reached }) =>
      bar(series, series, `${series}, ${sheets.join(' and ') || 'no sheet'}`, reached, true),
    ),
  ];
  return [
    {
      title: 'Colour on the mired line',
      unit: 'mired',
      ...spanAround(
        [...pegs.map(({ stops }) => stops), ...spans.map(({ toStops }) => toStops), at(miredOf(10_000)), 40],
        10,
        1,
      ),
      read: (place) => formatNumber(place * STEP_MIRED),
      towards: 'warmer to the right',
      parts: 1,
      pegs,
      spans,
      landmarks: KELVINS.map((value) => ({ title: kelvin(value), stops: at(miredOf(value)) })),
      caption: `Hatched is the shift that is wanted, filled what the nearest sheets bring: ${nearest.map(({ series, sheets }) => `${series}, ${sheets.join(' and ') || 'no sheet'}`).join('; ')}.`,
    },
  ];
};
