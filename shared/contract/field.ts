import type { z } from 'zod';

/** Units that fields carry; the text is what a person reads after the number. */
export type Unit =
  | 'stops'
  | 's'
  | 'ms'
  | 'm'
  | 'mm'
  | 'µm'
  | 'px'
  | 'cd/m²'
  | 'lx'
  | 'K'
  | 'mired'
  | 'Hz'
  | '°'
  | '%'
  | 'W·s'
  | 'lm·s/Ws'
  | 'm/s'
  | 'cd·s'
  | 'stops/min'
  | '°/s'
  | 'frames/s';

/** Camera and flash settings, which are read and written by their marks. */
export type SettingKind = 'aperture' | 'shutter' | 'iso' | 'power';

/** What a schema says about itself beyond its type; the form, the documents and the messages read it. */
export interface FieldMeta {
  readonly title?: string;
  readonly description?: string;
  readonly unit?: Unit;
  readonly setting?: SettingKind;
  /** A bound that JSON Schema can't say of a setting, since it is written as number or text. */
  readonly range?: readonly [number, number];
  /** Shown under "more" in forms. */
  readonly advanced?: boolean;
  /** A slider's step in forms. */
  readonly step?: number;
  /** The alternatives of a one-or-many field. */
  readonly oneOrMany?: z.ZodType;
  /** The longest list of a one-or-many field. */
  readonly maxItems?: number;
}

/** How a text is written, where that is fixed. */
export type TextFormat = 'datetime' | 'date';

export type FieldKind = 'number' | 'setting' | 'choice' | 'boolean' | 'text' | 'group' | 'list' | 'oneOrMany';

/** One field of a calculator's input, as described by its schema. */
export interface Field {
  readonly name: string;
  readonly kind: FieldKind;
  readonly required: boolean;
  readonly title: string;
  readonly description?: string;
  readonly unit?: Unit;
  readonly setting?: SettingKind;
  readonly advanced: boolean;
  readonly step?: number;
  readonly defaultValue?: unknown;
  readonly minimum?: number;
  readonly maximum?: number;
  readonly minimumIsExcluded?: boolean;
  readonly isInteger?: boolean;
  readonly choices?: readonly string[];
  readonly format?: TextFormat;
  /** Fields of a group. */
  readonly fields?: readonly Field[];
  /** What a list holds. */
  readonly item?: Field;
  readonly maxItems?: number;
  readonly minItems?: number;
}
