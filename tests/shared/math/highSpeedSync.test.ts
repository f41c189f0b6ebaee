import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  assumedCurtainS,
  highSpeedSyncLossStops,
  highSpeedSyncShare,
  isCurtainPossible,
  isFasterThanSync,
  litFrameShare,
} from '../../../shared/math/highSpeedSync';
import highSpeed from '../../reference/high-speed-sync.json';
import slit from '../../reference/sync-slit.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const shutterS = fc.double({ min: Math.log(1e-6), max: Math.log(86_400), noNaN: true }).map(Math.exp);
const curtainS = fc.double({ min: 0, max: 1, noNaN: true });

describe('high-speed sync', () => {
  it('gives the published shares and losses', () => {
    eachRow(highSpeed, 10, (row, where) => {
      const [t, curtain] = [1 / row.shutterParts, 1 / row.curtainParts];
      within(highSpeedSyncShare(t, curtain), row.share, highSpeed.tolerance, where);
      within(-highSpeedSyncLossStops(t, curtain), row.stops, highSpeed.tolerance, where);
    });
  });

  it('loses what the share says, plus the extra', () => {
    fc.assert(
      fc.property(shutterS, curtainS, fc.double({ min: 0, max: 5, noNaN: true }), (t, curtain, extra) => {
        const loss = highSpeedSyncLossStops(t, curtain, extra);
        expect(Number.isFinite(loss)).toBe(true);
        expect(loss).toBeGreaterThanOrEqual(extra);
        expect(2 ** (extra - loss)).toBeCloseTo(highSpeedSyncShare(t, curtain), 10);
      }),
    );
  });

  it('loses more the faster the shutter and the slower the curtain', () => {
    fc.assert(
      fc.property(shutterS, curtainS, (t, curtain) => {
        const loss = highSpeedSyncLossStops(t, curtain);
        expect(highSpeedSyncLossStops(t / 2, curtain)).toBeGreaterThanOrEqual(loss);
        expect(highSpeedSyncLossStops(t, curtain * 2)).toBeGreaterThanOrEqual(loss);
        // Halving the time never costs the flash more than it costs the ambient light.
        expect(highSpeedSyncLossStops(t / 2, curtain) - loss).toBeLessThanOrEqual(1 + 1e-12);
      }),
    );
  });

  it('agrees with a slit that passes under an even light, added up row by row', () => {
    // The light lasts T + t; a row at height y of the frame is open from y·T to y·T + t.
    const [t, curtain] = [1 / 2000, 1 / 300];
    const rows = Array.from({ length: 101 }, (_, i) => (i / 100) * curtain);
    for (const from of rows) {
      const lit = Math.min(from + t, curtain + t) - Math.max(from, 0);
      within(lit / (curtain + t), highSpeedSyncShare(t, curtain), 1e-12, `row from ${from}`);
    }
  });
});

describe('an ordinary flash above the sync speed', () => {
  it('lights the published shares of the frame', () => {
    eachRow(slit, 5, (row, where) =>
      within(litFrameShare(1 / row.shutterParts, 1 / row.curtainParts), row.share, slit.tolerance, where),
    );
  });

  it('never lights more than the frame', () => {
    fc.assert(
      fc.property(shutterS, fc.double({ min: 1e-6, max: 1, noNaN: true }), (t, curtain) => {
        const share = litFrameShare(t, curtain);
        expect(share).toBeGreaterThan(0);
        expect(share).toBeLessThanOrEqual(1);
      }),
    );
  });
});

describe('curtain and sync speed', () => {
  it('belong together when the curtain is no slower, and the assumed curtain always fits', () => {
    expect(isCurtainPossible(1 / 200, 1 / 250)).toBe(false);
    expect(isCurtainPossible(1 / 250, 1 / 250)).toBe(true);
    fc.assert(
      fc.property(shutterS, (sync) => {
        expect(isCurtainPossible(assumedCurtainS(sync), sync)).toBe(true);
      }),
    );
  });

  it('ask for high-speed sync only when the shutter is faster', () => {
    expect(isFasterThanSync(1 / 256, 1 / 256)).toBe(false);
    expect(isFasterThanSync(1 / 257, 1 / 256)).toBe(true);
    expect(isFasterThanSync(1 / 60, 1 / 256)).toBe(false);
  });

  it('are refused outside their domain', () => {
    for (const bad of [0, -1, NaN, Infinity]) {
      expect(() => assumedCurtainS(bad)).toThrow(RangeError);
      expect(() => highSpeedSyncShare(bad, 0.003)).toThrow(/shutterS/);
      expect(() => isFasterThanSync(bad, 0.004)).toThrow(/shutterS/);
      expect(() => litFrameShare(0.001, bad)).toThrow(/curtainS/);
    }
    expect(() => highSpeedSyncLossStops(0.001, -1)).toThrow(/curtainS/);
    expect(() => highSpeedSyncLossStops(0.001, 0.003, NaN)).toThrow(/extraLossStops/);
  });
});
