import { z } from 'zod';
import { powerLabel } from '../math/fill/powerSteps';
import type { DuskLadder, LadderNote, Rung } from '../math/ladder/ladderTypes';
import type { Scale } from '../math/marks';
import { formatInstant } from '../time/instant';
import { note, type Remark } from './answer';
import { chosenMark, exactWithMark, settingOut } from './settingOut';

const CODES = ['handheld_limit', 'aperture_opens', 'iso_rises', 'flash_limit', 'out_of_reach'] as const;
const shift = (title: string) =>
  z
    .number()
    .nullable()
    .meta({ title, unit: 's', description: 'by the model’s spread; null where it is more than two hours' });

const rungOut = z.strictObject({
  at: z.string().meta({ title: 'From' }),
  until: z.string().meta({ title: 'Until' }),
  aperture: settingOut('Aperture'),
  shutter: settingOut('Shutter'),
  iso: settingOut('ISO'),
  power: settingOut('Flash power').nullable().optional().meta({
    title: 'Flash power',
    description: 'null where the ambient light alone is enough',
  }),
  sceneEv100: z.number().meta({ title: 'Scene’s EV at ISO 100', unit: 'stops' }),
  sunAltitudeDeg: z.number().meta({ title: 'Sun’s altitude', unit: '°' }),
  errorStops: z.number().meta({
    title: 'Off the aim',
    unit: 'stops',
    description: 'how much brighter (+) the background comes out at the start of the rung',
  }),
  earlyS: shift('May be due earlier'),
  lateS: shift('May be due later'),
});

/** A dusk ladder as it is answered. */
export const ladderOut = z.strictObject({
  timeZone: z.string().meta({ title: 'Time zone' }),
  rungs: z.array(rungOut).meta({ title: 'Rungs', description: 'one a change, joined without gaps' }),
  turningPoints: z
    .array(
      z.strictObject({
        at: z.string().meta({ title: 'At' }),
        code: z.enum(CODES).meta({ title: 'What turns' }),
        isLeft: z.boolean().meta({ title: 'Ends', description: 'true where the light comes back out of it' }),
      }),
    )
    .meta({ title: 'Turning points' }),
  model: z
    .strictObject({
      skyOffsetStops: z.number().meta({
        title: 'Scene against the sky',
        unit: 'stops',
        description: 'how much brighter (+) the scene is than level ground under a clear sky',
      }),
      lampFloorEv100: z
        .number()
        .nullable()
        .meta({ title: 'Light of lamps', unit: 'stops', description: 'null where there is none' }),
      spreadStops: z.number().meta({ title: 'Spread', unit: 'stops', description: 'how far off it may be' }),
      misfitStops: z
        .array(z.number())
        .meta({ title: 'Misfits', unit: 'stops', description: 'each frame less the model' }),
    })
    .meta({ title: 'Model of the scene' }),
});

export type LadderOut = z.output<typeof ladderOut>;

function rungOf(rung: Rung, scale: Scale, say: (ms: number) => string): LadderOut['rungs'][number] {
  const { aperture, shutterS, iso, power, sceneEv100, sunAltitudeDeg, errorStops } = rung;
  return {
    at: say(rung.atMs),
    until: say(rung.untilMs),
    aperture: exactWithMark('aperture', scale, aperture),
    shutter: exactWithMark('shutter', scale, shutterS),
    iso: exactWithMark('iso', scale, iso),
    ...(power !== undefined && {
      power: power === null ? null : chosenMark({ label: powerLabel(power), exact: power }),
    }),
    sceneEv100,
    sunAltitudeDeg,
    errorStops,
    earlyS: rung.earlyS,
    lateS: rung.lateS,
  };
}

/** A ladder in the answer's shape, times in a zone. */
export function shapeLadder(ladder: DuskLadder, scale: Scale, timeZone: string): LadderOut {
  const say = (ms: number) => formatInstant(ms, timeZone);
  return {
    timeZone,
    rungs: ladder.rungs.map((rung) => rungOf(rung, scale, say)),
    turningPoints: ladder.turningPoints.map(({ atMs, code, isLeft }) => ({ at: say(atMs), code, isLeft })),
    model: { ...ladder.model, misfitStops: [...ladder.model.misfitStops] },
  };
}

/** What would mislead, in words. */
export function ladderRemark(found: LadderNote, timeZone: string): Remark {
  switch (found.code) {
    case 'lamps_undetermined':
    case 'frame_below_lamps':
    case 'check_clock':
      return remarkWith(found);
    case 'lamps_came_on':
      return note('lamps_came_on', { at: formatInstant(found.atMs, timeZone) });
    default:
      return note(found.code);
  }
}

type Measured = Extract<LadderNote, { code: 'lamps_undetermined' | 'frame_below_lamps' | 'check_clock' }>;

function remarkWith(found: Measured): Remark {
  if (found.code === 'lamps_undetermined') return note('lamps_undetermined', found);
  return found.code === 'frame_below_lamps' ? note('frame_below_lamps', found) : note('check_clock', found);
}
