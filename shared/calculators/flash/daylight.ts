import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { circleOfView, daylightIn, daylightScene, type DaylightIn } from '../../contract/daylightIn';
import { cost, costOut, costsOfWay } from '../../contract/daylightCosts';
import { defineCalculator } from '../../contract/defineCalculator';
import { outshoneHelp, outshoneHelpOut } from '../../contract/flashHelp';
import { guideNumberOf } from '../../contract/flashIn';
import { exactHighSpeedSync } from '../../contract/highSpeedSyncIn';
import { exactWithMark, settingOut } from '../../contract/settingOut';
import { settingsOut } from '../../contract/settings';
import { settingsWithMarks } from '../../contract/settingsWithMarks';
import { usualGearNotes } from '../../contract/usualGear';
import {
  settingsAsWanted,
  settingsOfWay,
  syncConflictStops,
  type DaylightScene,
  type DaylightWay,
} from '../../math/daylightWays';
import { depthLimits } from '../../math/depthOfField';
import type { ExactSettings } from '../../math/exposure';
import {
  betterForFlash,
  flashDemand,
  UNMEASURED_EXTRA_STOPS,
  type FlashDemand,
} from '../../math/flashDemand';
import { highSpeedSyncLossStops } from '../../math/highSpeedSync';
import type { CautionCode } from '../../text';
import { daylightExamples } from './examples/daylightExamples';

const WAYS: [DaylightWay, ...DaylightWay[]] = ['smallerAperture', 'neutralDensity', 'highSpeedSync'];

/** A conflict that is only rounding is none. */
const SMALLEST_CONFLICT_STOPS = 1e-9;
/** Depth of field is told for f-numbers that a lens can have. */
const LENS_APERTURES = { min: 0.1, max: 1000 };
/** Scenes as bright as this are lit by the sun. Common practice: sunny weather is EV 15. */
const SUNLIT_EV100 = 14;
/** Reserves that differ by less are the same. */
const SAME_RESERVE_STOPS = 1e-9;

const flashPart = {
  settings: settingsOut().meta({ title: 'Settings' }),
  power: settingOut('Flash power')
    .nullable()
    .meta({ description: 'more than 1 is more than the flash has; null where ambient light leaves no room' }),
  withinPower: z.boolean().meta({ title: 'The flash reaches' }),
  reserveStops: z.number().nullable().meta({
    title: 'In reserve',
    unit: 'stops',
    description: 'from the power needed up to full; negative where the flash does not reach',
  }),
  whatHelps: outshoneHelpOut(),
  depth: z
    .strictObject({
      nearM: z.number().meta({ title: 'Sharp from', unit: 'm' }),
      farM: z.number().nullable().meta({ title: 'Sharp to', unit: 'm', description: 'null is infinity' }),
      totalM: z.number().nullable().meta({ title: 'Depth', unit: 'm', description: 'null is without end' }),
    })
    .optional()
    .meta({ title: 'Depth of field' }),
};

const wayOut = z.strictObject({
  way: z.enum(WAYS).meta({ title: 'Way' }),
  ...flashPart,
  reserveRange: z
    .strictObject({
      lowStops: z.number().meta({ title: 'At the most loss', unit: 'stops' }),
      highStops: z.number().meta({ title: 'At the least loss', unit: 'stops' }),
    })
    .optional()
    .meta({
      title: 'In reserve, between',
      description:
        'where the loss by high-speed sync beyond the model is not measured: at 1.5 and at 0 stops',
    }),
  costs: z.array(costOut()).meta({ title: 'Costs', description: 'against the aperture as wanted' }),
});

export const flashDaylightOut = z.strictObject({
  conflictStops: z.number().meta({
    title: 'Too wide by',
    unit: 'stops',
    description: 'what the wanted aperture lets in too much at the sync speed; 0 or less needs no way out',
  }),
  asWanted: z
    .strictObject(flashPart)
    .nullable()
    .meta({ title: 'As wanted', description: 'where no way out is needed; else null' }),
  ways: z.array(wayOut).meta({ title: 'Ways', description: 'empty where none is needed' }),
  better: z.enum(['neutralDensity', 'highSpeedSync']).nullable().meta({
    title: 'Better for the flash',
    description: 'of the two that keep the aperture; null while that is not known',
  }),
});

/** The flash as it stands: one head, with the loss that could be taken away. */
const flashUsed = ({ flash }: DaylightIn) => ({ ...flash, heads: 1 });

type Part = z.output<typeof flashDaylightOut>['asWanted'];

function partOf(given: DaylightIn, exact: ExactSettings, demand: FlashDemand): NonNullable<Part> {
  const { view, aim, scale } = given;
  const { aperture } = exact;
  const withDepth = view && aperture >= LENS_APERTURES.min && aperture <= LENS_APERTURES.max;
  const withinPower =
    demand.reserveStops === null
      ? demand.ambientStops <= aim.subjectStops + SAME_RESERVE_STOPS
      : demand.reserveStops >= -SAME_RESERVE_STOPS;
  return {
    settings: settingsWithMarks(exact, scale),
    power: demand.power === null ? null : exactWithMark('power', scale, demand.power),
    withinPower,
    reserveStops: demand.reserveStops,
    whatHelps:
      demand.reserveStops !== null && !withinPower
        ? outshoneHelp(-demand.reserveStops, flashUsed(given))
        : null,
    ...(withDepth
      ? { depth: depthLimits({ ...view, aperture, circleOfConfusionUm: circleOfView(view) }) }
      : {}),
  };
}

