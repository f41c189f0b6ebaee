import { ev100OfIlluminance, ev100OfLuminance } from '../math/exposure';

/** Light as a request says it, in exactly one of three ways, with the meter constants in use. */
export interface LightIn {
  readonly ev100?: number;
  readonly luminanceCdM2?: number;
  readonly illuminanceLux?: number;
  readonly reflectedK: number;
  readonly incidentC: number;
}

/** The light's EV at ISO 100; 0 only where nothing was said, which the schema does not let through. */
export function lightEv100(light: LightIn): number {
  if (light.luminanceCdM2 !== undefined) return ev100OfLuminance(light.luminanceCdM2, light.reflectedK);
  if (light.illuminanceLux !== undefined) return ev100OfIlluminance(light.illuminanceLux, light.incidentC);
  return light.ev100 ?? 0;
}
