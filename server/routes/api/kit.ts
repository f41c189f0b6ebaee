import { z } from 'zod';
import { kitIn } from '../../../shared/contract/kit';
import { keepKit, kitOf } from '../../services/saved/kits';
import { closedRoute, type Route } from './route';

const versionIn = () => z.int().min(0).max(1_000_000_000).meta({ title: 'Version that was changed' });
const shared = { tag: 'saved', limit: 'usual', path: '/api/kit', status: 200 } as const;
const answer = z.strictObject({ kit: z.record(z.string(), z.unknown()), version: z.int() });

export const kitRoute: Route = closedRoute({
  ...shared,
  id: 'ReadKit',
  method: 'GET',
  summary: 'The gear of the account; version 0 where nothing was kept yet',
  problems: [],
  answer,
  handle: (_given, { signedIn }, { database }) => kitOf(database, signedIn.account.id),
});

export const keepKitRoute: Route = closedRoute({
  ...shared,
  id: 'KeepKit',
  method: 'PUT',
  summary: 'Keep the gear of the account, as changed from a version',
  problems: [409],
  body: z.strictObject({ kit: kitIn, version: versionIn() }),
  answer,
  handle: ({ body }, { signedIn }, { database }) => keepKit(database, signedIn.account.id, body),
});
