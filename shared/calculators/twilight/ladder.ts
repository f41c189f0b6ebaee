import { note, type Remark } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import { zoneOf } from '../../contract/geographicIn';
import { exactLadder } from '../../contract/ladderExact';
import { ladderIn } from '../../contract/ladderIn';
import { ladderOut, ladderRemark, shapeLadder } from '../../contract/ladderOut';
import { duskLadder } from '../../math/ladder/duskLadder';
import { ladderFlash } from './examples/ladderFlash';
import { ladderOneFrame } from './examples/ladderOneFrame';

export const twilightLadder = defineCalculator({
  id: 'twilight/ladder',
  title: 'Dusk ladder',
  summary: 'The settings that follow the falling light from a test frame on, with the minute of each change.',
  units: 5,
  input: ladderIn,
  output: ladderOut,
  sources: [
    'Light of sky and moon: Explanatory Supplement to the Astronomical Almanac (1992), p. 491; light adds',
    'Offset of the scene and light of the lamps: least squares over the test frames, derivation',
    'Spread: half a stop from one frame, a quarter from several, two before sunset; modelling choices',
  ],
  examples: [ladderOneFrame, ladderFlash],
  compute(given) {
    const timeZone = zoneOf(given);
    const ladder = duskLadder(exactLadder(given));
    const hasPower = given.flash !== undefined && given.subjectBelowBackgroundStops !== undefined;
    const notes: Remark[] = [
      ...(given.timeZone === undefined ? [note('zone_looked_up', { timeZone })] : []),
      ...ladder.notes.map((found) => ladderRemark(found, timeZone)),
      ...(hasPower ? [note('lights_fixed_to_key')] : []),
    ];
    return {
      result: shapeLadder(ladder, given.scale, timeZone),
      notes,
      cautions: given.flash
        ? (['night_and_place', 'flash_and_eyes', 'stands_and_wind'] as const)
        : (['night_and_place'] as const),
    };
  },
});
