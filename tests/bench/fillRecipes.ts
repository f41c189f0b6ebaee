import { fillRecipes } from '../../shared/calculators/fill/recipes';
import { answerFor, parseInput, type Calculator } from '../../shared/contract/defineCalculator';
import { hostileFill, threeFlashes } from '../support/hostileFill';
import type { BenchLine, Measurement } from './benchLine';
import { median } from './statistics';

const ROUNDS = 200;
const HOSTILE = 2000;
/** The slowest are timed again, so that a pause of the machine is not taken for a slow request. */
const AGAIN = 20;
const TIMES = 5;
const NOW = new Date('2026-06-21T18:00:00Z');

/** Lines that need nothing but the process itself. */
export const fillRecipesLines: Measurement<unknown> = {
  names: ['fill-recipes', 'fill-recipes-worst'],
  measure: () => Promise.resolve(benchFillRecipes()),
};

/**
 * The lines `fill-recipes` and `fill-recipes-worst`: parsing, search, what stands in the way and the answer's shape, in
 * the process, as processor time; the second over generated requests as large and awkward as the schema allows, those
 * that are refused included.
 */
function benchFillRecipes(): BenchLine[] {
  for (let seed = 1; seed <= AGAIN; seed++) ask(hostileFill(seed));
  const usual: number[] = [];
  for (let round = 0; round < ROUNDS; round++) usual.push(processorMs(threeFlashes));
  const hostile: { seed: number; ms: number }[] = [];
  for (let seed = 1; seed <= HOSTILE; seed++) hostile.push({ seed, ms: processorMs(hostileFill(seed)) });
  const slowest = hostile.sort((a, b) => b.ms - a.ms).slice(0, AGAIN);
  const again = slowest.map(({ seed }) =>
    Math.min(...Array.from({ length: TIMES }, () => processorMs(hostileFill(seed)))),
  );
  return [
    { name: 'fill-recipes', value: median(usual), unit: 'ms', goal: '< 20' },
    { name: 'fill-recipes-worst', value: Math.max(...again), unit: 'ms', goal: '< 50' },
  ];
}

function ask(body: unknown): void {
  const calculator = fillRecipes as unknown as Calculator;
  const parsed = parseInput(calculator, body);
  if ('input' in parsed) answerFor(calculator, parsed.input, { now: NOW });
}

function processorMs(body: unknown): number {
  const start = process.cpuUsage();
  ask(body);
  const { user, system } = process.cpuUsage(start);
  return (user + system) / 1000;
}
