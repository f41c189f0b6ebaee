import { describe, expect, it } from 'vitest';
import { calculatorList } from '../../../shared/calculators';
import { answerFor, parseInput, type AnyCalculator } from '../../../shared/contract/defineCalculator';
import type { Body } from '../../../src/form/body';
import { carriedBody } from '../../../src/form/carriedBody';
import { CARRY_RULES, type Asked } from '../../../src/form/carryRules';
import { measuresLengths } from '../../../src/form/measuresLengths';

const now = new Date('2026-06-21T18:00:00Z');

async function calculatorOf(id: string): Promise<AnyCalculator> {
  return (await calculatorList.find((one) => one.id === id)?.load()) as AnyCalculator;
}

function asked(calculator: AnyCalculator, body: Body): Asked {
  const parsed = parseInput(calculator, body);
  if (!('input' in parsed)) throw new Error(JSON.stringify(parsed.faults));
  return { body, result: answerFor(calculator, parsed.input, { now }).result as Body };
}

async function carried(from: string, to: string, body: Body): Promise<Body | null> {
  const rule = CARRY_RULES[from]?.find((one) => one.to === to);
  if (!rule) throw new Error(`Nothing goes from ${from} to ${to}`);
  return carriedBody(await calculatorOf(to), rule, asked(await calculatorOf(from), body));
}

describe('values that go from one calculator to another', () => {
  it.each(Object.keys(CARRY_RULES))(
    'make a question that is taken, from the examples of %s',
    async (from) => {
      const source = await calculatorOf(from);
      for (const rule of CARRY_RULES[from] ?? []) {
        const target = await calculatorOf(rule.to);
        const bodies = source.examples.map(({ input }) =>
          carriedBody(target, rule, asked(source, input as Body)),
        );
        const found = bodies.filter((body) => body !== null);
        expect(found.length, `${from} to ${rule.to}`).toBeGreaterThan(0);
        for (const body of found) expect(parseInput(target, body)).toHaveProperty('input');
      }
    },
  );

  it('are the settings as given, and marks where they were solved', async () => {
    const body = { ev100: 13, aperture: 'f/8', iso: 100 };
    // EV 13 at f/8 (Av 6) asks for Tv 7, 1/125.
    expect(await carried('exposure/solve', 'exposure/equivalents', body)).toMatchObject({
      aperture: 'f/8',
      shutter: '1/125',
      iso: 100,
    });
  });

  it('take the place of what an example solves otherwise', async () => {
    const body = await carried('exposure/solve', 'flash/exposure', { ev100: 5, aperture: 'f/4', iso: 400 });
    expect(body).toMatchObject({ aperture: 'f/4', iso: 400 });
  });

  it('reach into groups on both sides', async () => {
    const motion = {
      subject: { speedMS: 1 },
      distanceM: 3,
      focalLengthMm: 50,
      pixelPitchUm: 6,
      ambient: { shutter: '1/4', subjectBrightnessStops: 0 },
    };
    expect(await carried('flash/motion', 'exposure/handheld', motion)).toMatchObject({
      focalLengthMm: 50,
      shutter: '1/4',
    });
    expect(await carried('flash/motion', 'flash/duration', motion)).toBeNull();
    expect(
      await carried('flash/duration', 'flash/motion', { t01S: 0.002, control: 'cutoff', power: '1/4' }),
    ).toMatchObject({
      flash: { t01S: 0.002, control: 'cutoff', power: '1/4' },
    });
  });

  it('are none where the answer has none', async () => {
    expect(await carried('light/add', 'exposure/solve', { parts: [{ stops: 1 }] })).toBeNull();
    expect(
      await carried('light/add', 'exposure/solve', { parts: [{ ev100: 1 }, { ev100: 1 }] }),
    ).toMatchObject({ ev100: 2 });
  });
});

it('lengths are found however deep they stand', async () => {
  expect(measuresLengths((await calculatorOf('flash/daylight')).fields)).toBe(true);
  expect(measuresLengths((await calculatorOf('exposure/value')).fields)).toBe(false);
});
