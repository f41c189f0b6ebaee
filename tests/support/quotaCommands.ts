import type fc from 'fast-check';
import { expect } from 'vitest';
import { hashOfKey, newKey, shownPartsOf } from '../../server/services/keys/keyText';
import type { ModelKey, QuotaModel, Verdict } from './quotaModel';
import type { CallAnswer, TestService } from './service';

/** The account that a run of commands works on, in the real service. */
export interface RealAccount {
  readonly service: TestService;
  readonly accountId: string;
  readonly keys: { readonly id: string; readonly text: string }[];
  /** What happened in this run, for knowing that the runs reach far enough. */
  readonly seen: Map<string, number>;
}

type QuotaCommand = fc.AsyncCommand<QuotaModel, RealAccount>;
type Run = (model: QuotaModel, real: RealAccount) => Promise<void>;

const ONE = { path: '/v1/exposure/value', body: { aperture: 8, shutter: '1/125' } };
const GOOD_ITEM = { calculator: 'light/convert', input: { ev100: 5 } };
const BAD_ITEM = { calculator: 'light/convert', input: { ev100: 'bright' } };

const same = (answer: CallAnswer): Verdict => ({
  status: answer.status,
  code: ((answer.body as unknown as { code?: string } | undefined)?.code ?? null) as string | null,
  retryAfterS: answer.headers['retry-after'] === undefined ? null : Number(answer.headers['retry-after']),
});

/** The counts in the database are the model's, after every step. */
async function expectSameCounts(model: QuotaModel, { service, accountId, keys }: RealAccount): Promise<void> {
  const [row] = await service.sql<{ used: string; tokens: number }>(
    'SELECT used, tokens FROM quota_periods WHERE account_id = $1 AND month = month_of(service_now())',
    [accountId],
  );
  expect(Number(row?.used ?? 0)).toBe(model.usedNow);
  if (row) expect(row.tokens).toBe(model.bucket?.tokens);
  const byKey = await service.sql<{ key_id: string; used: string }>(
    `SELECT key_id, used FROM key_periods p JOIN api_keys k ON k.id = p.key_id
     WHERE k.account_id = $1 AND month = month_of(service_now())`,
    [accountId],
  );
  const used = new Map(byKey.map((one) => [one.key_id, Number(one.used)]));
  expect(keys.map(({ id }) => used.get(id) ?? 0)).toEqual(model.keys.map((key) => model.keyUsedNow(key)));
}

function expectLimitsTold(model: QuotaModel, { headers }: CallAnswer): void {
  if (headers.ratelimit === undefined) return;
  const { tokens } = model.bucket ?? { tokens: model.burst };
  const left = Math.max(0, model.units - model.usedNow);
  const refillS = Math.max(1, Math.ceil((model.burst - tokens) / model.ratePerSecond));
  expect(headers.ratelimit).toBe(
    `"burst";r=${Math.floor(tokens)};t=${refillS}, "month";r=${left};t=${model.secondsToNextMonth}`,
  );
  expect(headers['evenfall-quota-remaining']).toBe(String(left));
}

/** A step: `label` as a failure shows it; it needs a key unless it says otherwise. */
function command(label: string, run: Run, needsKey = true): QuotaCommand {
  return {
    check: (model) => !needsKey || model.keys.length > 0,
    run: async (model, real) => {
      await run(model, real);
      await expectSameCounts(model, real);
    },
    toString: () => label,
  };
}

function keyAt(model: QuotaModel, real: RealAccount, index: number) {
  const i = index % model.keys.length;
  const key = model.keys[i] as ModelKey;
  const { id, text } = real.keys[i] as { id: string; text: string };
  return { key, id, text };
}

function note(real: RealAccount, verdict: Verdict): void {
  const name = verdict.code ?? String(verdict.status);
  real.seen.set(name, (real.seen.get(name) ?? 0) + 1);
}

const seconds = (ms: number) => new Date(ms).toISOString();

export const makeKey = (holds: ModelKey['holds'], cap: number | null) =>
  command(
    `makeKey(${holds}, cap ${cap})`,
    async (model, { service, accountId, keys }) => {
      const text = newKey('server');
      const { shownPrefix, lastFour } = shownPartsOf(text);
      const [row] = await service.sql<{ id: string }>(
        `INSERT INTO api_keys (account_id, kind, name, hash, shown_prefix, last_four, claimed_at, scopes, monthly_cap)
         VALUES ($1, 'server', 'model', $2, $3, $4, service_now(), $5, $6) RETURNING id`,
        [accountId, hashOfKey(text), shownPrefix, lastFour, [holds === 'light' ? 'light' : '*'], cap],
      );
      keys.push({ id: row?.id ?? '', text });
      model.keys.push({ holds, cap, isRevoked: false, expiresMs: null, used: new Map() });
    },
    false,
  );

export const revoke = (index: number) =>
  command(`revoke(${index})`, async (model, real) => {
    const { key, id } = keyAt(model, real, index);
    await real.service.sql('UPDATE api_keys SET revoked_at = service_now() WHERE id = $1', [id]);
    key.isRevoked = true;
  });

