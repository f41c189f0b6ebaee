import type { Ask, Decision, Refusal, Standing } from './meter';

const REFUSALS: Record<string, Refusal> = {
  i: 'key_invalid',
  r: 'key_revoked',
  e: 'key_expired',
  b: 'account_blocked',
  s: 'scope_missing',
  o: 'origin_not_allowed',
  l: 'rate_limited',
  q: 'quota_exhausted',
  c: 'key_cap_reached',
};

/** One row for a whole batch: a verdict letter a call, and the state of each key after it. */
export interface TakeRow {
  readonly verdicts: string;
  readonly at: Date;
  readonly keys: readonly KeyState[];
}

interface KeyState {
  readonly id: string | null;
  readonly account: string;
  readonly limit?: number;
  readonly used: number;
  readonly cap: number | null;
  readonly keyUsed: number;
  readonly rate: number;
  readonly burst: number;
  readonly tokens: number;
}

const TAKE = 'SELECT verdicts, at, keys FROM meter_take($1, $2, $3, $4, $5)';
const TAKE_WITH_PASSES = 'SELECT verdicts, at, keys FROM meter_take_with_passes($1, $2, $3, $4, $5)';

/** The statement for a batch; only one that holds a pass pays for looking passes up. */
export function takeStatement(asks: readonly Ask[]): { readonly name: string; readonly text: string } {
  const withPasses = asks.some(({ isPass }) => isPass === true);
  return withPasses ? { name: 'take-with-passes', text: TAKE_WITH_PASSES } : { name: 'take', text: TAKE };
}

/** The parameters of `meter_take` for a batch; calls on one key share its hash. */
export function takeParameters(
  asks: readonly Ask[],
): readonly [Buffer[], number[], number[], string[], string[]] {
  const numbers = new Map<string, number>();
  const hashes: Buffer[] = [];
  const keys = asks.map(({ keyHash }) => {
    const name = keyHash.toString('latin1');
    const known = numbers.get(name);
    if (known !== undefined) return known;
    hashes.push(keyHash);
    numbers.set(name, hashes.length);
    return hashes.length;
  });
  return [
    hashes,
    keys,
    asks.map(({ units }) => units),
    asks.map(({ needs }) => needs.join(' ')),
    asks.map(({ site }) => site ?? ''),
  ];
}

const SPECIAL = /["\\]/;

function elementText(element: unknown): string | number {
  if (typeof element === 'number') return element;
  if (Buffer.isBuffer(element)) return `"\\\\x${element.toString('hex')}"`;
  const text = String(element);
  return `"${SPECIAL.test(text) ? text.replace(/["\\]/g, '\\$&') : text}"`;
}

/**
 * A list of numbers, texts or bytes as PostgreSQL writes an array (manual, 8.15.6). The driver does the same at
 * several times the cost.
 */
export function arrayText(elements: readonly unknown[]): string {
  let text = '{';
  for (let i = 0; i < elements.length; i++) text += (i === 0 ? '' : ',') + elementText(elements[i]);
  return `${text}}`;
}

function standingOf(key: KeyState, at: Date): Standing | null {
  if (key.limit === undefined || key.id === null) return null;
  return {
    accountId: key.account,
    keyId: key.id,
    limit: key.limit,
    used: key.used,
    cap: key.cap,
    keyUsed: key.keyUsed,
    ratePerSecond: key.rate,
    burst: key.burst,
    tokens: key.tokens,
    at,
  };
}

/** The decisions of a batch, in its order. `keyNumbers` is the second parameter of the statement. */
export function decisionsOf(row: TakeRow, keyNumbers: readonly number[]): Decision[] {
  const standings = row.keys.map((key) => standingOf(key, row.at));
  return keyNumbers.map((number, i) => {
    const standing = standings[number - 1] ?? null;
    const verdict = row.verdicts[i] ?? '';
    if (verdict === 'g' && standing) return { granted: true, standing };
    const refusal = REFUSALS[verdict];
    if (!refusal) throw new Error(`the meter gave no verdict for call ${i + 1}`);
    return { granted: false, refusal, keyId: row.keys[number - 1]?.id ?? null, standing };
  });
}
