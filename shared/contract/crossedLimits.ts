import type { z } from 'zod';
import { sayFault } from '../text';
import { numberOfSetting, type SettingIn } from './settingIn';

const PAIRS = [
  ['aperture', 'apertureMin', 'apertureMax'],
  ['shutter', 'shutterFastest', 'shutterSlowest'],
  ['iso', 'isoMin', 'isoMax'],
] as const;

/** A check that no lower limit in `limits` lies above its upper one. */
export function crossedLimits<T extends z.ZodType>(schema: T): T {
  return schema.check((payload) => {
    const { limits } = payload.value as { limits?: Record<string, SettingIn | undefined> };
    for (const [kind, low, high] of PAIRS) {
      const [from, to] = [limits?.[low], limits?.[high]];
      if (from === undefined || to === undefined) continue;
      if (numberOfSetting(kind, from) <= numberOfSetting(kind, to)) continue;
      payload.issues.push({
        code: 'custom',
        input: to,
        path: ['limits', high],
        message: sayFault('limits_crossed', { low, high }),
        params: { fault: 'contradiction', code: 'limits_crossed' },
      });
    }
  }) as T;
}
