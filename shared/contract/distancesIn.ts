import { z } from 'zod';
import { distancesBetween } from '../math/falloff';
import type { FoundContradiction } from './contradictionAt';
import { asList } from './oneOrMany';
import { distanceM, integer } from './quantities';

/** Longest list of distances in a request. */
const MOST_DISTANCES = 500;

/** A row of distances in equal steps. */
interface Span {
  readonly nearM: number;
  readonly farM: number;
  readonly steps: number;
}

const span = {
  nearM: distanceM({ title: 'From' }),
  farM: distanceM({ title: 'To' }),
  steps: integer({ title: 'Steps', description: 'between the two ends', min: 1, max: MOST_DISTANCES }),
};

/** The same as fields of their own, so that a link or a form can hold them. */
export const spanFields = {
  nearM: span.nearM.optional(),
  farM: span.farM.optional(),
  steps: span.steps.optional(),
};

/** A distance, a list of 1 to 500, or { nearM, farM, steps }. */
export const distancesIn = () =>
  z
    .custom<number | number[] | Span>()
    .check((payload) => {
      const value: unknown = payload.value;
      const item = distanceM();
      const isGroup = typeof value === 'object' && value !== null && !Array.isArray(value);
      const schema = isGroup ? z.strictObject(span) : z.array(item).min(1).max(MOST_DISTANCES);
      const parsed = (Array.isArray(value) || isGroup ? schema : item).safeParse(value);
      if (parsed.success) return;
      for (const issue of parsed.error.issues)
        payload.issues.push({ ...issue, input: value, path: [...issue.path] } as z.core.$ZodRawIssue);
    })
    .meta({
      title: 'Distances',
      description: 'one distance, a list of up to 500, or { nearM, farM, steps }',
      unit: 'm',
      oneOrMany: distanceM(),
      maxItems: MOST_DISTANCES,
    });

interface Given extends Partial<Span> {
  readonly distanceM?: number | number[] | Span;
}

function spanOf(given: Given): Span | null {
  const inside = given.distanceM;
  if (typeof inside === 'object' && !Array.isArray(inside)) return inside;
  const { nearM, farM, steps } = given;
  return nearM === undefined || farM === undefined || steps === undefined ? null : { nearM, farM, steps };
}

/** The fault of a far end that lies nearer than the near one, where it stands. */
export function spanFaults(given: Given): FoundContradiction[] {
  const found = spanOf(given);
  if (!found || found.farM >= found.nearM) return [];
  const path = given.nearM === undefined ? ['distanceM', 'farM'] : ['farM'];
  return [{ code: 'far_before_near', path, params: { ...found } }];
}

/** All distances that a request asks for. */
export function listOfDistances(given: Given): readonly number[] {
  const found = spanOf(given);
  if (found) return distancesBetween(found.nearM, found.farM, found.steps);
  return asList(given.distanceM as number | number[]);
}
