import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { throughStops, trailBelowFlashStops } from '../../../../../shared/math/ghost';
import { encodeSrgb, linearOfStops } from '../../../../../shared/math/srgb';
import {
  lanternPatches,
  lanternTones,
  type LanternView,
} from '../../../../../src/components/drawings/geometry/lanternFrame';
import { lanternText } from '../../../../../src/components/drawings/geometry/lanternText';
import {
  sweptRow,
  type Patch,
  type SweptScene,
} from '../../../../../src/components/drawings/geometry/sweptLight';

const still: SweptScene = { subject: [], trailPx: 0, lamps: [], ground: 0, shakePx: 0 };
const stripe = (leftPx: number, widthPx: number, light = 1): Patch => ({
  leftPx,
  rightPx: leftPx + widthPx,
  topPx: 0,
  bottomPx: 100,
  light,
});
const sum = (row: ArrayLike<number>) => Array.from(row).reduce((total, light) => total + light, 0);

describe('light that is swept over pixels', () => {
  it('gives a detail of the width w on its path w + B on average w/(w + B) of its light', () => {
    // The share by which `trailBelowFlashStops` thins the ghost (derivation: an even movement).
    const row = sweptRow({ ...still, subject: [stripe(20, 10)], trailPx: 30 }, 50, 200);
    const path = row.slice(20, 60);
    expect(2 ** -trailBelowFlashStops(0, 30, 10)).toBeCloseTo(0.25, 12);
    expect(sum(path) / 40).toBeCloseTo(0.25, 12);
    expect(sum(row)).toBeCloseTo(sum(path), 12);
    // In its middle no pixel sees the detail for longer than it takes to pass: w/B of the exposure.
    expect(Math.max(...row)).toBeCloseTo(10 / 30, 12);
  });

  it('lets the ground through where the detail was not, for the rest of the time', () => {
    const row = sweptRow({ ...still, subject: [stripe(20, 10, 0)], trailPx: 30, ground: 1 }, 50, 200);
    const through = sum(row.slice(20, 60)) / 40;
    expect(Math.log2(through)).toBeCloseTo(throughStops(0, 30, 10) ?? 0, 12);
    expect(row[10]).toBe(1);
  });

  it('streaks a lamp over its height and the shake, and no light gets lost', () => {
    const lamp = { leftPx: 5, rightPx: 9, topPx: 10, bottomPx: 14, light: 2 };
    const scene = { ...still, lamps: [lamp], shakePx: 12 };
    const column = Array.from({ length: 40 }, (_, y) => sweptRow(scene, y, 12)[6] ?? 0);
    const lit = column.flatMap((light, y) => (light > 0 ? [y] : []));
    expect([lit[0], lit.at(-1)]).toEqual([10, 25]);
    expect(sum(column)).toBeCloseTo(4 * 2, 12);
  });

  it('agrees with a picture summed from many short exposures, whatever moves', () => {
    const place = fc.integer({ min: 0, max: 40 });
    fc.assert(
      fc.property(
        place,
        fc.integer({ min: 2, max: 12 }),
        fc.integer({ min: 0, max: 30 }),
        fc.integer({ min: 0, max: 20 }),
        place,
        (left, width, trailPx, shakePx, y) => {
          const subject = [{ ...stripe(left, width), topPx: 10, bottomPx: 25 }];
          const lamps = [{ leftPx: 20, rightPx: 26, topPx: 12, bottomPx: 18, light: 3 }];
          const scene = { subject, trailPx, lamps, ground: 0.2, shakePx };
          const row = sweptRow(scene, y, 60);
          const moments = 4000;
          const within = (p: Patch, px: number, py: number) =>
            px >= p.leftPx && px < p.rightPx && py >= p.topPx && py < p.bottomPx;
          for (const x of [left, left + width, 22, 40]) {
            let light = 0;
            for (let i = 0; i < moments; i++) {
              const moment = (i + 0.5) / moments;
              const [py, px] = [y + 0.5 - shakePx * moment, x + 0.5];
              const patch =
                subject.find((one) => within(one, px - trailPx * moment, py)) ??
                lamps.find((one) => within(one, px, py));
              light += (patch?.light ?? 0.2) / moments;
            }
            expect(row[x]).toBeCloseTo(light, 2);
          }
        },
      ),
      { numRuns: 60 },
    );
  });
});

