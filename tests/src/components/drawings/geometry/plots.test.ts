import { describe, expect, it } from 'vitest';
import { flashBudget } from '../../../../../shared/calculators/flash/budget';
import { flashDuration } from '../../../../../shared/calculators/flash/duration';
import { frameSwingStops, residualRipple } from '../../../../../shared/math/flicker';
import { evenZone, falloffStops } from '../../../../../shared/math/falloff';
import { discLayout } from '../../../../../src/components/drawings/geometry/blurDisc';
import { chargePlot } from '../../../../../src/components/drawings/geometry/budgetPlot';
import { falloffPlot } from '../../../../../src/components/drawings/geometry/falloffPlot';
import { flickerPlot } from '../../../../../src/components/drawings/geometry/flickerPlot';
import {
  pathOf,
  placeOn,
  pointsOf,
  roundTicks,
} from '../../../../../src/components/drawings/geometry/plotFrame';
import { pulsePlot } from '../../../../../src/components/drawings/geometry/pulsePlot';
import { reachPlot } from '../../../../../src/components/drawings/geometry/reachPlot';
import { askCalculator } from '../../../../support/askCalculator';

describe('the ruling of a plot', () => {
  it('places values evenly between its edges, upwards as well', () => {
    expect(placeOn([0, 10], [50, 250], 5)).toBe(150);
    expect(placeOn([-4, 4], [240, 30], 4)).toBe(30);
  });

  it('ticks at round numbers, about as many as asked for, and none on an axis without length', () => {
    expect(roundTicks([0, 5.3], 6).map(({ label }) => label)).toEqual(['0', '1', '2', '3', '4', '5']);
    expect(roundTicks([-3, 2.5], 6).map(({ value }) => value)).toEqual([-3, -2, -1, 0, 1, 2]);
    expect(roundTicks([1, 1], 6)).toEqual([]);
    expect(roundTicks([0, Infinity], 6)).toEqual([]);
  });

  it('draws a curve through its points', () => {
    const points = pointsOf((x) => 2 * x, [0, 10], 2);
    expect(pathOf(points, { x: (v) => v, y: (v) => v })).toBe('M0.0 0.0L5.0 10.0L10.0 20.0');
  });
});

describe('the pulse', () => {
  const plotOf = (body: unknown) => {
    const { result } = askCalculator(flashDuration, body);
    return pulsePlot(flashDuration.input.parse(body), result);
  };

  it('stands at half and at a tenth of its peak where t0.5 and t0.1 end', () => {
    const { points, t05S, t01S, endS, openS } = plotOf({ t05S: 0.001, control: 'decay' });
    const near = (timeS: number) =>
      points.reduce((a, b) => (Math.abs(b.x - timeS) < Math.abs(a.x - timeS) ? b : a));
    // Working definitions of the trade: time above half, and above a tenth of the peak.
    expect(near(t05S).y).toBeCloseTo(0.5, 1);
    expect(near(t01S).y).toBeCloseTo(0.1, 1);
    expect(endS).toBeGreaterThan(t01S);
    expect(openS).toBeNull();
  });

  it('is clipped from the moment at which the frame closes, by as much light as the answer says', () => {
    const body = { t05S: 0.001, control: 'decay', shutter: 1 / 500, readAs: 'exact' };
    const { clipped, openS } = plotOf(body);
    expect(openS).toBe(0.002);
    expect(clipped[0]).toEqual({ x: 0.002, y: expect.closeTo(0.25, 9) as number });
    // Share collected in an open time T of an exponential: 1 − 2^(−T/t0.5) = 0.75 (derivation).
    expect(askCalculator(flashDuration, body).result.shareThroughShutter).toBeCloseTo(0.75, 9);
  });

  it('is not squeezed by a shutter that is open for an age', () => {
    expect(plotOf({ t05S: 0.001, control: 'decay', shutter: 30 }).endS).toBeLessThan(0.01);
    expect(plotOf({ t05S: 0.001, control: 'cutoff', power: '1/128' }).endS).toBeGreaterThan(0);
  });
});

