import type { z } from 'zod';
import { describeFields } from '../../shared/contract/describeFields';
import { faultsOf, type Fault } from '../../shared/contract/faults';

/** Parses a body by a schema as a calculator would; gives the faults, or none. */
export function faultsIn(schema: z.ZodType, body: unknown): readonly Fault[] {
  const parsed = schema.safeParse(body);
  return parsed.success ? [] : faultsOf(parsed.error.issues, describeFields(schema), body);
}

/** The same with the body as JSON text, which can say 1e999 and "__proto__". */
export const faultsInJson = (schema: z.ZodType, text: string) => faultsIn(schema, JSON.parse(text));

/** Faults in short, as "pointer code", in order. */
export const inShort = (faults: readonly Fault[]) => faults.map(({ pointer, code }) => `${pointer} ${code}`);

/** What one body's only fault says. Throws when there is none or more than one. */
export function onlyDetail(schema: z.ZodType, body: unknown): string {
  const [fault, ...more] = faultsIn(schema, body);
  if (!fault || more.length > 0) throw new Error(`expected one fault: ${JSON.stringify([fault, ...more])}`);
  return fault.detail;
}
