/** One line of the benchmark. */
export interface BenchLine {
  readonly name: string;
  /** Null where it can't be measured here, or what it measures does not exist yet. */
  readonly value: number | null;
  readonly unit: string;
  readonly goal: string;
}

/** Lines that come out of one measurement. */
export interface Measurement<Context> {
  readonly names: readonly string[];
  /** @param wanted which of the names are asked for; others may be left out */
  measure(context: Context, wanted: readonly string[]): Promise<readonly BenchLine[]>;
}

function shown(value: number | null): string {
  if (value === null) return 'n/a';
  return Math.abs(value) >= 100 ? value.toFixed(0) : String(Number(value.toPrecision(3)));
}

export function lineText({ name, value, unit, goal }: BenchLine): string {
  return [name, shown(value), unit, `(${goal})`].filter(Boolean).join(' ');
}
