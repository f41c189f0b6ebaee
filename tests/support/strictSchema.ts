import { Ajv2020, type ValidateFunction } from 'ajv/dist/2020';
import addFormats from 'ajv-formats';
import type { JsonSchema } from '../../shared/contract/jsonSchema';

/** A strict validator of draft 2020-12 that knows our two annotations and nothing else beyond the standard. */
export function compiled(schema: JsonSchema): ValidateFunction {
  const ajv = new Ajv2020({ strict: true, strictRequired: false, allErrors: true });
  addFormats.default(ajv);
  ajv.addVocabulary(['x-unit', 'x-advanced']);
  return ajv.compile(schema);
}
