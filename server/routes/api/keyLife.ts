import { z } from 'zod';
import { ProblemError } from '../../http/ProblemError';
import { confirmPassword } from '../../services/accounts/confirmPassword';
import { claimKey, revokeKey, rotateKey } from '../../services/keys/changeKey';
import { givePass } from '../../services/keys/givePass';
import { ownKey } from '../../services/keys/ownKeys';
import { passwordIn } from './fields';
import { freshKeyAnswer, keyParams, requireDeveloper, shown } from './keys';
import { closedRoute, type Route } from './route';

const shared = { tag: 'keys', limit: 'usual', problems: [404, 409], params: keyParams } as const;

export const rotateKeyRoute: Route = closedRoute({
  ...shared,
  id: 'RotateKey',
  method: 'POST',
  path: '/api/keys/:id/rotate',
  summary:
    'Make the key that takes another’s place; without grace the old one ends at once, and the password is asked for',
  status: 201,
  body: z.strictObject({
    grace: z
      .enum(['none', 'hour', 'day', 'week'])
      .default('day')
      .meta({ title: 'Grace', description: 'how long the old key keeps working: at once, 1 h, 24 h, 7 d' }),
    password: passwordIn().optional(),
  }),
  answer: freshKeyAnswer,
  async handle({ params, body }, { signedIn, origin }, services) {
    requireDeveloper(signedIn);
    const accountId = signedIn.account.id;
    await ownKey(services.database, accountId, params.id);
    if (body.grace === 'none') {
      if (body.password === undefined) throw new ProblemError('password_wrong');
      await confirmPassword(services, signedIn, body.password, origin);
    }
    const fresh = await rotateKey(services, { accountId, keyId: params.id, origin }, body.grace);
    return { key: shown(await ownKey(services.database, accountId, fresh.id)), secret: fresh.key };
  },
});

export const revokeKeyRoute: Route = closedRoute({
  ...shared,
  id: 'RevokeKey',
  method: 'POST',
  path: '/api/keys/:id/revoke',
  summary: 'End a key for good; doing it again changes nothing',
  status: 200,
  body: z.strictObject({}),
  answer: z.strictObject({ key: freshKeyAnswer.shape.key }),
  async handle({ params }, { signedIn, origin }, services) {
    const accountId = signedIn.account.id;
    await revokeKey(services, { accountId, keyId: params.id, origin });
    return { key: shown(await ownKey(services.database, accountId, params.id)) };
  },
});

export const claimKeyRoute: Route = closedRoute({
  ...shared,
  id: 'ClaimKey',
  method: 'POST',
  path: '/api/keys/:id/claim',
  summary: 'Generate a key that an administrator issued to you: once, shown whole in this answer alone',
  status: 201,
  body: z.strictObject({}),
  answer: freshKeyAnswer,
  async handle({ params }, { signedIn, origin }, services) {
    const accountId = signedIn.account.id;
    const fresh = await claimKey(services, { accountId, keyId: params.id, origin });
    return { key: shown(await ownKey(services.database, accountId, fresh.id)), secret: fresh.key };
  },
});

export const passRoute: Route = closedRoute({
  ...shared,
  id: 'GivePass',
  method: 'POST',
  path: '/api/keys/:id/pass',
  summary: 'A bearer for the try page: ten minutes, from the console’s pages only, charged to this key',
  status: 201,
  body: z.strictObject({}),
  answer: z.strictObject({ pass: z.string(), expiresAt: z.iso.datetime() }),
  async handle({ params }, { signedIn, origin }, services) {
    requireDeveloper(signedIn);
    const { sessionId, account } = signedIn;
    const wish = { accountId: account.id, keyId: params.id, sessionId, origin };
    const { pass, expiresAt } = await givePass(services, wish);
    return { pass, expiresAt: expiresAt.toISOString() };
  },
});
