import type { AnyCalculator } from '../../../shared/contract/defineCalculator';
import { inputJsonSchema, outputJsonSchema } from '../../../shared/contract/jsonSchema';
import type { Operation } from './operation';

function entryOf(calculator: AnyCalculator) {
  const { id, group, title, summary, units, answersGet } = calculator;
  const schemas = `/v1/calculators/${id}`;
  return {
    id,
    group,
    path: `/v1/${id}`,
    title,
    summary,
    get: answersGet,
    units,
    inputSchema: `${schemas}/input.schema.json`,
    outputSchema: `${schemas}/output.schema.json`,
  };
}

/** The list of calculators and each one's JSON Schemas; open to anyone, at no cost. */
export function listOperations(calculators: readonly AnyCalculator[]): Operation[] {
  const open = (path: string, name: string, value: unknown): Operation => {
    return { method: 'GET', path, name, access: 'open', body: JSON.stringify(value) };
  };
  return [
    open('/v1/calculators', 'calculators', { calculators: calculators.map(entryOf) }),
    ...calculators.flatMap((calculator) => [
      open(`/v1/calculators/${calculator.id}/input.schema.json`, 'schema', inputJsonSchema(calculator)),
      open(`/v1/calculators/${calculator.id}/output.schema.json`, 'schema', outputJsonSchema(calculator)),
    ]),
  ];
}
