import { USUAL_GEAR } from '../../shared/contract/limits';
import type { SettingKind } from '../../shared/contract/field';
import { exactOf, type Reading } from '../../shared/contract/settings';
import { numberOfSetting, type SettingIn } from '../../shared/contract/settingIn';
import { markAt, positionOf, stepsPerStop, type MarkedKind, type Scale } from '../../shared/math/marks';
import { nearestPowerMark, powerMarkAt } from '../../shared/math/powerMarks';

/** One place where a setting's slider clicks; in order from less to more light in the picture. */
export interface SettingMark {
  readonly label: string;
  /** What goes into the request. */
  readonly value: SettingIn;
  readonly isFullStop: boolean;
}

/** The least power that sliders offer, stops below full. */
const LEAST_POWER_STOPS = 8;

const ENDS: Record<MarkedKind, readonly [darkest: number, brightest: number]> = {
  aperture: [USUAL_GEAR.apertureMax, USUAL_GEAR.apertureMin],
  shutter: [USUAL_GEAR.shutterFastestS, USUAL_GEAR.shutterSlowestS],
  iso: [USUAL_GEAR.isoMin, USUAL_GEAR.isoMax],
};

/** Positions of a scale from its dark to its bright end, within usual gear. */
function positionsOf(kind: MarkedKind, scale: Scale): number[] {
  const [dark, bright] = ENDS[kind].map((exact) => Math.round(positionOf(kind, scale, exact))) as [
    number,
    number,
  ];
  const count = Math.abs(bright - dark) + 1;
  return Array.from({ length: count }, (_, i) => dark + Math.sign(bright - dark) * i);
}

function powerMarks(scale: Scale): SettingMark[] {
  const perStop = stepsPerStop(scale);
  const most = LEAST_POWER_STOPS * perStop;
  return Array.from({ length: most + 1 }, (_, i) => {
    const { label } = powerMarkAt(scale, most - i);
    return { label, value: label, isFullStop: (most - i) % perStop === 0 };
  });
}

/** The marks that a setting's slider clicks through, from darker to brighter. */
export function settingMarks(kind: SettingKind, scale: Scale): SettingMark[] {
  if (kind === 'power') return powerMarks(scale);
  return positionsOf(kind, scale).map((position) => {
    const { label } = markAt(kind, scale, position);
    return {
      label,
      value: kind === 'iso' ? Number(label) : label,
      isFullStop: position % stepsPerStop(scale) === 0,
    };
  });
}

/** The slider's place for a value: the nearest mark, an end where the value lies beyond, null where it says nothing. */
export function placeOfSetting(kind: SettingKind, value: unknown, reading: Reading): number | null {
  if (typeof value !== 'number' && typeof value !== 'string') return null;
  const number = numberOfSetting(kind, value);
  if (!(number > 0)) return null;
  if (kind === 'power') return placeOfPower(value, reading);
  const positions = positionsOf(kind, reading.scale);
  const position = Math.round(positionOf(kind, reading.scale, exactOf(kind, value, reading)));
  const first = positions[0] ?? 0;
  const rising = (positions[1] ?? 0) > first;
  const place = rising ? position - first : first - position;
  return Math.min(positions.length - 1, Math.max(0, place));
}

function placeOfPower(value: SettingIn, reading: Reading): number {
  const marks = powerMarks(reading.scale);
  const { label } = nearestPowerMark(reading.scale, exactOf('power', value, reading));
  return Math.max(
    0,
    marks.findIndex((mark) => mark.label === label),
  );
}
