import { refusedByNetwork } from './Refused';

export interface PublicCall {
  /** `group/name`, or `batch`. */
  readonly id: string;
  /** JSON as it goes out; it may be wrong. */
  readonly body: string;
  readonly bearer: string;
}

/** An answer of the metered API, as it came. */
export interface PublicAnswer {
  readonly status: number;
  readonly headers: readonly (readonly [string, string])[];
  readonly text: string;
  readonly ms: number;
}

const TIME_OUT_MS = 20_000;

/**
 * Makes a call of the metered API as a program would.
 * @throws Refused where no answer comes; the signal's own reason where it was given up
 */
export async function publicCall(
  { id, body, bearer }: PublicCall,
  signal: AbortSignal,
): Promise<PublicAnswer> {
  const began = performance.now();
  try {
    const response = await fetch(`/v1/${id}`, {
      method: 'POST',
      body,
      credentials: 'omit',
      headers: { Authorization: `Bearer ${bearer}`, 'Content-Type': 'application/json' },
      signal: AbortSignal.any([signal, AbortSignal.timeout(TIME_OUT_MS)]),
    });
    const text = await response.text();
    const { status, headers } = response;
    return { status, headers: [...headers], text, ms: performance.now() - began };
  } catch (error) {
    if (signal.aborted) throw error;
    throw refusedByNetwork(error);
  }
}
