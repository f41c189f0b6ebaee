import { isSettingShape } from '../text/settingShape';
import type { Body } from './body';

/** A question with its answer, of which values are carried on. */
export interface Asked {
  readonly body: Body;
  readonly result: Body;
}

/** Which of a calculator's values are of use in another one. */
export interface CarryRule {
  readonly to: string;
  readonly carry: (asked: Asked) => Body;
}

/** An answer's setting as a person would write it: its mark. */
function asInput(name: string, value: unknown): unknown {
  if (isSettingShape(value)) return name === 'iso' ? Number(value.mark) : value.mark;
  return typeof value === 'number' ? Number(value.toPrecision(6)) : value;
}

/** Values of a question, or else of its answer, under their own names. */
const named =
  (...names: string[]) =>
  ({ body, result }: Asked): Body =>
    Object.fromEntries(names.map((name) => [name, body[name] ?? asInput(name, result[name])]));

const within = (held: unknown) => (held ?? {}) as Body;
const settingsOf = (held: unknown): Body =>
  Object.fromEntries(['aperture', 'shutter', 'iso'].map((name) => [name, asInput(name, within(held)[name])]));
const firstOf = (list: unknown) => within(Array.isArray(list) ? list[0] : undefined);
const SETTINGS = ['aperture', 'shutter', 'iso'];
const to = (id: string, carry: CarryRule['carry']): CarryRule => ({ to: id, carry });

const durationOf = (held: Body): Body => ({
  t05S: held.t05S,
  t01S: held.t01S,
  control: held.control,
  power: held.power,
});

/** From each calculator, the ones that go on from its answer. */
export const CARRY_RULES: Readonly<Record<string, readonly CarryRule[]>> = {
  'exposure/value': [
    to('exposure/equivalents', named(...SETTINGS)),
    to('exposure/solve', ({ body, result }) => ({
      ev100: asInput('ev100', result.ev100),
      iso: body.iso ?? 100,
    })),
    to('exposure/handheld', named('shutter')),
    to('light/convert', named('ev100')),
  ],
  'exposure/solve': [
    to('exposure/equivalents', named(...SETTINGS)),
    to('exposure/handheld', named('shutter')),
    to('flash/exposure', named('aperture', 'iso')),
  ],
  'exposure/equivalents': [
    to('exposure/depth', named('aperture')),
    to('exposure/handheld', named('shutter')),
    to('exposure/value', named(...SETTINGS)),
  ],
  'exposure/difference': [to('exposure/equivalents', ({ body }) => settingsOf(body.to))],
  'exposure/handheld': [to('exposure/depth', named('focalLengthMm')), to('light/flicker', named('shutter'))],
  'exposure/depth': [
    to('flash/motion', named('focalLengthMm', 'distanceM')),
    to('exposure/handheld', named('focalLengthMm')),
  ],
  'light/convert': [to('exposure/solve', named('ev100'))],
  'light/add': [to('exposure/solve', named('ev100'))],
  'light/flicker': [to('exposure/handheld', named('shutter')), to('exposure/value', named('shutter'))],
  'filters/density': [
    to('exposure/value', ({ result }) => ({ ndStops: asInput('ndStops', result.stops) })),
    to('flash/exposure', ({ result }) => ({ ndStops: asInput('ndStops', result.stops) })),
    to('exposure/long', ({ result }) => ({
      meteredS: asInput('s', within(within(within(result).settings).shutter).exact),
    })),
  ],
  'filters/gel': [
    to('flash/exposure', ({ result }) => ({
      lossStops: asInput('stops', firstOf(result.nearest).lossStops),
    })),
  ],
  'flash/exposure': [
    to('flash/duration', named('power')),
    to('flash/budget', named('power')),
    to('flash/falloff', ({ result }) => ({ referenceM: asInput('m', result.distanceM) })),
  ],
  'flash/measured': [
    to('flash/exposure', ({ result }) => ({
      guideNumberM: asInput('m', result.guideNumberM),
      lossStops: 0,
    })),
  ],
  'flash/falloff': [to('flash/exposure', ({ body }) => ({ distanceM: body.referenceM }))],
  'flash/duration': [
    to('flash/motion', ({ body }) => ({ flash: { ...durationOf(body), brightnessStops: 0 } })),
    to('flash/budget', named('power')),
  ],
  'flash/motion': [
    to('flash/duration', ({ body }) => durationOf(within(body.flash))),
    to('exposure/handheld', ({ body }) => ({
      focalLengthMm: body.focalLengthMm,
      shutter: within(body.ambient).shutter,
    })),
    to('exposure/depth', named('focalLengthMm', 'distanceM')),
  ],
  'flash/daylight': [
    to('flash/exposure', ({ body }) => ({
      iso: body.iso,
      distanceM: within(body.flash).distanceM,
      guideNumberM: within(body.flash).guideNumberM,
    })),
    to('exposure/depth', named('aperture')),
  ],
  'flash/budget': [to('flash/duration', named('power'))],
  'twilight/at': [to('exposure/solve', named('ev100')), to('light/convert', named('ev100'))],
  'fill/recipes': [to('exposure/equivalents', ({ result }) => settingsOf(firstOf(result.recipes).settings))],
  'fill/check': [to('exposure/equivalents', ({ body }) => settingsOf(body.settings))],
};
