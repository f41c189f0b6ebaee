import { counted, readable } from './format';
import { stopsOf } from './stopsOf';

/** What a sentence about a limit may need. */
export interface LimitParams {
  readonly stops: number;
  /** the marking that the limit would have to reach */
  readonly to: string;
  /** a share of its distance for a flash that moves */
  readonly distanceFactor: number;
  readonly heads: number;
  /** loss by modifier and gel that all flashes concerned have, stops */
  readonly lossStops: number;
  readonly guideNumberPerM: number;
}

const digits = (value: number) => readable(Number(value.toPrecision(3)));

const moreLight = (whose: string) => (p: LimitParams) => {
  const less = p.lossStops >= p.stops ? `, take ${stopsOf(p.stops)} of modifier and gel away` : '';
  return `Bring ${whose} ${stopsOf(p.stops)} more light: move it to ${digits(p.distanceFactor)} of its distance, use ${counted(Math.ceil(p.heads - 1e-9), 'equal head')}${less}, or wait until background and ambient light are darker by as much. Aperture, ISO and filter change flash and background alike.`;
};

const lessLight = (whose: string) => (p: LimitParams) =>
  `${whose} is too strong at its least power: move it to ${digits(1 / p.distanceFactor)} times its distance, or take ${stopsOf(p.stops)} by gel or modifier.`;

/** What to give up for a limit that stands in the way, by its code. */
export const fillLimits = {
  aperture_min: (p: LimitParams) => `Take a lens that opens to ${p.to}, ${stopsOf(p.stops)} wider.`,
  aperture_max: (p: LimitParams) => `Take a lens that closes to ${p.to}, ${stopsOf(p.stops)} smaller.`,
  iso_min: (p: LimitParams) => `Take a camera that goes down to ISO ${p.to}, ${stopsOf(p.stops)} lower.`,
  iso_max: (p: LimitParams) => `Let ISO go up to ${p.to}, ${stopsOf(p.stops)} higher, for more noise.`,
  shutter_slowest: (p: LimitParams) =>
    `Let the shutter go to ${p.to}, ${stopsOf(p.stops)} slower, on a tripod and with a subject that stays still.`,
  shutter_fastest: (p: LimitParams) => `Take a camera with a shutter of ${p.to}, ${stopsOf(p.stops)} faster.`,
  sync_speed: (p: LimitParams) =>
    `Take a camera that syncs at ${p.to}, ${stopsOf(p.stops)} faster, such as one with a leaf shutter.`,
  high_speed_sync: (p: LimitParams) =>
    `Take a camera and flashes with high-speed sync; the shutter goes ${stopsOf(p.stops)} beyond the sync speed.`,
  nd_stops: (p: LimitParams) => `Put on a filter of ${stopsOf(p.stops)}.`,
  key_power: moreLight('the key'),
  fill_power: moreLight('the fill'),
  front_power: moreLight('key and fill each'),
  rim_power: moreLight('the rim'),
  key_least: lessLight('The key'),
  fill_least: lessLight('The fill'),
  rim_least: lessLight('The rim'),
  key_missing: (p: LimitParams) =>
    p.guideNumberPerM > 0
      ? `Bring a flash: at ISO 100 its guide number has to be ${digits(p.guideNumberPerM)} m at full power for each metre of its distance. Without one the subject is ${stopsOf(p.stops)} too dark.`
      : 'Bring a key flash; a ratio needs key and fill.',
  fill_missing: () => 'Bring a fill flash, or let the ratio go; a ratio needs key and fill.',
  rim_missing: () => 'Bring a rim flash, or let the rim go.',
  ambient_too_bright: (p: LimitParams) =>
    `Shade the subject by ${stopsOf(p.stops)}; no flash darkens. Or lower everything and let the background come out darker.`,
  aim_background: (p: LimitParams) => `Let the background come out ${stopsOf(p.stops)} ${p.to}.`,
  aim_subject: (p: LimitParams) => `Let the subject come out ${stopsOf(p.stops)} ${p.to}.`,
  aim_ratio: () => 'Let the lighting ratio come out as it may.',
  aim_rim: () => 'Do without the rim.',
} as const;

/** Words for which way a part of the aim is given up. */
export const fillSides = { brighter: 'brighter', darker: 'darker' } as const;
