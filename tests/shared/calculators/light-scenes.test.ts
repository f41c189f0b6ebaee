import { describe, expect, it } from 'vitest';
import { lightScenes } from '../../../shared/calculators/light/scenes';
import { SCENE_GROUPS, SCENES } from '../../../shared/math/scenes';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

describe('light/scenes', () => {
  it('lists every scene, in order, each with its source', () => {
    const { scenes } = askCalculator(lightScenes, {}).result;
    expect(scenes.map(({ code }) => code)).toEqual(SCENES.map(({ code }) => code));
    for (const { source } of scenes) expect(source).toMatch(/ANSI PH2\.7/);
  });

  it('lists each scene in exactly one group', () => {
    const perGroup = SCENE_GROUPS.map((group) => askCalculator(lightScenes, { group }).result.scenes);
    for (const scenes of perGroup) expect(scenes.length).toBeGreaterThan(0);
    expect(perGroup.flat()).toEqual(askCalculator(lightScenes, {}).result.scenes);
  });

  it('always says that it is for settings, and speaks of direct sun where there is some', () => {
    const notes = (input: object) => codesOf(askCalculator(lightScenes, input).notes);
    expect(notes({})).toEqual(['scenes_are_settings', 'scenes_in_direct_sun']);
    expect(notes({ group: 'indoors' })).toEqual(['scenes_are_settings']);
  });

  it('answers GET, and names its groups to who asks for another', () => {
    expect(lightScenes.answersGet).toBe(true);
    const faults = faultsIn(lightScenes, { group: 'beach' });
    expect(placesOf(faults)).toEqual(['/group not_a_choice']);
    expect(faults[0]?.detail).toContain('sky_at_sunset');
  });
});
