import { nextTick, ref, type Ref } from 'vue';
import { Refused } from '../api/Refused';

export interface Submission {
  /** Whether an answer is waited for. */
  readonly isSending: Readonly<Ref<boolean>>;
  /** Sentences by the field that they are about. */
  readonly faults: Readonly<Ref<Readonly<Record<string, readonly string[]>>>>;
  /** What is wrong that no field is at fault for. */
  readonly trouble: Readonly<Ref<string | null>>;
  readonly code: Readonly<Ref<string | null>>;
  submit(): Promise<void>;
}

function byField(refused: Refused): Record<string, string[]> {
  const faults: Record<string, string[]> = {};
  for (const { pointer, detail } of refused.faults) (faults[pointer.split('/')[1] ?? ''] ??= []).push(detail);
  return faults;
}

/** Takes the reader to the first field at fault, once it says so. */
async function showFirstFault(): Promise<void> {
  await nextTick();
  document.querySelector<HTMLElement>('main [aria-invalid=true]')?.focus();
}

/**
 * Runs what a form asks for, once at a time, and keeps what went wrong beside the fields that it is about. What was
 * typed stays as it is.
 */
export function useSubmit(send: () => Promise<unknown>): Submission {
  const isSending = ref(false);
  const faults = ref<Record<string, readonly string[]>>({});
  const trouble = ref<string | null>(null);
  const code = ref<string | null>(null);

  async function submit(): Promise<void> {
    if (isSending.value) return;
    isSending.value = true;
    faults.value = {};
    trouble.value = null;
    code.value = null;
    try {
      await send();
    } catch (error) {
      if (!(error instanceof Refused)) throw error;
      code.value = error.code;
      faults.value = byField(error);
      if (error.faults.length > 0) await showFirstFault();
      else trouble.value = error.message;
    } finally {
      isSending.value = false;
    }
  }

  return { isSending, faults, trouble, code, submit };
}
