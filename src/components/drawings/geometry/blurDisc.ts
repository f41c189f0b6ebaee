/** The picture and the disc that a point of the background makes in it, both to one scale. */
export interface DiscLayout {
  readonly frameWidthPx: number;
  readonly frameHeightPx: number;
  readonly discPx: number;
  /** The circle that still counts as sharp, to the same scale. */
  readonly circlePx: number;
  /** The disc is wider than the picture, which then lies inside it. */
  readonly isBeyond: boolean;
}

const WIDEST_PX = 420;

/** Sizes in pixels of a picture that is as wide as there is room, in the sensor's proportions or 3:2. */
export function discLayout(
  roomPx: number,
  sensor: { readonly widthMm: number; readonly heightMm?: number },
  sizes: { readonly blurUm: number; readonly circleUm: number },
): DiscLayout {
  const frameWidthPx = Math.min(WIDEST_PX, Math.max(1, roomPx - 2));
  const { widthMm, heightMm = (widthMm * 2) / 3 } = sensor;
  const pxPerUm = frameWidthPx / (widthMm * 1000);
  // A strip of a sensor would hide everything, and a tower would fill the page.
  const shape = Math.min(1.5, Math.max(0.25, heightMm / widthMm));
  return {
    frameWidthPx,
    frameHeightPx: frameWidthPx * shape,
    discPx: sizes.blurUm * pxPerUm,
    circlePx: sizes.circleUm * pxPerUm,
    isBeyond: sizes.blurUm * pxPerUm > frameWidthPx,
  };
}
