import { describe, expect, it } from 'vitest';
import { calculatorList } from '../../../../../shared/calculators';
import { answerFor, parseInput, type AnyCalculator } from '../../../../../shared/contract/defineCalculator';
import { depthPictures } from '../../../../../src/components/drawings/geometry/depthPictures';
import { batteryPictures } from '../../../../../src/components/drawings/geometry/budgetPlot';
import { filterPictures } from '../../../../../src/components/drawings/geometry/filterPictures';
import {
  daylightPictures,
  measuredPictures,
} from '../../../../../src/components/drawings/geometry/flashPictures';
import { gelPictures } from '../../../../../src/components/drawings/geometry/gelPictures';
import { handheldPictures } from '../../../../../src/components/drawings/geometry/handheldPictures';
import {
  addPictures,
  ratioPictures,
  scenePictures,
} from '../../../../../src/components/drawings/geometry/lightPictures';
import { longPictures } from '../../../../../src/components/drawings/geometry/longPictures';
import type { PicturesOf, ScalePicture } from '../../../../../src/components/drawings/geometry/scalePicture';
import { isFiniteThroughout } from '../../../../support/closeTo';

const now = new Date('2026-06-21T18:00:00Z');

async function calculatorOf(id: string): Promise<AnyCalculator> {
  return (await calculatorList.find((one) => one.id === id)?.load()) as AnyCalculator;
}

async function drawn(id: string, picturesOf: PicturesOf, body: unknown): Promise<readonly ScalePicture[]> {
  const calculator = await calculatorOf(id);
  const parsed = parseInput(calculator, body);
  if (!('input' in parsed)) throw new Error(JSON.stringify(parsed.faults));
  const { result } = answerFor(calculator, parsed.input, { now });
  return picturesOf(parsed.input, result, 'metres');
}

const peg = (picture: ScalePicture | undefined, id: string) =>
  picture?.pegs.find((one) => one.id === id)?.stops;
const span = (picture: ScalePicture | undefined, id: string) => {
  const found = picture?.spans.find((one) => one.id === id);
  return found && [found.fromStops, found.toStops, found.isLit];
};

