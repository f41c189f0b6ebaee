import type { FillCamera, FillFlash } from './fillTypes';
import { powersOf } from './powerSteps';
import { pulseClipStops } from './pulseClip';
import type { GridShutter } from './cameraGrid';

/**
 * What a flash can give, one entry a power from off upwards, as light on a subject at f/1, ISO 100 without a filter
 * (1 is a middle tone). A flash that may be moved gives anything from `low` to `high` at each power.
 */
export interface FlashLevels {
  readonly flash: FillFlash;
  readonly isFill: boolean;
  /** 0 is off, then the fractions of full power, rising */
  readonly powers: readonly number[];
  readonly low: Float64Array;
  readonly high: Float64Array;
}

/** All flashes at one shutter, those of the front apart from the rim, in an order that the request does not decide. */
export interface FlashTable {
  readonly front: readonly FlashLevels[];
  readonly rim: readonly FlashLevels[];
  /** every power that one of them can be set to, rising */
  readonly frontPowers: readonly number[];
  readonly rimPowers: readonly number[];
  readonly keyMost: number;
  readonly fillMost: number;
  readonly rimMost: number;
  /** what the flashes of the front give at full power when no shutter clips them */
  readonly frontWhole: number;
}

/** More than a tube takes to light up, s. */
const MOST_RISE_S = 1e-3;
/** A share that is this near to all of a pulse is all of it in a double: 1 − e^−40. */
const WHOLE_PULSE = 40 / Math.LN2;

function levelsOf(
  flash: FillFlash,
  powers: readonly number[],
  clipOf: (power: number) => number,
): FlashLevels {
  const low = new Float64Array(powers.length + 1);
  const high = new Float64Array(powers.length + 1);
  const rising = [...powers].reverse();
  const reach = 2 * Math.log2(flash.guideNumberM) - flash.lossStops;
  rising.forEach((power, i) => {
    const stops = reach + Math.log2(power) + clipOf(power);
    low[i + 1] = 2 ** (stops - 2 * Math.log2(flash.farM));
    high[i + 1] = 2 ** (stops - 2 * Math.log2(flash.nearM));
  });
  return { flash, isFill: flash.role === 'fill', powers: [0, ...rising], low, high };
}

const wholeLight = ({ guideNumberM, nearM, lossStops }: FillFlash) =>
  2 ** (2 * Math.log2(guideNumberM / nearM) - lossStops);

const most = (all: readonly FlashLevels[], isFill: boolean) =>
  all.reduce((sum, one) => (one.isFill === isFill ? sum + (one.high[one.high.length - 1] ?? 0) : sum), 0);

const allPowers = (levels: readonly FlashLevels[]) =>
  [...new Set(levels.flatMap(({ powers }) => powers.slice(1)))].sort((a, b) => a - b);

function tableOf(levels: readonly FlashLevels[]): FlashTable {
  const front = levels.filter(({ flash }) => flash.role !== 'rim');
  const rim = levels.filter(({ flash }) => flash.role === 'rim');
  return {
    front,
    rim,
    frontPowers: allPowers(front),
    rimPowers: allPowers(rim),
    keyMost: most(front, false),
    fillMost: most(front, true),
    rimMost: most(rim, false),
    frontWhole: front.reduce((sum, { flash }) => sum + wholeLight(flash), 0),
  };
}

/** Fills first, then the strongest, then by name, so that the order in the request changes nothing. */
function inOwnOrder(flashes: readonly FillFlash[]): FillFlash[] {
  const strength = ({ guideNumberM, lossStops, nearM }: FillFlash) =>
    2 * Math.log2(guideNumberM / nearM) - lossStops;
  const turn = ({ role }: FillFlash) => (role === 'fill' ? 0 : 1);
  return [...flashes].sort(
    (a, b) => turn(a) - turn(b) || strength(b) - strength(a) || (a.name < b.name ? -1 : 1),
  );
}

/**
 * What the flashes can give at each shutter. In normal sync that depends on the shutter only where it clips a pulse;
 * the loss of high-speed sync is the same for all flashes and is left to the caller.
 *
 * @param flashes what there is
 * @param camera for the part of the exposure in which the frame is not wholly open
 * @returns the table for a shutter, made once and kept
 */
export function flashTables(
  flashes: readonly FillFlash[],
  camera: FillCamera,
): (shutter: GridShutter) => FlashTable {
  const ordered = inOwnOrder(flashes);
  const powers = ordered.map((flash) => powersOf(flash.minPower, flash.powerStepStops));
  const make = (shutterS: number | null) =>
    tableOf(
      ordered.map((flash, i) =>
        levelsOf(flash, powers[i] ?? [], (power) =>
          shutterS === null ? 0 : pulseClipStops(flash, power, shutterS, camera.shutCurtainS),
        ),
      ),
    );
  const whole = make(null);
  const none = tableOf([]);
  const longestS = Math.max(0, ...flashes.map(({ t05S }) => t05S ?? 0));
  // A rise of the tube stretches a cut-off pulse by no more than this.
  const wholeFromS = camera.shutCurtainS + WHOLE_PULSE * longestS + MOST_RISE_S;
  const clipped = new Map<number, FlashTable>();
  return ({ sync, mark }) => {
    if (sync === 'none') return none;
    if (sync === 'highSpeed' || longestS === 0 || mark.exact >= wholeFromS) return whole;
    const known = clipped.get(mark.exact) ?? make(mark.exact);
    clipped.set(mark.exact, known);
    return known;
  };
}
