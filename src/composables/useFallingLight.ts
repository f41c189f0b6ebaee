import { computed, ref } from 'vue';
import { answerFor, parseInput, type AnyCalculator } from '../../shared/contract/defineCalculator';
import type { SettingOut } from '../../shared/contract/settingOut';
import type { Remark } from '../../shared/contract/answer';
import { clock } from './clock';
import { useCalculator } from './useCalculator';

/** The settings that a light asks for, so many stops from now. */
export interface NextExposure {
  readonly stopsLater: number;
  readonly ev100: number;
  readonly shutter: SettingOut;
  readonly notes: readonly Remark[];
}

const STOPS_LATER = [0, 1, 2, 3] as const;

function exposureAt(
  calculator: AnyCalculator,
  ev100: number,
  settings: { aperture: string; iso: number },
): Omit<NextExposure, 'stopsLater'> | null {
  const parsed = parseInput(calculator, { ev100, ...settings });
  if (!('input' in parsed)) return null;
  const { result, notes } = answerFor(calculator, parsed.input, { now: clock.now() });
  return { ev100, shutter: (result as { shutter: SettingOut }).shutter, notes };
}

/** The landing page's live answer: the shutter now, and after each further stop of falling light. */
export function useFallingLight() {
  const { load, again } = useCalculator(() => 'exposure/solve');
  const ev100 = ref(9);
  const aperture = ref('f/4');
  const iso = ref(400);
  const exposures = computed<NextExposure[]>(() => {
    if (load.value.state !== 'ready') return [];
    const { calculator } = load.value;
    return STOPS_LATER.flatMap((stopsLater) => {
      const settings = { aperture: aperture.value, iso: iso.value };
      const found = exposureAt(calculator, ev100.value - stopsLater, settings);
      return found ? [{ stopsLater, ...found }] : [];
    });
  });
  return { load, again, ev100, aperture, iso, exposures };
}
