import { describe, expect, it } from 'vitest';
import { duskLadder } from '../../../../shared/math/ladder/duskLadder';
import type { DuskLadder } from '../../../../shared/math/ladder/ladderTypes';
import { clear, eveningMs, frameOf, inputOf, munich, type Evening } from '../../../support/ladderInputs';
import { within } from '../../../support/within';

const MINUTE_MS = 60_000;

describe('what would mislead is said', () => {
  const codes = (ladder: DuskLadder) => ladder.notes.map(({ code }) => code);
  const at = (altitudeDeg: number) => eveningMs(munich, clear.sunsetMs, altitudeDeg);

  it('lamps are unknown after one frame, not when they are told', () => {
    const one = { ...inputOf(clear), frames: [frameOf(clear, at(-3))] };
    expect(codes(duskLadder(one))).toContain('lamps_unknown');
    expect(codes(duskLadder({ ...one, lampFloorEv100: 0 }))).not.toContain('lamps_unknown');
    expect(codes(duskLadder(inputOf(clear)))).not.toContain('lamps_unknown');
  });

  it('lamps are undetermined, within a range that holds the truth, when the frames are close together', () => {
    const lit = { ...clear, floorEv100: 0 };
    const close = { ...inputOf(lit), frames: [frameOf(lit, at(-2)), frameOf(lit, at(-3))] };
    const note = duskLadder(close).notes.find(({ code }) => code === 'lamps_undetermined');
    if (note?.code !== 'lamps_undetermined') throw new Error('not said');
    expect(note.lowEv100 ?? -Infinity).toBeLessThan(0);
    expect(note.highEv100).toBeGreaterThan(0);
    expect(codes(duskLadder(inputOf(lit)))).not.toContain('lamps_undetermined');
  });

  it('lamps came on when a later frame is brighter, and count from then on', () => {
    const before = frameOf({ ...clear, floorEv100: null }, at(-5));
    const after = frameOf({ ...clear, floorEv100: 5 }, at(-6));
    const ladder = duskLadder({ ...inputOf(clear), frames: [before, after] });
    expect(ladder.notes).toContainEqual({ code: 'lamps_came_on', atMs: after.atMs });
    within(ladder.model.lampFloorEv100 ?? NaN, 5, 1e-3, 'floor');
    within(ladder.model.skyOffsetStops, 1, 1e-3, 'offset');
    // Told when they came on, the same model without the note.
    const told = duskLadder({
      ...inputOf(clear),
      frames: [before, after],
      lamps: { onMs: after.atMs - 1000 },
    });
    expect(codes(told)).not.toContain('lamps_came_on');
    within(told.model.lampFloorEv100 ?? NaN, 5, 1e-3, 'floor');
    const rung = told.rungs.find(({ atMs }) => atMs === after.atMs - 1000);
    expect(rung).toMatchObject({ earlyS: 0, lateS: 0 });
  });

  it('a frame is darker than the lamps that are told to light it, which leaves nothing for the sky', () => {
    const frame = frameOf(clear, at(-8));
    const floor = 4;
    const ladder = duskLadder({ ...inputOf(clear), frames: [frame], lampFloorEv100: floor });
    const note = ladder.notes.find(({ code }) => code === 'frame_below_lamps');
    if (note?.code !== 'frame_below_lamps') throw new Error('not said');
    expect(note.lampFloorEv100).toBe(floor);
    expect(note.sceneEv100).toBeLessThan(floor);
    expect(codes(ladder)).not.toContain('check_clock');
    within(ladder.rungs.at(-1)?.sceneEv100 ?? NaN, floor, 0.02, 'scene');
    expect(codes(duskLadder({ ...inputOf(clear), lampFloorEv100: -9 }))).not.toContain('frame_below_lamps');
  });

  it('a frame before sunset is worth two stops of spread, unless there are better ones', () => {
    const early = frameOf(clear, at(2));
    const alone = duskLadder({ ...inputOf(clear), frames: [early] });
    expect(codes(alone)).toContain('frame_before_sunset');
    expect(alone.model.spreadStops).toBe(2);
    const strange = { ...early, offsetStops: early.offsetStops + 2 };
    const helped = duskLadder({
      ...inputOf(clear),
      frames: [strange, frameOf(clear, at(-3)), frameOf(clear, at(-8))],
    });
    expect(codes(helped)).toContain('frame_before_sunset');
    expect(helped.model.spreadStops).toBeLessThan(0.5);
    within(helped.model.skyOffsetStops, 1, 0.05, 'offset');
  });

  it('a clock that is an hour wrong shows as an offset that no scene has', () => {
    const frame = frameOf(clear, at(-3));
    const ladder = duskLadder({
      ...inputOf(clear),
      frames: [{ ...frame, atMs: frame.atMs + 60 * MINUTE_MS }],
    });
    expect(codes(ladder)).toContain('check_clock');
    expect(codes(duskLadder({ ...inputOf(clear), frames: [frame] }))).not.toContain('check_clock');
  });

  it('the moon counts when it is full and the sky is dark', () => {
    const place = { latitude: 45, longitude: 0 };
    const full: Evening = {
      place,
      sunsetMs: eveningMs(place, Date.UTC(2026, 2, 3, 12), -50 / 60),
      offsetStops: 0,
      floorEv100: null,
    };
    expect(codes(duskLadder({ ...inputOf(full), toMs: eveningMs(place, full.sunsetMs, -18) }))).toContain(
      'moon_counts',
    );
    const young = { ...full, sunsetMs: eveningMs(place, Date.UTC(2026, 2, 19, 12), -50 / 60) };
    expect(codes(duskLadder(inputOf(young)))).not.toContain('moon_counts');
  });
});
