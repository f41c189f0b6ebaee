import fc from 'fast-check';
import { afterAll, beforeAll, expect, it } from 'vitest';
import * as step from '../../support/quotaCommands';
import { QuotaModel } from '../../support/quotaModel';
import { startService, type TestService } from '../../support/service';

let service: TestService;
beforeAll(async () => {
  service = await startService();
}, 30_000);
afterAll(() => service.stop());

const key = fc.nat(7);
const cap = fc.option(fc.nat(12));
const eighths = fc.oneof({ weight: 3, arbitrary: fc.nat(8) }, { weight: 1, arbitrary: fc.nat(400) });

/** A kind of step, so many times as likely as others. */
const often = <T>(times: number, arbitrary: fc.Arbitrary<T>) => Array<fc.Arbitrary<T>>(times).fill(arbitrary);
const holds = fc.constantFrom<'everything' | 'light'>('everything', 'everything', 'everything', 'light');

const steps = fc.commands(
  [
    ...often(
      2,
      fc.tuple(holds, cap).map(([what, own]) => step.makeKey(what, own)),
    ),
    key.map(step.revoke),
    fc.tuple(key, fc.nat(20)).map(([i, inS]) => step.expire(i, inS)),
    fc.tuple(key, cap).map(([i, own]) => step.setCap(i, own)),
    fc.nat(50).map(step.setUnits),
    fc.integer({ min: 1, max: 6 }).map(step.setRate),
    fc.constant(step.block(true)),
    ...often(3, fc.constant(step.block(false))),
    ...often(
      4,
      key.map((i) => step.call(i, 1)),
    ),
    ...often(
      4,
      fc.tuple(key, fc.integer({ min: 2, max: 12 })).map(([i, n]) => step.call(i, n)),
    ),
    key.map(step.faultyCall),
    ...often(
      3,
      fc
        .tuple(key, fc.integer({ min: 1, max: 12 }), fc.nat(2))
        .map(([i, good, bad]) => step.batch(i, good, bad)),
    ),
    key.map((i) => step.batch(i, 0, 2)),
    key.map(step.askUsage),
    ...often(3, eighths.map(step.advance)),
    ...often(2, fc.nat(8).map(step.approachMonthEnd)),
  ],
  { maxCommands: 60, size: 'max' },
);

let accounts = 0;
const seen = new Map<string, number>();

async function newAccount(): Promise<{ model: QuotaModel; real: step.RealAccount }> {
  const model = new QuotaModel(Date.parse('2031-12-31T23:59:50Z'), 30, 5);
  await service.setClock(new Date(model.nowMs).toISOString());
  const [row] = await service.sql<{ id: string }>(
    `INSERT INTO accounts (email, name, own_units_per_month, own_rate_per_second) VALUES ($1, 'model', $2, $3) RETURNING id`,
    [`model-${(accounts += 1)}@example.org`, model.units, model.ratePerSecond],
  );
  const real: step.RealAccount = { service, accountId: row?.id ?? '', keys: [], seen };
  // Most steps need keys; two are there from the start.
  for (const own of [null, 9]) await step.makeKey('everything', own).run(model, real);
  return { model, real };
}

it('decides and counts as plain counters and a token bucket would, step by step', async () => {
  await fc.assert(
    fc.asyncProperty(steps, async (commands) => {
      const { model, real } = await newAccount();
      await fc.asyncModelRun(() => ({ model, real }), commands);
    }),
    { numRuns: 50 },
  );
  process.stdout.write(
    `  decided: ${[...seen]
      .sort()
      .map(([name, count]) => `${count} ${name}`)
      .join(', ')}\n`,
  );
  // The runs are long enough to meet every limit.
  const limits = ['200', 'invalid_input', 'key_revoked', 'key_expired', 'account_blocked', 'scope_missing'];
  for (const name of [...limits, 'rate_limited', 'quota_exhausted', 'key_cap_reached'])
    expect(seen.get(name) ?? 0, name).toBeGreaterThan(0);
}, 120_000);
