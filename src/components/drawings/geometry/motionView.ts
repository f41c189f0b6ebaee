import type { z } from 'zod';
import type { flashMotionOut } from '../../../../shared/calculators/flash/motion';
import type { MotionIn } from '../../../../shared/contract/motionIn';
import type { LanternView } from './lanternFrame';

/** What the answer about motion makes of the picture at 100 %. */
export function motionView(
  { flash, ambient, detailPx }: MotionIn,
  result: z.output<typeof flashMotionOut>,
): LanternView {
  return {
    flash: flash && result.flash ? { stops: flash.brightnessStops, blurPx: result.flash.blurPx } : null,
    ambient:
      ambient && result.ambient
        ? { stops: ambient.subjectBrightnessStops, blurPx: result.ambient.blurPx }
        : null,
    backgroundStops: ambient?.backgroundBrightnessStops ?? null,
    shakePx: result.shake?.blurPx ?? 0,
    detailPx,
  };
}
