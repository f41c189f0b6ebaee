import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { pointerOf } from '../../../shared/contract/faults';
import { number } from '../../../shared/contract/quantities';
import { detailOf, everyField, withMore } from '../../support/everyField';
import { faultsIn, faultsInJson, inShort, onlyDetail } from '../../support/trial';

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
    expect(inShort(faultsIn(everyField, body)).sort()).toEqual(
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
    expect(inShort(faultsIn(everyField, withMore({ count: 1e300 })))).toEqual(['/count out_of_range']);
  });
});

describe('numbers at the edge of what JSON can say', () => {
  it('infinity is out of range, not another type', () => {
    const faults = faultsInJson(everyField, '{"aperture":1e999,"count":-1e999,"iso":1e999,"guides":[1e999]}');
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
    expect(detailOf({ count: Number.NaN })).toBe('Count takes a whole number; not a number was given.');
    expect(inShort(faultsIn(everyField, { aperture: Number.NaN }))).toEqual(['/aperture wrong_type']);
  });

  it('negative zero is zero', () => {
    const stops = z.strictObject({ nd: number({ title: 'ND', min: 0, max: 40 }) });
    expect(faultsIn(stops, { nd: -0 })).toEqual([]);
    expect(onlyDetail(everyField, { aperture: -0 })).toBe('Aperture must be from 0.5 to 256, not 0.');
    expect(inShort(faultsIn(everyField, withMore({ lamps: [{ distanceM: 1, power: -0 }] })))).toEqual([
      '/lamps/0/power out_of_range',
    ]);
  });

  it('a negative number is written with a minus', () => {
    expect(detailOf({ count: -2.5e-7 })).toContain('−2.5e-7 was given');
    expect(
      onlyDetail(z.strictObject({ s: number({ title: 'S', unit: 'stops', min: -1, max: 1 }) }), { s: -61 }),
    ).toBe('S must be from −1 to 1 stop, not −61 stops.');
  });
});

describe('hostile input', () => {
  it('very long text is shortened, and stays whole at the cut', () => {
    const said = detailOf({ way: 'x'.repeat(10_000) });
    expect(said.length).toBeLessThan(120);
    expect(said).toContain('…"');
    const emoji = detailOf({ way: '🌒'.repeat(100) });
    // A lone half of a character can't be written as UTF-8.
    expect(() => encodeURIComponent(emoji)).not.toThrow();
    expect(emoji).toContain('…');
    expect(detailOf({ ['y'.repeat(100_000)]: 1 }).length).toBeLessThan(250);
  });

  it('text that would break a sentence is told escaped', () => {
    expect(detailOf({ way: 'a"b\n\u0000' })).toBe('Way is one of up or down; "a\\"b\\n\\u0000" was given.');
    expect(detailOf({ aperture: '' })).toContain('"" can’t be read');
  });

  it('names of the language’s own objects are unknown fields like any others', () => {
    const faults = faultsInJson(
      everyField,
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
    const [fault] = faultsInJson(everyField, `{"aperture":${'['.repeat(depth)}${']'.repeat(depth)}}`);
    expect(fault?.detail).toBe(
      'Aperture takes a number such as 5.6, or text such as "f/5.6"; a list was given.',
    );
  });

  it('an object that pretends to have a length is an object', () => {
    const length = '{"valueOf":1,"toString":1}';
    const named = `{"aperture":8,"lamps":{"length":${length}},"guides":{"length":${length}}}`;
    expect(inShort(faultsInJson(everyField, named))).toEqual(['/lamps wrong_type', '/guides wrong_type']);
    expect(inShort(faultsInJson(everyField, `{"aperture":{"length":${length}},"day":{"length":1}}`))).toEqual(
      ['/aperture wrong_type', '/day wrong_type'],
    );
    const inList = `{"aperture":8,"lamps":[{"distanceM":1,"name":{"length":${length}}}]}`;
    expect(inShort(faultsInJson(everyField, inList))).toEqual(['/lamps/0/name wrong_type']);
  });

  it('thousands of unknown names are told without delay', () => {
    const names = Array.from({ length: 4000 }, (_, i) => [`${'unknown'.repeat(7)}${i}`, i]);
    const before = performance.now();
    const faults = faultsIn(everyField, { aperture: 8, ...Object.fromEntries(names) });
    expect(faults.length).toBe(4000);
    expect(performance.now() - before).toBeLessThan(1000);
  });

  it('a pointer escapes what JSON Pointer escapes', () => {
    // RFC 6901, section 3.
    expect(pointerOf(['a/b', 'c~d', 0, ''])).toBe('/a~1b/c~0d/0/');
    expect(faultsIn(everyField, { aperture: 8, 'x/y~z': 1 })[0]?.pointer).toBe('/x~1y~0z');
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
    for (const { detail: sentence } of faultsIn(everyField, body)) {
      expect(sentence).not.toMatch(
        /expected|received|Invalid|Unrecognized|Too (big|small)|undefined|NaN|zod/,
      );
      expect(sentence).toMatch(/^[A-Z"].*[.?]$/);
      told += 1;
    }
  expect(told).toBeGreaterThan(10);
});
