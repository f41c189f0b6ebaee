import { describe, expect, it } from 'vitest';
import { flashMotion } from '../../../../../shared/calculators/flash/motion';
import { parseInput, type AnyCalculator } from '../../../../../shared/contract/defineCalculator';
import { motionIn } from '../../../../../shared/contract/motionIn';
import {
  placeOfUnder,
  underPlaces,
  withAmbient,
} from '../../../../../src/components/drawings/geometry/motionControls';
import { motionView } from '../../../../../src/components/drawings/geometry/motionView';
import { askCalculator } from '../../../../support/askCalculator';

describe('the two controls under the frame', () => {
  it('click in thirds from twelve stops under the flash to three over it', () => {
    expect(underPlaces).toHaveLength(46);
    expect(underPlaces[1]).toEqual({ stops: 11.6667, label: '12', isFullStop: false });
    expect([underPlaces[0]?.stops, underPlaces.at(-1)?.stops]).toEqual([12, -3]);
    expect([placeOfUnder(null), placeOfUnder(3), placeOfUnder(99), placeOfUnder(-99)]).toEqual([
      null,
      27,
      0,
      45,
    ]);
  });

  it('move one thing and leave the other as it was, or start it', () => {
    const body = { flash: { brightnessStops: 1 } };
    expect(withAmbient(body, { shutter: '1s' })).toEqual({
      ...body,
      ambient: { shutter: '1s', subjectBrightnessStops: -2 },
    });
    const given = {
      ...body,
      ambient: { shutter: '1/4', subjectBrightnessStops: 0, backgroundBrightnessStops: -1 },
    };
    expect(withAmbient(given, { underFlashStops: 5 })).toEqual({
      ...body,
      ambient: { shutter: '1/4', subjectBrightnessStops: -4, backgroundBrightnessStops: -1 },
    });
  });

  it('make a question that the calculator takes, from every example', () => {
    for (const { input } of flashMotion.examples)
      expect(
        parseInput(flashMotion as unknown as AnyCalculator, withAmbient(input, { shutter: '2s' })),
      ).toHaveProperty('input');
  });
});

it('the frame shows the blurs of the answer and the brightness of the question', () => {
  const body = flashMotion.examples[2]?.input;
  const { result } = askCalculator(flashMotion, body);
  expect(motionView(motionIn.parse(body), result)).toEqual({
    flash: { stops: 0, blurPx: result.flash?.blurPx },
    ambient: { stops: -3, blurPx: result.ambient?.blurPx },
    backgroundStops: null,
    shakePx: 2.734375,
    detailPx: 10,
  });
});
