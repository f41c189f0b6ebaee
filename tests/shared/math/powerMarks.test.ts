import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { residualStops, stepsPerStop, type Scale } from '../../../shared/math/marks';
import { nearestPowerMark, powerMarkAt, powerOfText } from '../../../shared/math/powerMarks';
import { inRatio } from '../../support/spread';

const SCALES: Scale[] = ['full', 'half', 'third'];
const anyScale = fc.constantFrom(...SCALES);
const anyPower = inRatio(2 ** -30, 1);

describe('marks of power', () => {
  it('count down from full by the steps of the scale, named as a part of full and what is over it', () => {
    // Common practice, no source.
    const labels = (scale: Scale) => Array.from({ length: 7 }, (_, n) => powerMarkAt(scale, n).label);
    expect(labels('full')).toEqual(['1/1', '1/2', '1/4', '1/8', '1/16', '1/32', '1/64']);
    expect(labels('half')).toEqual(['1/1', '1/2+1/2', '1/2', '1/4+1/2', '1/4', '1/8+1/2', '1/8']);
    expect(labels('third')).toEqual(['1/1', '1/2+2/3', '1/2+1/3', '1/2', '1/4+2/3', '1/4+1/3', '1/4']);
  });

  it('lead from text to value and back, on every scale down to thirty stops', () => {
    let checked = 0;
    for (const scale of SCALES)
      for (let n = 0; n <= 30 * stepsPerStop(scale); n++) {
        const mark = powerMarkAt(scale, n);
        expect(mark.exact).toBeCloseTo(2 ** (-n / stepsPerStop(scale)), 15);
        expect((powerOfText(mark.label) ?? Number.NaN) / mark.exact, mark.label).toBeCloseTo(1, 12);
        expect(nearestPowerMark(scale, mark.exact)).toEqual(mark);
        checked += 1;
      }
    expect(checked).toBe(31 + 61 + 91);
  });

  it('are off by half a step at most when nearest, and safe when rounded to one side', () => {
    fc.assert(
      fc.property(anyScale, anyPower, (scale, power) => {
        const near = nearestPowerMark(scale, power).exact;
        expect(Math.abs(residualStops('power', power, near))).toBeLessThanOrEqual(
          0.5 / stepsPerStop(scale) + 1e-9,
        );
        expect(nearestPowerMark(scale, power, 'floor').exact).toBeLessThanOrEqual(power * (1 + 1e-9));
        expect(nearestPowerMark(scale, power, 'ceil').exact).toBeGreaterThanOrEqual(power * (1 - 1e-9));
      }),
      { numRuns: 1000 },
    );
  });

  it('end at full power, whatever is asked', () => {
    for (const rounding of ['nearest', 'floor', 'ceil'] as const)
      expect(nearestPowerMark('third', 1000, rounding).label).toBe('1/1');
  });

  it('refuse no power, and steps that are none', () => {
    for (const power of [0, -1, Number.NaN, Infinity])
      expect(() => nearestPowerMark('third', power)).toThrow(RangeError);
    for (const steps of [-1, 0.5, Number.NaN]) expect(() => powerMarkAt('third', steps)).toThrow(RangeError);
  });
});

describe('power as text', () => {
  it('is read as written: a part of full, and parts of a stop over it', () => {
    expect(powerOfText('1/16')).toBe(1 / 16);
    expect(powerOfText(' 1/1 ')).toBe(1);
    expect(powerOfText('1/16 + 1/3')).toBeCloseTo(2 ** (-11 / 3), 15);
    expect(powerOfText('1/16+1/2')).toBeCloseTo(2 ** -3.5, 15);
    expect(powerOfText('1/16+2/3')).toBeCloseTo(2 ** (-10 / 3), 15);
    expect(powerOfText('1/6.4')).toBeCloseTo(1 / 6.4, 15);
  });

  it('is nothing where it says more than full, nothing, or something else', () => {
    for (const text of ['1/1+1/3', '1/0.5', '1/0', '2/1', '1/16+2/2', '1/16+3/3', '1/16-1/3', '+1/3', '']) {
      expect(powerOfText(text), text).toBeNull();
    }
    for (const text of ['full', '50%', '1/', '/16', '1/-4', '1/1e2', `1/${'9'.repeat(400)}`])
      expect(powerOfText(text), text).toBeNull();
  });

  it('is refused at once however long it is', () => {
    const long = `1/1${' '.repeat(200_000)}x`;
    const before = performance.now();
    expect(powerOfText(long)).toBeNull();
    expect(performance.now() - before).toBeLessThan(500);
  });
});
