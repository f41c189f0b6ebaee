import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { pointerOf } from '../../../shared/contract/faults';
import { guardLengths } from '../../../shared/contract/guardLengths';
import { oneOrMany } from '../../../shared/contract/oneOrMany';
import { distanceM, integer, number } from '../../../shared/contract/quantities';
import { apertureIn, isoIn, powerIn, shutterIn } from '../../../shared/contract/settingIn';
import { faultsIn, faultsInJson, inShort, onlyDetail } from '../../support/trial';

const lamp = z.strictObject({
  name: z.string().min(2).max(5).meta({ title: 'Name' }).optional(),
  distanceM: distanceM(),
  power: powerIn().optional(),
});
const schema = guardLengths(
  z.strictObject({
    aperture: apertureIn(),
    shutter: shutterIn().optional(),
    iso: isoIn().default(100),
    way: z.enum(['up', 'down']).meta({ title: 'Way' }).optional(),
    flag: z.boolean().meta({ title: 'Flag' }).optional(),
    count: integer({ title: 'Count', min: 1, max: 10 }).optional(),
    share: number({ title: 'Share', min: 0, max: 1, above: true }).optional(),
    at: z.iso.datetime({ offset: true }).meta({ title: 'Time' }).optional(),
    day: z.iso.date().meta({ title: 'Date' }).optional(),
    limits: z
      .strictObject({ isoMax: isoIn({ title: 'Highest ISO' }).optional() })
      .meta({ title: 'Limits' })
      .optional(),
    lamps: z.array(lamp).min(1).max(3).meta({ title: 'Lamps' }).optional(),
    guides: oneOrMany(distanceM({ title: 'Guide number' }), 3).optional(),
  }),
);

/** One valid body with something put in. */
const withMore = (more: object) => ({ aperture: 8, ...more });
const detail = (more: object) => onlyDetail(schema, withMore(more));

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
    const faults = faultsIn(schema, withMore(more));
    expect(inShort(faults)).toEqual([short]);
    expect(faults[0]?.detail).toBe(sentence);
  });

  it('a body that is no object', () => {
    const sentences = [null, 7, 'text', [], true].map((body) => onlyDetail(schema, body));
    expect(sentences).toEqual([
      'The body takes an object with named fields; null was given.',
      'The body takes an object with named fields; 7 was given.',
      'The body takes an object with named fields; the text "text" was given.',
      'The body takes an object with named fields; an empty list was given.',
      'The body takes an object with named fields; true was given.',
    ]);
    expect(onlyDetail(schema, undefined)).toBe('The body is missing.');
  });
});

describe('all faults are told at once', () => {
  it('at every depth, each once', () => {
    const body = {
      shutter: 'soon',
      iso: 0,
      way: 'left',
      limits: { isoMax: -1, more: 1 },
      lamps: [{ distanceM: 0 }, { name: 'x' }],
      guides: [0, 5, 0],
      extra: 1,
    };
    expect(inShort(faultsIn(schema, body)).sort()).toEqual(
      [
        '/aperture missing',
        '/extra unknown_field',
        '/guides/0 out_of_range',
        '/guides/2 out_of_range',
        '/iso out_of_range',
        '/lamps/0/distanceM out_of_range',
        '/lamps/1/distanceM missing',
        '/lamps/1/name too_short',
        '/limits/isoMax out_of_range',
        '/limits/more unknown_field',
        '/shutter not_a_setting',
        '/way not_a_choice',
      ].sort(),
    );
  });

  it('a whole number beyond what a double holds is one fault', () => {
    expect(inShort(faultsIn(schema, withMore({ count: 1e300 })))).toEqual(['/count out_of_range']);
  });
});

describe('numbers at the edge of what JSON can say', () => {
  it('infinity is out of range, not another type', () => {
    const faults = faultsInJson(schema, '{"aperture":1e999,"count":-1e999,"iso":1e999,"guides":[1e999]}');
    expect(inShort(faults)).toEqual([
      '/aperture out_of_range',
      '/iso out_of_range',
      '/count out_of_range',
      '/guides/0 out_of_range',
    ]);
    expect(faults.map((fault) => fault.detail)).toEqual([
      'Aperture must be from 0.5 to 256, not infinity.',
      'ISO must be from 1 to 10,000,000, not infinity.',
      'Count must be from 1 to 10, not −infinity.',
      'Item 1 must be from 0.01 to 10,000 m, not infinity.',
    ]);
  });

  it('what is not a number at all is told so, for callers in the process', () => {
    expect(detail({ count: Number.NaN })).toBe('Count takes a whole number; not a number was given.');
    expect(inShort(faultsIn(schema, { aperture: Number.NaN }))).toEqual(['/aperture wrong_type']);
  });

  it('negative zero is zero', () => {
    const stops = z.strictObject({ nd: number({ title: 'ND', min: 0, max: 40 }) });
    expect(faultsIn(stops, { nd: -0 })).toEqual([]);
    expect(onlyDetail(schema, { aperture: -0 })).toBe('Aperture must be from 0.5 to 256, not 0.');
    expect(inShort(faultsIn(schema, withMore({ lamps: [{ distanceM: 1, power: -0 }] })))).toEqual([
      '/lamps/0/power out_of_range',
    ]);
  });

  it('a negative number is written with a minus', () => {
    expect(detail({ count: -2.5e-7 })).toContain('−2.5e-7 was given');
    expect(
      onlyDetail(z.strictObject({ s: number({ title: 'S', unit: 'stops', min: -1, max: 1 }) }), { s: -61 }),
    ).toBe('S must be from −1 to 1 stop, not −61 stops.');
  });
});