const size = { widthPx: 400, heightPx: 200 };
const view: LanternView = {
  flash: { stops: 0, blurPx: 0 },
  ambient: { stops: -3, blurPx: 70 },
  backgroundStops: -1,
  shakePx: 0,
  detailPx: 10,
};
const toneOf = (linear: number) => Math.round(255 * encodeSrgb(linear));

describe('the frame at 100 %', () => {
  const [first] = lanternPatches(10, 0, size);
  const at = (tones: Uint8ClampedArray, x: number) => tones[100 * size.widthPx + x];

  it('adds flash and ambient light in linear light and encodes the sum', () => {
    const tones = lanternTones(view, size);
    const left = first?.leftPx ?? 0;
    // The first pixel of the pale stripe, in whose middle the stripe has stood for half a pixel's way of 70.
    const seen = 0.5 / 70;
    const ambient = linearOfStops(-3) * seen + linearOfStops(-1) * (1 - seen);
    expect(at(tones, left)).toBe(toneOf(linearOfStops(0) + ambient));
    // Right of the lantern the stripes pass: four pale and three dark ones, each for a seventh of the way.
    const passed = (4 * linearOfStops(-3) + 3 * linearOfStops(-6)) / 7;
    expect(at(tones, left + 70)).toBe(toneOf((passed * 69.5 + linearOfStops(-1) * 0.5) / 70));
    expect(at(tones, left + 145)).toBe(toneOf(linearOfStops(-1)));
  });

  it('ends the trail after as many pixels as the answer says', () => {
    const tones = lanternTones({ ...view, backgroundStops: null, ambient: { stops: 0, blurPx: 55 } }, size);
    const row = Array.from(tones.slice(100 * size.widthPx, 101 * size.widthPx));
    const lit = row.flatMap((tone, x) => (tone > 0 ? [x] : []));
    const onLantern = lit.filter((x) => x >= (first?.leftPx ?? 0) && x < (first?.leftPx ?? 0) + 70 + 55);
    expect(onLantern).toHaveLength(70 + 55);
  });

  it('shows the same sharp lantern at 1/250 and at 2 s where the ambient light is far under the flash', () => {
    const dark = { ...view, backgroundStops: null };
    const short = lanternTones({ ...dark, ambient: { stops: -9, blurPx: 0.1 } }, size);
    const long = lanternTones({ ...dark, ambient: { stops: -9, blurPx: 300 } }, size);
    const left = first?.leftPx ?? 0;
    for (let x = left; x < left + 70; x++)
      expect(Math.abs((at(short, x) ?? 0) - (at(long, x) ?? 0))).toBeLessThanOrEqual(3);
  });

  it('stays a picture for nothing at all, and for what no camera could hold', () => {
    const nothing = { flash: null, ambient: null, backgroundStops: null, shakePx: 0, detailPx: 10 };
    expect(Math.max(...lanternTones(nothing, size))).toBe(0);
    const absurd = {
      flash: { stops: 900, blurPx: 1e12 },
      ambient: { stops: -900, blurPx: 1e15 },
      backgroundStops: 1000,
      shakePx: 1e9,
      detailPx: 1e5,
    };
    expect(new Set(lanternTones(absurd, size)).has(255)).toBe(true);
  });

  it('is told in words with the numbers that it is drawn from', () => {
    expect(lanternText(view)).toBe(
      'By the flash the pale stripes stand at 0 stops and are smeared over 0 pixels. ' +
        'By the ambient light they trail over 70 pixels; each stripe spreads its light along the way and comes ' +
        'out at −6 stops, 6 under the flash. The ground stands at −1 stop; the lamps behind stay points.',
    );
  });
});
