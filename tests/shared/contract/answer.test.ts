import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { answerSchema, caution, note } from '../../../shared/contract/answer';
import { answerFor, defineCalculator, parseInput } from '../../../shared/contract/defineCalculator';
import { PROBLEM_CODES, problemOf, statusOf } from '../../../shared/contract/problems';
import { number } from '../../../shared/contract/quantities';
import { usualGearNotes } from '../../../shared/contract/usualGear';
import { exactWithMark } from '../../../shared/contract/settingOut';

const doubling = defineCalculator({
  id: 'trial/doubling',
  title: 'Doubling',
  summary: 'Twice a number, and the hour it was asked in.',
  units: 1,
  input: z.strictObject({ n: number({ title: 'N', min: 0, max: 10 }).default(1) }),
  output: z.strictObject({
    twice: z.number().meta({ title: 'Twice' }),
    hour: z.number().meta({ title: 'Hour' }),
  }),
  sources: ['derivation'],
  examples: [],
  compute: ({ n }, { now }) => ({
    result: { twice: 2 * n, hour: now.getUTCHours() },
    ...(n > 5 && { notes: [note('no_equivalents')], cautions: ['permits'] as const }),
  }),
});

describe('a calculator', () => {
  const now = new Date('2026-06-21T18:00:00Z');

  it('is known by group and name, and by whether GET answers', () => {
    expect(doubling).toMatchObject({ group: 'trial', name: 'doubling', answersGet: true });
    expect(doubling.fields.map(({ name }) => name)).toEqual(['n']);
  });

  it('parses with its defaults, and computes by the clock that it is handed', () => {
    const parsed = parseInput(doubling, {});
    expect(parsed).toEqual({ input: { n: 1 } });
    expect(answerFor(doubling, { n: 1 }, { now })).toEqual({
      result: { twice: 2, hour: 18 },
      notes: [],
      cautions: [],
    });
    expect(parseInput(doubling, { n: 11 })).toMatchObject({
      faults: [{ pointer: '/n', code: 'out_of_range' }],
    });
  });

  it('answers in one envelope, with notes and cautions as code and sentence', () => {
    const answer = answerFor(doubling, { n: 6 }, { now });
    expect(answer.notes).toEqual([note('no_equivalents')]);
    expect(answer.cautions).toEqual([caution('permits')]);
    const schema = answerSchema(doubling.output);
    expect(schema.safeParse(answer).success).toBe(true);
    expect(schema.safeParse({ ...answer, more: 1 }).success).toBe(false);
    expect(schema.safeParse({ ...answer, notes: [{ code: 'x' }] }).success).toBe(false);
  });
});

describe('a problem', () => {
  const where = { publicUrl: 'https://evenfall.example', requestId: 'abc' };

  it('has a page, a status, and says what to do where nothing more is known', () => {
    // RFC 9457, section 3.1: type, title, status, detail, instance.
    expect(problemOf('rate_limited', where)).toMatchObject({
      type: 'https://evenfall.example/problems/rate_limited',
      status: 429,
      code: 'rate_limited',
      instance: 'urn:evenfall:request:abc',
      detail: expect.stringMatching(/Retry-After/) as string,
    });
  });

  it('has its detail and its errors where they are given, and no errors otherwise', () => {
    const errors = [{ pointer: '/n', code: 'missing', detail: 'N is missing.' }];
    expect(problemOf('invalid_input', { ...where, detail: 'One fault.', errors })).toMatchObject({
      detail: 'One fault.',
      errors,
    });
    expect(problemOf('not_found', where)).not.toHaveProperty('errors');
  });

  it('is one of a catalogue whose every entry says what happened and what to do', () => {
    expect(PROBLEM_CODES.length).toBeGreaterThanOrEqual(20);
    for (const code of PROBLEM_CODES) {
      expect(statusOf(code)).toBeGreaterThanOrEqual(400);
      const { title, detail } = problemOf(code, where);
      expect(title).toMatch(/^[A-Z].*[^.]$/);
      expect(detail).toMatch(/^[A-Z].*\. [A-Z].*\.$/);
    }
  });
});

describe('notes on usual gear', () => {
  const codes = (settings: Parameters<typeof usualGearNotes>[0]) =>
    usualGearNotes(settings).map(({ code }) => code);
  const aperture = (exact: number) => ({ aperture: exactWithMark('aperture', 'third', exact) });
  const shutter = (exact: number) => ({ shutter: exactWithMark('shutter', 'third', exact) });
  const iso = (exact: number) => ({ iso: exactWithMark('iso', 'third', exact) });

  it('begin with the first mark beyond its ends, not with a remainder that the mark takes away', () => {
    expect(codes(aperture(1))).toEqual([]);
    expect(codes(aperture(32 * 2 ** (1 / 13)))).toEqual([]);
    expect(codes(aperture(32 * 2 ** (1 / 6)))).toEqual(['aperture_outside_usual_gear']);
    expect(codes(aperture(0.9))).toEqual(['aperture_outside_usual_gear']);
    expect(codes(shutter(1 / 8192))).toEqual([]);
    expect(codes(shutter(32.4))).toEqual([]);
    expect(codes(shutter(33))).toEqual(['shutter_outside_usual_gear']);
    expect(codes(shutter(1 / 10_000))).toEqual(['shutter_outside_usual_gear']);
    expect(codes(iso(50))).toEqual([]);
    expect(codes(iso(102_400))).toEqual([]);
    expect(codes(iso(110_000))).toEqual([]);
    expect(codes(iso(129_000))).toEqual(['iso_outside_usual_gear']);
    expect(codes(iso(40))).toEqual(['iso_outside_usual_gear']);
  });

  it('say which way a time is out', () => {
    expect(usualGearNotes(shutter(90))[0]?.message).toMatch(/^90s is longer than /);
    expect(usualGearNotes(shutter(1e-5))[0]?.message).toMatch(/^1\/102400 is shorter than /);
  });

  it('are none for settings that are not named, and several where several are out', () => {
    expect(codes({})).toEqual([]);
    expect(codes({ ...aperture(90), ...shutter(90), ...iso(9) }).length).toBe(3);
  });
});
