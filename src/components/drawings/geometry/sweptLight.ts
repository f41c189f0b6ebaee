/** A rectangle of one brightness, in pixels of the picture at the start of the exposure. */
export interface Patch {
  readonly leftPx: number;
  readonly rightPx: number;
  readonly topPx: number;
  readonly bottomPx: number;
  /** Linear light where the patch stays for the whole exposure. */
  readonly light: number;
}

/** A scene that is exposed while things move at an even pace. */
export interface SweptScene {
  /** What moves on across the picture; none covers another. */
  readonly subject: readonly Patch[];
  /** How far it moves to the right, pixels, ≥ 0. */
  readonly trailPx: number;
  /** Small lights behind it; none covers another. */
  readonly lamps: readonly Patch[];
  /** Linear light of the ground behind all of it. */
  readonly ground: number;
  /** How far the whole picture sinks, subject and ground alike, pixels, ≥ 0. */
  readonly shakePx: number;
}

/** A patch with the stretch of the exposure, whose whole is 0 to 1, for which a row sees it. */
interface Held {
  readonly patch: Patch;
  readonly from: number;
  readonly to: number;
}

/** When a row sees a patch that sinks by the shake; an empty stretch is always the same one. */
function heldBy(patch: Patch, y: number, shakePx: number): Held {
  const { topPx, bottomPx } = patch;
  if (shakePx === 0) return { patch, from: 0, to: topPx <= y && y < bottomPx ? 1 : 0 };
  const from = Math.max(0, (y - bottomPx) / shakePx);
  const to = Math.min(1, (y - topPx) / shakePx);
  return from < to ? { patch, from, to } : { patch, from: 0, to: 0 };
}

const heldInRow = (patches: readonly Patch[], y: number, shakePx: number): Held[] =>
  patches.map((patch) => heldBy(patch, y + 0.5, shakePx)).filter(({ from, to }) => from < to);

/** For how much of the stretch from `begin` to `end` a pixel sees a patch of the moving subject. */
function seenFor({ patch, from, to }: Held, x: number, trailPx: number, begin: number, end: number): number {
  let first = Math.max(from, begin);
  let last = Math.min(to, end);
  if (trailPx > 0) {
    first = Math.max(first, (x - patch.rightPx) / trailPx);
    last = Math.min(last, (x - patch.leftPx) / trailPx);
  } else if (x < patch.leftPx || x >= patch.rightPx) return 0;
  return Math.max(0, last - first);
}

/** Lights a row from one pixel up to another; what lies outside is left alone. */
function lightUp(row: Float64Array, leftPx: number, rightPx: number, lightAt: (x: number) => number): void {
  const last = Math.min(row.length, Math.ceil(rightPx));
  for (let i = Math.max(0, Math.floor(leftPx)); i < last; i++) row[i] = (row[i] ?? 0) + lightAt(i + 0.5);
}

/**
 * One row of a picture in linear light. What a pixel gets from a thing that passes is its light times the share of
 * the exposure for which the thing stood before that pixel; with an even pace those shares are stretches of time,
 * so the sum is exact and needs no sampling. Pixels are looked at in their middle.
 */
export function sweptRow(scene: SweptScene, y: number, widthPx: number): Float64Array {
  const { ground, trailPx, shakePx } = scene;
  const row = new Float64Array(widthPx).fill(ground);
  const subject = heldInRow(scene.subject, y, shakePx);
  for (const held of subject) {
    const over = held.patch.light - ground;
    const { leftPx, rightPx } = held.patch;
    lightUp(row, leftPx, rightPx + trailPx, (x) => over * seenFor(held, x, trailPx, 0, 1));
  }
  for (const { patch, from, to } of heldInRow(scene.lamps, y, shakePx)) {
    lightUp(row, patch.leftPx, patch.rightPx, (x) => {
      const hidden = subject.reduce((sum, held) => sum + seenFor(held, x, trailPx, from, to), 0);
      return (patch.light - ground) * (to - from - hidden);
    });
  }
  // Differences of huge lights may leave a rounding below nothing.
  for (let i = 0; i < widthPx; i++) row[i] = Math.max(0, row[i] ?? 0);
  return row;
}

/** What tells one row from another: rows with the same key have the same light. */
export function rowKey(scene: SweptScene, y: number): string {
  const held = (patches: readonly Patch[]) =>
    patches.map((patch) => heldBy(patch, y + 0.5, scene.shakePx)).map(({ from, to }) => `${from},${to}`);
  return `${held(scene.subject).join(';')}|${held(scene.lamps).join(';')}`;
}
