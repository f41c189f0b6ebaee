import { describe, expect, it } from 'vitest';
import { everyField, withMore } from '../../support/everyField';
import { faultsIn, inShort, onlyDetail } from '../../support/trial';

describe('every kind of fault has its pointer, its code and a sentence', () => {
  // Each sentence is written here as it is to be read, since no outside source says how.
  const cases: [string, object, string, string][] = [
    [
      'a missing field',
      { aperture: undefined },
      '/aperture missing',
      'Aperture is missing; give a number such as 5.6, or text such as "f/5.6".',
    ],
    [
      'a number that is text',
      { count: '5' },
      '/count wrong_type',
      'Count takes a whole number; the text "5" was given.',
    ],
    [
      'a part of a whole number',
      { count: 1.5 },
      '/count wrong_type',
      'Count takes a whole number; 1.5 was given.',
    ],
    ['a number below its range', { count: 0 }, '/count out_of_range', 'Count must be from 1 to 10, not 0.'],
    [
      'a number on its open bound',
      { share: 0 },
      '/share out_of_range',
      'Share must be above 0 and at most 1, not 0.',
    ],
    [
      'a number just above',
      { share: 1.00000001 },
      '/share out_of_range',
      'Share must be above 0 and at most 1, not 1.00000001.',
    ],
    ['null', { count: null }, '/count wrong_type', 'Count takes a whole number; null was given.'],
    [
      'a list for a number',
      { count: [] },
      '/count wrong_type',
      'Count takes a whole number; an empty list was given.',
    ],
    [
      'an f-number out of range',
      { aperture: 300 },
      '/aperture out_of_range',
      'Aperture must be from 0.5 to 256, not 300.',
    ],
    [
      'an f-number as text out of range',
      { aperture: 'f/300' },
      '/aperture out_of_range',
      'Aperture must be from 0.5 to 256, not "f/300".',
    ],
    [
      'an f-number in a foreign form',
      { aperture: '5,6' },
      '/aperture not_a_setting',
      'Aperture takes a number such as 5.6, or text such as "f/5.6"; "5,6" can’t be read as that.',
    ],
    [
      'an object for an f-number',
      { aperture: {} },
      '/aperture wrong_type',
      'Aperture takes a number such as 5.6, or text such as "f/5.6"; an object was given.',
    ],
    [
      'a time of nothing',
      { shutter: 0 },
      '/shutter out_of_range',
      'Shutter must be from 0.000001 to 86,400 s, not 0 s.',
    ],
    [
      'a time divided by nothing',
      { shutter: '1/0' },
      '/shutter not_a_setting',
      'Shutter takes seconds as a number such as 0.5, or text such as "1/125" or "2s"; "1/0" can’t be read as that.',
    ],
    [
      'a speed as text',
      { iso: '400' },
      '/iso wrong_type',
      'ISO takes a number such as 400; the text "400" was given.',
    ],
    [
      'a choice that is none',
      { way: 'left' },
      '/way not_a_choice',
      'Way is one of up or down; "left" was given.',
    ],
    [
      'a yes that is text',
      { flag: 'yes' },
      '/flag wrong_type',
      'Flag takes true or false; the text "yes" was given.',
    ],
    [
      'a time of day without an offset',
      { at: '2026-06-21T21:30:00' },
      '/at wrong_format',
      'Time takes a time with its offset such as "2026-06-21T21:30:00+02:00"; "2026-06-21T21:30:00" can’t be read as that.',
    ],
    [
      'a day that is none',
      { day: '2026-02-30' },
      '/day wrong_format',
      'Date takes a date such as "2026-06-21"; "2026-02-30" can’t be read as that.',
    ],
    [
      'a number for a day',
      { day: 20260621 },
      '/day wrong_type',
      'Date takes a date such as "2026-06-21"; 20260621 was given.',
    ],
    [
      'a value for a group',
      { limits: 5 },
      '/limits wrong_type',
      'Limits takes an object with named fields; 5 was given.',
    ],
    [
      'a fault within a group',
      { limits: { isoMax: 0 } },
      '/limits/isoMax out_of_range',
      'Highest ISO must be from 1 to 10,000,000, not 0.',
    ],
    [
      'too few of a list',
      { lamps: [] },
      '/lamps too_few_items',
      'Lamps takes at least 1 item; 0 were given.',
    ],
    [
      'too many of a list',
      { lamps: Array(4).fill({ distanceM: 1 }) },
      '/lamps too_many_items',
      'Lamps takes at most 3 items; 4 were given.',
    ],
    [
      'an item of the wrong kind',
      { lamps: [{ distanceM: 1 }, 7] },
      '/lamps/1 wrong_type',
      'Item 2 takes an object with named fields; 7 was given.',
    ],
    [
      'a fault within an item',
      { lamps: [{ distanceM: 0 }] },
      '/lamps/0/distanceM out_of_range',
      'Distance must be from 0.01 to 10,000 m, not 0 m.',
    ],
    [
      'a field missing in an item',
      { lamps: [{}] },
      '/lamps/0/distanceM missing',
      'Distance is missing; give a number in m.',
    ],
    [
      'no power',
      { lamps: [{ distanceM: 1, power: 0 }] },
      '/lamps/0/power out_of_range',
      'Flash power must be above 0 and at most 1, not 0.',
    ],
    [
      'a name too short',
      { lamps: [{ distanceM: 1, name: 'k' }] },
      '/lamps/0/name too_short',
      'Name takes at least 2 characters; 1 was given.',
    ],
    [
      'a name too long',
      { lamps: [{ distanceM: 1, name: 'keylight' }] },
      '/lamps/0/name too_long',
      'Name takes at most 5 characters; 8 were given.',
    ],
    [
      'a lone value of one or many',
      { guides: 0 },
      '/guides out_of_range',
      'Guide number must be from 0.01 to 10,000 m, not 0 m.',
    ],
    [
      'an item of one or many',
      { guides: [5, 'x'] },
      '/guides/1 wrong_type',
      'Item 2 takes a number in m; the text "x" was given.',
    ],
    [
      'something else for one or many',
      { guides: 'x' },
      '/guides wrong_type',
      'Guide number takes a number in m, or a list of such; the text "x" was given.',
    ],
    [
      'too many of one or many',
      { guides: [1, 2, 3, 4] },
      '/guides too_many_items',
      'Guide number takes at most 3 items; 4 were given.',
    ],
    [
      'an unknown field',
      { apperture: 8 },
      '/apperture unknown_field',
      '"apperture" is not a field here; did you mean “aperture”?',
    ],
    [
      'an unknown field in a group',
      { limits: { isomax: 8 } },
      '/limits/isomax unknown_field',
      '"isomax" is not a field here; did you mean “isoMax”?',
    ],
    [
      'an unknown field like no other',
      { limits: { zzz: 1 } },
      '/limits/zzz unknown_field',
      '"zzz" is not a field here; the only one is isoMax.',
    ],
    [
      'an unknown field in an item',
      { lamps: [{ distanceM: 1, distanceF: 3 }] },
      '/lamps/0/distanceF unknown_field',
      '"distanceF" is not a field here; did you mean “distanceM”?',
    ],
  ];

  it.each(cases)('%s', (_, more, short, sentence) => {
    const faults = faultsIn(everyField, withMore(more));
    expect(inShort(faults)).toEqual([short]);
    expect(faults[0]?.detail).toBe(sentence);
  });

  it('a body that is no object', () => {
    const sentences = [null, 7, 'text', [], true].map((body) => onlyDetail(everyField, body));
    expect(sentences).toEqual([
      'The body takes an object with named fields; null was given.',
      'The body takes an object with named fields; 7 was given.',
      'The body takes an object with named fields; the text "text" was given.',
      'The body takes an object with named fields; an empty list was given.',
      'The body takes an object with named fields; true was given.',
    ]);
    expect(onlyDetail(everyField, undefined)).toBe('The body is missing.');
  });
});
