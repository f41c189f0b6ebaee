import { describe, expect, it } from 'vitest';
import { agentText } from '../../../src/text/agentText';
import { eventText } from '../../../src/text/eventText';
import { hasEnded, keyStateLine, mayChange, scopesText, shownKey } from '../../../src/text/keyText';
import { lengthOf, metresOf, unitShown } from '../../../src/text/lengthUnit';
import { formatQuantity } from '../../../src/text/formatQuantity';

describe('a browser', () => {
  it.each([
    [
      'Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/126.0.0.0 Safari/537.36',
      'Chrome on Linux',
    ],
    [
      'Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/126.0.0.0 Safari/537.36 Edg/126.0.0.0',
      'Edge on Windows',
    ],
    [
      'Mozilla/5.0 (Macintosh; Intel Mac OS X 14.5; rv:127.0) Gecko/20100101 Firefox/127.0',
      'Firefox on macOS',
    ],
    [
      'Mozilla/5.0 (iPhone; CPU iPhone OS 17_5 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.5 Mobile/15E148 Safari/604.1',
      'Safari on iOS',
    ],
    [
      'Mozilla/5.0 (Linux; Android 14) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/126.0.0.0 Mobile Safari/537.36',
      'Chrome on Android',
    ],
    ['Something (Linux)', 'A browser on Linux'],
    ['curl/8.8.0', 'A browser or program'],
    ['', 'A browser or program'],
  ])('%s is called %s', (agent, text) => expect(agentText(agent)).toBe(text));
});

describe('a key', () => {
  it('says when its time is over, or was', () => {
    const day = '2027-03-01T12:00:00.000Z';
    expect(keyStateLine('live', null)).toBe('works');
    expect(keyStateLine('live', day)).toBe('works, until 1 Mar 2027');
    expect(keyStateLine('expired', day)).toBe('expired on 1 Mar 2027');
    expect(keyStateLine('revoked', day)).toBe('revoked');
  });

  it('is shown by its first characters and its last', () => {
    expect(shownKey({ shownPrefix: 'evenfall_server_Ab12', lastFour: 'wxyz' })).toBe(
      'evenfall_server_Ab12…wxyz',
    );
    expect(shownKey({ shownPrefix: null, lastFour: null })).toBe('not generated yet');
  });

  it('changes while it stands for itself', () => {
    const states = ['unclaimed', 'live', 'replaced', 'expired', 'revoked'] as const;
    expect(states.filter((state) => mayChange({ kind: 'server', state }))).toEqual(['unclaimed', 'live']);
    expect(states.filter((state) => mayChange({ kind: 'page', state }))).toEqual([]);
    expect(states.filter(hasEnded)).toEqual(['expired', 'revoked']);
  });

  it('says what it may call', () => {
    expect(scopesText(['*'])).toBe('everything');
    expect(scopesText(['exposure', 'frames', 'batch'])).toBe('Exposure, Test frames, Batches');
  });
});

describe('an event', () => {
  it('has words, says who did it, and is shown by its code where it has none', () => {
    expect(eventText('key_made', true)).toBe('Key made');
    expect(eventText('key_revoked', false)).toBe('Key revoked, not by you');
    expect(eventText('sign_in_failed', false)).toBe('Sign-in failed');
    expect(eventText('something_new', true)).toBe('something new');
  });
});

describe('lengths', () => {
  // The international foot is 0.3048 m exactly.
  it('are feet where somebody measures so, and come back as they were typed', () => {
    expect(metresOf(10, 'feet')).toBe(3.048);
    for (const feet of [1, 3.5, 12.25, 100, 1234.5])
      expect(lengthOf(metresOf(feet, 'feet'), 'feet')).toBe(feet);
    expect([lengthOf(2.5, 'metres'), metresOf(2.5, 'metres')]).toEqual([2.5, 2.5]);
  });

  it('bear their unit', () => {
    expect([unitShown('m', 'feet'), unitShown('m', 'metres'), unitShown('mm', 'feet')]).toEqual([
      'ft',
      'm',
      'mm',
    ]);
    expect(formatQuantity(3.048, 'm', 'feet')).toBe('10 ft');
    expect(formatQuantity(3.048, 'm')).toBe('3.048 m');
    expect(formatQuantity(50, 'mm', 'feet')).toBe('50 mm');
  });
});
