import { describe, expect, it } from 'vitest';
import { calculatorList } from '../../../../shared/calculators';
import { answerFor, parseInput, type AnyCalculator } from '../../../../shared/contract/defineCalculator';
import { differenceSpans } from '../../../../src/components/drawings/differenceSpans';
import { isChosenRow, markInput } from '../../../../src/components/drawings/equivalentRow';
import { lightOfAnswer } from '../../../../src/components/drawings/lightOfAnswer';

async function asked(id: string, body: unknown): Promise<{ input: unknown; result: unknown }> {
  const calculator = (await calculatorList.find((one) => one.id === id)?.load()) as AnyCalculator;
  const parsed = parseInput(calculator, body);
  if (!('input' in parsed)) throw new Error(JSON.stringify(parsed.faults));
  const { result } = answerFor(calculator, parsed.input, { now: new Date('2026-06-21T18:00:00Z') });
  return { input: parsed.input, result };
}

describe('the light on the scale', () => {
  it('is what the settings suit, and the band stands on it', async () => {
    const { input, result } = await asked('exposure/value', { aperture: 8, shutter: '1/125', ndStops: 3 });
    expect(lightOfAnswer(input, result)).toEqual({ ev100: 16, middleEv100: 16 });
  });

  it('is what was asked about, while the band moves by the brightness wanted', async () => {
    const body = { ev100: 5, aperture: 'f/4', shutter: '1/30', brightnessStops: -1 };
    const { input, result } = await asked('exposure/solve', body);
    const light = lightOfAnswer(input, result);
    expect(light?.ev100).toBe(5);
    // One stop darker than a middle tone: the settings suit a light of one stop more.
    expect(light?.middleEv100).toBeCloseTo(6, 9);
  });

  it('is the middle of a scene, and has no band without a camera', async () => {
    const scene = await asked('exposure/solve', { scene: 'home', aperture: 8, iso: 100 });
    expect(lightOfAnswer(scene.input, scene.result)?.ev100).toBe(6);
    const converted = await asked('light/convert', { illuminanceLux: 20 });
    // 20 lx is three stops over 2.5 lx with C 250 (ISO 2720:1974 as the calculator quotes it).
    expect(lightOfAnswer(converted.input, converted.result)).toEqual({ ev100: 3 });
    expect(lightOfAnswer(undefined, null)).toBeNull();
  });
});

it('the parts of a difference stand end to end and arrive at the whole', () => {
  const spans = differenceSpans([
    { title: 'aperture', stops: 2 },
    { title: 'shutter', stops: 0 },
    { title: 'ISO', stops: 3 },
    { title: 'filter', stops: -6 },
  ]);
  expect(spans.map(({ title, fromStops, toStops, isLit }) => [title, fromStops, toStops, isLit])).toEqual([
    ['aperture', 0, 2, true],
    ['ISO', 2, 5, true],
    ['filter', 5, -1, false],
  ]);
});

describe('a row of equivalents', () => {
  const row = { aperture: { mark: 'f/8' }, shutter: { mark: '1/125' }, iso: { mark: '100' } };
  const reading = { scale: 'third', readAs: 'mark' } as const;

  it('is the chosen one when its marks are the settings in question', () => {
    expect(isChosenRow(row, { aperture: 8, shutter: 1 / 125, iso: 100 }, reading)).toBe(true);
    expect(isChosenRow(row, { aperture: 'f/8', shutter: '1/60', iso: 100 }, reading)).toBe(false);
    expect(isChosenRow(row, { aperture: 'f/8' }, reading)).toBe(false);
    expect(isChosenRow(row, { aperture: 'wide', shutter: '1/125', iso: 100 }, reading)).toBe(false);
  });

  it('goes into a request as a person would write it', () => {
    expect(markInput('iso', { mark: '100' })).toBe(100);
    expect(markInput('shutter', { mark: '1/125' })).toBe('1/125');
  });
});
