import { countOf } from './fillMisses';
import { caseAt, lowerBounds, NOT_LOOKED_AT, type FillProblem } from './fillProblem';
import { onAimCount } from './fillScore';
import type { FillLimit, LimitInTheWay } from './limitInTheWay';

/** Flashes that the aim asks for and that are not there. */
export function missingFlashes(problem: FillProblem): LimitInTheWay[] {
  const { wish, parts } = problem;
  const has = (role: string) => wish.flashes.some((flash) => flash.role === role);
  const missing: LimitInTheWay[] = [];
  const add = (limit: FillLimit, more: Partial<LimitInTheWay> = {}) =>
    missing.push({ limit, shortByStops: null, leavesStops: 0, recipe: null, ...more });
  const isRatioMissed = wish.aim.ratio !== null && !parts.ratio;
  const needed = has('key') || has('fill') ? null : lightNeeded(problem);
  if (needed !== null || (isRatioMissed && !has('key'))) add('key_missing', needed ?? {});
  if (isRatioMissed && !has('fill')) add('fill_missing');
  if (wish.aim.rimStops !== null && !parts.rim) add('rim_missing');
  return missing;
}

/** What a flash has to bring where there is none and ambient light leaves the subject too dark; null where it does not. */
function lightNeeded(problem: FillProblem): Pick<LimitInTheWay, 'shortByStops' | 'guideNumberPerM'> | null {
  const count = onAimCount(problem.grid);
  const bounds = lowerBounds(problem, count);
  let best: { shortByStops: number; guideNumberPerM: number } | null = null;
  for (let place = 0; place < bounds.length; place++) {
    if ((bounds[place] ?? NOT_LOOKED_AT) === NOT_LOOKED_AT) continue;
    const { front, shutter, backgroundCount } = caseAt(problem, place);
    const missing = front.wished - front.ambient;
    if (backgroundCount > count || shutter.sync !== 'normal' || !(missing > 0)) continue;
    const shortByStops = Math.log2(front.wished / front.ambient);
    if (countOf(shortByStops) <= count) return null;
    const guideNumberPerM = Math.sqrt(missing);
    if (best === null || guideNumberPerM < best.guideNumberPerM) best = { shortByStops, guideNumberPerM };
  }
  return best;
}
