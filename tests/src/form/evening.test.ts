import { describe, expect, it } from 'vitest';
import { pageBodyOf, questionOf, zoneOfBody } from '../../../src/form/eveningBody';
import { frameList, withFrameAdded, withoutFrame } from '../../../src/form/eveningFrames';

const question = {
  latitude: 51.5074,
  longitude: -0.1278,
  testFrame: { at: '2026-10-04T18:45:00+01:00', aperture: 'f/4', shutter: '1/60', iso: 400 },
  lamps: { onAt: '2026-10-04T19:10:00+01:00' },
  to: '2026-10-05T00:30:00+01:00',
};

describe('the evening page’s body', () => {
  it('holds clock times and a date, and asks the very question again that was saved', () => {
    const body = pageBodyOf(question);
    expect(body).toMatchObject({
      date: '2026-10-04',
      testFrame: { at: '18:45' },
      lamps: { onAt: '19:10' },
      to: '00:30',
    });
    expect(questionOf(body, (name) => name !== 'date', 0)).toEqual(question);
  });

  it('keeps the clock’s reading when the date moves', () => {
    const moved = questionOf({ ...pageBodyOf(question), date: '2026-12-01' }, () => true, 0);
    expect(moved).toMatchObject({ testFrame: { at: '2026-12-01T18:45:00+00:00' } });
  });

  it('has no zone where place or zone are none', () => {
    expect(zoneOfBody({ latitude: 91, longitude: 0 })).toBeNull();
    expect(zoneOfBody({ latitude: 51, longitude: 0, timeZone: 'Europe/Londinium' })).toBeNull();
  });

  it('moves later frames up when an earlier one is taken out', () => {
    const nowMs = Date.UTC(2026, 9, 4, 18, 30);
    const three = withFrameAdded(withFrameAdded(pageBodyOf(question), nowMs), nowMs + 600_000);
    expect(frameList(three).map(({ frame }) => frame.at)).toEqual(['18:45', '19:30', '19:40']);
    const two = withoutFrame(three, 0);
    expect(frameList(two).map(({ path, frame }) => [path.join('.'), frame.at])).toEqual([
      ['testFrame', '19:30'],
      ['secondFrame', '19:40'],
    ]);
    expect('moreFrames' in two).toBe(false);
  });
});
