import { hash } from 'node:crypto';
import { answerFor, parseInput, type AnyCalculator } from '../../../shared/contract/defineCalculator';
import { decodeQuery, type QueryPairs } from '../../../shared/contract/queryCodec';
import { invalidInput } from './invalidInput';
import type { Operation, Prepared } from './operation';

const BODY_LIMIT = 256 * 1024;

function prepared(calculator: AnyCalculator, body: unknown, now: () => Date): Prepared & { input?: unknown } {
  const needs = [calculator.id];
  const parsed = parseInput(calculator, body);
  if ('faults' in parsed) {
    return { units: 0, needs, problem: invalidInput(parsed.faults), answer: () => null };
  }
  const { input } = parsed;
  const answer = () => answerFor(calculator, input, { now: now() });
  return { units: calculator.units, needs, input, answer };
}

/** Weak, from the engine's version and the input with its defaults, so known before the calculation. */
function etagOf(calculator: AnyCalculator, input: unknown, version: string): string {
  const text = hash('sha256', calculator.id + JSON.stringify(input), 'base64url');
  return `W/"${version}-${text.slice(0, 22)}"`;
}

/** The operations of one calculator: POST always, GET where its required fields are scalars. */
export function calculatorOperations(
  calculator: AnyCalculator,
  { version, now }: { version: string; now: () => Date },
): Operation[] {
  const path = `/v1/${calculator.id}`;
  const shared = { path, name: calculator.id, access: 'key', bodyLimit: BODY_LIMIT } as const;
  const post: Operation = { ...shared, method: 'POST', prepare: (body) => prepared(calculator, body, now) };
  if (!calculator.answersGet) return [post];
  const get: Operation = {
    ...shared,
    method: 'GET',
    prepare: (pairs) => {
      const body = decodeQuery(pairs as QueryPairs, calculator.fields);
      const ready = prepared(calculator, body, now);
      return ready.problem ? ready : { ...ready, etag: etagOf(calculator, ready.input, version) };
    },
  };
  return [post, get];
}
