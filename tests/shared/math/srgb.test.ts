import { describe, expect, it } from 'vitest';
import { encodeSrgb, linearOfStops, MIDDLE_TONE_LINEAR } from '../../../shared/math/srgb';

describe('the sRGB transfer function', () => {
  it('meets its two pieces at the break, and ends at 0 and 1', () => {
    // IEC 61966-2-1:1999 from memory: 12.92·L below 0.0031308, 1.055·L^(1/2.4) − 0.055 above.
    expect(encodeSrgb(0)).toBe(0);
    expect(encodeSrgb(1)).toBeCloseTo(1, 12);
    expect(encodeSrgb(0.0031308)).toBeCloseTo(0.04045, 5);
    expect(encodeSrgb(0.0031309)).toBeCloseTo(encodeSrgb(0.0031308), 5);
  });

  it('writes a middle tone as 118 of 255, and half of white as 188', () => {
    // Derivation: 1.055·0.18^(1/2.4) − 0.055 = 0.4613, 1.055·0.5^(1/2.4) − 0.055 = 0.7354.
    expect(Math.round(255 * encodeSrgb(MIDDLE_TONE_LINEAR))).toBe(118);
    expect(Math.round(255 * encodeSrgb(0.5))).toBe(188);
  });

  it('clips what is over white and refuses what is no light', () => {
    expect(encodeSrgb(40)).toBeCloseTo(1, 12);
    expect(encodeSrgb(Infinity)).toBeCloseTo(1, 12);
    expect(() => encodeSrgb(-0.1)).toThrow(RangeError);
    expect(() => encodeSrgb(NaN)).toThrow(RangeError);
  });
});

it('a stop doubles the light', () => {
  expect(linearOfStops(0)).toBe(0.18);
  expect(linearOfStops(2)).toBe(0.72);
  expect(linearOfStops(-3)).toBe(0.0225);
});