describe('the ripple', () => {
  it.each([0.2, 0.78125, 1, 1.5, 2.3, 400])(
    'holds %s cycles in two windows as far apart as the answer says',
    (cycles) => {
      const residual = residualRipple(cycles);
      const { brightest, darkest, points } = flickerPlot(cycles, residual, 0.8);
      expect(Math.log2(brightest.mean / darkest.mean)).toBeCloseTo(frameSwingStops(residual, 0.8), 9);
      expect(brightest.toCycles - brightest.fromCycles).toBeCloseTo(cycles, 9);
      expect(points.length).toBeLessThan(600);
    },
  );

  it.each([0.2, 0.9, 1.4, 2.5])(
    'over %s cycles has the mean light that its brightest window is as high as',
    (cycles) => {
      const residual = residualRipple(cycles);
      const { brightest } = flickerPlot(cycles, residual, 0.8);
      const n = 20_000;
      let sum = 0;
      for (let i = 0; i < n; i++)
        sum += 1 + 0.8 * Math.cos(2 * Math.PI * (brightest.fromCycles + (cycles * (i + 0.5)) / n));
      expect(sum / n).toBeCloseTo(brightest.mean, 6);
    },
  );
});

describe('brightness against distance', () => {
  it('falls two stops a doubling, full power on top, and crosses the wish at its reach', () => {
    const plot = reachPlot({ distanceM: 2, brightnessStops: 0, reserveStops: 2 }, 'metres');
    // Inverse square: two stops in reserve reach twice as far.
    expect(plot.reachM).toBe(4);
    const [full] = plot.powers;
    const slope = ((full?.to.y ?? 0) - (full?.from.y ?? 0)) / ((full?.to.x ?? 0) - (full?.from.x ?? 1));
    expect(slope).toBe(-2);
    expect((full?.from.y ?? 0) - 2 * (2 - (full?.from.x ?? 0))).toBe(0);
    expect(plot.own.from.y).toBe(plot.powers[2]?.from.y);
    expect(plot.subject).toEqual({ x: 1, y: 0 });
  });

  it('reaches less far than the subject where the flash is short', () => {
    expect(reachPlot({ distanceM: 8, brightnessStops: 1, reserveStops: -4 }, 'feet').reachM).toBe(2);
  });

  it('stays even between the distances of the answer', () => {
    const light = { referenceM: 2, toleranceStops: 0.5, sourceDiameterM: 0 };
    const even = evenZone(2, 0.5);
    const { points, across, up } = falloffPlot([{ distanceM: 4, stops: -2 }], even, light);
    expect(across[1]).toBeCloseTo(4.4, 9);
    expect(up[0]).toBe(-3);
    for (const { x, y } of points.filter(({ x: at }) => at > 0.01))
      expect(y).toBeCloseTo(falloffStops(x, 2), 9);
    const huge = falloffPlot([{ distanceM: 0.01, stops: 20 }], evenZone(10_000, 20), {
      ...light,
      referenceM: 10_000,
      toleranceStops: 20,
    });
    expect([...huge.across, ...huge.up].every(Number.isFinite)).toBe(true);
  });
});

describe('the blur disc', () => {
  it('has the share of the frame that it has of the sensor', () => {
    const layout = discLayout(1000, { widthMm: 36, heightMm: 24 }, { blurUm: 3600, circleUm: 36 });
    expect(layout.discPx / layout.frameWidthPx).toBeCloseTo(0.1, 12);
    expect(layout.circlePx / layout.discPx).toBeCloseTo(0.01, 12);
    expect(layout.frameHeightPx / layout.frameWidthPx).toBeCloseTo(2 / 3, 12);
    expect(layout.isBeyond).toBe(false);
  });

  it('says where it is wider than the frame, and keeps the frame in bounds', () => {
    const layout = discLayout(328, { widthMm: 1, heightMm: 500 }, { blurUm: 1e6, circleUm: 30 });
    expect(layout.isBeyond).toBe(true);
    expect(layout.frameHeightPx).toBeLessThanOrEqual(1.5 * 328);
  });
});

describe('the charge through a burst', () => {
  it('falls short of a frame just after as many frames as the answer says', () => {
    const { result } = askCalculator(flashBudget, {
      fullPowerPops: 200,
      power: '1/4',
      frames: 500,
      recycleFullS: 2,
      fps: 3,
    });
    const burstFrames = result.burstFrames ?? null;
    const { points, power } = chargePlot(0.25, { recycleFullS: 2, fps: 3, burstFrames });
    const before = points.filter((one, i) => points[i + 1]?.x === one.x).map(({ y }) => y);
    expect(before.filter((charge) => charge >= power - 1e-9)).toHaveLength(burstFrames ?? 0);
    expect(before.at(-1)).toBeLessThan(power);
  });

  it('comes back to full between frames where the flash keeps up', () => {
    const { points } = chargePlot(1 / 16, { recycleFullS: 1.5, fps: 4, burstFrames: null });
    expect(points.filter(({ y }) => y === 1).length).toBeGreaterThan(6);
    expect(
      chargePlot(1, { recycleFullS: 3600, fps: 1000, burstFrames: 1 }).points.every(({ y }) => y >= 0),
    ).toBe(true);
  });
});
