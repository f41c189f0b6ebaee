import { fillRecipes } from '../../shared/calculators/fill/recipes';
import { askCalculator } from '../support/askCalculator';
import { hostileFill, threeFlashes } from '../support/hostileFill';
import type { BenchLine } from './benchLine';
import { median } from './statistics';

const ROUNDS = 200;
const HOSTILE = 2000;
/** The slowest are timed again, so that a pause of the machine is not taken for a slow request. */
const AGAIN = 20;
const TIMES = 5;

/**
 * The lines `fill-recipes` and `fill-recipes-worst`: parsing, search, what stands in the way and the answer's shape, in
 * the process, as processor time; the second over generated requests as large and awkward as the schema allows.
 */
export async function benchFillRecipes(): Promise<BenchLine[]> {
  for (let seed = 1; seed <= AGAIN; seed++) askCalculator(fillRecipes, hostileFill(seed));
  const usual: number[] = [];
  for (let round = 0; round < ROUNDS; round++) usual.push(processorMs(threeFlashes));
  const hostile: { seed: number; ms: number }[] = [];
  for (let seed = 1; seed <= HOSTILE; seed++) hostile.push({ seed, ms: processorMs(hostileFill(seed)) });
  const slowest = hostile.sort((a, b) => b.ms - a.ms).slice(0, AGAIN);
  const again = slowest.map(({ seed }) =>
    Math.min(...Array.from({ length: TIMES }, () => processorMs(hostileFill(seed)))),
  );
  return Promise.resolve([
    { name: 'fill-recipes', value: median(usual), unit: 'ms', goal: '< 20' },
    { name: 'fill-recipes-worst', value: Math.max(...again), unit: 'ms', goal: '< 50' },
  ]);
}

function processorMs(body: unknown): number {
  const start = process.cpuUsage();
  askCalculator(fillRecipes, body);
  const { user, system } = process.cpuUsage(start);
  return (user + system) / 1000;
}
