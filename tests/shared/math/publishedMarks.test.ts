import { describe, expect, it } from 'vitest';
import {
  exactOfMarking,
  markAt,
  nearestMark,
  numberOfLabel,
  residualStops,
  type MarkedKind,
  type Scale,
} from '../../../shared/math/marks';
import apertureHalf from '../../reference/aperture-marks-half.json';
import apertureThird from '../../reference/aperture-marks-third.json';
import doubles from '../../reference/double-meanings.json';
import isoThird from '../../reference/iso-marks-third.json';
import shutterHalf from '../../reference/shutter-marks-half.json';
import shutterThird from '../../reference/shutter-marks-third.json';
import { digitsOf } from '../../support/digitsOf';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const SCALES: Scale[] = ['full', 'half', 'third'];

interface Row {
  readonly position: number;
  readonly label: string;
  readonly exact: number;
  readonly errorStops: number;
}

/** The handbook's tables count thirds by thirds and halves by halves, and give labels without a unit. */
function checkRow(kind: MarkedKind, scale: Scale, row: Row, room: number, where: string): void {
  const mark = markAt(kind, scale, row.position);
  const wanted = kind === 'shutter' && !row.label.startsWith('1/') ? `${row.label}s` : row.label;
  expect(mark.label, where).toBe(wanted);
  expect(mark.position, where).toBe(row.position);
  within(mark.exact, row.exact, room, where);
  const error = residualStops(kind, mark.exact, digitsOf(mark.label)) * (kind === 'aperture' ? -1 : 1);
  within(error, row.errorStops, 5.01e-4, where);
  expect(exactOfMarking(kind, scale, digitsOf(mark.label)), where).toBe(mark.exact);
  expect(nearestMark(kind, scale, mark.exact), where).toEqual(mark);
}

describe('the published marks', () => {
  it('are the f-numbers of third stops, f/0.7 to f/64', () => {
    eachRow(apertureThird, 40, (row, where) => {
      checkRow('aperture', 'third', row, apertureThird.tolerance, where);
      if (row.position % 3 === 0)
        expect(markAt('aperture', 'full', row.position / 3).label, where).toBe(row.label);
    });
  });

  it('are the f-numbers of half stops, f/0.85 to f/54', () => {
    eachRow(apertureHalf, 13, (row, where) =>
      checkRow('aperture', 'half', row, apertureHalf.tolerance, where),
    );
  });

  it('are the times of third stops up to 30 s; 40, 50 and 60 s mean themselves', () => {
    let longer = 0;
    eachRow(shutterThird, 64, (row, where) => {
      if (row.position >= -15) {
        checkRow('shutter', 'third', row, shutterThird.tolerance * row.exact, where);
        if (row.position % 3 === 0)
          expect(markAt('shutter', 'full', row.position / 3).label.replace(/s$/, ''), where).toBe(row.label);
        return;
      }
      const seconds = Number(row.label);
      for (const scale of SCALES) {
        expect(exactOfMarking('shutter', scale, seconds), where).toBe(seconds);
        expect(nearestMark('shutter', scale, seconds), where).toMatchObject({
          label: `${seconds}s`,
          exact: seconds,
        });
      }
      longer += 1;
    });
    expect(longer).toBe(3);
  });

  it('are the times of half stops up to 20 s; 45 s means itself', () => {
    let longer = 0;
    eachRow(shutterHalf, 21, (row, where) => {
      if (row.position >= -9) {
        checkRow('shutter', 'half', row, shutterHalf.tolerance * row.exact, where);
        return;
      }
      expect(row.label).toBe('45');
      expect(exactOfMarking('shutter', 'half', 45)).toBe(45);
      expect(nearestMark('shutter', 'half', row.exact).label).toBe('45s');
      longer += 1;
    });
    expect(longer).toBe(1);
  });

  it('are the speeds of third stops, ISO 25 to 102400', () => {
    eachRow(isoThird, 37, (row, where) => {
      checkRow('iso', 'third', row, isoThird.tolerance, where);
      if (row.position % 3 === 0)
        expect(markAt('iso', 'full', row.position / 3).label, where).toBe(row.label);
      // The log speed of ISO 5800 rises by one degree a third stop, 21° at ISO 100.
      expect(Math.round(10 * Math.log10(Number(row.label)) + 1), where).toBe(row.degrees);
    });
  });

  it('mean one value on the scale of thirds and another on that of halves where both have them', () => {
    eachRow(doubles, 8, (row, where) => {
      const kind = row.kind as MarkedKind;
      const value = numberOfLabel(row.mark);
      within(exactOfMarking(kind, 'third', value) / row.third, 1, doubles.tolerance, where);
      within(exactOfMarking(kind, 'half', value) / row.half, 1, doubles.tolerance, where);
      expect(exactOfMarking(kind, 'full', value), where).toBe(value);
    });
  });
});
