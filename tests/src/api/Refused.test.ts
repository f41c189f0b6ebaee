import { expect, it } from 'vitest';
import { refusedBy } from '../../../src/api/Refused';

const response = (status: number) => new Response(null, { status, headers: { 'x-request-id': 'r-1' } });

it('a problem is told in the service’s own words, with its faults', () => {
  const errors = [{ pointer: '/name', code: 'name_not_valid', detail: 'Give a name.' }];
  const problem = {
    type: 't',
    title: 'T',
    status: 422,
    detail: 'Mend it.',
    instance: 'i',
    code: 'invalid_input',
    errors,
  };
  expect(refusedBy(response(422), problem)).toMatchObject({
    message: 'Mend it.',
    status: 422,
    code: 'invalid_input',
    faults: errors,
    requestId: 'r-1',
  });
});

it.each([undefined, null, '<html>', {}])('an answer of %j is told without a reason', (given) => {
  const refused = refusedBy(response(502), given);
  expect(refused).toMatchObject({ status: 502, code: 'unexplained', faults: [] });
  expect(refused.message).toContain('502');
});
