import type { Place } from '../sunSite';
import type { LadderAim, LadderFlash } from './rungPower';
import type { LampTimes } from './sceneModel';
import type { StaircasePlan } from './staircase';

/** A test frame: when, with which settings, and how much brighter than a middle tone its metered part came out. */
export interface LadderFrame {
  /** Milliseconds since 1970 (UTC). */
  readonly atMs: number;
  readonly aperture: number;
  readonly shutterS: number;
  readonly iso: number;
  readonly ndStops: number;
  readonly offsetStops: number;
}

/** Everything that a dusk ladder is made from. */
export interface LadderInput {
  readonly place: Place;
  /** At least one, in any order; the first one's shutter is kept while something else gives way before it. */
  readonly frames: readonly LadderFrame[];
  /** EV100 of what lamps and windows add, where it is known. */
  readonly lampFloorEv100?: number;
  readonly lamps?: LampTimes;
  readonly aim: LadderAim;
  readonly plan: Omit<StaircasePlan, 'baseShutterS' | 'fastestShutterS'>;
  readonly flash?: {
    readonly syncS?: number;
    /** Where the power on the subject is to be worked out. */
    readonly onSubject?: LadderFlash;
  };
  readonly fromMs?: number;
  readonly toMs?: number;
}

/** Settings from one instant until another. */
export interface Rung {
  readonly atMs: number;
  readonly untilMs: number;
  readonly aperture: number;
  readonly shutterS: number;
  readonly iso: number;
  /** Fraction of full power; null where the ambient light alone is enough; absent without a flash on the subject. */
  readonly power?: number | null;
  readonly sceneEv100: number;
  readonly sunAltitudeDeg: number;
  /** How much brighter than its aim the background comes out at the rung's start. */
  readonly errorStops: number;
  /**
   * How much earlier or later than `atMs` the change may be due, by the model's spread; 0 where lamps are switched, null
   * for the ladder's start and where it is more than two hours.
   */
  readonly earlyS: number | null;
  readonly lateS: number | null;
}

export type TurningCode = 'handheld_limit' | 'aperture_opens' | 'iso_rises' | 'flash_limit' | 'out_of_reach';

/** An instant at which the ladder reaches a limit or begins to use something up, or leaves that again. */
export interface TurningPoint {
  readonly atMs: number;
  readonly code: TurningCode;
  /** Whether the state ends here, as when the light comes back; false where it begins. */
  readonly isLeft: boolean;
}

/** What would mislead if it were not said. */
export type LadderNote =
  | { readonly code: 'lamps_unknown' }
  | {
      readonly code: 'lamps_undetermined';
      readonly lowEv100: number | null;
      readonly highEv100: number | null;
    }
  | { readonly code: 'frame_below_lamps'; readonly sceneEv100: number; readonly lampFloorEv100: number }
  | { readonly code: 'lamps_came_on'; readonly atMs: number }
  | { readonly code: 'frame_before_sunset' }
  | { readonly code: 'check_clock'; readonly offsetStops: number }
  | { readonly code: 'moon_counts' };

/** The dusk ladder. */
export interface DuskLadder {
  readonly rungs: readonly Rung[];
  readonly turningPoints: readonly TurningPoint[];
  readonly model: {
    readonly skyOffsetStops: number;
    readonly lampFloorEv100: number | null;
    readonly spreadStops: number;
    /** Measured less modelled, one a frame, in the frames' order. */
    readonly misfitStops: readonly number[];
  };
  readonly notes: readonly LadderNote[];
}
