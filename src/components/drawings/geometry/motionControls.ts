import type { Body } from '../../../form/body';
import { thirdsAsStops } from '../../../form/stopsRuler';
import type { SettingIn } from '../../../../shared/contract/settingIn';
import type { SliderPlace } from '../../scale/RuledSlider.vue';

/** From twelve stops under the flash, where no trail is seen, to three over it, where nothing else is. */
const UNDER_STOPS = [12, -3] as const;
const COUNT = (UNDER_STOPS[0] - UNDER_STOPS[1]) * 3 + 1;

export interface UnderPlace extends SliderPlace {
  readonly stops: number;
}

/** Where the second control clicks: thirds of a stop, more ambient light to the right. */
export const underPlaces: readonly UnderPlace[] = Array.from({ length: COUNT }, (_, i) => {
  const stops = thirdsAsStops(UNDER_STOPS[0] * 3 - i);
  return { stops, label: String(Math.round(stops)).replace('-', '−'), isFullStop: i % 3 === 0 };
});

/** The place of a difference; an end where it lies beyond, null where there is none. */
export function placeOfUnder(stops: number | null): number | null {
  if (stops === null) return null;
  return Math.min(COUNT - 1, Math.max(0, Math.round((UNDER_STOPS[0] - stops) * 3)));
}

/** What the ambient light is until someone says otherwise. */
const FIRST = { shutter: '1/8', underFlashStops: 3 } as const;

/** The question with another time, or another difference; what else it needs is filled in where it is missing. */
export function withAmbient(
  body: Body,
  change: { readonly shutter: SettingIn } | { readonly underFlashStops: number },
): Body {
  const flash = (body.flash ?? {}) as Body;
  const ambient = (body.ambient ?? {}) as Body;
  const flashStops = typeof flash.brightnessStops === 'number' ? flash.brightnessStops : 0;
  const under = (stops: number) => Number((flashStops - stops).toFixed(4));
  const started = {
    shutter: FIRST.shutter,
    subjectBrightnessStops: under(FIRST.underFlashStops),
    ...ambient,
  };
  const changed =
    'shutter' in change
      ? { shutter: change.shutter }
      : { subjectBrightnessStops: under(change.underFlashStops) };
  return { ...body, ambient: { ...started, ...changed } };
}
