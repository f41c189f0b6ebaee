import type { z } from 'zod';
import type { flashBudget } from '../../../../shared/calculators/flash/budget';
import { formatNumber } from '../../../text/formatQuantity';
import type { Span } from '../../scale/lightScale';
import { plainAxis } from './axes';
import type { PlotPoint } from './plotFrame';
import type { PicturesOf } from './scalePicture';

type Result = z.output<typeof flashBudget.output>;
type Input = z.output<typeof flashBudget.input>;

/** More batteries than these are drawn as one long bar. */
const MOST_BATTERIES = 6;

/** The frames that each battery gives, end to end, and the frames planned. */
export const batteryPictures: PicturesOf = (given, answer) => {
  const { frames } = given as Input;
  const { framesPerBattery, batteriesNeeded } = answer as Result;
  const count = Math.max(1, batteriesNeeded ?? 1);
  const { at, read, toStops } = plainAxis(Math.max(frames, count * framesPerBattery, 1), '');
  const shown = count <= MOST_BATTERIES ? count : 1;
  const size = (count * framesPerBattery) / shown;
  const spans = Array.from({ length: framesPerBattery > 0 ? shown : 0 }, (_, i): Span => {
    const name = shown === count ? `battery ${i + 1}` : `${formatNumber(count)} batteries`;
    return {
      id: String(i),
      title: name,
      label: shown > 1 || count === 1 || shown !== count ? name : undefined,
      fromStops: at(i * size),
      toStops: at((i + 1) * size),
      isLit: true,
    };
  });
  return [
    {
      title: 'Frames and batteries',
      unit: 'frames at this power',
      fromStops: 0,
      toStops,
      read,
      towards: 'more frames to the right',
      parts: 1,
      pegs: [{ id: 'planned', title: 'Planned', stops: at(frames), kind: 'subject' }],
      spans,
      caption:
        framesPerBattery > 0
          ? 'Each bar is what one charge gives, placed where the one before it is empty.'
          : 'One charge is not enough for a single frame, so there is no bar.',
    },
  ];
};

/** The charge over a burst: it falls by the power at each frame and rises evenly in between, up to full. */
export interface ChargePlot {
  readonly points: readonly PlotPoint[];
  readonly endS: number;
  /** What a frame takes. */
  readonly power: number;
}

/** So many frames of a burst are drawn; with more the teeth would run together. */
const MOST_FRAMES = 16;

export function chargePlot(
  power: number,
  { recycleFullS, fps, burstFrames }: { recycleFullS: number; fps: number; burstFrames: number | null },
): ChargePlot {
  const frames = Math.min(MOST_FRAMES, burstFrames === null ? 6 : burstFrames + 1);
  const betweenS = 1 / fps;
  const points: PlotPoint[] = [];
  let charge = 1;
  for (let i = 0; i < frames; i++) {
    points.push({ x: i * betweenS, y: charge });
    // The frame that comes too early has no more to give than there is.
    charge = Math.max(0, charge - power);
    points.push({ x: i * betweenS, y: charge });
    const fullAfterS = (1 - charge) * recycleFullS;
    if (fullAfterS < betweenS) points.push({ x: i * betweenS + fullAfterS, y: 1 });
    charge = Math.min(1, charge + betweenS / recycleFullS);
  }
  points.push({ x: frames * betweenS, y: charge });
  return { points, endS: frames * betweenS, power };
}