describe('answers on the ruled scale stand where their numbers say', () => {
  it('a hand-held time of two stops over the limit reaches two steps beyond it, and streaks in proportion', async () => {
    // Reciprocal rule: 1/64 s at 64 mm; 1/16 s is two stops over. Blur f·ω·t = 64 mm·0.03/16 = 120 µm (derivation).
    const [limit, streak] = await drawn('exposure/handheld', handheldPictures, {
      focalLengthMm: 64,
      shutter: 1 / 16,
      readAs: 'exact',
    });
    expect(peg(limit, 'limit')).toBeCloseTo(-6, 9);
    expect(peg(limit, 'shutter')).toBeCloseTo(-4, 9);
    expect(span(limit, 'room')).toEqual([expect.closeTo(-6, 9), expect.closeTo(-4, 9), false]);
    const [, blur = 0] = (span(streak, 'blur') ?? []) as number[];
    const [, sharp = 1] = (span(streak, 'sharp') ?? []) as number[];
    expect(blur / sharp).toBeCloseTo(120 / 30, 9);
  });

  it('sharpness lies between its limits on doubling distances, and runs to the end where it has none', async () => {
    const [near] = await drawn('exposure/depth', depthPictures, {
      focalLengthMm: 50,
      aperture: 8,
      distanceM: 4,
      circleOfConfusionUm: 30,
      readAs: 'exact',
    });
    expect(peg(near, 'focus')).toBe(2);
    const [from = 0, to = 0] = (span(near, 'sharp') ?? []) as number[];
    // H = f²/(N·c) + f = 10.4667 m; near s(H−f)/(H+s−2f), far s(H−f)/(H−s) (encyclopaedia, "Depth of field").
    expect(2 ** from).toBeCloseTo((4 * 10.41667) / (10.46667 + 4 - 0.1), 4);
    expect(2 ** to).toBeCloseTo((4 * 10.41667) / (10.46667 - 4), 3);
    const [far] = await drawn('exposure/depth', depthPictures, {
      focalLengthMm: 24,
      aperture: 11,
      distanceM: 2,
    });
    expect(span(far, 'sharp')?.[1]).toBe(far?.toStops);
    expect(far?.spans[0]?.words).toMatch(/to infinity$/);
  });

  it('filters stand end to end and arrive at their sum', async () => {
    const [picture] = await drawn('filters/density', filterPictures, {
      stack: [{ stops: 6 }, { factor: 8 }, { polariserDeg: 60 }],
    });
    expect(picture?.spans.map(({ fromStops, toStops }) => [fromStops, Number(toStops.toFixed(9))])).toEqual([
      [0, -6],
      [-6, -9],
      [-9, -11],
    ]);
    expect(peg(picture, 'through')).toBeCloseTo(-11, 9);
  });

  it('gels reach from the bare light by their mired, ten to a step', async () => {
    const [picture] = await drawn('filters/gel', gelPictures, { sourceK: 5000, targetK: 2500 });
    // 10⁶/5000 = 200 and 10⁶/2500 = 400 mired (encyclopaedia, "Mired").
    expect([peg(picture, 'source'), peg(picture, 'result')]).toEqual([20, 40]);
    expect(span(picture, 'wanted')).toEqual([20, 40, false]);
    expect(picture?.read?.(20)).toBe('200');
  });

  it('equal lights add a stop, then 0.58, then 0.42 of one', async () => {
    const [picture] = await drawn('light/add', addPictures, {
      parts: Array.from({ length: 4 }, () => ({ stops: 0 })),
    });
    const lengths = picture?.spans.map(({ fromStops, toStops }) => toStops - fromStops);
    // log2 2, log2 3/2, log2 4/3 (derivation).
    expect(lengths?.map((one) => Number(one.toFixed(3)))).toEqual([1, 0.585, 0.415]);
    expect(peg(picture, 'sum')).toBe(2);
    const [many] = await drawn('light/add', addPictures, {
      parts: Array.from({ length: 100 }, () => ({ ev100: 3 })),
    });
    expect(many?.spans.every(({ label }) => label === undefined)).toBe(true);
  });

  it('key, fill and lit side stand apart as the ratio says', async () => {
    const [picture] = await drawn('light/ratio', ratioPictures, { ratio: 5 });
    // 5:1 is a key two stops over the fill; the lit side is log2 5 over the shadow side (encyclopaedia, "Lighting ratio").
    expect(peg(picture, 'key')).toBeCloseTo(2, 9);
    expect(span(picture, 'sides')?.[1]).toBeCloseTo(Math.log2(5), 9);
  });

  it('scenes reach from their least to their most light', async () => {
    const [picture] = await drawn('light/scenes', scenePictures, { group: 'sky_at_sunset' });
    expect(span(picture, 'sky_before_sunset')).toEqual([12, 14, true]);
  });

  it('the reserve of each way reaches from its power up to full, and what is lacking beyond it', async () => {
    const calculator = await calculatorOf('flash/daylight');
    for (const { input } of calculator.examples) {
      const parsed = parseInput(calculator, input);
      const { result } = answerFor(calculator, 'input' in parsed ? parsed.input : null, { now });
      const { ways } = result as { ways: { reserveStops: number | null }[] };
      const [picture] = daylightPictures(null, result, 'metres');
      const reserves = ways.flatMap(({ reserveStops }) => (reserveStops === null ? [] : [reserveStops]));
      for (const reserve of reserves)
        expect(
          picture?.spans.some(
            ({ fromStops, toStops, isLit }) =>
              fromStops === -reserve && toStops === 0 && isLit === reserve >= 0,
          ),
        ).toBe(true);
    }
  });

  it('the flash adds from the ambient light up to the result', async () => {
    const [picture] = await drawn('flash/measured', measuredPictures, {
      aperture: 'f/5.6',
      iso: 200,
      distanceM: 2,
      power: '1/8',
      resultStops: 0.5,
      ambientStops: -2,
    });
    expect(span(picture, 'adds')).toEqual([-2, 0.5, true]);
    expect(peg(picture, 'flash')).toBeCloseTo(Math.log2(2 ** 0.5 - 2 ** -2), 9);
  });

  it('film takes the time between what is metered and what is exposed', async () => {
    const [picture] = await drawn('exposure/long', longPictures, { meteredS: 16, exponent: 1.25 });
    // Tc = Tm^P: 16^1.25 = 32 s, one stop more.
    expect(span(picture, 'added')).toEqual([4, expect.closeTo(5, 9), false]);
  });

  it('batteries stand end to end; a charge too small for one frame has no bar', async () => {
    const [picture] = await drawn('flash/budget', batteryPictures, {
      fullPowerPops: 180,
      power: 1,
      frames: 300,
    });
    expect(picture?.spans.map(({ fromStops, toStops }) => [fromStops, toStops])).toEqual([
      [0, 1.8],
      [1.8, 3.6],
    ]);
    expect(peg(picture, 'planned')).toBe(3);
    const [none] = await drawn('flash/budget', batteryPictures, { fullPowerPops: 0.1, power: 1, frames: 0 });
    expect(none?.spans).toEqual([]);
  });
});

describe('absurd answers are still drawn with numbers', () => {
  const absurd: [string, PicturesOf, unknown][] = [
    ['exposure/handheld', handheldPictures, { focalLengthMm: 2000, cropFactor: 20, shutter: 86_400 }],
    [
      'exposure/depth',
      depthPictures,
      { focalLengthMm: 1, aperture: 256, distanceM: 10_000, backgroundM: 0.01 },
    ],
    ['filters/density', filterPictures, { stops: 0 }],
    ['filters/density', filterPictures, { factor: 1e12 }],
    ['filters/gel', gelPictures, { sourceK: 40_000, targetK: 1000 }],
    ['light/add', addPictures, { parts: [{ stops: -60 }, { stops: 60 }] }],
    ['light/ratio', ratioPictures, { keyStops: -60, fillStops: 60 }],
    ['exposure/long', longPictures, { meteredS: 86_400, exponent: 3 }],
    ['exposure/long', longPictures, { meteredS: 1e-6, exponent: 1 }],
    ['flash/budget', batteryPictures, { fullPowerPops: 0.1, power: 1e-8, frames: 10_000_000 }],
    ['flash/budget', batteryPictures, { fullPowerPops: 1, power: 1, frames: 10_000_000 }],
  ];

  it.each(absurd)('%s %#', async (id, picturesOf, body) => {
    for (const picture of await drawn(id, picturesOf, body)) {
      expect(isFiniteThroughout({ ...picture, read: null })).toBe(true);
      expect(picture.toStops).toBeGreaterThan(picture.fromStops);
      for (const { stops } of picture.pegs) {
        expect(stops).toBeGreaterThanOrEqual(picture.fromStops);
        expect(stops).toBeLessThanOrEqual(picture.toStops);
      }
      const ends = picture.read ?? String;
      expect([ends(picture.fromStops), ends(picture.toStops)].join()).not.toMatch(/NaN|Infinity|undefined/);
    }
  });
});
