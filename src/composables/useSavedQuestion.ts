import { computed, shallowRef, type ComputedRef, type Ref } from 'vue';
import type { SavedThing } from '../api/consoleApi';
import type { Body } from '../form/body';

type Kind = SavedThing['kind'];

export interface SavedQuestion {
  /** What was saved in this visit; null before. */
  readonly thing: Readonly<Ref<SavedThing | null>>;
  /** Whether the question is another one than was saved. */
  readonly isChanged: ComputedRef<boolean>;
  save(name: string): Promise<void>;
  share(): Promise<void>;
  unshare(): Promise<void>;
}

/** Comes with the first request, not with the page. */
const client = () => import('../api/consoleApi');

/** Saves a calculator's question under a name, saves it again when it was changed, and shares it by a link. */
export function useSavedQuestion(kind: Kind, body: () => Body): SavedQuestion {
  const thing = shallowRef<SavedThing | null>(null);
  const savedText = shallowRef('');

  async function save(name: string): Promise<void> {
    const { consoleApi, taken } = await client();
    const [asked, before] = [body(), thing.value];
    const answer = before
      ? await taken(
          consoleApi.PATCH('/api/saved/{id}', {
            params: { path: { id: before.id } },
            body: { name, body: asked, version: before.version },
          }),
        )
      : await taken(consoleApi.POST('/api/saved', { body: { kind, name, body: asked } }));
    thing.value = answer.thing;
    savedText.value = JSON.stringify(asked);
  }

  async function share(): Promise<void> {
    const { consoleApi, taken } = await client();
    if (!thing.value) return;
    const path = { id: thing.value.id };
    thing.value = (
      await taken(consoleApi.POST('/api/saved/{id}/link', { params: { path }, body: {} }))
    ).thing;
  }

  async function unshare(): Promise<void> {
    const { consoleApi, taken } = await client();
    if (!thing.value) return;
    const path = { id: thing.value.id };
    thing.value = (await taken(consoleApi.DELETE('/api/saved/{id}/link', { params: { path } }))).thing;
  }

  const isChanged = computed(() => savedText.value !== JSON.stringify(body()));
  return { thing, isChanged, save, share, unshare };
}
