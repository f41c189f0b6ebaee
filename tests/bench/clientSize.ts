import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { calculatorList } from '../../shared/calculators';
import { buildClient } from '../../server/scripts/support/buildClient';
import type { BenchLine } from './benchLine';

/** Vite's manifest: what was built from which source, and what each file fetches with it or later. */
interface Chunk {
  readonly file: string;
  readonly imports?: readonly string[];
  readonly dynamicImports?: readonly string[];
}
type Manifest = Readonly<Record<string, Chunk>>;

const ENTRY = 'index.html';
const FIRST_PAINT = 'first-paint.js';
const VIEWS = 'src/views/';
const DRAWINGS = 'src/components/drawings/';

const calculatorSource = (id: string) => `shared/calculators/${id}.ts`;

/** The files that the browser fetches for these sources: their own, and whatever those import in turn. */
function filesOf(manifest: Manifest, sources: readonly string[]): Set<string> {
  const seen = new Set<string>();
  const files = new Set<string>();
  const follow = (source: string): void => {
    if (seen.has(source)) return;
    seen.add(source);
    const chunk = manifest[source];
    if (!chunk) throw new Error(`The client's build has nothing from ${source}`);
    files.add(chunk.file);
    chunk.imports?.forEach(follow);
  };
  sources.forEach(follow);
  return files;
}

function gzippedKb(folder: string, files: Iterable<string>): number {
  let bytes = 0;
  for (const file of files) bytes += gzipSync(readFileSync(join(folder, file))).length;
  return bytes / 1000;
}

/** What a calculator's page fetches; all the drawings are counted, though a page shows at most one. */
function calculatorSources(manifest: Manifest, id: string): string[] {
  const view = `${VIEWS}CalculatorView.vue`;
  const drawings = (manifest[view]?.dynamicImports ?? []).filter((source) => source.startsWith(DRAWINGS));
  return [ENTRY, view, calculatorSource(id), ...drawings];
}

/** Gzipped JavaScript of the first load of a few screens, in kB of 1,000 bytes, as the build's manifest tells it. */
export async function benchClientSize(clientFolder?: string): Promise<BenchLine[]> {
  const folder = clientFolder ?? (await buildClient());
  const manifest = JSON.parse(readFileSync(join(folder, '.vite/manifest.json'), 'utf8')) as Manifest;
  const sizeOf = (sources: readonly string[]) =>
    gzippedKb(folder, new Set([FIRST_PAINT, ...filesOf(manifest, sources)]));
  const largest = (isOne: (id: string) => boolean): number | null => {
    const sizes = calculatorList
      .filter(({ id }) => isOne(id))
      .map(({ id }) => sizeOf(calculatorSources(manifest, id)));
    return sizes.length > 0 ? Math.max(...sizes) : null;
  };
  const isTwilight = (id: string) => id.startsWith('twilight/');
  const landing = sizeOf([ENTRY, `${VIEWS}LandingView.vue`, calculatorSource('exposure/solve')]);
  const line = (name: string, value: number | null, most: number): BenchLine => ({
    name,
    value,
    unit: 'kB',
    goal: `≤ ${most}`,
  });
  return [
    line('client-landing', landing, 180),
    line(
      'client-calculator',
      largest((id) => !isTwilight(id)),
      260,
    ),
    line('client-twilight', largest(isTwilight), 340),
  ];
}
