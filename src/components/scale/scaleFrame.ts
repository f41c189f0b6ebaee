/** A ruled axis in stops, laid over a width in pixels; more light is to the right. */
export interface ScaleFrame {
  readonly fromStops: number;
  readonly toStops: number;
  readonly widthPx: number;
  /** Room left and right, so that a cursor on an end stays inside. */
  readonly padPx: number;
}

export interface Tick {
  readonly stops: number;
  readonly xPx: number;
  readonly rank: 'third' | 'stop' | 'numbered';
}

/** Thirds are drawn from this distance between stops on; closer together they would only be grey. */
const THIRDS_FROM_PX = 21;
const NUMBERS_APART_PX = 40;
/** Closer together, single steps would be grey too, and there may be thousands of them. */
const STEPS_FROM_PX = 4;

/** How many pixels one stop takes. */
export function pxPerStop({ fromStops, toStops, widthPx, padPx }: ScaleFrame): number {
  return (widthPx - 2 * padPx) / (toStops - fromStops);
}

/** Where a value stands on the axis. */
export function xOf(frame: ScaleFrame, stops: number): number {
  return frame.padPx + (stops - frame.fromStops) * pxPerStop(frame);
}

/** A value held within the axis, and whether it lay beyond. */
export function heldWithin(frame: ScaleFrame, stops: number): { stops: number; isBeyond: boolean } {
  const held = Math.min(frame.toStops, Math.max(frame.fromStops, stops));
  return { stops: held, isBeyond: held !== stops };
}

/**
 * Every how many stops a number stands, so that the numbers do not touch.
 * @param apartPx from one number's middle to the next at least
 */
export function numberedEvery(frame: ScaleFrame, apartPx = NUMBERS_APART_PX): number {
  const stopPx = pxPerStop(frame);
  const decades = [1, 10, 100, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8];
  const steps = decades.flatMap((ten) => [ten, 2 * ten, 5 * ten]);
  return steps.find((every) => every * stopPx >= Math.max(NUMBERS_APART_PX, apartPx)) ?? 1e9;
}

/** The ruling: thirds where there is room, stops, and the numbered ones among them; these alone where it is close. */
export function ticksOf(frame: ScaleFrame, parts: 1 | 3 = 3, apartPx?: number): Tick[] {
  const every = numberedEvery(frame, apartPx);
  const stopPx = pxPerStop(frame);
  const perStop = stopPx >= THIRDS_FROM_PX ? parts : stopPx >= STEPS_FROM_PX ? 1 : 1 / every;
  const first = Math.ceil(frame.fromStops * perStop);
  const last = Math.floor(frame.toStops * perStop);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => {
    const step = first + i;
    const stops = perStop < 1 ? step * every : step / perStop;
    const isStop = Number.isInteger(stops);
    return {
      stops,
      xPx: xOf(frame, stops),
      rank: !isStop ? 'third' : stops % every === 0 ? 'numbered' : 'stop',
    };
  });
}

/** Whole stops around the values, with a margin, and at least `least` stops wide. */
export function spanAround(
  values: readonly number[],
  least: number,
  marginStops = 1,
): { fromStops: number; toStops: number } {
  const known = values.filter(Number.isFinite);
  const low = Math.floor(Math.min(...(known.length ? known : [0]))) - marginStops;
  const high = Math.ceil(Math.max(...(known.length ? known : [0]))) + marginStops;
  const missing = Math.max(0, least - (high - low));
  return { fromStops: low - Math.floor(missing / 2), toStops: high + Math.ceil(missing / 2) };
}
