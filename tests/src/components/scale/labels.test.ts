import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lanesOf } from '../../../../src/components/scale/lanesOf';
import { lightScaleText } from '../../../../src/components/scale/lightScaleText';
import { placeLabels } from '../../../../src/components/scale/placeLabels';
import { thinnedLabels } from '../../../../src/components/scale/thinnedLabels';

const anyLabels = fc.array(
  fc.record({ xPx: fc.integer({ min: 0, max: 328 }), text: fc.string({ minLength: 1, maxLength: 18 }) }),
  { maxLength: 10 },
);

describe('labels above and below the axis', () => {
  it('never cover one another within a lane and never leave the drawing', () => {
    fc.assert(
      fc.property(anyLabels, (labels) => {
        const given = labels.map((label, i) => ({ ...label, id: String(i) }));
        const placed = placeLabels(given, { widthPx: 328, sizePx: 14 });
        for (const one of placed) {
          expect(one.leftPx).toBeGreaterThanOrEqual(0);
          expect(one.leftPx + one.textPx).toBeLessThanOrEqual(328);
          for (const other of placed) {
            if (one === other || one.lane !== other.lane) continue;
            expect(one.leftPx + one.textPx <= other.leftPx || other.leftPx + other.textPx <= one.leftPx).toBe(
              true,
            );
          }
        }
      }),
    );
  });

  it('stand over their place where there is room, in the nearest lane', () => {
    const [label] = placeLabels([{ id: 'a', xPx: 100, text: 'now' }], { widthPx: 300, sizePx: 10 });
    expect(label?.lane).toBe(0);
    expect((label?.leftPx ?? 0) + (label?.textPx ?? 0) / 2).toBeCloseTo(100, 9);
  });

  it('go up a lane where they would touch, and are left out where no lane is free', () => {
    const same = ['a', 'b', 'c'].map((id) => ({ id, xPx: 100, text: 'street' }));
    expect(
      placeLabels(same, { widthPx: 300, sizePx: 10, maxLanes: 2 }).map(({ id, lane }) => [id, lane]),
    ).toEqual([
      ['a', 0],
      ['b', 1],
    ]);
  });
});

describe('labels under a ruler', () => {
  const labels = (count: number, apartPx: number) =>
    Array.from({ length: count }, (_, i) => ({
      text: `f/${i}`,
      xPx: 20 + i * apartPx,
      isFullStop: i % 3 === 0,
    }));

  it('stand at full stops alone', () => {
    expect(thinnedLabels(labels(7, 40), { widthPx: 400, sizePx: 13 }).map(({ text }) => text)).toEqual([
      'f/0',
      'f/3',
      'f/6',
    ]);
  });

  it('are thinned to one even distance until none touches', () => {
    const kept = thinnedLabels(labels(31, 6), { widthPx: 300, sizePx: 13 });
    const apart = new Set(kept.slice(1).map(({ xPx }, i) => xPx - (kept[i]?.xPx ?? 0)));
    expect(apart.size).toBe(1);
    expect(kept.length).toBeGreaterThan(2);
  });
});

describe('stretches', () => {
  it('that only touch share a lane; those that overlap do not; a labelled one stands alone', () => {
    const stretch = (fromStops: number, toStops: number, label?: string) => ({ fromStops, toStops, label });
    expect(lanesOf([stretch(0, 3), stretch(3, 5), stretch(4, 1)])).toEqual([0, 0, 1]);
    expect(lanesOf([stretch(0, 1, 'aperture'), stretch(1, 2, 'shutter')])).toEqual([0, 1]);
  });
});

it('the scale is told in words: what stands where, and what is lit', () => {
  const words = lightScaleText(
    [{ id: 'now', title: 'Now', stops: -2.5, kind: 'light' }],
    [{ id: 'gone', title: 'light that has gone', fromStops: -2.5, toStops: 16, isLit: false }],
    { unit: 'EV at ISO 100' },
  );
  expect(words).toBe(
    'In EV at ISO 100, more light to the right: Now at −2.5; light that has gone, unlit, from −2.5 to 16.',
  );
});
