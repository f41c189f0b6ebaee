import { formatCivilDate } from '../../shared/time/civilDate';
import { clockTimeAt, eveningDateAt } from '../../shared/time/clockTime';
import { valueAt, withValueAt, type Body } from './body';
import { clockPlaceOf } from './eveningBody';

/** Maren Heights, the invented town of all examples. */
const PLACE = { latitude: 46.62, longitude: 9.75 };

const GEAR = {
  hold: { aperture: 'f/4', iso: 400 },
  limits: { shutterSlowest: '1/15', isoMax: 6400, apertureMin: 'f/2' },
};

function todayAt(body: Body, nowMs: number): string {
  return formatCivilDate(eveningDateAt(nowMs, clockPlaceOf(body) ?? { timeZone: 'UTC', longitudeDeg: 0 }));
}

/** What the page opens with on a first visit: a place and gear to be changed, today, and no test frame yet. */
export function eveningStart(nowMs: number): Body {
  return { ...PLACE, date: todayAt(PLACE, nowMs), horizonDeg: 0, ...GEAR };
}

/** What an address leaves out is filled in: the gear, today, and for a frame without a time this minute. */
export function completed(body: Body, nowMs: number): Body {
  const placed = body.latitude === undefined && body.longitude === undefined ? { ...PLACE, ...body } : body;
  const zone = clockPlaceOf(placed)?.timeZone ?? 'UTC';
  const whole: Body = { date: todayAt(placed, nowMs), ...GEAR, ...placed };
  const isUntimed = whole.testFrame !== undefined && valueAt(whole, ['testFrame', 'at']) === undefined;
  return isUntimed ? withValueAt(whole, ['testFrame', 'at'], clockTimeAt(nowMs, zone).slice(0, 5)) : whole;
}
