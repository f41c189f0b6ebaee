import { describe, expect, it } from 'vitest';
import { clockTimeAt, eveningDateAt, instantOfClock, isClockTime } from '../../../shared/time/clockTime';

const date = { year: 2026, month: 10, day: 4 };

describe('clock times of an evening', () => {
  it('are instants of the place, and back', () => {
    expect(instantOfClock(date, '18:45', 'Europe/London')).toBe(Date.UTC(2026, 9, 4, 17, 45));
    expect(instantOfClock(date, '18:45:10', 'Asia/Kathmandu')).toBe(Date.UTC(2026, 9, 4, 13, 0, 10));
    expect(clockTimeAt(Date.UTC(2026, 9, 4, 17, 45), 'Europe/London')).toBe('18:45');
    expect(clockTimeAt(Date.UTC(2026, 9, 4, 17, 45, 7), 'Europe/London')).toBe('18:45:07');
  });

  it('belong to the night after where they come before 3:00', () => {
    const ms = instantOfClock(date, '00:30', 'Europe/London') ?? NaN;
    expect(ms).toBe(Date.UTC(2026, 9, 4, 23, 30));
    expect(eveningDateAt(ms, 'Europe/London')).toEqual(date);
    expect(eveningDateAt(Date.UTC(2026, 9, 4, 2, 30), 'Europe/London')).toEqual(date);
  });

  it('know winter from summer on the days when the clocks change', () => {
    // Europe/Berlin went to +02:00 on 29 March 2026 and back on 25 October (IANA time zone database).
    const spring = { year: 2026, month: 3, day: 29 };
    expect(instantOfClock(spring, '19:00', 'Europe/Berlin')).toBe(Date.UTC(2026, 2, 29, 17));
    const autumn = { year: 2026, month: 10, day: 25 };
    expect(instantOfClock(autumn, '19:00', 'Europe/Berlin')).toBe(Date.UTC(2026, 9, 25, 18));
  });

  it('are no readings beyond a clock’s face', () => {
    for (const text of ['24:00', '7:05', '12:60', '2026-10-04T18:45:00Z', '']) {
      expect(isClockTime(text), text).toBe(false);
      expect(instantOfClock(date, text, 'UTC'), text).toBeNull();
    }
  });
});
