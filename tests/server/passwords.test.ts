import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { contextWords, passwordFault } from '../../server/policies/passwordRules';
import { refreshVerdict } from '../../server/policies/sessionLife';
import { bcryptWork, preHash } from '../../server/services/passwords/bcryptWork';
import { isCommonPassword } from '../../server/services/passwords/commonPasswords';

const judge = (password: string, words: readonly string[] = []) =>
  passwordFault(password, { isCommon: isCommonPassword, words });

describe('passwordFault', () => {
  it.each([
    ['fourteen chars', 'password_too_short'],
    ['fifteen, exact!', null],
    ['☾'.repeat(7) + 'eight ab', null],
    ['passwordpassword', 'password_common'],
    ['PASSWORDPASSWORD', 'password_common'],
    ['1qaz2wsx3edc4rfv', 'password_common'],
    ['aaaaaaaaaaaaaaaaa', 'password_common'],
    ['ab12ab12ab12ab12ab', 'password_common'],
    ['abcdefghijklmnopqr', 'password_common'],
    ['0987654321098765', 'password_common'],
    ['                    ', 'password_common'],
    ['12 words of my own', null],
  ])('judges “%s”: %s', (password, fault) => {
    expect(judge(password)).toBe(fault);
  });

  it('counts characters, not bytes or UTF-16 units', () => {
    expect(judge('🌒🌓🌔🌕🌖🌗🌘🌙🌚🌛🌜🌝🌞⭐🌟')).toBeNull();
    expect(judge('🌒🌓🌔🌕🌖🌗🌘🌙🌚🌛🌜🌝🌞⭐')).toBe('password_too_short');
  });

  it('refuses what is made of words about its owner, and takes them beside others', () => {
    const words = contextWords('evenfall', 'orla.wick@maren-heights.example', 'Orla Wick');
    expect(judge('orla.wick@maren-heights', words)).toBe('password_about_you');
    expect(judge('Orla Wick 1987!', words)).toBe('password_about_you');
    expect(judge('evenfall evenfall 12', words)).toBe('password_about_you');
    expect(judge('orla counts nine lamps', words)).toBeNull();
  });

  it('judges every spelling of the same characters alike', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', minLength: 1, maxLength: 60 }), (text) => {
        expect(judge(text.normalize('NFD'))).toBe(judge(text.normalize('NFC')));
      }),
    );
  });
});

describe('bcrypt after the pre-hash', () => {
  it('reads all of a password, and any spelling of it', () => {
    const hash = bcryptWork({ text: preHash(`${'x'.repeat(100)}é`), cost: 4 }) as string;
    expect(hash).toMatch(/^\$2b\$04\$/);
    expect(bcryptWork({ text: preHash(`${'x'.repeat(100)}e\u0301`), hash })).toBe(true);
    expect(bcryptWork({ text: preHash(`${'x'.repeat(100)}e`), hash })).toBe(false);
    expect(preHash('anything')).toHaveLength(44);
  });
});

describe('refreshVerdict', () => {
  const live = { isSessionLive: true, isSuccessorUsed: false, usedAgoS: null };

  it.each([
    [{ ...live }, 'renew'],
    [{ ...live, usedAgoS: 0 }, 'grace'],
    [{ ...live, usedAgoS: 10 }, 'grace'],
    [{ ...live, usedAgoS: 10.1 }, 'reuse'],
    [{ ...live, usedAgoS: 1, isSuccessorUsed: true }, 'reuse'],
    [{ ...live, isSessionLive: false }, 'ended'],
    [{ ...live, isSessionLive: false, usedAgoS: 100 }, 'ended'],
  ])('of %o is %s', (facts, verdict) => {
    expect(refreshVerdict(facts)).toBe(verdict);
  });
});
