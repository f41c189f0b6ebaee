import { z } from 'zod';
import type { Giving } from '../math/ladder/staircase';
import { contradictionAt, type FoundContradiction } from './contradictionAt';
import { powerRangeFields } from './fillFields';
import { guideNumberIn } from './flashIn';
import { geographicFields, instantIn, msOf, yearFaults, zoneFaults } from './geographicIn';
import { distanceM, ev100In, lossStops, stops } from './quantities';
import { apertureIn, isoIn, shutterIn } from './settingIn';
import { exactOf, ndStopsIn, readingFields, settingsIn } from './settings';

/** Frames and ladder belong to one evening or one dawn. */
const MOST_HOURS = 16;
const MOST_FRAMES = 20;
const HOUR_MS = 3_600_000;
const GIVING: [Giving, ...Giving[]] = ['shutter', 'aperture', 'iso'];

const frame = () =>
  z.strictObject({
    at: instantIn('Taken at'),
    ...settingsIn().shape,
    offsetStops: stops({
      title: 'Came out',
      description: 'how much brighter than a middle tone the metered part came out',
    }).default(0),
  });

const holdIn = z
  .strictObject({ aperture: apertureIn(), iso: isoIn(), ndStops: ndStopsIn().default(0) })
  .meta({ title: 'Hold', description: 'for as long as the light allows' });

const limitsIn = z
  .strictObject({
    shutterSlowest: shutterIn({ title: 'Slowest shutter' }),
    isoMax: isoIn({ title: 'Highest ISO' }),
    apertureMin: apertureIn({ title: 'Widest aperture' }),
  })
  .meta({ title: 'Limits' });

const flashIn = z
  .strictObject({
    guideNumberM: guideNumberIn(),
    distanceM: distanceM({ title: 'Flash to subject' }),
    lossStops: lossStops({ title: 'Loss', description: 'by gel and modifier' }).default(0),
    ...powerRangeFields,
    syncSpeed: shutterIn({
      title: 'Sync speed',
      description: 'the fastest shutter for an ordinary flash',
    }).optional(),
  })
  .meta({ title: 'Flash', description: 'the key; others keep their ratio to it' });

export const ladderFields = z.strictObject({
  ...geographicFields,
  testFrame: frame().meta({ title: 'Test frame' }),
  secondFrame: frame().optional().meta({ title: 'Second frame', description: 'later, so that lamps show' }),
  moreFrames: z.array(frame()).max(MOST_FRAMES).optional().meta({ title: 'More frames', advanced: true }),
  lampFloorEv100: ev100In({
    title: 'Light of lamps',
    description: 'what lamps and windows give and keep giving; worked out where the frames tell it',
    advanced: true,
  }).optional(),
  lamps: z
    .strictObject({ onAt: instantIn('On at'), offAt: instantIn('Off at').optional() })
    .optional()
    .meta({ title: 'Lamps', description: 'when they are lit; all the time where left out', advanced: true }),
  aim: z
    .strictObject({
      backgroundStops: stops({ title: 'Background', description: 'against a middle tone' }).default(0),
      subjectStops: stops({ title: 'Subject', description: 'against a middle tone' }).default(0),
    })
    .prefault({})
    .meta({ title: 'Aim', description: 'how bright each is to come out' }),
  hold: holdIn,
  limits: limitsIn,
  order: z
    .array(z.enum(GIVING).meta({ title: 'Setting' }))
    .min(1)
    .max(GIVING.length)
    .default(['shutter', 'aperture', 'iso'])
    .meta({
      title: 'What gives way',
      description: 'in this order; what is left out never does',
      advanced: true,
    }),
  flash: flashIn.optional(),
  subjectBelowBackgroundStops: stops({
    title: 'Subject under background',
    description: 'its own ambient light; with it each rung carries the flash’s power',
  }).optional(),
  from: instantIn('From', 'the first test frame where left out').optional(),
  to: instantIn('To', 'where the sky is dark, or the golden hour over, where left out').optional(),
  ...readingFields,
});

export type LadderIn = z.output<typeof ladderFields>;
type FrameIn = LadderIn['testFrame'];

