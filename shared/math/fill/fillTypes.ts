import type { ExactSettings } from '../exposure';
import type { FlashControl } from '../flashDuration';
import type { GhostVisibility } from '../ghost';
import type { Scale } from '../marks';
import type { Blur, Movement } from '../motionBlur';

/** What a flash is for. Key and fill light the subject's front; the rim lights its edge and does not count there. */
export type FlashRole = 'key' | 'fill' | 'rim';
/** One pulse in an open frame, a train of light over a travelling slit, or no flash at all. */
export type SyncKind = 'normal' | 'highSpeed' | 'none';
/** What to favour among recipes that are equally near to the aim. */
export type FillPreference = 'shallowFocus' | 'deepFocus' | 'lowIso' | 'frozen' | 'battery';

/** The light that is there, as scene exposure values at ISO 100. */
export interface FillScene {
  readonly backgroundEv100: number;
  readonly subjectEv100: number;
  /** ambient light on the edge that the rim lights; null where nobody said */
  readonly rimEv100: number | null;
}

/** How bright each part is to come out, stops from a middle tone. */
export interface FillAim {
  readonly backgroundStops: number;
  readonly subjectStops: number;
  /** (key + fill):fill of the flashes on the face, above 1; null where none is wished */
  readonly ratio: number | null;
  /** the rim flash alone; null where none is wished */
  readonly rimStops: number | null;
}

/** What the camera allows; f-numbers, seconds, ISO speeds. */
export interface FillCamera {
  readonly scale: Scale;
  readonly apertureMin: number;
  readonly apertureMax: number;
  readonly isoMin: number;
  readonly isoMax: number;
  readonly shutterSlowestS: number;
  readonly shutterFastestS: number;
  readonly syncSpeedS: number;
  /** null where the camera or the flashes can't */
  readonly highSpeedSync: { readonly curtainS: number; readonly extraLossStops: number } | null;
  /** part of the exposure in which the frame is not wholly open, s; 0 where it was not told */
  readonly shutCurtainS: number;
  /** filters at hand, stops, each by itself; none is always allowed */
  readonly ndStops: readonly number[];
}

/** A flash and where it may stand. */
export interface FillFlash {
  readonly name: string;
  readonly role: FlashRole;
  /** f-number times metres at ISO 100 and full power */
  readonly guideNumberM: number;
  /** smallest fraction of full power */
  readonly minPower: number;
  /** between two powers, stops */
  readonly powerStepStops: number;
  /** nearest and farthest place, m; the same for a flash that stays where it stands */
  readonly nearM: number;
  readonly farM: number;
  /** gel and modifier, stops that take light away */
  readonly lossStops: number;
  /** at full power, s; null where it is not known, so that nothing is clipped */
  readonly t05S: number | null;
  readonly control: FlashControl;
  /** after a pop at full power, s */
  readonly recycleFullS: number | null;
}

/** How the picture is framed. */
export interface FillView {
  readonly focalLengthMm: number;
  readonly distanceM: number;
  readonly pitchUm: number;
  readonly cropFactor: number;
}

/** What is known of movement and support; null where nothing is. */
export interface FillMotion {
  readonly view: FillView | null;
  readonly subject: Movement | null;
  /** null on a tripod, or where nobody said */
  readonly handheld: { readonly stabilisationStops: number } | null;
}

/** Everything that decides how a frame comes out, but for the settings and the flashes in use. */
export interface FillSetup {
  readonly scene: FillScene;
  readonly aim: FillAim;
  readonly camera: FillCamera;
  readonly motion: FillMotion;
}

/** A request for recipes. */
export interface FillWish extends FillSetup {
  readonly flashes: readonly FillFlash[];
  readonly prefer: FillPreference | null;
  readonly count: number;
}

/** A flash as it is set. */
export interface UsedFlash {
  readonly flash: FillFlash;
  readonly power: number;
  readonly distanceM: number;
}

/** How far each part is from the aim, stops, + is too bright; null for a part that is wished and not there. */
export interface FillMisses {
  readonly backgroundStops: number;
  readonly subjectStops: number;
  readonly ratioStops?: number | null;
  readonly rimStops?: number | null;
}

/** How a frame comes out. Stops are from a middle tone; null is light that is not there. */
export interface FillOutcome {
  readonly backgroundStops: number;
  readonly subjectAmbientStops: number;
  readonly subjectFlashStops: number | null;
  readonly subjectStops: number;
  readonly keyStops: number | null;
  readonly fillStops: number | null;
  /** ambient light and fill: the side that the key does not reach; null without a key */
  readonly shadowSideStops: number | null;
  /** (key + fill):fill; null unless both are there */
  readonly ratio: number | null;
  readonly rimStops: number | null;
  readonly rimAmbientStops: number | null;
  readonly flashToAmbientStops: number | null;
  /** what the shutter takes from the pulses on the front; null where no duration is known */
  readonly clippedStops: number | null;
  readonly highSpeedLossStops: number | null;
  /** of the flash that works hardest, up to full power; null without a flash */
  readonly reserveStops: number | null;
  /** until the slowest flash is ready again, s; null where that is not known */
  readonly recycleS: number | null;
  readonly ghost: {
    readonly stopsBelowFlash: number;
    readonly trailPx: number;
    readonly visibility: GhostVisibility;
    readonly throughStops: number | null;
  } | null;
  /** by the flash where it freezes and its duration is known, else by the shutter */
  readonly blur: (Blur & { readonly by: 'flash' | 'shutter'; readonly lightS: number }) | null;
  readonly handheld: {
    readonly withinLimit: boolean;
    readonly overStops: number;
    readonly limitS: number;
  } | null;
  readonly misses: FillMisses;
  /** the largest of the misses, without its sign */
  readonly missStops: number;
  /** what each used flash puts on the subject, in the order of the flashes */
  readonly onSubjectStops: readonly number[];
}

/** A setting that the camera has: the value behind the mark, its name, its place on the scale. */
export interface GearMark {
  readonly label: string;
  readonly exact: number;
}

/** One way to take the picture with the gear at hand. */
export interface FillRecipe {
  readonly aperture: GearMark;
  readonly shutter: GearMark;
  readonly iso: GearMark;
  readonly ndStops: number;
  readonly sync: SyncKind;
  readonly flashes: readonly UsedFlash[];
  readonly outcome: FillOutcome;
  /** less is better */
  readonly score: number;
}

/** The settings of a recipe as exact values. */
export function exactSettingsOf(recipe: Omit<FillRecipe, 'score' | 'outcome'>): ExactSettings {
  const { aperture, shutter, iso, ndStops } = recipe;
  return { aperture: aperture.exact, shutterS: shutter.exact, iso: iso.exact, ndStops };
}
