import { z } from 'zod';
import type { FillOutcome } from '../math/fill/fillTypes';
import { onAimStops } from '../math/fill/fillScore';
import { ratioOfStops } from '../math/mixing';
import type { Scale } from '../math/marks';
import { exactWithMark, settingOut } from './settingOut';

const stops = (title: string, description?: string) =>
  z.number().meta({ title, unit: 'stops', ...(description === undefined ? {} : { description }) });

const ghostOut = z.strictObject({
  stopsBelowFlash: stops('Ambient under flash', 'on the subject: flash minus ambient'),
  trailPx: z.number().meta({ title: 'Trail', unit: 'px' }),
  visibility: z.enum(['none', 'faint', 'clear', 'dominant']).meta({ title: 'Visibility' }),
  throughStops: stops('Background through the edge', 'against a middle tone').optional(),
});

const blurOut = z.strictObject({
  by: z.enum(['flash', 'shutter']).meta({ title: 'Judged by', description: 'what freezes the subject' }),
  lightS: z
    .number()
    .meta({ title: 'Light lasts', unit: 's', description: 't0.1 of the flash, or the shutter' }),
  blurPx: z.number().meta({ title: 'Blur', unit: 'px' }),
  blurUm: z.number().meta({ title: 'Blur on the sensor', unit: 'µm' }),
  blurMmAtSubject: z.number().meta({ title: 'Travel at the subject', unit: 'mm' }),
  frozen: z.boolean().meta({ title: 'Frozen', description: 'within a pixel' }),
});

const handheldOut = z.strictObject({
  withinLimit: z.boolean().meta({ title: 'Within the hand-held limit' }),
  overStops: stops('Slower than the limit'),
  slowestShutter: settingOut('Hand-held limit').meta({ description: 'the mark is on the safe side' }),
});

const missesOut = z.strictObject({
  backgroundStops: stops('Background'),
  subjectStops: stops('Subject'),
  ratioStops: stops(
    'Ratio',
    'how much farther the lit side stands above the shadow than wished; null without both',
  )
    .nullable()
    .optional(),
  rimStops: stops('Rim', 'null where there is none').nullable().optional(),
});

/** How a frame comes out. */
export const fillOutcomeOut = z.strictObject({
  backgroundStops: stops('Background', 'against a middle tone'),
  subjectAmbientStops: stops('Subject by ambient light'),
  subjectFlashStops: stops('Subject by flash', 'key and fill; null without').nullable(),
  subjectStops: stops('Subject', 'ambient light, key and fill together'),
  keyStops: stops('Key').optional(),
  fillStops: stops('Fill').optional(),
  shadowSideStops: stops('Shadow side', 'ambient light and fill, where the key does not reach').optional(),
  ratio: z.number().optional().meta({ title: 'Lighting ratio', description: '(key + fill):fill' }),
  litOverShadowRatio: z
    .number()
    .optional()
    .meta({ title: 'Lit side to shadow side', description: 'with the ambient light, which fills as well' }),
  rimStops: stops('Rim by flash', 'the rim flash alone').optional(),
  rimAmbientStops: stops('Rim by ambient light').optional(),
  flashToAmbientStops: stops('Flash over ambient', 'on the subject; null without flash').nullable(),
  clippedStops: stops('Clipped', 'what the shutter takes from the pulses; 0 or less').optional(),
  highSpeedLossStops: stops('Lost in high-speed sync').optional(),
  reserveStops: stops('In reserve', 'of the flash that works hardest, up to full power').optional(),
  recycleS: z
    .number()
    .optional()
    .meta({ title: 'Recycling', unit: 's', description: 'of the slowest flash' }),
  ghost: ghostOut.optional().meta({ title: 'Ghost' }),
  blur: blurOut.optional().meta({ title: 'Blur of the subject' }),
  handheld: handheldOut.optional().meta({ title: 'Hand-held limit' }),
  misses: missesOut.meta({ title: 'Off the aim', description: 'what came out minus what was wished' }),
  missStops: stops('Largest miss', 'without its sign; a ratio or rim that is not there counts as 10'),
  onAim: z.boolean().meta({ title: 'On the aim', description: 'every part within half a step' }),
});

/** Takes out what is null, for fields that are there only where they mean something. */
function known<T extends object>(fields: T): { [K in keyof T]?: NonNullable<T[K]> } {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== null)) as {
    [K in keyof T]?: NonNullable<T[K]>;
  };
}

/** An outcome in the answer's shape. */
export function shapeOutcome(outcome: FillOutcome, scale: Scale): z.output<typeof fillOutcomeOut> {
  const { ghost, handheld, shadowSideStops, subjectStops, keyStops } = outcome;
  return {
    backgroundStops: outcome.backgroundStops,
    subjectAmbientStops: outcome.subjectAmbientStops,
    subjectFlashStops: outcome.subjectFlashStops,
    subjectStops,
    ...known({
      keyStops,
      fillStops: outcome.fillStops,
      shadowSideStops,
      ratio: outcome.ratio,
      litOverShadowRatio: litOverShadow(keyStops, shadowSideStops),
      rimStops: outcome.rimStops,
      rimAmbientStops: outcome.rimAmbientStops,
    }),
    flashToAmbientStops: outcome.flashToAmbientStops,
    ...known({
      clippedStops: outcome.clippedStops,
      highSpeedLossStops: outcome.highSpeedLossStops,
      reserveStops: outcome.reserveStops,
      recycleS: outcome.recycleS,
      blur: outcome.blur,
    }),
    ...(ghost ? { ghost: shapeGhost(ghost) } : {}),
    ...(handheld ? { handheld: shapeHandheld(handheld, scale) } : {}),
    misses: outcome.misses,
    missStops: outcome.missStops,
    onAim: outcome.missStops <= onAimStops(scale),
  };
}

/** Beyond this many stops a ratio is no finite number. */
const WIDEST_STOPS = 1000;

function litOverShadow(keyStops: number | null, shadowSideStops: number | null): number | null {
  if (keyStops === null || shadowSideStops === null) return null;
  return Math.abs(keyStops - shadowSideStops) > WIDEST_STOPS ? null : ratioOfStops(keyStops, shadowSideStops);
}

function shapeGhost({ throughStops, ...ghost }: NonNullable<FillOutcome['ghost']>) {
  return { ...ghost, ...(throughStops === null ? {} : { throughStops }) };
}

function shapeHandheld(handheld: NonNullable<FillOutcome['handheld']>, scale: Scale) {
  const { withinLimit, overStops, limitS } = handheld;
  return { withinLimit, overStops, slowestShutter: exactWithMark('shutter', scale, limitS, 'ceil') };
}
