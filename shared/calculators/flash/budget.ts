import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import { flashPowerIn } from '../../contract/flashIn';
import { contradiction } from '../../contract/contradiction';
import { integer, number } from '../../contract/quantities';
import { exactOf, readingFields } from '../../contract/settings';
import {
  chargesNeeded,
  framesLeft,
  framesPerCharge,
  paceOf,
  recycleAtS,
  type Pace,
} from '../../math/flashBudget';
import type { CautionCode } from '../../text';

/** Flashes a second from which photosensitive people are at risk: 3 to 30, as an epilepsy society says. */
const FLICKER_FPS = 3;
/** Frames from which heat is worth a word. Common practice, no source. */
const MANY_FRAMES = 50;

const fields = z.strictObject({
  fullPowerPops: number({
    title: 'Pops at full power',
    description: 'from one charge of the battery',
    min: 0.1,
    max: 1_000_000,
  }),
  power: flashPowerIn(),
  frames: integer({ title: 'Frames planned', min: 0, max: 10_000_000 }),
  recycleFullS: number({
    title: 'Recycle time',
    description: 'after a pop at full power',
    unit: 's',
    min: 0.001,
    max: 3600,
  }).optional(),
  fps: number({ title: 'Frames a second', unit: 'frames/s', min: 0.001, max: 1000 }).optional(),
  ...readingFields,
});

const input = contradiction<typeof fields, 'needed_together'>(
  'needed_together',
  ['recycleFullS'],
  (given) => given.fps !== undefined && given.recycleFullS === undefined,
  () => ({ missing: 'recycleFullS', given: 'fps' }),
)(fields);

type Given = z.output<typeof fields>;

interface Recycling extends Partial<Pace> {
  readonly recycleS?: number;
  readonly fastestFps?: number;
}

/** Recycle time and pace, as far as the request allows. */
function recycling(given: Given, power: number): Recycling {
  if (given.recycleFullS === undefined) return {};
  const recycleS = recycleAtS(given.recycleFullS, power);
  const ready = { recycleS, fastestFps: 1 / recycleS };
  return given.fps === undefined ? ready : { ...ready, ...paceOf(given.recycleFullS, power, given.fps) };
}

export const flashBudget = defineCalculator({
  id: 'flash/budget',
  title: 'Battery and recycling',
  summary: 'How many frames a flash has, how many batteries a shoot needs, and whether it keeps up.',
  units: 1,
  input,
  output: z.strictObject({
    framesPerBattery: z.number().meta({ title: 'Frames from a battery', description: 'at this power' }),
    batteriesNeeded: z.number().nullable().meta({
      title: 'Batteries needed',
      description: 'for the frames planned; null where one is not enough for a single frame',
    }),
    framesLeft: z.number().meta({
      title: 'Frames left',
      description: 'in the last battery, when the frames planned are done',
    }),
    recycleS: z.number().optional().meta({ title: 'Recycle time at this power', unit: 's' }),
    fastestFps: z.number().optional().meta({
      title: 'Fastest rate',
      unit: 'frames/s',
      description: 'at which the flash is ready for every frame, without end',
    }),
    keepsUp: z.boolean().optional().meta({ title: 'Keeps up' }),
    burstFrames: z.number().nullable().optional().meta({
      title: 'Frames of a burst',
      description: 'from full, before one comes too early; null where the flash keeps up',
    }),
  }),
  sources: [
    'Model: energy goes with power and flows in evenly; makers’ tables know better',
    'Epilepsy Society (UK): 3 to 30 flashes a second are the common trigger',
  ],
  examples: [
    {
      title:
        '200 pops at full power are 800 at a quarter; at 3 frames a second the flash falls behind after ten',
      input: { fullPowerPops: 200, power: '1/4', frames: 500, recycleFullS: 2, fps: 3 },
      output: {
        framesPerBattery: 800,
        batteriesNeeded: 1,
        framesLeft: 300,
        recycleS: 0.5,
        fastestFps: 2,
        keepsUp: false,
        burstFrames: 10,
      },
    },
    {
      title: 'An evening of 300 frames at full power takes two batteries',
      input: { fullPowerPops: 180, power: 1, frames: 300, recycleFullS: 1.5 },
      output: {
        framesPerBattery: 180,
        batteriesNeeded: 2,
        framesLeft: 60,
        recycleS: 1.5,
        fastestFps: 0.6666666666666666,
      },
    },
    {
      title: 'At a sixteenth, 4 frames a second go on without end',
      input: { fullPowerPops: 180, power: '1/16', frames: 40, recycleFullS: 1.5, fps: 4 },
      output: {
        framesPerBattery: 2880,
        batteriesNeeded: 1,
        framesLeft: 2840,
        recycleS: 0.09375,
        fastestFps: 10.666666666666666,
        keepsUp: true,
        burstFrames: null,
      },
    },
  ],
  compute(given) {
    const power = exactOf('power', given.power, given);
    const framesPerBattery = framesPerCharge(given.fullPowerPops, power);
    const batteriesNeeded = chargesNeeded(given.frames, framesPerBattery);
    const pace = recycling(given, power);
    const notes: Remark[] = [note('energy_goes_with_power')];
    if (framesPerBattery === 0) notes.push(note('charge_too_small'));
    if (typeof pace.burstFrames === 'number')
      notes.push(note('flash_too_slow', { burstFrames: pace.burstFrames }));
    if (given.frames >= MANY_FRAMES) notes.push(note('heat_of_many_pops'));
    const cautions: CautionCode[] = ['electricity_and_water'];
    if ((given.fps ?? 0) >= FLICKER_FPS) cautions.push('flash_and_eyes');
    return {
      result: {
        framesPerBattery,
        batteriesNeeded,
        framesLeft: framesLeft(given.frames, framesPerBattery, batteriesNeeded),
        ...pace,
      },
      notes,
      cautions,
    };
  },
});
