import fc from 'fast-check';
import { DateTime } from 'luxon';
import { describe, expect, it } from 'vitest';
import { civilDateAt, civilDay, formatCivilDate, parseCivilDate } from '../../../shared/time/civilDate';
import { formatInstant } from '../../../shared/time/instant';

const HOUR_MS = 3_600_000;

function hoursOf(text: string, timeZone: string): number | null {
  const date = parseCivilDate(text);
  const day = date && civilDay(date, timeZone);
  return day ? (day.endMs - day.startMs) / HOUR_MS : null;
}

describe('a civil date', () => {
  it('is read from its ISO form and written back', () => {
    expect(parseCivilDate('2026-06-21')).toEqual({ year: 2026, month: 6, day: 21 });
    expect(parseCivilDate('2024-02-29')).toEqual({ year: 2024, month: 2, day: 29 });
    expect(formatCivilDate({ year: 1899, month: 1, day: 2 })).toBe('1899-01-02');
    fc.assert(
      fc.property(fc.integer({ min: -2_000_000, max: 2_000_000 }), (days) => {
        const text = new Date(days * 86_400_000).toISOString().slice(0, 10);
        fc.pre(/^[0-9]{4}-/.test(text) && !text.startsWith('0000'));
        const date = parseCivilDate(text);
        expect(date && formatCivilDate(date)).toBe(text);
      }),
    );
  });

  it('is none when the calendar has no such day or the text is another', () => {
    for (const text of [
      '2026-02-30',
      '2025-02-29',
      '1900-02-29',
      '2026-04-31',
      '2026-13-01',
      '2026-00-10',
      '2026-01-00',
      '0000-01-01',
      '2026-1-1',
      '26-01-01',
      '2026-01-01T00:00',
      ' 2026-01-01',
      '',
    ]) {
      expect(parseCivilDate(text), text).toBeNull();
    }
  });

  it('has 23, 24, 24.5 or 25 hours where clocks are changed', () => {
    expect(hoursOf('2026-06-21', 'Europe/London')).toBe(24);
    expect(hoursOf('2026-03-29', 'Europe/London')).toBe(23);
    expect(hoursOf('2026-10-25', 'Europe/London')).toBe(25);
    expect(hoursOf('2026-03-08', 'America/New_York')).toBe(23);
    expect(hoursOf('2026-11-01', 'America/New_York')).toBe(25);
    expect(hoursOf('2026-04-05', 'Australia/Lord_Howe')).toBe(24.5);
  });

  it('begins at one o’clock where midnight is skipped, and at the first of two midnights', () => {
    const saoPaulo = civilDay({ year: 2018, month: 11, day: 4 }, 'America/Sao_Paulo');
    expect(formatInstant(saoPaulo?.startMs ?? NaN, 'America/Sao_Paulo')).toBe('2018-11-04T01:00:00-02:00');
    expect(hoursOf('2018-11-04', 'America/Sao_Paulo')).toBe(23);
    const havana = civilDay({ year: 2026, month: 11, day: 1 }, 'America/Havana');
    expect(formatInstant(havana?.startMs ?? NaN, 'America/Havana')).toBe('2026-11-01T00:00:00-04:00');
    expect(hoursOf('2026-11-01', 'America/Havana')).toBe(25);
  });

  it('never was where a zone crossed the date line: Samoa had no 30 December 2011', () => {
    expect(hoursOf('2011-12-29', 'Pacific/Apia')).toBe(24);
    expect(hoursOf('2011-12-30', 'Pacific/Apia')).toBeNull();
    expect(hoursOf('2011-12-31', 'Pacific/Apia')).toBe(24);
  });

  const zones = fc.constantFrom(
    'UTC',
    'Europe/London',
    'America/New_York',
    'America/Sao_Paulo',
    'America/Havana',
    'America/St_Johns',
    'Asia/Kathmandu',
    'Asia/Tehran',
    'Asia/Beirut',
    'Africa/Casablanca',
    'Africa/Monrovia',
    'Australia/Lord_Howe',
    'Pacific/Apia',
    'Pacific/Kiritimati',
    'Pacific/Kwajalein',
    'America/Nuuk',
    'Antarctica/Troll',
    'Europe/Amsterdam',
  );
  const dates = fc
    .integer({ min: -25_567, max: 47_846 })
    .map((day) => new Date(day * 86_400_000).toISOString().slice(0, 10));

  it('begins where the one before ends, is shown by its zone’s calendar, and lasts 0 or 20 to 28 hours', () => {
    fc.assert(
      fc.property(dates, zones, (text, zone) => {
        const date = parseCivilDate(text);
        const next = parseCivilDate(
          DateTime.fromISO(text, { zone: 'UTC' }).plus({ days: 1 }).toISODate() ?? '',
        );
        const day = date && civilDay(date, zone);
        if (!date || !next || !day) {
          expect([text, zone]).toEqual(['2011-12-30', 'Pacific/Apia']);
          return;
        }
        const tomorrow = civilDay(next, zone);
        if (tomorrow) expect(tomorrow.startMs).toBe(day.endMs);
        const hours = (day.endMs - day.startMs) / HOUR_MS;
        expect(hours).toBeGreaterThanOrEqual(20);
        expect(hours).toBeLessThanOrEqual(28);
        expect(formatCivilDate(civilDateAt(day.startMs, zone))).toBe(text);
        expect(formatCivilDate(civilDateAt((day.startMs + day.endMs) / 2, zone))).toBe(text);
        expect(formatCivilDate(civilDateAt(day.startMs - 1000, zone))).not.toBe(text);
      }),
      { numRuns: 1000 },
    );
  });

  it('begins when luxon says it does, where midnight comes once', () => {
    fc.assert(
      fc.property(dates, zones, (text, zone) => {
        const date = parseCivilDate(text);
        const midnight = DateTime.fromISO(`${text}T00:00:00`, { zone });
        fc.pre(date !== null && midnight.toISODate() === text && midnight.hour === 0);
        fc.pre(midnight.getPossibleOffsets().length === 1);
        expect(date && civilDay(date, zone)?.startMs).toBe(midnight.toMillis());
      }),
      { numRuns: 500 },
    );
  });
});
