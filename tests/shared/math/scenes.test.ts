import { describe, expect, it } from 'vitest';
import { SCENE_CODES, SCENES, sceneMiddleEv100, type Scene } from '../../../shared/math/scenes';
import { solveSetting } from '../../../shared/math/exposure';
import settings from '../../reference/scene-settings.json';
import published from '../../reference/scenes.json';
import { eachRow } from '../../support/eachRow';

const byCode = new Map<string, Scene>(SCENES.map((scene) => [scene.code, scene]));

describe('the list of scenes', () => {
  it('holds exactly the published ranges', () => {
    eachRow(published, 36, (row, where) => {
      const scene = byCode.get(row.code);
      expect([scene?.ev100Low, scene?.ev100High], where).toEqual([row.ev100Low, row.ev100High]);
    });
    expect(SCENES).toHaveLength(36);
  });

  it('has codes and words that occur once', () => {
    expect(new Set(SCENE_CODES).size).toBe(SCENES.length);
    expect(new Set(SCENES.map((scene) => scene.title)).size).toBe(SCENES.length);
    for (const code of SCENE_CODES) expect(code).toMatch(/^[a-z]+(_[a-z]+)*$/);
  });

  it('has ranges in order, and their middle inside', () => {
    for (const scene of SCENES) {
      const middle = sceneMiddleEv100(scene.code);
      expect(scene.ev100Low).toBeLessThanOrEqual(middle);
      expect(middle).toBeLessThanOrEqual(scene.ev100High);
      expect(middle - scene.ev100Low).toBe(scene.ev100High - middle);
    }
  });

  it('leads to the settings that are derived from it', () => {
    eachRow(settings, 9, (row, where) => {
      const code = SCENE_CODES.find((one) => one === row.code);
      expect(code && sceneMiddleEv100(code), where).toBe(row.ev100);
      const shutterS = solveSetting('shutter', row.ev100, {
        aperture: row.aperture,
        shutterS: 1,
        iso: row.iso,
      });
      expect(Math.abs(shutterS / row.shutterS - 1), where).toBeLessThanOrEqual(settings.tolerance);
    });
  });
});
