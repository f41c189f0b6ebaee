import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { textWidthPx } from '../../../../src/components/scale/placeLabels';
import { placeSpans } from '../../../../src/components/scale/placeSpans';

const WIDTH_PX = 328;
const SIZE_PX = 14;
const drawing = { at: (stops: number) => stops, widthPx: WIDTH_PX, sizePx: SIZE_PX, topPx: 50 };
const span = (fromStops: number, toStops: number, label?: string) => ({
  id: `${fromStops}`,
  title: 'light',
  fromStops,
  toStops,
  isLit: true,
  label,
});

describe('words of a stretch', () => {
  it('stand to the right of it where there is room, else to the left, else on a line above it', () => {
    const beside = (from: number, to: number) =>
      placeSpans([span(from, to, 'daylight +131')], drawing).placed[0]?.words;
    expect(beside(20, 100)).toMatchObject({ xPx: 108, anchor: 'start', isAbove: false });
    expect(beside(200, 300)).toMatchObject({ xPx: 192, anchor: 'end', isAbove: false });
    expect(beside(60, 300)).toMatchObject({ xPx: 60, anchor: 'start', isAbove: true });
  });

  it('never lie on a stretch or outside the drawing, and lanes follow one another', () => {
    const place = fc.integer({ min: 0, max: WIDTH_PX });
    const some = fc.array(fc.tuple(place, place, fc.string({ minLength: 1, maxLength: 20 })), {
      minLength: 1,
      maxLength: 6,
    });
    fc.assert(
      fc.property(some, (given) => {
        const { placed, bottomPx } = placeSpans(
          given.map(([from, to, label]) => span(from, to, label)),
          drawing,
        );
        expect(placed).toHaveLength(given.length);
        let endPx = drawing.topPx;
        for (const { span: of, leftPx, widthPx, topPx, heightPx, words } of placed) {
          const textPx = textWidthPx(of.label ?? '', SIZE_PX);
          const textLeft = words.anchor === 'start' ? words.xPx : words.xPx - textPx;
          expect(textLeft).toBeGreaterThanOrEqual(0);
          expect(textLeft + textPx).toBeLessThanOrEqual(WIDTH_PX + 1e-9);
          const isClear = textLeft >= leftPx + widthPx || textLeft + textPx <= leftPx;
          expect(words.isAbove ? words.baselinePx < topPx : isClear || widthPx <= 2).toBe(true);
          expect(words.isAbove ? words.baselinePx - SIZE_PX : topPx).toBeGreaterThanOrEqual(endPx - 1);
          endPx = topPx + heightPx;
        }
        expect(bottomPx).toBeGreaterThanOrEqual(endPx);
      }),
    );
  });
});
