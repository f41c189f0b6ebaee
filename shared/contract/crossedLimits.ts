import type { z } from 'zod';
import { contradictionAt, type FoundContradiction } from './contradictionAt';
import { exactOf, type Reading } from './settings';
import type { SettingIn } from './settingIn';

const PAIRS = [
  ['aperture', 'apertureMin', 'apertureMax'],
  ['shutter', 'shutterFastest', 'shutterSlowest'],
  ['iso', 'isoMin', 'isoMax'],
] as const;

interface WithLimits extends Reading {
  readonly limits?: Record<string, SettingIn | undefined>;
}

function crossed({ limits, ...reading }: WithLimits): FoundContradiction[] {
  return PAIRS.flatMap(([kind, low, high]) => {
    const [from, to] = [limits?.[low], limits?.[high]];
    if (from === undefined || to === undefined) return [];
    if (exactOf(kind, from, reading) <= exactOf(kind, to, reading)) return [];
    return [{ code: 'limits_crossed' as const, path: ['limits', high], params: { low, high, from, to } }];
  });
}

/**
 * A check that no lower limit in `limits` lies above its upper one. It compares the exact values that the limits
 * mean, since a mark may stand on the other side of a number than its own digits do: "1/125" is 1/128 s.
 */
export function crossedLimits<T extends z.ZodType>(schema: T): T {
  const find = (value: z.output<T>) => crossed(value as WithLimits);
  return contradictionAt<T>(find, ['limits', 'readAs', 'scale'])(schema);
}
