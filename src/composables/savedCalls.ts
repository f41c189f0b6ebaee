import { consoleApi, taken } from '../api/consoleApi';
import { Refused } from '../api/Refused';

export type SavedLine = Awaited<ReturnType<typeof fetchList>>['things'][number];
export type SavedThing = Awaited<ReturnType<typeof fetchOne>>['thing'];
export type SharedThing = Awaited<ReturnType<typeof savedCalls.shared>>;

/** What was read last stays in this browser, so that it can be read where there is no network. */
const KEPT_AS = 'evenfall.saved';

interface Kept {
  readonly list?: { readonly things: SavedLine[] };
  readonly things?: Readonly<Record<string, SavedThing>>;
}

function kept(): Kept {
  try {
    return (JSON.parse(localStorage.getItem(KEPT_AS) ?? '{}') ?? {}) as Kept;
  } catch {
    return {};
  }
}

function keep(more: Kept): void {
  try {
    localStorage.setItem(KEPT_AS, JSON.stringify({ ...kept(), ...more }));
  } catch {
    // Storage may be full or closed; then there is nothing to read without a network.
  }
}

const at = (id: string) => ({ params: { path: { id } } });
const fetchList = () => taken(consoleApi.GET('/api/saved'));
const fetchOne = (id: string) => taken(consoleApi.GET('/api/saved/{id}', at(id)));

/** What stood there at the last visit, where the service can't be reached. */
async function orAsBefore<T>(
  ask: () => Promise<T>,
  before: () => T | undefined,
): Promise<{ got: T; isOld: boolean }> {
  try {
    return { got: await ask(), isOld: false };
  } catch (error) {
    const old = error instanceof Refused && error.status === 0 ? before() : undefined;
    if (old === undefined) throw error;
    return { got: old, isOld: true };
  }
}

/** What photographers do with what they saved. */
export const savedCalls = {
  list: () =>
    orAsBefore(
      async () => {
        const list = await fetchList();
        keep({ list });
        return list;
      },
      () => kept().list,
    ),
  read: (id: string) =>
    orAsBefore(
      async () => {
        const { thing } = await fetchOne(id);
        keep({ things: { ...kept().things, [id]: thing } });
        return thing;
      },
      () => kept().things?.[id],
    ),
  rename: async (id: string, name: string, version: number) =>
    (await taken(consoleApi.PATCH('/api/saved/{id}', { ...at(id), body: { name, version } }))).thing,
  drop: (id: string) => taken(consoleApi.DELETE('/api/saved/{id}', at(id))),
  share: async (id: string) =>
    (await taken(consoleApi.POST('/api/saved/{id}/link', { ...at(id), body: {} }))).thing,
  unshare: async (id: string) => (await taken(consoleApi.DELETE('/api/saved/{id}/link', at(id)))).thing,
  shared: (token: string) => taken(consoleApi.GET('/api/shared/{token}', { params: { path: { token } } })),
};
