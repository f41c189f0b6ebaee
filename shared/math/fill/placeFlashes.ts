import { ABSENT_COUNT, factorAt, mostAt } from './fillMisses';
import type { UsedFlash } from './fillTypes';
import type { Assignment } from './assignFlashes';
import type { FlashLevels } from './flashLevels';
import { boundsFor, keysFor, type Allowed, type FlashGroup, type FlashTask } from './flashMix';
import { levelsOfCode, type RoleSums } from './roleSums';

const clamp = (value: number, low: number, high: number) => Math.min(high, Math.max(low, value));

interface Span {
  readonly low: number;
  readonly high: number;
}

/** A flash at one of its powers, and what it can give there. */
interface SetFlash extends Span {
  readonly levels: FlashLevels;
  readonly power: number;
}

function setFlashes(sums: RoleSums, code: number): SetFlash[] {
  const levels = levelsOfCode(sums, code);
  return sums.flashes.map((one, i) => {
    const level = levels[i] ?? 0;
    return {
      levels: one,
      power: one.powers[level] ?? 0,
      low: one.low[level] ?? 0,
      high: one.high[level] ?? 0,
    };
  });
}

const spanOf = (flashes: readonly SetFlash[]): Span => ({
  low: flashes.reduce((sum, { low }) => sum + low, 0),
  high: flashes.reduce((sum, { high }) => sum + high, 0),
});

/** Halvings of a miss; 60 leave less than any double tells. */
const HALVINGS = 60;

/** The key and fill within reach that come nearest to the task. */
function nearestMix(task: FlashTask, key: Span, fill: Span, allowed: Allowed): [number, number] {
  if (key.low === key.high && fill.low === fill.high) return [key.low, fill.low];
  const isAlike = allowed.sum === allowed.ratio;
  const ratioFactor = allowed.ratio >= ABSENT_COUNT ? null : factorAt(allowed.ratio);
  const isAbsent = task.isNeeded && allowed.sum >= ABSENT_COUNT;
  const boundsAt = (stops: number) => {
    const factor = 2 ** stops;
    return boundsFor(task, isAbsent ? null : factor, isAlike && ratioFactor !== null ? factor : ratioFactor);
  };
  const holds = (stops: number) => {
    const [least, most] = keysFor(boundsAt(stops), fill.low, fill.high);
    return least <= most && key.low <= most && key.high >= least;
  };
  let [bad, good] = [0, mostAt(allowed.sum)];
  if (holds(0)) good = 0;
  for (let i = 0; i < HALVINGS && good - bad > Number.EPSILON; i++) {
    const middle = (bad + good) / 2;
    if (holds(middle)) good = middle;
    else bad = middle;
  }
  const b = boundsAt(good);
  const [least, most] = keysFor(b, fill.low, fill.high);
  const chosen = clamp(
    (least + Math.min(most, key.high)) / 2,
    Math.max(key.low, least),
    Math.min(key.high, most),
  );
  // The fills that go with that key, by the same bounds seen from the other side.
  const fillLow = Math.max(fill.low, b.sumLow - chosen, b.ratioHigh === Infinity ? 0 : chosen / b.ratioHigh);
  const fillHigh = Math.min(fill.high, b.sumHigh - chosen, b.ratioLow > 0 ? chosen / b.ratioLow : Infinity);
  return [chosen, clamp((fillLow + fillHigh) / 2, fill.low, fill.high)];
}

/** Each flash as far away as it may be, then one after the other nearer until the light is right; inverse square. */
function placed(flashes: readonly SetFlash[], wished: number): UsedFlash[] {
  let missing = wished - spanOf(flashes).low;
  return flashes.flatMap(({ levels: { flash }, power, low, high }) => {
    if (power === 0) return [];
    if (flash.nearM === flash.farM) return [{ flash, power, distanceM: flash.nearM }];
    const more = clamp(missing, 0, high - low);
    missing -= more;
    const distanceM = clamp(flash.farM * Math.sqrt(low / (low + more)), flash.nearM, flash.farM);
    return [{ flash, power, distanceM }];
  });
}

/**
 * The flashes of an assignment that are on, with the distances that bring their light nearest to the task.
 *
 * @param group the flashes of a part
 * @param task what they have to do
 * @param assignment which powers they have
 * @returns power and distance of each
 * @source inverse square law
 */
export function placeFlashes(group: FlashGroup, task: FlashTask, assignment: Assignment): UsedFlash[] {
  const keys = setFlashes(group.keys, assignment.keyCode);
  const fills = setFlashes(group.fills, assignment.fillCode);
  const [key, fill] = nearestMix(task, spanOf(keys), spanOf(fills), assignment.allowed);
  return [...placed(keys, key), ...placed(fills, fill)];
}
