import { countOf } from './fillMisses';
import { caseOf, someNearBackground, type FillProblem } from './fillProblem';
import { onAimCount } from './fillScore';
import type { FillSearch } from './fillSearch';
import type { FillLimit, LimitInTheWay } from './limitInTheWay';

/** Flashes that the aim asks for and that are not there. */
export function missingFlashes({ problem, least }: FillSearch): LimitInTheWay[] {
  const { wish, parts } = problem;
  const has = (role: string) => wish.flashes.some((flash) => flash.role === role);
  const missing: LimitInTheWay[] = [];
  const add = (limit: FillLimit, more: Partial<LimitInTheWay> = {}) =>
    missing.push({ limit, shortByStops: null, leavesStops: 0, recipe: null, ...more });
  const isRatioMissed = wish.aim.ratio !== null && !parts.ratio;
  const needed = has('key') || has('fill') ? null : lightNeeded(problem, least?.main ?? 0);
  if (needed !== null || (isRatioMissed && !has('key'))) add('key_missing', needed ?? {});
  if (isRatioMissed && !has('fill')) add('fill_missing');
  if (wish.aim.rimStops !== null && !parts.rim) add('rim_missing');
  return missing;
}

/**
 * What a flash has to bring where there is none and ambient light leaves the subject too dark; null where it does not.
 * @param least how far off the background may have to be; parts of 1/120 stop
 */
function lightNeeded(
  problem: FillProblem,
  least: number,
): Pick<LimitInTheWay, 'shortByStops' | 'guideNumberPerM'> | null {
  let best: { shortByStops: number; guideNumberPerM: number } | null = null;
  let isNeeded = true;
  const count = onAimCount(problem.grid);
  someNearBackground(problem, Math.max(count, least), (lens, shutter) => {
    const { front } = caseOf(problem, lens, shutter);
    const missing = front.wished - front.ambient;
    if (shutter.sync === 'none') return false;
    const shortByStops = Math.log2(front.wished / front.ambient);
    isNeeded = shortByStops > 0 && countOf(shortByStops) > count;
    const guideNumberPerM = Math.sqrt(missing);
    if (isNeeded && (best === null || guideNumberPerM < best.guideNumberPerM))
      best = { shortByStops, guideNumberPerM };
    return !isNeeded;
  });
  if (!isNeeded) return null;
  return best;
}
