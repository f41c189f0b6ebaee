import { z } from 'zod';
import type { FoundContradiction } from './contradictionAt';
import { distanceM } from './quantities';

/** From where to where a flash may stand. */
interface Span {
  readonly minM: number;
  readonly maxM: number;
}

const span = {
  minM: distanceM({ title: 'Nearest place', description: 'where the flash may be moved' }),
  maxM: distanceM({ title: 'Farthest place', description: 'where the flash may be moved' }),
};

/** The same as fields of their own, so that a form can hold them; together, in the place of `distanceM`. */
export const spanFields = { minM: span.minM.optional(), maxM: span.maxM.optional() };

/** A flash's distance: one, or from where to where as { minM, maxM } or [nearest, farthest]. */
export const placeIn = () =>
  z
    .custom<number | number[] | Span>()
    .check((payload) => {
      const value: unknown = payload.value;
      const isGroup = typeof value === 'object' && value !== null && !Array.isArray(value);
      const list = z.array(distanceM()).min(1).max(2);
      const parsed = (isGroup ? z.strictObject(span) : Array.isArray(value) ? list : distanceM()).safeParse(
        value,
      );
      if (parsed.success) return;
      for (const issue of parsed.error.issues)
        payload.issues.push({ ...issue, input: value, path: [...issue.path] } as z.core.$ZodRawIssue);
    })
    .meta({
      title: 'Flash to subject',
      description:
        'where it stands; a list of the nearest and the farthest place, or { minM, maxM }, where it may move',
      unit: 'm',
      oneOrMany: distanceM(),
      maxItems: 2,
    });

interface Given extends Partial<Span> {
  readonly distanceM?: number | number[] | Span;
}

/** From where to where a flash may stand; both the same where it stays. */
export function placeOf({ distanceM: at, minM, maxM }: Given): {
  readonly nearM: number;
  readonly farM: number;
} {
  if (typeof at === 'number') return { nearM: at, farM: at };
  if (Array.isArray(at)) return { nearM: at[0] ?? 1, farM: at[1] ?? at[0] ?? 1 };
  const { minM: nearM = 1, maxM: farM = 1 } = at ?? { minM, maxM };
  return { nearM, farM };
}

/** The fault of a farthest place that lies nearer than the nearest one. */
export function placeFaults(given: Given, path: readonly (string | number)[]): FoundContradiction[] {
  const { nearM, farM } = placeOf(given);
  if (farM >= nearM) return [];
  const at = given.distanceM;
  const place = at === undefined ? ['maxM'] : ['distanceM', Array.isArray(at) ? 1 : 'maxM'];
  return [{ code: 'far_before_near', path: [...path, ...place], params: { nearM, farM } }];
}
