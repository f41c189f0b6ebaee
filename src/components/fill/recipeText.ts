import { formatNumber, formatStops } from '../../text/formatQuantity';
import type { FillRecipeOut } from './fillAnswer';

type Flash = FillRecipeOut['flashes'][number];

const stopsText = (stops: number) => {
  const text = formatStops(stops);
  return `${text} ${text === '1' ? 'stop' : 'stops'}`;
};

/** What is to be set on the camera, dial by dial. */
export function settingsParts({ settings }: FillRecipeOut): string[] {
  const { aperture, shutter, iso, ndStops } = settings;
  const filter = ndStops > 0 ? [`filter ${stopsText(ndStops)}`] : [];
  return [aperture.mark, shutter.mark, `ISO ${iso.mark}`, ...filter];
}

/** The same on one line. */
export const settingsLine = (recipe: FillRecipeOut): string => settingsParts(recipe).join(', ');

/** A distance as a tape measure gives it. */
export const distanceText = (distanceM: number): string =>
  `${formatNumber(Number(distanceM.toFixed(2)))}\u00a0m`;

export const flashLine = ({ name, power, distanceM }: Flash): string =>
  `${name} ${power.mark} at ${distanceText(distanceM)}`;

const SYNCS = {
  normal: 'ordinary sync',
  highSpeed: 'high-speed sync',
  none: 'no flash',
} as const;

export const syncText = (recipe: FillRecipeOut): string => SYNCS[recipe.sync];

/** A line of numbers about a recipe's outcome. */
export interface OutcomeRow {
  readonly title: string;
  readonly text: string;
}

const row = (title: string, value: number | null | undefined, text: (value: number) => string) =>
  value === null || value === undefined ? [] : [{ title, text: text(value) }];

/** Everything that the outcome says, in the order in which one looks at a picture. */
export function outcomeRows({ outcome }: FillRecipeOut): OutcomeRow[] {
  const { ghost, blur, handheld } = outcome;
  return [
    ...row('Background', outcome.backgroundStops, formatStops),
    ...row('Subject in ambient light', outcome.subjectAmbientStops, formatStops),
    ...row('Subject in flash', outcome.subjectFlashStops, formatStops),
    ...row('Subject in sum', outcome.subjectStops, formatStops),
    ...row('Shadow side', outcome.shadowSideStops, formatStops),
    ...row('Key and fill to fill', outcome.ratio, (ratio) => `${formatNumber(Number(ratio.toFixed(2)))}:1`),
    ...row('Rim', outcome.rimStops, formatStops),
    ...row('Flash over ambient light', outcome.flashToAmbientStops, stopsText),
    ...row('Lost in high-speed sync', outcome.highSpeedLossStops || null, stopsText),
    ...row('Clipped by the shutter', outcome.clippedStops || null, stopsText),
    ...row('In reserve', outcome.reserveStops, stopsText),
    ...row('Ready again after', outcome.recycleS, (s) => `${formatNumber(s)} s`),
    ...(ghost ? [{ title: 'Ghost', text: `${ghost.visibility}, ${formatNumber(ghost.trailPx)} px` }] : []),
    ...(blur
      ? [{ title: 'Blur', text: blur.frozen ? 'frozen' : `${formatNumber(blur.blurPx)} px at 100 %` }]
      : []),
    ...(handheld
      ? [
          {
            title: 'By hand',
            text: handheld.withinLimit
              ? `within the limit of ${handheld.slowestShutter.mark}`
              : `${stopsText(handheld.overStops)} over the limit of ${handheld.slowestShutter.mark}`,
          },
        ]
      : []),
  ];
}
