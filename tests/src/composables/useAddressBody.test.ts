import { expect, it } from 'vitest';
import { loadCalculators } from '../../../shared/calculators';
import { encodeQuery } from '../../../shared/contract/queryCodec';
import { bodyOfQuery } from '../../../src/composables/useAddressBody';

const calculators = await loadCalculators();

it('an address that says nothing leaves the form to its example', () => {
  expect(bodyOfQuery({}, calculators[0]?.fields ?? [])).toBeUndefined();
});

it.each(
  calculators.flatMap(({ id, fields, examples }) =>
    examples.map(({ title, input }) => [id, title, fields, input] as const),
  ),
)('%s: “%s” comes back from the address that it makes', (_, __, fields, input) => {
  const pairs = encodeQuery(input);
  const search = new URLSearchParams(pairs);
  expect(bodyOfQuery(Object.fromEntries(new URLSearchParams(search.toString())), fields) ?? {}).toEqual(
    input,
  );
});

it('an address with a name twice, or without a value, is read as it stands', () => {
  const fields = calculators.find(({ id }) => id === 'exposure/value')?.fields ?? [];
  expect(bodyOfQuery({ aperture: ['8', '5.6'], iso: null }, fields)).toEqual({ aperture: 5.6, iso: '' });
});
