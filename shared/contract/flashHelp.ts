import { z } from 'zod';
import { flashRemedies } from '../math/flashExposure';
import { note, type Remark } from './answer';
import { exactWithMark, settingOut } from './settingOut';
import type { Reading } from './settings';

const help = {
  distanceM: z.number().meta({ title: 'Flash moved to', unit: 'm' }),
  heads: z.number().meta({ title: 'Equal heads instead' }),
  lessLossStops: z.number().nullable().meta({
    title: 'Less loss',
    unit: 'stops',
    description: 'by modifier, gel or filter; null where there is not so much loss to take away',
  }),
};

const HELP = {
  title: 'What helps',
  description: 'each alone makes up for what is missing; null where nothing is',
};

/** What would make up for a flash that falls short, each by itself. */
export const flashHelpOut = () =>
  z
    .strictObject({
      ...help,
      aperture: settingOut('Aperture instead').meta({ description: 'the mark is on the safe side' }),
      iso: settingOut('ISO instead').meta({ description: 'the mark is on the safe side' }),
    })
    .nullable()
    .meta(HELP);

/** The same beside sunlight at a fixed brightness, where aperture, ISO and filter change both lights alike. */
export const outshoneHelpOut = () => z.strictObject(help).nullable().meta(HELP);

interface Used {
  readonly distanceM: number;
  readonly heads: number;
  readonly lossStops: number;
}

/** What helps a flash that is so many stops short and is to be changed itself. */
export function outshoneHelp(
  shortByStops: number,
  now: Used,
): NonNullable<z.output<ReturnType<typeof outshoneHelpOut>>> {
  const by = flashRemedies(shortByStops);
  return {
    distanceM: now.distanceM * by.distanceFactor,
    heads: now.heads * by.headsFactor,
    lessLossStops: by.lessLossStops <= now.lossStops ? by.lessLossStops : null,
  };
}

/**
 * What helps a flash that is so many stops short, as fields and as a note.
 * @param now what is used at present
 */
export function flashHelp(
  shortByStops: number,
  now: Used & { readonly aperture: number; readonly iso: number },
  { scale }: Pick<Reading, 'scale'>,
): { readonly out: NonNullable<z.output<ReturnType<typeof flashHelpOut>>>; readonly note: Remark } {
  const by = flashRemedies(shortByStops);
  const itself = outshoneHelp(shortByStops, now);
  const aperture = exactWithMark('aperture', scale, now.aperture / by.apertureFactor, 'floor');
  const iso = exactWithMark('iso', scale, now.iso * by.isoFactor, 'ceil');
  const told = { stops: shortByStops, ...itself, aperture: aperture.mark, iso: iso.mark };
  return { out: { ...itself, aperture, iso }, note: note('flash_too_weak', told) };
}
