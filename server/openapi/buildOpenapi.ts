import { OpenApiGeneratorV31, OpenAPIRegistry } from '@asteasolutions/zod-to-openapi';
import type { AnyCalculator } from '../../shared/contract/defineCalculator';
import { calculatorPaths } from './calculatorPaths';
import { registerComponents } from './components';
import { otherPaths } from './otherPaths';

export interface DocumentOptions {
  readonly version: string;
  readonly publicUrl: string;
}

const ABOUT = `Exposure mathematics for photographs that mix available light with flash while the daylight goes.

**Keys.** Send \`Authorization: Bearer <key>\`. A server key starts with \`evenfall_server_\` and belongs on a server; a page key starts with \`evenfall_page_\` and works from the sites of its widget only.

**Marks and exact values.** A number that is a marking on the given \`scale\` means the exact value behind it: f/5.6 is 4√2, 1/125 s is 1/128 s. Send \`readAs: "exact"\` where a number is to mean itself. Answers give the exact value, the mark to set and the residual between them in stops.

**Signs.** Stops are positive where it gets brighter; filters and losses are positive numbers that take light away.

**Counting.** Units are taken before the calculation, by one statement in the database: no call beyond the quota is answered, with any number of server processes. Faulty input and 304 cost nothing; they count in the rate. Should a server process die, calls under way may have been counted though not answered; none is answered uncounted. While the database can't be reached, calls get 503. A call whose answer you did not wait for is counted.`;

/**
 * The public API's document, OpenAPI 3.1, made from the calculators. The registry and generator assemble it;
 * the schemas come from zod's own JSON Schema, which tells requests from answers and keeps every bound.
 */
export function buildOpenapi(
  calculators: readonly AnyCalculator[],
  { version, publicUrl }: DocumentOptions,
): Record<string, unknown> {
  const registry = new OpenAPIRegistry();
  registerComponents(registry, calculators);
  for (const path of [...otherPaths(), ...calculators.flatMap(calculatorPaths)]) registry.registerPath(path);
  const document = new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: { title: 'Evenfall', version, description: ABOUT, license: { name: 'MIT', identifier: 'MIT' } },
    servers: [{ url: publicUrl }],
    security: [{ serverKey: [] }, { pageKey: [] }],
    tags: [...new Set(calculators.map(({ group }) => group)), 'account'].map((name) => ({ name })),
  });
  return document as unknown as Record<string, unknown>;
}
