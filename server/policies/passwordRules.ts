/** NIST SP 800-63B-4, 3.1.1.2: at least 15 characters where the password is the only factor. */
export const PASSWORD_MIN = 15;
/** NIST asks for at least 64; a limit there must be, since hashing takes what it is given. */
export const PASSWORD_MAX = 128;

/** What of a password must be left once everything that a stranger would guess about its owner is taken out. */
const OWN_CHARACTERS = 8;
/** A run of so few characters, said again and again, is guessed as quickly as the run itself. */
const LONGEST_REPEATED = 5;
const SHORTEST_WORD = 3;

export type PasswordFault =
  'password_too_short' | 'password_too_long' | 'password_common' | 'password_about_you';

/** One spelling for all that look alike (NIST SP 800-63B-4, 3.1.1.2: NFKC), as it is hashed. */
export function normalPassword(password: string): string {
  return password.normalize('NFKC');
}

/** The spelling under which blocklists are kept. */
function foldPassword(password: string): string {
  return normalPassword(password).toLowerCase();
}

const characters = (text: string) => [...text];

function repeatsFewCharacters(folded: readonly string[]): boolean {
  return Array.from({ length: LONGEST_REPEATED }, (_, i) => i + 1).some((period) =>
    folded.every((character, i) => character === folded[i % period]),
  );
}

/** "abcdefghijklmno", "987654321098765": each character is the neighbour of the one before. */
function isOneRun(folded: readonly string[]): boolean {
  const codes = folded.map((character) => character.codePointAt(0) ?? 0);
  const steps = codes.slice(1).map((code, i) => code - (codes[i] ?? 0));
  return [1, -1].some((step) => steps.every((given) => given === step || given === -9 * step));
}

/** Words that a stranger would try first: of the address, the name, the host and the product. */
export function contextWords(...texts: readonly string[]): string[] {
  const words = texts.flatMap((text) => foldPassword(text).split(/[^\p{L}\p{N}]+/u));
  return [...new Set(words)].filter((word) => characters(word).length >= SHORTEST_WORD);
}

function isAbout(folded: string, words: readonly string[]): boolean {
  // The longest first, so that no word breaks a longer one apart.
  const ordered = [...words].sort((a, b) => b.length - a.length);
  const rest = ordered.reduce((text, word) => text.replaceAll(word, ' '), folded);
  if (rest === folded) return false;
  return characters(rest).filter((character) => /[\p{L}\p{N}]/u.test(character)).length < OWN_CHARACTERS;
}

interface Known {
  /** Whether a folded password is on the list of common ones. */
  readonly isCommon: (folded: string) => boolean;
  readonly words?: readonly string[];
}

/**
 * Why a password may not be taken, or null. Its length, whether it is a common one, and whether it is about its
 * owner: there are no rules of composition, and any character counts.
 */
export function passwordFault(password: string, { isCommon, words = [] }: Known): PasswordFault | null {
  const normal = normalPassword(password);
  const length = characters(normal).length;
  if (length < PASSWORD_MIN) return 'password_too_short';
  if (length > PASSWORD_MAX) return 'password_too_long';
  const folded = foldPassword(password);
  const each = characters(folded);
  if (isCommon(folded) || repeatsFewCharacters(each) || isOneRun(each)) return 'password_common';
  return isAbout(folded, words) ? 'password_about_you' : null;
}
