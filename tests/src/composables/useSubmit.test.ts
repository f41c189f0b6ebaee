import { beforeEach, expect, it, vi } from 'vitest';
import { Refused } from '../../../src/api/Refused';
import { useSubmit } from '../../../src/composables/useSubmit';

const field = { focused: 0, focus: () => void (field.focused += 1) };
let hasFaultyField: boolean;

beforeEach(() => {
  field.focused = 0;
  hasFaultyField = true;
  const querySelector = () => (hasFaultyField ? field : null);
  vi.stubGlobal('document', { activeElement: null, querySelector });
});

const fault = (pointer: string, detail: string) => ({ pointer, code: 'c', detail });
const refusing = (...faults: ReturnType<typeof fault>[]) => {
  const refused = new Refused('Mend it.', 422, 'invalid_input', faults);
  return () => Promise.reject(refused);
};

it('every fault stands at its field, those of an item at its list, and the first has the focus', async () => {
  const send = refusing(fault('/name', 'A'), fault('/scopes/0', 'B'), fault('/scopes/1', 'C'));
  const { submit, faults, trouble, isSending } = useSubmit(send);
  await submit();
  expect(faults.value).toEqual({ name: ['A'], scopes: ['B', 'C'] });
  expect([trouble.value, isSending.value, field.focused]).toEqual([null, false, 1]);
});

it('a fault whose field is not on the screen is said of the form', async () => {
  hasFaultyField = false;
  const { submit, trouble } = useSubmit(refusing(fault('/token', 'Not a link of ours.')));
  await submit();
  expect(trouble.value).toBe('Not a link of ours.');
});

it('a problem without faults is said of the form, or stands at the field that it is about', async () => {
  const send = () => Promise.reject(new Refused('It does not fit.', 403, 'password_wrong'));
  const plain = useSubmit(send);
  await plain.submit();
  expect([plain.trouble.value, plain.code.value]).toEqual(['It does not fit.', 'password_wrong']);
  const placed = useSubmit(send, { fieldOf: { password_wrong: 'password' } });
  await placed.submit();
  expect([placed.trouble.value, placed.faults.value]).toEqual([null, { password: ['It does not fit.'] }]);
});

it('sends once at a time, and forgets what was wrong when it sends again', async () => {
  const answers: (() => void)[] = [];
  let isRefused = true;
  const { submit, faults, isSending } = useSubmit(() => {
    if (isRefused) return refusing(fault('/name', 'A'))();
    return new Promise<void>((resolve) => answers.push(resolve));
  });
  await submit();
  expect(faults.value).not.toEqual({});
  isRefused = false;
  const first = submit();
  await submit();
  expect([answers.length, isSending.value, faults.value]).toEqual([1, true, {}]);
  answers[0]?.();
  await first;
  expect(isSending.value).toBe(false);
});
