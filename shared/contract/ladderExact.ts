import type { LadderFrame, LadderInput } from '../math/ladder/ladderTypes';
import { stepOf } from './fillExact';
import { guideNumberOf } from './flashIn';
import { msOf } from './geographicIn';
import { framesOf, type LadderIn } from './ladderIn';
import { exactOf, exactSettings } from './settings';

function flashOf(given: LadderIn): LadderInput['flash'] {
  const { flash, subjectBelowBackgroundStops } = given;
  if (!flash) return undefined;
  const syncS = flash.syncSpeed === undefined ? undefined : exactOf('shutter', flash.syncSpeed, given);
  if (subjectBelowBackgroundStops === undefined) return { syncS };
  return {
    syncS,
    onSubject: {
      guideNumberM: guideNumberOf(flash.guideNumberM),
      distanceM: flash.distanceM,
      lossStops: flash.lossStops,
      minPower: exactOf('power', flash.minPower, given),
      stepStops: stepOf(flash.powerStep),
      belowBackgroundStops: subjectBelowBackgroundStops,
    },
  };
}

/** A request as the mathematics takes it: exact settings, milliseconds. */
export function exactLadder(given: LadderIn): LadderInput {
  const { latitude, longitude, lampFloorEv100, lamps, aim, hold, limits, order, scale } = given;
  return {
    place: { latitude, longitude },
    frames: framesOf(given).map(({ frame }): LadderFrame => ({
      ...exactSettings(frame, given),
      ndStops: frame.ndStops,
      atMs: msOf(frame.at),
      offsetStops: frame.offsetStops,
    })),
    lampFloorEv100,
    lamps: lamps && {
      onMs: msOf(lamps.onAt),
      ...(lamps.offAt !== undefined && { offMs: msOf(lamps.offAt) }),
    },
    aim,
    plan: {
      scale,
      holdAperture: exactOf('aperture', hold.aperture, given),
      holdIso: exactOf('iso', hold.iso, given),
      ndStops: hold.ndStops,
      order,
      slowestShutterS: exactOf('shutter', limits.shutterSlowest, given),
      isoMax: exactOf('iso', limits.isoMax, given),
      apertureMin: exactOf('aperture', limits.apertureMin, given),
    },
    flash: flashOf(given),
    fromMs: given.from === undefined ? undefined : msOf(given.from),
    toMs: given.to === undefined ? undefined : msOf(given.to),
  };
}
