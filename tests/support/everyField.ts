import { z } from 'zod';
import { guardLengths } from '../../shared/contract/guardLengths';
import { oneOrMany } from '../../shared/contract/oneOrMany';
import { distanceM, integer, number } from '../../shared/contract/quantities';
import { apertureIn, isoIn, powerIn, shutterIn } from '../../shared/contract/settingIn';
import { onlyDetail } from './trial';

const lamp = z.strictObject({
  name: z.string().min(2).max(5).meta({ title: 'Name' }).optional(),
  distanceM: distanceM(),
  power: powerIn().optional(),
});
/** A body with a field of every kind, to be put at fault. */
export const everyField = guardLengths(
  z.strictObject({
    aperture: apertureIn(),
    shutter: shutterIn().optional(),
    iso: isoIn().default(100),
    way: z.enum(['up', 'down']).meta({ title: 'Way' }).optional(),
    flag: z.boolean().meta({ title: 'Flag' }).optional(),
    count: integer({ title: 'Count', min: 1, max: 10 }).optional(),
    share: number({ title: 'Share', min: 0, max: 1, above: true }).optional(),
    at: z.iso.datetime({ offset: true }).meta({ title: 'Time' }).optional(),
    day: z.iso.date().meta({ title: 'Date' }).optional(),
    limits: z
      .strictObject({ isoMax: isoIn({ title: 'Highest ISO' }).optional() })
      .meta({ title: 'Limits' })
      .optional(),
    lamps: z.array(lamp).min(1).max(3).meta({ title: 'Lamps' }).optional(),
    guides: oneOrMany(distanceM({ title: 'Guide number' }), 3).optional(),
  }),
);

/** One valid body with something put in. */
export const withMore = (more: object) => ({ aperture: 8, ...more });
/** What the only fault of such a body says. */
export const detailOf = (more: object) => onlyDetail(everyField, withMore(more));
