import { expect, it } from 'vitest';
import { readCap, readExpiry, shownDate } from '../../../../src/components/keys/keyLimits';

it.each([
  ['', null],
  ['  ', null],
  ['0', 0],
  ['1,000', 1000],
  [' 40 000 ', 40_000],
  ['1.5', 1.5],
])('a cap typed as %j is %j', (text, cap) => expect(readCap(text)).toBe(cap));

it.each(['plenty', '1e999', '5 a day'])(
  'a cap typed as %j goes out as text, since JSON would make it none',
  (text) => {
    expect(JSON.stringify(readCap(text))).toMatch(/^"/);
  },
);

it('a last day lasts to its end in the reader’s own zone, and is shown as that day again', () => {
  const end = readExpiry('2027-03-01');
  expect(new Date(end ?? '').getHours()).toBe(23);
  expect(shownDate(end)).toBe('2027-03-01');
  expect([readExpiry(''), shownDate(null)]).toEqual([null, '']);
});

it('what is no date is left to the service to refuse', () =>
  expect(readExpiry('2027-13-45')).toBe('2027-13-45'));