export const expire = (index: number, inS: number) =>
  command(`expire(${index}, in ${inS} s)`, async (model, real) => {
    const { key, id } = keyAt(model, real, index);
    key.expiresMs = model.nowMs + 1000 * inS;
    await real.service.sql('UPDATE api_keys SET expires_at = $2 WHERE id = $1', [id, seconds(key.expiresMs)]);
  });

export const setCap = (index: number, cap: number | null) =>
  command(`setCap(${index}, ${cap})`, async (model, real) => {
    const { key, id } = keyAt(model, real, index);
    await real.service.sql('UPDATE api_keys SET monthly_cap = $2 WHERE id = $1', [id, cap]);
    key.cap = cap;
  });

export const setUnits = (units: number) =>
  command(`setUnits(${units})`, async (model, { service, accountId }) => {
    await service.sql('UPDATE accounts SET own_units_per_month = $2 WHERE id = $1', [accountId, units]);
    model.units = units;
  });

export const setRate = (rate: number) =>
  command(`setRate(${rate})`, async (model, { service, accountId }) => {
    await service.sql('UPDATE accounts SET own_rate_per_second = $2 WHERE id = $1', [accountId, rate]);
    model.ratePerSecond = rate;
  });

export const block = (isBlocked: boolean) =>
  command(isBlocked ? 'block' : 'unblock', async (model, { service, accountId }) => {
    const at = isBlocked ? 'service_now()' : 'NULL';
    await service.sql(`UPDATE accounts SET blocked_at = ${at} WHERE id = $1`, [accountId]);
    model.isBlocked = isBlocked;
  });

/** `n` calls of one unit each, at the same time. */
export const call = (index: number, n: number) =>
  command(`call(${index}, ${n} at once)`, async (model, real) => {
    const { key, text } = keyAt(model, real, index);
    const make = () => real.service.call('POST', ONE.path, { key: text, body: ONE.body });
    const answers = await Promise.all(Array.from({ length: n }, make));
    const verdicts = answers.map(() => model.take({ key, units: 1, needs: ['exposure/value'] }));
    for (const verdict of verdicts) note(real, verdict);
    const texts = (list: readonly Verdict[]) => list.map((one) => `${one.status} ${one.code}`).sort();
    expect(texts(answers.map(same))).toEqual(texts(verdicts));
    if (n > 1) return;
    expect(same(answers[0] as CallAnswer)).toEqual(verdicts[0]);
    expectLimitsTold(model, answers[0] as CallAnswer);
  });

export const faultyCall = (index: number) =>
  command(`faultyCall(${index})`, async (model, real) => {
    const { key, text } = keyAt(model, real, index);
    const answer = await real.service.call('POST', ONE.path, { key: text, body: { aperture: 0 } });
    const verdict = model.take({ key, units: 0, needs: ['exposure/value'] });
    const told = verdict.code ? verdict : { ...verdict, status: 422, code: 'invalid_input' };
    note(real, told);
    expect(same(answer)).toEqual(told);
    expectLimitsTold(model, answer);
  });

export const batch = (index: number, good: number, bad: number) =>
  command(`batch(${index}, ${good} good and ${bad} bad)`, async (model, real) => {
    const { key, text } = keyAt(model, real, index);
    const calls = [...Array<unknown>(good).fill(GOOD_ITEM), ...Array<unknown>(bad).fill(BAD_ITEM)];
    const answer = await real.service.call('POST', '/v1/batch', { key: text, body: { calls } });
    const needs = good > 0 ? ['batch', 'light/convert'] : ['batch'];
    const verdict = model.take({ key, units: good, needs });
    note(real, verdict);
    expect(same(answer)).toEqual(verdict);
    expectLimitsTold(model, answer);
  });

export const askUsage = (index: number) =>
  command(`usage(${index})`, async (model, real) => {
    const { key, text } = keyAt(model, real, index);
    const answer = await real.service.call('GET', '/v1/usage', { key: text });
    const verdict = model.take({ key, units: 0, needs: [] });
    expect(same(answer)).toEqual(verdict);
    if (verdict.status !== 200) return;
    expect(answer.body).toMatchObject({
      used: model.usedNow,
      limit: model.units,
      key: { used: model.keyUsedNow(key), cap: key.cap },
    });
  });

async function setClock(model: QuotaModel, { service }: RealAccount, nowMs: number): Promise<void> {
  await service.setClock(seconds(nowMs));
  model.nowMs = nowMs;
}

/** Eighths of a second, which binary numbers hold exactly, so that both buckets agree to the last bit. */
export const advance = (eighths: number) =>
  command(
    `advance(${eighths / 8} s)`,
    (model, real) => setClock(model, real, model.nowMs + eighths * 125),
    false,
  );

/** To so long before the month's end, unless that is past; the next small step crosses it. */
export const approachMonthEnd = (eighths: number) =>
  command(
    `approachMonthEnd(${eighths / 8} s before)`,
    (model, real) => {
      const endMs = Math.floor(model.nowMs / 1000) * 1000 + 1000 * model.secondsToNextMonth;
      return setClock(model, real, Math.max(model.nowMs, endMs - eighths * 125));
    },
    false,
  );
