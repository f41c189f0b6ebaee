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

interface SubmitOptions {
  /** The field at fault for problems that name none, by their code. */
  readonly fieldOf?: Readonly<Record<string, string>>;
}

type Faults = Record<string, string[]>;

function byField(refused: Refused, fieldOf: SubmitOptions['fieldOf'] = {}): Faults {
  const field = fieldOf[refused.code];
  if (field) return { [field]: [refused.message] };
  const faults: Faults = {};
  for (const { pointer, detail } of refused.faults) (faults[pointer.split('/')[1] ?? ''] ??= []).push(detail);
  return faults;
}

/** Takes the reader to the first field at fault of the form that they are in, once it says so; false if none does. */
async function showFirstFault(): Promise<boolean> {
  const scope = document.activeElement?.closest('[role=dialog], form, main') ?? document;
  await nextTick();
  const first = scope.querySelector<HTMLElement>('[aria-invalid=true]');
  first?.focus();
  return first !== null;
}

/**
 * Runs what a form asks for, once at a time, and keeps what went wrong beside the fields that it is about; a fault
 * whose field is not on the screen is said of the form as a whole. What was typed stays as it is.
 */
export function useSubmit(send: () => Promise<unknown>, { fieldOf }: SubmitOptions = {}): Submission {
  const isSending = ref(false);
  const faults = ref<Readonly<Record<string, readonly string[]>>>({});
  const trouble = ref<string | null>(null);
  const code = ref<string | null>(null);

  async function tell(refused: Refused): Promise<void> {
    code.value = refused.code;
    faults.value = byField(refused, fieldOf);
    const said = Object.values(faults.value).flat();
    if (said.length === 0) trouble.value = refused.message;
    else if (!(await showFirstFault())) trouble.value = said.join(' ');
  }

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
      await tell(error);
    } finally {
      isSending.value = false;
    }
  }

  return { isSending, faults, trouble, code, submit };
}
