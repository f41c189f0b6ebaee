import { clockTimeAt } from '../../shared/time/clockTime';
import { valueAt, type Body, type Path } from './body';
import { zoneOfBody } from './eveningBody';

interface FrameAt {
  readonly path: Path;
  readonly frame: Body;
}

const isBody = (value: unknown): value is Body => typeof value === 'object' && value !== null;

/** Every test frame of a body in order, with the place where it stands. */
export function frameList(body: Body): FrameAt[] {
  const more = Array.isArray(body.moreFrames) ? (body.moreFrames as unknown[]) : [];
  const places: [Path, unknown][] = [
    [['testFrame'], body.testFrame],
    [['secondFrame'], body.secondFrame],
    ...more.map((frame, i): [Path, unknown] => [['moreFrames', i], frame]),
  ];
  return places.flatMap(([path, frame]) => (isBody(frame) ? [{ path, frame }] : []));
}

function withFrames(body: Body, frames: readonly Body[]): Body {
  const [testFrame, secondFrame, ...moreFrames] = frames;
  const next = { ...body, testFrame, secondFrame, moreFrames: moreFrames.length ? moreFrames : undefined };
  return Object.fromEntries(Object.entries(next).filter(([, value]) => value !== undefined));
}

/** What the place's clock shows at an instant, to the minute. */
export const frameTimedAt = (body: Body, nowMs: number): string =>
  clockTimeAt(nowMs, zoneOfBody(body) ?? 'UTC').slice(0, 5);

/** Another frame, taken now with the settings of the last one, or with those that are held. */
export function withFrameAdded(body: Body, nowMs: number): Body {
  const frames = frameList(body).map(({ frame }) => frame);
  const held = {
    aperture: valueAt(body, ['hold', 'aperture']),
    shutter: '1/60',
    iso: valueAt(body, ['hold', 'iso']),
    offsetStops: 0,
  };
  const { aperture, shutter, iso, ndStops } = (frames.at(-1) ?? held) as Body;
  const settings = { aperture, shutter, iso, ...(ndStops !== undefined && { ndStops }) };
  return withFrames(body, [...frames, { at: frameTimedAt(body, nowMs), ...settings, offsetStops: 0 }]);
}

export function withoutFrame(body: Body, index: number): Body {
  const frames = frameList(body).map(({ frame }) => frame);
  return withFrames(
    body,
    frames.filter((_, i) => i !== index),
  );
}
