import type { TwilightDayOut } from '../../shared/calculators/twilight/day';
import type { LadderOut } from '../../shared/contract/ladderOut';

export type DayAnswer = TwilightDayOut;
export type LadderAnswer = LadderOut;
export type Rung = LadderAnswer['rungs'][number];
export type TurningPoint = LadderAnswer['turningPoints'][number];
export type DayEvent = DayAnswer['events'][number];
