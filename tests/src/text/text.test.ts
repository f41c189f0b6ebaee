import { describe, expect, it } from 'vitest';
import { loadCalculators } from '../../../shared/calculators';
import { describeFields } from '../../../shared/contract/describeFields';
import { calculatorGroup } from '../../../src/text/calculatorGroups';
import { choiceTitle } from '../../../src/text/choiceTitle';
import {
  formatNumber,
  formatQuantity,
  formatSignedStops,
  formatStops,
} from '../../../src/text/formatQuantity';
import { headlineOf, resultParts, type ResultPart } from '../../../src/text/resultParts';
import { residualText, valueText } from '../../../src/text/valueText';

const calculators = await loadCalculators();

describe('numbers', () => {
  it.each([
    [1024, '1,024'],
    [0.0078125, '0.007813'],
    [-3, '−3'],
    [0, '0'],
    [2.5e-7, '2.5·10⁻⁷'],
    [-1.2349e12, '−1.235·10¹²'],
  ])('%d reads %s', (value, text) => expect(formatNumber(value)).toBe(text));

  it.each([
    [5.333333, '5.33'],
    [-0.001, '0'],
    [-2.5, '−2.5'],
  ])('%d stops read %s', (value, text) => expect(formatStops(value)).toBe(text));

  it('differences bear their sign, except nothing', () => {
    expect([2, -1.5, 0, -0.001].map(formatSignedStops)).toEqual(['+2', '−1.5', '0', '0']);
  });

  it.each([
    [3, 'm', '3 m'],
    [59910, 's', '16 h 38 min 30 s'],
    [7200, 's', '2 h'],
    [-3660, 's', '−1 h 1 min'],
    [45, '°', '45°'],
    [12.5, '%', '12.5 %'],
    [4.6e-5, 's', '46 µs'],
    [0.004, 's', '4 ms'],
    [2, 's', '2 s'],
    [0, 's', '0 s'],
    [7, undefined, '7'],
  ])('%d %s reads %s', (value, unit, text) => expect(formatQuantity(value, unit)).toBe(text));

  it('a residual says which way the mark lies', () => {
    expect([0.05, -1, 0.001].map(residualText)).toEqual([
      'the mark is 0.05 stops brighter',
      'the mark is 1 stop darker',
      'on the mark',
    ]);
  });
});

describe('words', () => {
  it('are made of codes', () => {
    expect(['iso', 'sky_at_sunset', 'shallowFocus', 'none'].map(choiceTitle)).toEqual([
      'ISO',
      'sky at sunset',
      'shallow focus',
      'none',
    ]);
  });

  it('stand for every group of calculators', () => {
    for (const { group } of calculators) expect(calculatorGroup(group).about, group).not.toBe('');
    expect(calculatorGroup('new').title).toBe('New');
  });
});

const EXAMPLES = calculators.map(
  ({ id, output, examples }) => [id, describeFields(output), examples[0]?.output] as const,
);
const partsOfExample = (id: string): ResultPart[] => {
  const [, fields, output] = EXAMPLES.find(([name]) => name === id) ?? [];
  return resultParts(fields ?? [], output);
};

/** Every text that a reader would see. */
function textsOf(parts: readonly ResultPart[]): string[] {
  return parts.flatMap((part) => {
    if (part.kind === 'value') return [part.title, part.text, part.exactly ?? ''];
    if (part.kind === 'group') return [part.title, ...textsOf(part.parts)];
    if (part.kind === 'sentences') return [part.title, ...part.sentences];
    return [part.title, ...part.columns, ...part.rows.flat()];
  });
}

describe('an answer', () => {
  it.each(EXAMPLES)('of %s is shown without a trace of JSON', (_, fields, output) => {
    const texts = textsOf(resultParts(fields, output));
    expect(texts.length).toBeGreaterThan(0);
    for (const text of texts) expect(text).not.toMatch(/\[object|undefined|NaN|null|[{}]/);
  });

  it('shows a setting as its mark, with the exact value and the residual', () => {
    const part = partsOfExample('exposure/solve').find(({ name }) => name === 'shutter');
    expect(part).toMatchObject({ kind: 'value', text: '1/125', exactly: 'exactly 0.007813 s, on the mark' });
  });

  it('shows rows as a table and what belongs together as a group', () => {
    const rows = partsOfExample('exposure/equivalents').find(({ name }) => name === 'rows');
    expect(rows).toMatchObject({ kind: 'table', columns: ['Aperture', 'Shutter', 'ISO'] });
    expect(rows?.kind === 'table' && rows.rows[0]).toEqual(['f/4', '1/500', '100']);
    const apex = partsOfExample('exposure/value').find(({ name }) => name === 'apex');
    expect(apex?.kind).toBe('group');
  });

  it('shows rows with things inside as a group each, and remarks as sentences', () => {
    const ways = partsOfExample('flash/daylight').filter(({ name }) => name.startsWith('ways'));
    expect(ways[0]).toMatchObject({ kind: 'group', title: 'Ways 1: smaller aperture' });
    const inside = ways.flatMap((way) => (way.kind === 'group' ? way.parts : []));
    expect(inside.some(({ kind, name }) => kind === 'sentences' && name === 'costs')).toBe(true);
  });

  it('names stops as differences, and places on a scale by their number alone', () => {
    const parts = partsOfExample('exposure/difference');
    expect(parts.find(({ name }) => name === 'stops')).toMatchObject({ text: '5 stops' });
    expect(partsOfExample('exposure/value')[0]).toMatchObject({ text: '13' });
  });
});

describe('instants', () => {
  const field = { name: 'at', title: 'At', kind: 'text', isRequired: true } as const;

  it.each([
    ['2026-06-21T22:00:00+01:00', '2026-06-21 22:00:00'],
    ['2026-06-21T21:00:00.000Z', '2026-06-21 21:00:00 UTC'],
    ['2026-06-21', '2026-06-21'],
  ])('%s reads %s', (instant, text) => expect(valueText(field as never, instant)).toBe(text));
});

describe('the headline', () => {
  it('is the solved setting where the answer names one', () => {
    expect(headlineOf(partsOfExample('exposure/solve')).map(({ name }) => name)).toEqual(['shutter']);
  });

  it('is the first values else, without the parts of a sum and what is left open', () => {
    expect(headlineOf(partsOfExample('exposure/depth')).map(({ name }) => name)).toEqual(['nearM', 'farM']);
    expect(headlineOf(partsOfExample('exposure/difference')).map(({ name }) => name)).toEqual(['stops']);
    expect(headlineOf(partsOfExample('flash/daylight')).every(({ text }) => text !== '–')).toBe(true);
  });

  it('says nothing twice, and not what was asked', () => {
    expect(headlineOf(partsOfExample('exposure/value')).map(({ name }) => name)).toEqual(['ev']);
    const names = headlineOf(partsOfExample('twilight/at')).map(({ name }) => name);
    expect(names).toHaveLength(2);
    expect(names).not.toContain('timeZone');
    expect(names).not.toContain('at');
  });
});