/** One way, and what remains to be said of its reserve where the loss is not measured. */
function wayOf(way: DaylightWay, given: DaylightIn, scene: DaylightScene): z.output<typeof wayOut> {
  const exact = settingsOfWay(way, scene, given.ndStops);
  const sync = exactHighSpeedSync(given.highSpeedSync, scene.syncSpeedS);
  const loss =
    way === 'highSpeedSync' ? highSpeedSyncLossStops(exact.shutterS, sync.curtainS, sync.extraLossStops) : 0;
  const flash = { ...given.flash, guideNumberM: guideNumberOf(given.flash.guideNumberM) };
  const part = partOf(given, exact, flashDemand(exact, scene, flash, loss));
  const highStops = part.reserveStops;
  const isOpen = way === 'highSpeedSync' && !sync.isMeasured && highStops !== null;
  const range = isOpen ? { lowStops: highStops - UNMEASURED_EXTRA_STOPS, highStops } : null;
  return {
    way,
    ...part,
    ...(range ? { reserveRange: range } : {}),
    costs: [
      ...costsOfWay(way, scene, exact, loss),
      ...(range && range.lowStops < 0 && part.withinPower ? [cost('reach_not_known', -range.lowStops)] : []),
      ...usualGearNotes(part.settings).map((remark) => ({ ...remark, stops: null })),
    ],
  };
}

type WayOut = z.output<typeof wayOut>;

const closesAperture = (way: WayOut | undefined) =>
  way?.costs.some(({ code }) => code === 'filter_too_weak') ?? false;

/** The better of the two ways that keep the aperture, as far as their reserves are known. */
function betterOf(ways: readonly WayOut[]) {
  const [, filter, highSpeed] = ways;
  const known = highSpeed?.reserveStops ?? null;
  if (!filter || filter.reserveStops === null || !highSpeed || known === null) return null;
  if (closesAperture(filter)) return null;
  return betterForFlash(filter.reserveStops, highSpeed.reserveRange ?? { lowStops: known, highStops: known });
}

function notesOn(
  result: z.output<typeof flashDaylightOut>,
  demand: FlashDemand,
  scene: DaylightScene,
): Remark[] {
  const notes: Remark[] = [];
  const over = demand.ambientStops - scene.subjectStops;
  if (demand.flashStops === null)
    notes.push(
      over > SAME_RESERVE_STOPS ? note('ambient_too_bright', { stops: over }) : note('no_flash_needed'),
    );
  const all = result.asWanted ? [result.asWanted] : result.ways;
  const [best] = [...all].sort((a, b) => (b.reserveStops ?? 0) - (a.reserveStops ?? 0));
  const room = { roomStops: Math.max(0, -result.conflictStops) };
  if (best?.whatHelps)
    notes.push(note('flash_outshone', { stops: -(best.reserveStops ?? 0), ...room, ...best.whatHelps }));
  if (result.asWanted) notes.push(note('aperture_needs_no_way_out'));
  const range = result.ways[2]?.reserveRange;
  if (range) notes.push(note('hss_loss_unmeasured', { extraStops: UNMEASURED_EXTRA_STOPS, ...range }));
  if (range && result.better === null && !closesAperture(result.ways[1]))
    notes.push(note('hss_and_filter_overlap'));
  return notes;
}

export const flashDaylight = defineCalculator({
  id: 'flash/daylight',
  title: 'Wide aperture in daylight',
  summary: 'Filter, high-speed sync or a smaller aperture: what each sets, what each costs the flash.',
  units: 1,
  input: daylightIn,
  output: flashDaylightOut,
  sources: [
    'Derivation from EV100 = log2(N²/t) − log2(S/100) + nd, the additivity of light and guide number = f-number times distance',
    'High-speed sync: light spread evenly over curtain travel and exposure, a model; up to 1.5 stops more are common practice, no source',
  ],
  examples: daylightExamples,
  compute(given) {
    const scene = daylightScene(given);
    const conflictStops = syncConflictStops(scene);
    const flash = { ...given.flash, guideNumberM: guideNumberOf(given.flash.guideNumberM) };
    const isFree = conflictStops <= SMALLEST_CONFLICT_STOPS;
    const plain = settingsAsWanted(scene);
    const demand = flashDemand(plain, scene, flash, 0);
    const ways = isFree ? [] : WAYS.map((way) => wayOf(way, given, scene));
    const result = {
      conflictStops,
      asWanted: isFree ? partOf(given, plain, demand) : null,
      ways,
      better: betterOf(ways),
    };
    const cautions: CautionCode[] = ['flash_and_eyes', 'stands_and_wind'];
    if (given.background.ev100 >= SUNLIT_EV100) cautions.push('sun_and_optics');
    return { result, notes: notesOn(result, demand, scene), cautions };
  },
});
