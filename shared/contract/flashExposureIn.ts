import { z } from 'zod';
import { UNMEASURED_EXTRA_STOPS } from '../math/flashDemand';
import { guideNumberOfEnergy } from '../math/flashEnergy';
import type { FlashSetup } from '../math/flashExposure';
import { highSpeedSyncLossStops, isFasterThanSync } from '../math/highSpeedSync';
import { note, type Remark } from './answer';
import { contradictionAt } from './contradictionAt';
import { atMostOne, exactly } from './exactlyOne';
import { flashEnergyFields, flashPowerIn, guideNumberIn, guideNumberOf } from './flashIn';
import { curtainFaults, exactHighSpeedSync, highSpeedSyncFields } from './highSpeedSyncIn';
import { distanceM, integer, lossStops, number, stops } from './quantities';
import { apertureIn, isoIn, shutterIn } from './settingIn';
import { exactOf, ndStopsIn, readingFields } from './settings';
import { together } from './together';

/** The quantities of a flash exposure, of which a request leaves one out. */
export const FLASH_UNKNOWNS = ['distanceM', 'aperture', 'iso', 'power', 'guideNumberM'] as const;

const fields = z.strictObject({
  guideNumberM: guideNumberIn().optional(),
  ...flashEnergyFields,
  distanceM: distanceM({ title: 'Flash to subject' }).optional(),
  aperture: apertureIn().optional(),
  iso: isoIn().optional(),
  power: flashPowerIn().optional(),
  lossStops: lossStops({ title: 'Loss', description: 'by modifier and gel' }).default(0),
  ndStops: ndStopsIn().default(0),
  magnification: number({
    title: 'Magnification',
    description: 'size on the sensor over size of the subject; counts in close-ups',
    min: 0,
    max: 100,
    advanced: true,
  }).default(0),
  brightnessStops: stops({
    title: 'Brightness wanted',
    description: 'how much brighter than a middle tone the subject is to come out',
  }).default(0),
  pops: integer({ title: 'Pops', description: 'fired one after the other', min: 1, max: 1000 }).default(1),
  heads: integer({ title: 'Heads', description: 'equal ones, aimed alike', min: 1, max: 1000 }).default(1),
  highSpeedSync: z
    .strictObject({
      shutter: shutterIn(),
      syncSpeed: shutterIn({ title: 'Sync speed' }).default('1/250'),
      ...highSpeedSyncFields,
    })
    .optional()
    .meta({ title: 'High-speed sync', description: 'for a shutter faster than the sync speed' }),
  ...readingFields,
});
export type FlashExposureIn = z.output<typeof fields>;

/** A flash exposure with one quantity left out. */
export const flashExposureIn = contradictionAt<typeof fields>((given) =>
  given.highSpeedSync === undefined
    ? []
    : curtainFaults(given.highSpeedSync, given.highSpeedSync.syncSpeed, given, ['highSpeedSync', 'curtainS']),
)(
  together<typeof fields>(
    'energyWs',
    'efficacyLmSPerWs',
  )(atMostOne('guideNumberM', 'energyWs')(exactly(4, [...FLASH_UNKNOWNS, 'energyWs'])(fields))),
);

/** What high-speed sync takes, and what is to be said about it. */
export function highSpeedLoss(given: FlashExposureIn): { stops: number; notes: Remark[] } {
  const sync = given.highSpeedSync;
  if (!sync) return { stops: 0, notes: [] };
  const shutterS = exactOf('shutter', sync.shutter, given);
  const syncSpeedS = exactOf('shutter', sync.syncSpeed, given);
  if (!isFasterThanSync(shutterS, syncSpeedS)) return { stops: 0, notes: [note('hss_not_needed')] };
  const { curtainS, extraLossStops, isMeasured } = exactHighSpeedSync(sync, syncSpeedS);
  const notes = [note('hss_as_continuous')];
  if (!isMeasured) notes.push(note('hss_loss_unmeasured', { extraStops: UNMEASURED_EXTRA_STOPS }));
  return { stops: highSpeedSyncLossStops(shutterS, curtainS, extraLossStops), notes };
}

/** The five quantities as exact numbers; 1 stands in for the one that was left out. */
export function setupOf(given: FlashExposureIn): FlashSetup {
  const { energyWs, efficacyLmSPerWs, reflectorFactor, incidentC } = given;
  const fromEnergy =
    energyWs !== undefined && efficacyLmSPerWs !== undefined
      ? guideNumberOfEnergy({ energyWs, efficacyLmSPerWs, reflectorFactor, incidentC })
      : 1;
  return {
    guideNumberM: given.guideNumberM === undefined ? fromEnergy : guideNumberOf(given.guideNumberM),
    distanceM: given.distanceM ?? 1,
    aperture: exactOf('aperture', given.aperture ?? 1, given),
    iso: exactOf('iso', given.iso ?? 100, given),
    power: exactOf('power', given.power ?? 1, given),
  };
}

/** Which quantity a request leaves out; energy counts as a guide number. */
export function unknownOf(given: FlashExposureIn): (typeof FLASH_UNKNOWNS)[number] {
  const known = { ...given, guideNumberM: given.guideNumberM ?? given.energyWs };
  return FLASH_UNKNOWNS.find((name) => known[name] === undefined) ?? 'aperture';
}
