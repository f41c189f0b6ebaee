import { trailBelowFlashStops } from '../../../../shared/math/ghost';
import { formatNumber, formatStops } from '../../../text/formatQuantity';
import { LAMP_STOPS, STRIPE_STOPS, stripePx, type LanternView } from './lanternFrame';

const pixels = (px: number) => `${formatNumber(px)} ${px === 1 ? 'pixel' : 'pixels'}`;
const stops = (value: number) => `${formatStops(value)} ${Math.abs(value) === 1 ? 'stop' : 'stops'}`;

function flashText({ flash }: LanternView): string {
  if (!flash) return 'No flash lights the lantern.';
  return `By the flash the pale stripes stand at ${stops(flash.stops)} and are smeared over ${pixels(flash.blurPx)}.`;
}

function ambientText({ flash, ambient, detailPx }: LanternView): string {
  if (!ambient) return 'No ambient light is given, so nothing trails.';
  const spread = ambient.stops - trailBelowFlashStops(0, ambient.blurPx, detailPx);
  const trail = `By the ambient light they trail over ${pixels(ambient.blurPx)}`;
  const thin = `each stripe spreads its light along the way and comes out at ${stops(spread)}`;
  const under = flash ? `, ${formatStops(flash.stops - spread)} under the flash` : '';
  return `${trail}; ${thin}${under}.`;
}

function groundText({ ambient, backgroundStops, shakePx }: LanternView): string {
  if (!ambient) return 'Without it the ground is black.';
  const ground =
    backgroundStops === null
      ? 'Nothing is known of the ground, which is drawn black'
      : `The ground stands at ${stops(backgroundStops)}`;
  const lamps =
    shakePx > 0 ? `the lamps behind streak over ${pixels(shakePx)} by shake` : 'the lamps behind stay points';
  return `${ground}; ${lamps}.`;
}

/** The picture in words, for those who do not see it. */
export function lanternText(view: LanternView): string {
  return [flashText(view), ambientText(view), groundText(view)].join(' ');
}

/** What the picture takes for granted. */
export function lanternCaption({ detailPx }: LanternView): string {
  return (
    `One pixel of the picture is one pixel here. Stripes of ${stripePx(detailPx)} pixels, the dark ones ` +
    `${STRIPE_STOPS} stops under the pale; lamps ${LAMP_STOPS} stops over a middle tone. The flash fires as the ` +
    'shutter opens, the lantern goes to the right, shake is drawn downwards.'
  );
}