/** Every frame of a request with the place where it stands. */
export function framesOf({
  testFrame,
  secondFrame,
  moreFrames = [],
}: Pick<LadderIn, 'testFrame' | 'secondFrame' | 'moreFrames'>): {
  frame: FrameIn;
  path: (string | number)[];
}[] {
  return [
    { frame: testFrame, path: ['testFrame'] },
    ...(secondFrame ? [{ frame: secondFrame, path: ['secondFrame'] }] : []),
    ...moreFrames.map((frameIn, i) => ({ frame: frameIn, path: ['moreFrames', i] })),
  ];
}

const hoursFrom = (ms: number, otherMs: number) => Math.abs(ms - otherMs) / HOUR_MS;

function timeFaults(given: LadderIn): FoundContradiction[] {
  const frames = framesOf(given);
  const wrongYears = frames.flatMap(({ frame: { at }, path }) => yearFaults(at, [...path, 'at']));
  if (wrongYears.length > 0) return wrongYears;
  const firstMs = msOf(given.testFrame.at);
  const apart = frames.slice(1).flatMap(({ frame: { at }, path }): FoundContradiction[] => {
    const hours = hoursFrom(msOf(at), firstMs);
    const params = { hours: MOST_HOURS, given: hours };
    return hours > MOST_HOURS ? [{ code: 'frames_too_far_apart', path: [...path, 'at'], params }] : [];
  });
  const ends = (['from', 'to'] as const).flatMap((name): FoundContradiction[] => {
    const at = given[name];
    const hours = at === undefined ? 0 : hoursFrom(msOf(at), firstMs);
    const params = { hours: MOST_HOURS, given: hours };
    return hours > MOST_HOURS ? [{ code: 'ladder_far_from_frames', path: [name], params }] : [];
  });
  const startMs = given.from === undefined ? firstMs : msOf(given.from);
  if (given.to !== undefined && msOf(given.to) <= startMs)
    ends.push({ code: 'ladder_ends_before_start', path: ['to'] });
  const { lamps } = given;
  const isUpsideDown = lamps?.offAt !== undefined && msOf(lamps.offAt) <= msOf(lamps.onAt);
  return [
    ...apart,
    ...ends,
    ...yearFaults(lamps?.onAt, ['lamps', 'onAt']),
    ...(isUpsideDown ? [{ code: 'lamps_off_before_on' as const, path: ['lamps', 'offAt'] }] : []),
  ];
}

function limitFaults(given: LadderIn): FoundContradiction[] {
  const { hold, limits, flash } = given;
  const faults: FoundContradiction[] = [];
  const beyond = (what: string, name: 'aperture' | 'iso', limit: unknown) =>
    faults.push({
      code: 'hold_beyond_limit',
      path: ['hold', name],
      params: { what, held: hold[name], limit },
    });
  const isWider =
    exactOf('aperture', hold.aperture, given) < exactOf('aperture', limits.apertureMin, given) * (1 - 1e-9);
  if (isWider) beyond('the aperture', 'aperture', limits.apertureMin);
  const isHigher = exactOf('iso', hold.iso, given) > exactOf('iso', limits.isoMax, given) * (1 + 1e-9);
  if (isHigher) beyond('the ISO', 'iso', limits.isoMax);
  if (flash?.syncSpeed === undefined) return faults;
  const syncSpeedS = exactOf('shutter', flash.syncSpeed, given);
  const slowestS = exactOf('shutter', limits.shutterSlowest, given);
  if (syncSpeedS > slowestS * (1 + 1e-9))
    faults.push({
      code: 'sync_leaves_no_shutter',
      path: ['limits', 'shutterSlowest'],
      params: { syncSpeedS, slowestS },
    });
  return faults;
}

function orderFaults({ order, flash, subjectBelowBackgroundStops }: LadderIn): FoundContradiction[] {
  const twice = order.flatMap((name, i): FoundContradiction[] =>
    order.indexOf(name) < i ? [{ code: 'gives_way_twice', path: ['order', i], params: { given: name } }] : [],
  );
  if (subjectBelowBackgroundStops !== undefined && !flash)
    twice.push({ code: 'subject_without_flash', path: ['flash'] });
  return twice;
}

/** What a dusk ladder is asked from. */
export const ladderIn = contradictionAt<typeof ladderFields>((given) => [
  ...zoneFaults(given),
  ...timeFaults(given),
  ...limitFaults(given),
  ...orderFaults(given),
])(ladderFields);
