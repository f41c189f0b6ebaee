import { BenchContext, type BenchOptions } from './BenchContext';
import { lineText, type Measurement } from './benchLine';
import { fillRecipesLines } from './fillRecipes';
import { throughput } from './lines/throughput';

export { runPart } from './parts/runPart';

const measurements: readonly Measurement<BenchContext>[] = [throughput, fillRecipesLines];

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
