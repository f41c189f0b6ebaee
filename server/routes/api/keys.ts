import type { IncomingHttpHeaders } from 'node:http';
import { z } from 'zod';
import { account as sentences } from '../../../shared/text';
import { ProblemError } from '../../http/ProblemError';
import { keyState, mayMakeKeys } from '../../policies/keyRules';
import { keySchema, presentKey } from '../../presenters/apiKey';
import { changeKey } from '../../services/keys/changeKey';
import { makeKey } from '../../services/keys/makeKey';
import { ownKey, ownKeys, type OwnKey } from '../../services/keys/ownKeys';
import type { SignedIn } from '../../services/sessions/liveSession';
import { invalidInput } from '../v1/invalidInput';
import { capIn, expiryIn, idIn, nameIn, scopesIn } from './fields';
import { closedRoute, type Route } from './route';

export const keyParams = z.strictObject({ id: idIn() });
const keyAnswer = z.strictObject({ key: keySchema });
/** A key whole: shown in this answer, and never again. */
export const freshKeyAnswer = z.strictObject({ key: keySchema, secret: z.string() });

export const shown = (key: OwnKey) => presentKey(key, keyState(key, key.now));

/** @throws ProblemError 403 */
export function requireDeveloper({ account }: SignedIn): void {
  if (!mayMakeKeys(account.roles))
    throw new ProblemError('role_missing', 'Server keys are for developers: add that role under Settings.');
}

/** @throws ProblemError 422 at `/expiresAt` */
function requireFuture(expiresAt: string | null | undefined, now: Date): void {
  if (!expiresAt || new Date(expiresAt) > now) return;
  const fault = { pointer: '/expiresAt', code: 'expiry_in_past', detail: sentences.expiry_in_past() };
  throw invalidInput([fault]);
}

/** The name that a caller gave its request, with or without the quotes of a structured field. */
function idempotencyNameOf(headers: IncomingHttpHeaders): string | null {
  const given = headers['idempotency-key'];
  if (given === undefined) return null;
  const name = /^"?([A-Za-z0-9._:-]{8,128})"?$/.exec(String(given))?.[1];
  if (name) return name;
  const detail = 'Idempotency-Key takes 8 to 128 letters, digits and . _ : -';
  throw invalidInput([{ pointer: '/Idempotency-Key', code: 'wrong_format', detail }]);
}

export const keysRoute: Route = closedRoute({
  id: 'ListKeys',
  method: 'GET',
  path: '/api/keys',
  tag: 'keys',
  summary: 'The keys of the account, the newest first',
  limit: 'usual',
  status: 200,
  problems: [],
  answer: z.strictObject({ keys: z.array(keySchema) }),
  async handle(_given, { signedIn }, { database }) {
    const keys = await ownKeys(database, signedIn.account.id);
    return { keys: keys.map(shown) };
  },
});

export const keyRoute: Route = closedRoute({
  id: 'ReadKey',
  method: 'GET',
  path: '/api/keys/:id',
  tag: 'keys',
  summary: 'One key',
  limit: 'usual',
  status: 200,
  problems: [404],
  params: keyParams,
  answer: keyAnswer,
  async handle({ params }, { signedIn }, { database }) {
    return { key: shown(await ownKey(database, signedIn.account.id, params.id)) };
  },
});

export const makeKeyRoute: Route = closedRoute({
  id: 'MakeKey',
  method: 'POST',
  path: '/api/keys',
  tag: 'keys',
  summary: 'Make a server key, shown whole in this answer alone; takes an Idempotency-Key',
  limit: 'usual',
  status: 201,
  problems: [409],
  body: z.strictObject({
    name: nameIn(),
    scopes: scopesIn().default(['*']),
    monthlyCap: capIn().default(null),
    expiresAt: expiryIn().default(null),
  }),
  answer: freshKeyAnswer,
  headers: ['Location'],
  async handle({ body }, visit, services) {
    const { signedIn, origin, request } = visit;
    requireDeveloper(signedIn);
    requireFuture(body.expiresAt, services.now());
    const accountId = signedIn.account.id;
    const fresh = await makeKey(services, accountId, body, idempotencyNameOf(request.headers), origin);
    visit.setHeader('Location', `/api/keys/${fresh.id}`);
    return { key: shown(await ownKey(services.database, accountId, fresh.id)), secret: fresh.key };
  },
});

export const changeKeyRoute: Route = closedRoute({
  id: 'ChangeKey',
  method: 'PATCH',
  path: '/api/keys/:id',
  tag: 'keys',
  summary: 'Rename a key, or give it other scopes, another cap or another expiry',
  limit: 'usual',
  status: 200,
  problems: [404, 409],
  params: keyParams,
  body: z.strictObject({
    name: nameIn().optional(),
    scopes: scopesIn().optional(),
    monthlyCap: capIn().optional(),
    expiresAt: expiryIn().optional(),
  }),
  answer: keyAnswer,
  async handle({ params, body }, { signedIn, origin }, services) {
    const which = { accountId: signedIn.account.id, keyId: params.id, origin };
    requireFuture(body.expiresAt, services.now());
    await changeKey(services, which, body);
    return { key: shown(await ownKey(services.database, which.accountId, params.id)) };
  },
});
