import { z } from 'zod';
import { POWER_FORM, powerOfText } from '../math/powerMarks';
import type { FieldMeta, SettingKind } from './field';

/** A setting as it is written in a request: a number, or text as on the camera. */
export type SettingIn = number | string;

/** Ranges of API section 2: physical and generous. */
export const SETTING_RANGES: Record<SettingKind, readonly [number, number]> = {
  aperture: [0.5, 256],
  shutter: [1e-6, 86_400],
  iso: [1, 10_000_000],
  power: [0, 1],
};

const NUMBER = '(\\d+(?:\\.\\d+)?|\\.\\d+)';
const whole = (form: string) => `^\\s*${form}\\s*$`;

/** How a setting is written as text; null where it is a number only. */
export const SETTING_PATTERNS: Record<SettingKind, string | null> = {
  aperture: whole(`[fF]/?${NUMBER}`),
  shutter: whole(`${NUMBER}(?:/${NUMBER})?(?: ?s)?`),
  iso: null,
  power: whole(POWER_FORM),
};
const APERTURE = new RegExp(SETTING_PATTERNS.aperture ?? '');
const SHUTTER = new RegExp(SETTING_PATTERNS.shutter ?? '');

const TITLES: Record<SettingKind, string> = {
  aperture: 'Aperture',
  shutter: 'Shutter',
  iso: 'ISO',
  power: 'Flash power',
};

const DESCRIPTIONS: Record<SettingKind, string> = {
  aperture: 'f-number, as a number or as text such as "f/5.6"',
  shutter: 'exposure time, in seconds or as text such as "1/125" or "2s"',
  iso: 'ISO arithmetic speed',
  power: 'fraction of full power, above 0 up to 1, or text such as "1/16" or "1/16+1/3"',
};

/**
 * The number that a setting's text stands for, before marks are considered: "f/5.6" is 5.6, "1/125" is
 * 0.008. NaN when it says nothing (also for "1/0", which is no time).
 */
export function numberOfSetting(kind: SettingKind, value: SettingIn): number {
  if (typeof value === 'number') return value;
  if (kind === 'power') return powerOfText(value) ?? Number.NaN;
  if (kind === 'iso') return Number.NaN;
  const match = (kind === 'aperture' ? APERTURE : SHUTTER).exec(value);
  if (!match) return Number.NaN;
  const number = Number(match[1]) / (kind === 'shutter' ? Number(match[2] ?? 1) : 1);
  return Number.isFinite(number) ? number : Number.NaN;
}

function isInRange(kind: SettingKind, number: number, [low, high]: readonly [number, number]): boolean {
  return number <= high && (kind === 'power' ? number > low : number >= low);
}

function settingIn(kind: SettingKind, meta: FieldMeta = {}) {
  const range = meta.range ?? SETTING_RANGES[kind];
  return z
    .custom<SettingIn>()
    .check((payload) => {
      const value: unknown = payload.value;
      const add = (fault: string) =>
        payload.issues.push({ code: 'custom', input: value, message: fault, params: { fault } });
      if (value === undefined) return void add('missing');
      if (typeof value !== 'number' && typeof value !== 'string') return void add('wrong_type');
      const number = numberOfSetting(kind, value);
      const isText = typeof value === 'string' && kind !== 'iso';
      if (Number.isNaN(number)) add(isText ? 'not_a_setting' : 'wrong_type');
      else if (!isInRange(kind, number, range)) add('out_of_range');
    })
    .meta({
      title: TITLES[kind],
      description: DESCRIPTIONS[kind],
      setting: kind,
      range,
      ...meta,
    });
}

/** An f-number from 0.5 to 256. */
export const apertureIn = (meta?: FieldMeta) => settingIn('aperture', meta);
/** An exposure time from 1 µs to a day. */
export const shutterIn = (meta?: FieldMeta) => settingIn('shutter', { unit: 's', ...meta });
/** An ISO speed from 1 to 10,000,000. */
export const isoIn = (meta?: FieldMeta) => settingIn('iso', meta);
/** A flash power, above 0 up to 1. */
export const powerIn = (meta?: FieldMeta) => settingIn('power', meta);
