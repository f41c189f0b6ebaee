import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { twilightDay } from '../../../shared/calculators/twilight/day';
import {
  clockTimeAt,
  eveningDateAt,
  instantOfClock,
  isClockTime,
  nightEndH,
} from '../../../shared/time/clockTime';
import { parseInstant } from '../../../shared/time/instant';
import { askCalculator } from '../../support/askCalculator';

const date = { year: 2026, month: 10, day: 4 };
const london = { timeZone: 'Europe/London', longitudeDeg: -0.13 };
const berlin = { timeZone: 'Europe/Berlin', longitudeDeg: 13.4 };

describe('clock times of an evening', () => {
  it('are instants of the place, and back', () => {
    expect(instantOfClock(date, '18:45', london)).toBe(Date.UTC(2026, 9, 4, 17, 45));
    expect(instantOfClock(date, '18:45:10', { timeZone: 'Asia/Kathmandu', longitudeDeg: 85.3 })).toBe(
      Date.UTC(2026, 9, 4, 13, 0, 10),
    );
    expect(clockTimeAt(Date.UTC(2026, 9, 4, 17, 45), 'Europe/London')).toBe('18:45');
    expect(clockTimeAt(Date.UTC(2026, 9, 4, 17, 45, 7), 'Europe/London')).toBe('18:45:07');
  });

  it('belong to the night after where they come before solar midnight, and to their own date from then on', () => {
    const ms = instantOfClock(date, '00:30', london) ?? NaN;
    expect(ms).toBe(Date.UTC(2026, 9, 4, 23, 30));
    expect(eveningDateAt(ms, london)).toEqual(date);
    const dawn = instantOfClock(date, '02:30', london) ?? NaN;
    expect(dawn).toBe(Date.UTC(2026, 9, 4, 1, 30));
    expect(eveningDateAt(dawn, london)).toEqual(date);
  });

  it.each([
    ['Fairbanks', 64.84, -147.72, 'America/Anchorage', '2026-06-21'],
    ['Reykjavik', 64.15, -21.94, 'Atlantic/Reykjavik', '2026-06-21'],
    ['Oslo', 59.91, 10.75, 'Europe/Oslo', '2026-06-21'],
    ['Auckland', -36.85, 174.76, 'Pacific/Auckland', '2026-12-21'],
    ['Kiritimati', 1.87, -157.4, 'Pacific/Kiritimati', '2026-03-20'],
  ])(
    'give %s its sunset in the evening of the date and its sunrise on it',
    (_, latitude, longitude, timeZone, day) => {
      // The calculator's own definition: the evening ends at solar midnight.
      const { events } = askCalculator(twilightDay, { latitude, longitude, timeZone, date: day }).result;
      const clock = { timeZone, longitudeDeg: longitude };
      const [year = 0, month = 0, dayOfMonth = 0] = day.split('-').map(Number);
      const found = events.filter(({ name, at }) => at !== null && (name === 'sunrise' || name === 'sunset'));
      expect(found).toHaveLength(2);
      for (const { at } of found) {
        const ms = parseInstant(at ?? '') ?? NaN;
        expect(eveningDateAt(ms, clock)).toEqual({ year, month, day: dayOfMonth });
        expect(instantOfClock({ year, month, day: dayOfMonth }, clockTimeAt(ms, timeZone), clock)).toBe(ms);
      }
    },
  );

  it('come back from every instant, wherever the clock hangs', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -180, max: 180 }),
        fc.integer({ min: 0, max: 366 * 1440 }),
        (longitudeDeg, minute) => {
          const clock = { timeZone: 'UTC', longitudeDeg };
          const ms = Date.UTC(2026, 0, 1) + minute * 60_000;
          expect(nightEndH(clock, ms)).toBeGreaterThanOrEqual(0);
          expect(nightEndH(clock, ms)).toBeLessThanOrEqual(12);
          expect(instantOfClock(eveningDateAt(ms, clock), clockTimeAt(ms, 'UTC'), clock)).toBe(ms);
        },
      ),
    );
  });

  it('know winter from summer on the days when the clocks change', () => {
    // Europe/Berlin went to +02:00 on 29 March 2026 and back on 25 October (IANA time zone database).
    const spring = { year: 2026, month: 3, day: 29 };
    expect(instantOfClock(spring, '19:00', berlin)).toBe(Date.UTC(2026, 2, 29, 17));
    const autumn = { year: 2026, month: 10, day: 25 };
    expect(instantOfClock(autumn, '19:00', berlin)).toBe(Date.UTC(2026, 9, 25, 18));
  });

  it('are no readings beyond a clock’s face', () => {
    for (const text of ['24:00', '7:05', '12:60', '2026-10-04T18:45:00Z', '']) {
      expect(isClockTime(text), text).toBe(false);
      expect(instantOfClock(date, text, london), text).toBeNull();
    }
  });
});
