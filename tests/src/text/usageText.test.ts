import { describe, expect, it } from 'vitest';
import { describeFields } from '../../../shared/contract/describeFields';
import { exposureValue } from '../../../shared/calculators/exposure/value';
import { answerFor, parseInput } from '../../../shared/contract/defineCalculator';
import { annotatedJson, answerField, PROBLEM_FIELD } from '../../../src/text/annotatedJson';
import { explainedHeaders } from '../../../src/text/headerNotes';
import { formatMs, usageCsv } from '../../../src/text/usageText';

const sums = { calls: 3, units: 2, refused: 1, failed: 0, p50Ms: 0.6, p95Ms: null };

describe('usage as comma-separated text', () => {
  it('has a line for each row, with the table that it comes from', () => {
    const csv = usageCsv([
      { by: 'key', rows: [{ name: 'Desk', ...sums }] },
      { by: 'day', rows: [{ name: '2026-12-01', ...sums }] },
    ]);
    expect(csv.split('\r\n')).toEqual([
      'by,name,calls,units,refused,failed,p50_ms,p95_ms',
      'key,Desk,3,2,1,0,0.600,',
      'day,2026-12-01,3,2,1,0,0.600,',
      '',
    ]);
  });

  it('quotes what would break a line, and disarms what a spreadsheet would take for a formula', () => {
    const csv = usageCsv([
      {
        by: 'key',
        rows: [
          { name: 'a "b", c', ...sums },
          { name: '=1+1', ...sums },
        ],
      },
    ]);
    expect(csv).toContain('key,"a ""b"", c",3');
    expect(csv).toContain("key,'=1+1,3");
  });
});

it('says milliseconds to two figures, and whole from a hundred on', () => {
  expect([0.123, 1.06, 45.6, 234.5].map(formatMs)).toEqual(['0.12', '1.1', '46', '235']);
  expect(formatMs(null)).toBe('—');
});

describe('an answer line by line', () => {
  const parsed = parseInput(exposureValue, { aperture: 8, shutter: '1/125' });
  const answer = 'input' in parsed ? answerFor(exposureValue, parsed.input, { now: new Date(0) }) : null;
  const lines = annotatedJson(answer, answerField(describeFields(exposureValue.output)));

  it('is the same JSON as came', () => {
    expect(JSON.parse(lines.map(({ text }) => text).join('\n'))).toEqual(JSON.parse(JSON.stringify(answer)));
  });

  it('explains every value of the result, with its unit', () => {
    const unexplained = lines.filter(({ text, note }) => /^ {4,}"\w+": [^{[]/.test(text) && !note);
    expect(unexplained).toEqual([]);
    expect(lines.find(({ text }) => text.includes('"luminanceCdM2"'))?.note).toMatch(/cd\/m²/);
  });

  it('explains problems and lists, each item’s kind once', () => {
    const problem = { code: 'invalid_input', errors: [{ pointer: '/a' }, { pointer: '/b' }] };
    const notes = annotatedJson(problem, PROBLEM_FIELD).map(({ note }) => note ?? '');
    expect(notes.filter((note) => /Every fault/.test(note))).toHaveLength(1);
  });

  it('prints what nothing is known of without notes', () => {
    expect(annotatedJson({ a: [], b: [1, 2], c: {} })).toEqual([
      { text: '{' },
      { text: '  "a": [],' },
      { text: '  "b": [1,2],' },
      { text: '  "c": {}' },
      { text: '}' },
    ]);
  });
});

it('shows the headers that it explains, in one order, and leaves out the transport’s own', () => {
  const shown = explainedHeaders([
    ['x-request-id', 'r-1'],
    ['date', 'today'],
    ['ratelimit', '"burst";r=3'],
  ]);
  expect(shown.map(({ name }) => name)).toEqual(['ratelimit', 'x-request-id']);
  expect(shown.every(({ note }) => (note ?? '').length > 10)).toBe(true);
});
