import { z } from 'zod';
import { loadCalculators } from '../../../shared/calculators';
import { parseInput } from '../../../shared/contract/defineCalculator';
import {
  changeThing,
  dropThing,
  savedLines,
  savedThing,
  saveThing,
  sharedThing,
  shareThing,
  shareToken,
  unshareThing,
  type SavedKind,
  type SavedLine,
  type SavedThing,
} from '../../services/saved/savedThings';
import { invalidInput } from '../v1/invalidInput';
import { idIn, linkTokenIn, nameIn } from './fields';
import { closedRoute, openRoute, type ConsoleServices, type Route } from './route';

/** Whose question each kind holds. */
const CALCULATORS: Record<SavedKind, string> = { recipe: 'fill/recipes', evening: 'twilight/ladder' };
const calculators = loadCalculators();

const kindIn = () => z.enum(['recipe', 'evening']).meta({ title: 'Kind' });
const bodyIn = () =>
  z.record(z.string(), z.unknown()).meta({ title: 'Question', description: 'as its calculator takes it' });
const versionIn = () => z.int().min(1).max(1_000_000_000).meta({ title: 'Version that was changed' });

const line = {
  id: z.uuid(),
  kind: kindIn(),
  name: z.string(),
  version: z.int(),
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  link: z
    .string()
    .nullable()
    .meta({ description: 'where whoever has it may read the thing; null: not shared' }),
};
const lineSchema = z.strictObject(line);
/** A saved thing, as its holder may see it. */
export const thingSchema = z.strictObject({ ...line, body: z.record(z.string(), z.unknown()) });
const answer = z.strictObject({ thing: thingSchema });

function lineOf(
  { id, kind, name, version, createdAt, updatedAt, shareNonce }: SavedLine,
  { settings }: ConsoleServices,
) {
  const { sessionSecret, publicUrl } = settings;
  return {
    id,
    kind,
    name,
    version,
    createdAt: createdAt.toISOString(),
    updatedAt: updatedAt.toISOString(),
    link: shareNonce && `${publicUrl}/shared/${shareToken(sessionSecret, id, shareNonce)}`,
  };
}

export const presentThing = (thing: SavedThing, services: ConsoleServices) => ({
  ...lineOf(thing, services),
  body: thing.body,
});

/** @throws ProblemError 422 with the calculator's own faults, each at its place in the question */
async function requireGood(kind: SavedKind, body: Record<string, unknown>): Promise<void> {
  const calculator = (await calculators).find(({ id }) => id === CALCULATORS[kind]);
  if (!calculator) throw new Error(`no calculator answers a saved ${kind}`);
  const parsed = parseInput(calculator, body);
  if (!('faults' in parsed)) return;
  throw invalidInput(parsed.faults.map((fault) => ({ ...fault, pointer: `/body${fault.pointer}` })));
}

const shared = { tag: 'saved', limit: 'usual' } as const;
const params = z.strictObject({ id: idIn() });

export const savedListRoute: Route = closedRoute({
  ...shared,
  id: 'ListSaved',
  method: 'GET',
  path: '/api/saved',
  summary: 'Saved recipes and evenings, the latest first',
  status: 200,
  problems: [],
  answer: z.strictObject({ things: z.array(lineSchema) }),
  async handle(_given, { signedIn }, services) {
    const things = await savedLines(services.database, signedIn.account.id);
    return { things: things.map((thing) => lineOf(thing, services)) };
  },
});

export const saveRoute: Route = closedRoute({
  ...shared,
  id: 'Save',
  method: 'POST',
  path: '/api/saved',
  summary: 'Save a recipe’s or an evening’s question under a name',
  status: 201,
  problems: [409],
  body: z.strictObject({ kind: kindIn(), name: nameIn(), body: bodyIn() }),
  answer,
  headers: ['Location'],
  async handle({ body }, visit, services) {
    await requireGood(body.kind, body.body);
    const thing = await saveThing(services.database, visit.signedIn.account.id, body);
    visit.setHeader('Location', `/api/saved/${thing.id}`);
    return { thing: presentThing(thing, services) };
  },
});

export const savedRoute: Route = closedRoute({
  ...shared,
  id: 'ReadSaved',
  method: 'GET',
  path: '/api/saved/:id',
  summary: 'One saved thing',
  status: 200,
  problems: [404],
  params,
  answer,
  async handle({ params: { id } }, { signedIn }, services) {
    return { thing: presentThing(await savedThing(services.database, signedIn.account.id, id), services) };
  },
});

export const changeSavedRoute: Route = closedRoute({
  ...shared,
  id: 'ChangeSaved',
  method: 'PATCH',
  path: '/api/saved/:id',
  summary: 'Rename a saved thing, or put another question in its place, as changed from a version',
  status: 200,
  problems: [404, 409],
  params,
  body: z.strictObject({ name: nameIn().optional(), body: bodyIn().optional(), version: versionIn() }),
  answer,
  async handle({ params: { id }, body }, { signedIn }, services) {
    const accountId = signedIn.account.id;
    const { kind } = await savedThing(services.database, accountId, id);
    if (body.body) await requireGood(kind, body.body);
    return { thing: presentThing(await changeThing(services.database, accountId, id, body), services) };
  },
});

export const dropSavedRoute: Route = closedRoute({
  ...shared,
  id: 'DropSaved',
  method: 'DELETE',
  path: '/api/saved/:id',
  summary: 'Remove a saved thing for good, and its link with it',
  status: 204,
  problems: [404],
  params,
  answer: null,
  handle: ({ params: { id } }, { signedIn }, { database }) => dropThing(database, signedIn.account.id, id),
});

export const shareRoute: Route = closedRoute({
  ...shared,
  id: 'Share',
  method: 'POST',
  path: '/api/saved/:id/link',
  summary: 'Let whoever has the link read this; asking again gives the same link',
  status: 200,
  problems: [404],
  params,
  body: z.strictObject({}),
  answer,
  async handle({ params: { id } }, { signedIn }, services) {
    const { database, settings } = services;
    const thing = await shareThing(database, signedIn.account.id, id, settings.sessionSecret);
    return { thing: presentThing(thing, services) };
  },
});

export const unshareRoute: Route = closedRoute({
  ...shared,
  id: 'Unshare',
  method: 'DELETE',
  path: '/api/saved/:id/link',
  summary: 'Make the link worthless; a later one is another',
  status: 200,
  problems: [404],
  params,
  answer,
  async handle({ params: { id } }, { signedIn }, services) {
    return { thing: presentThing(await unshareThing(services.database, signedIn.account.id, id), services) };
  },
});

export const sharedRoute: Route = openRoute({
  ...shared,
  id: 'ReadShared',
  method: 'GET',
  path: '/api/shared/:token',
  summary: 'What stands behind a link, without whose it is',
  status: 200,
  problems: [404],
  params: z.strictObject({ token: linkTokenIn() }),
  answer: z.strictObject({
    kind: kindIn(),
    name: z.string(),
    updatedAt: z.iso.datetime(),
    body: z.record(z.string(), z.unknown()),
  }),
  async handle({ params: { token } }, _visit, { database }) {
    const { kind, name, updatedAt, body } = await sharedThing(database, token);
    return { kind, name, updatedAt: updatedAt.toISOString(), body };
  },
});
