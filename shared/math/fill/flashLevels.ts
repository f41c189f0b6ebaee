import { leastRatioCount } from './assignFlashes';
import type { FillFlash, FlashRole, SyncKind } from './fillTypes';
import type { FlashGroup } from './flashMix';
import { roleSums, scaledSums, type RoleSums } from './roleSums';
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
/** Factors of light that differ by less are the same. */
const SAME_FACTOR = 1e-12;

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

/** The strongest first, then by name, so that the order in the request changes nothing. */
function inOwnOrder(flashes: readonly FillFlash[]): FillFlash[] {
  const strength = ({ guideNumberM, lossStops, nearM }: FillFlash) =>
    2 * Math.log2(guideNumberM / nearM) - lossStops;
  return [...flashes].sort((a, b) => strength(b) - strength(a) || (a.name < b.name ? -1 : 1));
}

/** The shortest time that lets all pulses through whole, s; 0 where no duration is known. */
export function wholeFromS(flashes: readonly FillFlash[], shutCurtainS: number): number {
  const longestS = Math.max(0, ...flashes.map(({ t05S }) => t05S ?? 0));
  return longestS === 0 ? 0 : shutCurtainS + WHOLE_PULSE * longestS + MOST_RISE_S;
}

/** Whether a shutter takes the same share from every flash of a role at every power. */
export function isClippedAlike(flashes: readonly FillFlash[]): boolean {
  const [first] = flashes;
  return flashes.every(
    ({ t05S, control }) => t05S === first?.t05S && (t05S === null || control !== 'cutoff'),
  );
}

/** The flashes of one role at each shutter: whole pulses, or what a shutter in normal sync lets through. */
export interface RoleTable {
  readonly flashes: readonly FillFlash[];
  readonly at: (shutter: GridShutter) => RoleSums;
}

/** By what factor all of these give more or less than those, nearest or farthest; null where that differs from flash to flash. */
function factorBetween(
  before: readonly FillFlash[],
  after: readonly FillFlash[],
  end: 'nearM' | 'farM',
): number | null {
  const factors = after.map((flash, i) => ((before[i]?.[end] ?? 0) / flash[end]) ** 2);
  const [first = 1] = factors;
  return factors.every((factor) => Math.abs(factor / first - 1) < SAME_FACTOR) ? first : null;
}

/** The table of flashes that differ from those of another by having moved alike, of which nothing need be summed anew. */
function movedTable(before: RoleTable, flashes: readonly FillFlash[]): RoleTable | null {
  const isMoved = (flash: FillFlash, i: number) => {
    const was = before.flashes[i];
    return was !== undefined && isSameFlash({ ...flash, nearM: was.nearM, farM: was.farM }, was);
  };
  if (flashes.length !== before.flashes.length || !flashes.every(isMoved)) return null;
  const far = factorBetween(before.flashes, flashes, 'farM');
  const near = factorBetween(before.flashes, flashes, 'nearM');
  if (far === null || near === null) return null;
  const known = new Map<RoleSums, RoleSums>();
  const at = (shutter: GridShutter) => {
    const was = before.at(shutter);
    const now = known.get(was) ?? withFlashes(scaledSums(was, far, near), before.flashes, flashes);
    known.set(was, now);
    return now;
  };
  return { flashes, at };
}

const isSameFlash = (a: FillFlash, b: FillFlash) =>
  (Object.keys(a) as (keyof FillFlash)[]).every((field) => a[field] === b[field]);

/** Sums with the flashes as they stand after moving. */
function withFlashes(sums: RoleSums, before: readonly FillFlash[], after: readonly FillFlash[]): RoleSums {
  const flashes = sums.flashes.map((one) => ({
    ...one,
    flash: after[before.indexOf(one.flash)] ?? one.flash,
  }));
  return { ...sums, flashes };
}

