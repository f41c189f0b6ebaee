import { BenchContext, type BenchOptions } from './BenchContext';
import { lineText, type Measurement } from './benchLine';
import { benchClientSize } from './clientSize';
import { fillRecipesLines } from './fillRecipes';
import { batch } from './lines/batch';
import { latency } from './lines/latency';
import { processes } from './lines/processes';
import { throughput } from './lines/throughput';
import { warmStart } from './lines/warmStart';
import { benchTwilight } from './twilight';

export { runPart } from './parts/runPart';

const twilight: Measurement<BenchContext> = {
  names: ['twilight-vs-suncalc', 'twilight-worst-below-60', 'twilight-missed-or-invented'],
  measure: benchTwilight,
};
const clientSize: Measurement<BenchContext> = {
  names: ['client-landing', 'client-calculator', 'client-twilight'],
  measure: ({ options }) => benchClientSize(options.clientFolder),
};

const measurements: readonly Measurement<BenchContext>[] = [
  throughput,
  latency,
  batch,
  processes,
  twilight,
  fillRecipesLines,
  warmStart,
  clientSize,
];

/** Prints a line for each thing that is measured; with arguments, only those whose name holds one of them. */
export async function runBench(options: BenchOptions): Promise<void> {
  const isWanted = (name: string) =>
    options.args.length === 0 || options.args.some((part) => name.includes(part));
  const context = await BenchContext.open(options, import.meta.url);
  try {
    for (const measurement of measurements) {
      const wanted = measurement.names.filter(isWanted);
      if (wanted.length === 0) continue;
      const lines = await measurement.measure(context, wanted);
      for (const line of lines) if (isWanted(line.name)) process.stdout.write(`${lineText(line)}\n`);
    }
  } finally {
    await context.close();
  }
}