describe('hostile input', () => {
  it('very long text is shortened, and stays whole at the cut', () => {
    const said = detail({ way: 'x'.repeat(10_000) });
    expect(said.length).toBeLessThan(120);
    expect(said).toContain('…"');
    const emoji = detail({ way: '🌒'.repeat(100) });
    // A lone half of a character can't be written as UTF-8.
    expect(() => encodeURIComponent(emoji)).not.toThrow();
    expect(emoji).toContain('…');
    expect(detail({ ['y'.repeat(100_000)]: 1 }).length).toBeLessThan(250);
  });

  it('text that would break a sentence is told escaped', () => {
    expect(detail({ way: 'a"b\n\u0000' })).toBe('Way is one of up or down; "a\\"b\\n\\u0000" was given.');
    expect(detail({ aperture: '' })).toContain('"" can’t be read');
  });

  it('names of the language’s own objects are unknown fields like any others', () => {
    const faults = faultsInJson(
      schema,
      '{"aperture":8,"__proto__":1,"constructor":{"x":1},"toString":2,"limits":{"__proto__":{}}}',
    );
    expect(inShort(faults)).toEqual([
      '/limits/__proto__ unknown_field',
      '/__proto__ unknown_field',
      '/constructor unknown_field',
      '/toString unknown_field',
    ]);
    for (const fault of faults) expect(fault.detail).toMatch(/^"\w+" is not a field here; /);
  });

  it('nesting without end is named, not spelt out', () => {
    const depth = 100_000;
    const [fault] = faultsInJson(schema, `{"aperture":${'['.repeat(depth)}${']'.repeat(depth)}}`);
    expect(fault?.detail).toBe(
      'Aperture takes a number such as 5.6, or text such as "f/5.6"; a list was given.',
    );
  });

  it('an object that pretends to have a length is an object', () => {
    const length = '{"valueOf":1,"toString":1}';
    const named = `{"aperture":8,"lamps":{"length":${length}},"guides":{"length":${length}}}`;
    expect(inShort(faultsInJson(schema, named))).toEqual(['/lamps wrong_type', '/guides wrong_type']);
    expect(inShort(faultsInJson(schema, `{"aperture":{"length":${length}},"day":{"length":1}}`))).toEqual([
      '/aperture wrong_type',
      '/day wrong_type',
    ]);
    const inList = `{"aperture":8,"lamps":[{"distanceM":1,"name":{"length":${length}}}]}`;
    expect(inShort(faultsInJson(schema, inList))).toEqual(['/lamps/0/name wrong_type']);
  });

  it('thousands of unknown names are told without delay', () => {
    const names = Array.from({ length: 4000 }, (_, i) => [`${'unknown'.repeat(7)}${i}`, i]);
    const before = performance.now();
    const faults = faultsIn(schema, { aperture: 8, ...Object.fromEntries(names) });
    expect(faults.length).toBe(4000);
    expect(performance.now() - before).toBeLessThan(1000);
  });

  it('a pointer escapes what JSON Pointer escapes', () => {
    // RFC 6901, section 3.
    expect(pointerOf(['a/b', 'c~d', 0, ''])).toBe('/a~1b/c~0d/0/');
    expect(faultsIn(schema, { aperture: 8, 'x/y~z': 1 })[0]?.pointer).toBe('/x~1y~0z');
  });
});

it('no sentence lets the library’s own words through', () => {
  const bodies: unknown[] = [
    {},
    { aperture: true },
    { aperture: 8, count: 'x', at: 7, day: '', lamps: {}, guides: null, flag: 0, share: 5, way: 9 },
    { aperture: 8, lamps: [{}, null, []], limits: [] },
  ];
  let told = 0;
  for (const body of bodies)
    for (const { detail: sentence } of faultsIn(schema, body)) {
      expect(sentence).not.toMatch(
        /expected|received|Invalid|Unrecognized|Too (big|small)|undefined|NaN|zod/,
      );
      expect(sentence).toMatch(/^[A-Z"].*[.?]$/);
      told += 1;
    }
  expect(told).toBeGreaterThan(10);
});
