import { storeToRefs } from 'pinia';
import type { ComputedRef } from 'vue';
import { useLengthStore } from '../stores/useLengthStore';
import type { LengthUnit } from '../text/lengthUnit';

/** How the reader measures: as chosen here, else as their account says, else in metres. */
export function useLengthUnit(): ComputedRef<LengthUnit> {
  return storeToRefs(useLengthStore()).lengthUnit;
}
