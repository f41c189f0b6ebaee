import { leastRatioCount } from './assignFlashes';
import type { FillCamera, FillFlash, FlashRole } from './fillTypes';
import type { FlashGroup } from './flashMix';
import { roleSums, type RoleSums } from './roleSums';
import { powersOf } from './powerSteps';
import { pulseClipStops } from './pulseClip';
import type { GridShutter } from './cameraGrid';

/**
 * What a flash can give, one entry a power from off upwards, as light on a subject at f/1, ISO 100 without a filter
 * (1 is a middle tone). A flash that may be moved gives anything from `low` to `high` at each power.
 */
export interface FlashLevels {
  readonly flash: FillFlash;
  /** 0 is off, then the fractions of full power, rising */
  readonly powers: readonly number[];
  readonly low: Float64Array;
  readonly high: Float64Array;
}

/** All flashes at one shutter: those of the front, and the rim. */
export interface FlashTable {
  readonly front: FlashGroup;
  readonly rim: FlashGroup;
  /** what key and fill, and the rim, give at most */
  readonly frontMost: number;
  readonly rimMost: number;
  /** what the flashes of the front give at full power when no shutter clips them */
  readonly frontWhole: number;
  /** by how much the ratio is missed at least, whatever the sum; null where there is none; parts of 1/120 stop */
  readonly ratioLeast: number | null;
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
  return { flash, powers: [0, ...rising], low, high };
}

const wholeLight = ({ guideNumberM, nearM, lossStops }: FillFlash) =>
  2 ** (2 * Math.log2(guideNumberM / nearM) - lossStops);

const mostOf = ({ reach }: RoleSums) => reach[reach.length - 1] ?? 0;

function tableOf(levels: readonly FlashLevels[], ratio: number | null): FlashTable {
  const sums = (role: FlashRole) => roleSums(levels.filter(({ flash }) => flash.role === role));
  const front = { keys: sums('key'), fills: sums('fill') };
  const rim = { keys: sums('rim'), fills: roleSums([]) };
  const inFront = [...front.keys.flashes, ...front.fills.flashes];
  return {
    front,
    rim,
    frontMost: mostOf(front.keys) + mostOf(front.fills),
    rimMost: mostOf(rim.keys),
    frontWhole: inFront.reduce((sum, { flash }) => sum + wholeLight(flash), 0),
    ratioLeast: ratio === null ? null : leastRatioCount(front, ratio),
  };
}

/** The strongest first, then by name, so that the order in the request changes nothing. */
function inOwnOrder(flashes: readonly FillFlash[]): FillFlash[] {
  const strength = ({ guideNumberM, lossStops, nearM }: FillFlash) =>
    2 * Math.log2(guideNumberM / nearM) - lossStops;
  return [...flashes].sort((a, b) => strength(b) - strength(a) || (a.name < b.name ? -1 : 1));
}

/** The shortest time that lets all pulses through whole, s; 0 where no duration is known. */
export function wholeFromS(
  flashes: readonly FillFlash[],
  { shutCurtainS }: Pick<FillCamera, 'shutCurtainS'>,
): number {
  const longestS = Math.max(0, ...flashes.map(({ t05S }) => t05S ?? 0));
  return longestS === 0 ? 0 : shutCurtainS + WHOLE_PULSE * longestS + MOST_RISE_S;
}

/**
 * What the flashes can give at each shutter. In normal sync that depends on the shutter only where it clips a pulse;
 * the loss of high-speed sync is the same for all flashes and is left to the caller.
 *
 * @param flashes what there is
 * @param camera for the part of the exposure in which the frame is not wholly open
 * @param ratio (key + fill):fill where one is wished and there are both
 * @returns the table for a shutter, made once and kept
 */
export function flashTables(
  flashes: readonly FillFlash[],
  camera: Pick<FillCamera, 'shutCurtainS'>,
  ratio: number | null,
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
      ratio,
    );
  const whole = make(null);
  const none = tableOf([], ratio);
  const fromS = wholeFromS(flashes, camera);
  const clipped = new Map<number, FlashTable>();
  return ({ sync, mark }) => {
    if (sync === 'none') return none;
    if (sync === 'highSpeed' || mark.exact >= fromS) return whole;
    const known = clipped.get(mark.exact) ?? make(mark.exact);
    clipped.set(mark.exact, known);
    return known;
  };
}
