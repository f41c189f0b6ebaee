import { describe, expect, it } from 'vitest';
import {
  edgeMarks,
  evLine,
  evLines,
  planeFrame,
  pointOf,
  xOfAperture,
  yOfShutter,
} from '../../../../src/components/drawings/exposurePlane';

const edges = { leftPx: 0, topPx: 0, rightPx: 1000, bottomPx: 1800 };
const f8 = pointOf(8, 1 / 128);
const frame = planeFrame([f8], edges);

describe('the exposure plane', () => {
  it('reaches over usual gear: f/32 to f/1 across, 1/8000 to 30 s up, a stop everywhere as long', () => {
    // Av of f/32 is 10 and of f/1 is 0; Tv of 1/8000 is 13 and of 30 s (32 s) is −5 (APEX).
    expect(frame.apertures).toEqual([10, 0]);
    expect(frame.shutters).toEqual([13, -5]);
    expect(xOfAperture(frame, 10)).toBe(0);
    expect(xOfAperture(frame, 0)).toBe(1000);
    expect(yOfShutter(frame, 13)).toBe(1800);
    expect(yOfShutter(frame, -5)).toBe(0);
  });

  it('stands f/8 and 1/125 at Av 6 and Tv 7', () => {
    expect(f8).toEqual({ apertureStops: 6, shutterStops: 7 });
    expect(xOfAperture(frame, f8.apertureStops)).toBe(400);
    expect(yOfShutter(frame, f8.shutterStops)).toBe(1200);
  });

  it('grows by whole stops for settings beyond usual gear', () => {
    const grown = planeFrame([pointOf(0.95, 1 / 128), pointOf(45.2, 300)], edges);
    expect(grown.apertures).toEqual([11, -1]);
    expect(grown.shutters).toEqual([13, -9]);
  });
});

describe('lines of equal exposure value', () => {
  it('run one stop down for each stop to the right, from edge to edge', () => {
    // EV 13 passes f/32 at Tv 3, and f/1 at Tv 13: from the left edge to the lower right corner.
    expect(evLine(frame, 13)).toEqual({
      ev: 13,
      fromX: 0,
      fromY: 800,
      toX: 1000,
      toY: 1800,
      endsRight: true,
    });
    // EV 18 passes f/32 at Tv 8 and leaves by the bottom at Tv 13, Av 5.
    expect(evLine(frame, 18)).toEqual({
      ev: 18,
      fromX: 0,
      fromY: 1300,
      toX: 500,
      toY: 1800,
      endsRight: false,
    });
    // EV 0 enters by the top at Tv −5, Av 5.
    expect(evLine(frame, 0)).toEqual({ ev: 0, fromX: 500, fromY: 0, toX: 1000, toY: 500, endsRight: true });
  });

  it('go through the settings whose value they bear', () => {
    const line = evLine(frame, f8.apertureStops + f8.shutterStops);
    if (!line) throw new Error('The line misses the plane');
    const share = (400 - line.fromX) / (line.toX - line.fromX);
    expect(line.fromY + share * (line.toY - line.fromY)).toBeCloseTo(1200, 9);
  });

  it('are none beyond the corners, and fill the plane between them', () => {
    expect(evLine(frame, -5)).toBeNull();
    expect(evLine(frame, 23)).toBeNull();
    expect(evLines(frame).map(({ ev }) => ev)).toEqual(Array.from({ length: 27 }, (_, i) => i - 4));
  });
});

it('the edges bear the marks of full stops, thinned evenly', () => {
  expect(edgeMarks('aperture', [6, 0], 2).map(({ label }) => label)).toEqual(['f/1.0', 'f/2', 'f/4', 'f/8']);
  expect(edgeMarks('shutter', [7, 5], 1)).toEqual([
    { stops: 5, label: '1/30' },
    { stops: 6, label: '1/60' },
    { stops: 7, label: '1/125' },
  ]);
});
