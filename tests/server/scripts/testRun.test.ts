import { describe, expect, it } from 'vitest';
import { needsOf } from '../../../server/scripts/support/selectedTests';
import { countLines, totalOf } from '../../../server/scripts/support/testCounts';

const files = [
  'tests/shared/math/light.test.ts',
  'tests/src/form/body.test.ts',
  'tests/server/keys.test.ts',
  'tests/browser/home.test.ts',
];

describe('needsOf', () => {
  it.each([
    [[], { service: true, browser: true, isWhole: true }],
    [['tests/shared/math'], { service: false, browser: false, isWhole: false }],
    [['./tests/src'], { service: false, browser: false, isWhole: false }],
    [['tests/server', 'tests/shared'], { service: true, browser: false, isWhole: false }],
    [['home'], { service: true, browser: true, isWhole: false }],
    [['--testNamePattern=a'], { service: true, browser: true, isWhole: false }],
    [['tests/nothing'], { service: false, browser: false, isWhole: false }],
  ])('sets up for %j no more than the selected files need', (args, needs) => {
    expect(needsOf(files, args)).toMatchObject(needs);
  });
});

describe('countLines', () => {
  const counts = {
    'shared/math': { passed: 812, failed: 0, skipped: 0 },
    browser: { passed: 30, failed: 2, skipped: 1 },
  };

  it('ends with the two numbers alone on the last line', () => {
    expect(countLines(counts)).toEqual([
      '  browser         30 passed, 2 failed, 1 skipped',
      '  shared/math    812 passed',
      '842 passed, 2 failed',
    ]);
    expect(totalOf(counts)).toEqual({ passed: 842, failed: 2, skipped: 1 });
  });

  it('says so when nothing ran', () => {
    expect(countLines({})).toEqual(['0 passed, 0 failed']);
  });
});
