import type { z } from 'zod';
import type { CautionCode } from '../text';
import { caution, type Answer, type Remark } from './answer';
import { acceptsGet, describeFields } from './describeFields';
import { faultsOf, type Fault } from './faults';
import type { Field } from './field';
import { guardLengths } from './guardLengths';

/** What a computation may know beside its input. The clock is handed in; nothing reads it elsewhere. */
export interface Context {
  readonly now: Date;
}

/** What `compute` gives back; notes and cautions only where there are some. */
export interface Computed<R> {
  readonly result: R;
  readonly notes?: readonly Remark[];
  readonly cautions?: readonly CautionCode[];
}

export interface Example<I, R> {
  readonly title: string;
  readonly input: I;
  readonly output: R;
}

/** The one description of a calculator, from which route, documents, form, snippet and tests follow. */
export interface CalculatorDefinition<I extends z.ZodType, O extends z.ZodType> {
  /** `group/name`, also the path under /v1. */
  readonly id: string;
  readonly title: string;
  /** One sentence, for lists. */
  readonly summary: string;
  /** What a call costs. */
  readonly units: number;
  readonly input: I;
  readonly output: O;
  /** Standard and clause, publication, or "derivation", as shown to users. */
  readonly sources: readonly string[];
  /** Run by the tests, shown in the documents; the first one starts the console's form. */
  readonly examples: readonly Example<z.input<I>, z.output<O>>[];
  compute(input: z.output<I>, context: Context): Computed<z.output<O>>;
}

export interface Calculator<
  I extends z.ZodType = z.ZodType,
  O extends z.ZodType = z.ZodType,
> extends CalculatorDefinition<I, O> {
  readonly group: string;
  readonly name: string;
  /** The input's fields in order, as described by the schema. */
  readonly fields: readonly Field[];
  readonly answersGet: boolean;
}

/** A calculator of any shape, as the list holds them. */
export type AnyCalculator = Calculator;

/** Completes a description with what follows from it. */
export function defineCalculator<I extends z.ZodType, O extends z.ZodType>(
  definition: CalculatorDefinition<I, O>,
): Calculator<I, O> {
  const [group = '', name = ''] = definition.id.split('/');
  const fields = describeFields(guardLengths(definition.input));
  return { ...definition, group, name, fields, answersGet: acceptsGet(fields) };
}

export type Parsed = { readonly input: unknown } | { readonly faults: readonly Fault[] };

/** Checks a request against a calculator's input; all faults at once, or the input with its defaults. */
export function parseInput(calculator: AnyCalculator, body: unknown): Parsed {
  const parsed = calculator.input.safeParse(body);
  if (parsed.success) return { input: parsed.data };
  return { faults: faultsOf(parsed.error.issues, calculator.fields, body) };
}

/** Computes the answer for input that `parseInput` let through. */
export function answerFor(calculator: AnyCalculator, input: unknown, context: Context): Answer<unknown> {
  const { result, notes = [], cautions = [] } = calculator.compute(input, context);
  return { result, notes, cautions: cautions.map(caution) };
}
