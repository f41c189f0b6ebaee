import { pointerOf } from '../../shared/contract/faults';
import type { Path } from './body';

/** The ids of a field's control, its hint and its faults, which refer to one another. */
export function fieldIds(path: Path): { control: string; hint: string; faults: string } {
  const base = `field${pointerOf(path).replaceAll('/', '-')}`;
  return { control: base, hint: `${base}-hint`, faults: `${base}-faults` };
}