function roleTable(flashes: readonly FillFlash[], shutCurtainS: number): RoleTable {
  const ordered = inOwnOrder(flashes);
  const powers = ordered.map((flash) => powersOf(flash.minPower, flash.powerStepStops));
  const make = (clipOf: (flash: FillFlash, power: number) => number) =>
    roleSums(ordered.map((flash, i) => levelsOf(flash, powers[i] ?? [], (power) => clipOf(flash, power))));
  const whole = make(() => 0);
  const none = roleSums([]);
  const fromS = wholeFromS(flashes, shutCurtainS);
  const [first] = ordered;
  const clippedAt = (shutterS: number) => {
    const clipOf = (flash: FillFlash, power: number) => pulseClipStops(flash, power, shutterS, shutCurtainS);
    return first && isClippedAlike(flashes) ? scaledSums(whole, 2 ** clipOf(first, 1)) : make(clipOf);
  };
  const clipped = new Map<number, RoleSums>();
  const at = ({ sync, mark }: GridShutter) => {
    if (sync === 'none') return none;
    if (sync === 'highSpeed' || mark.exact >= fromS) return whole;
    const known = clipped.get(mark.exact) ?? clippedAt(mark.exact);
    clipped.set(mark.exact, known);
    return known;
  };
  return { flashes, at };
}

const isSame = (a: readonly FillFlash[], b: readonly FillFlash[]) =>
  a.length === b.length && a.every((flash, i) => flash === b[i]);

/** What the flashes can give at each shutter, role by role. */
export interface FlashTables {
  readonly shutCurtainS: number;
  readonly ratio: number | null;
  readonly roles: Readonly<Record<FlashRole, RoleTable>>;
  readonly at: (shutter: GridShutter) => FlashTable;
}

/**
 * What the flashes can give at each shutter. In normal sync that depends on the shutter only where it clips a pulse;
 * the loss of high-speed sync is the same for all flashes and is left to the caller.
 *
 * @param flashes what there is
 * @param shutCurtainS part of the exposure in which the frame is not wholly open, s
 * @param ratio (key + fill):fill where one is wished and there are both
 * @param before tables like these, of which roles that are the same are used again
 * @returns the tables, each made once and kept
 */
export function flashTables(
  flashes: readonly FillFlash[],
  shutCurtainS: number,
  ratio: number | null,
  before?: FlashTables,
): FlashTables {
  const tableOf = (role: FlashRole) => {
    const own = flashes.filter((flash) => flash.role === role);
    const known = before?.roles[role];
    if (known === undefined || before?.shutCurtainS !== shutCurtainS) return roleTable(own, shutCurtainS);
    if (isSame(known.flashes, own)) return known;
    return movedTable(known, own) ?? roleTable(own, shutCurtainS);
  };
  const roles = { key: tableOf('key'), fill: tableOf('fill'), rim: tableOf('rim') };
  const isSameAll = before?.ratio === ratio && ROLES.every((role) => before.roles[role] === roles[role]);
  if (before && isSameAll) return before;
  const known = new Map<number, FlashTable>();
  const at = (shutter: GridShutter) => {
    // A shutter may be used with another sync than before, once a camera's sync speed has changed.
    const key = SYNCS.length * shutter.step + SYNCS.indexOf(shutter.sync);
    const table = known.get(key) ?? tableAt(roles, shutter, ratio);
    known.set(key, table);
    return table;
  };
  return { shutCurtainS, ratio, roles, at };
}

const ROLES: readonly FlashRole[] = ['key', 'fill', 'rim'];
const SYNCS: readonly SyncKind[] = ['normal', 'highSpeed', 'none'];
const NO_FILL = roleSums([]);

function tableAt(roles: FlashTables['roles'], shutter: GridShutter, ratio: number | null): FlashTable {
  const front = { keys: roles.key.at(shutter), fills: roles.fill.at(shutter) };
  const rim = { keys: roles.rim.at(shutter), fills: NO_FILL };
  return {
    front,
    rim,
    frontMost: mostOf(front.keys) + mostOf(front.fills),
    rimMost: mostOf(rim.keys),
    frontWhole: [...roles.key.flashes, ...roles.fill.flashes].reduce(
      (sum, flash) => sum + wholeLight(flash),
      0,
    ),
    ratioLeast: ratio === null ? null : leastRatioCount(front, ratio),
  };
}
