import { valueAt, withValueAt, type Body } from '../../form/body';

/** Somebody who stands and is asked to keep still sways about so much; common practice, no source. */
const STANDING_M_S = 0.1;
/** Of a small flash at full power; common practice, no source. */
const SMALL_FLASH_T05_S = 0.002;

/** What the page opens with: the calculator's first example, with what the picture at 100 % needs besides. */
export function initialBody(example: Body): Body {
  const flashes = (valueAt(example, ['flashes']) ?? []) as readonly Body[];
  const timed = flashes.map((flash) => ({ t05S: SMALL_FLASH_T05_S, control: 'cutoff', ...flash }));
  const moving = { ...example, flashes: timed, subject: { speedMS: STANDING_M_S } };
  return withValueAt(moving, ['count'], undefined);
}
