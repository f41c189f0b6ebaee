import { quoted, readable } from '../format';

export const exposureContradictions = {
  limits_crossed: (p: Record<string, unknown>) =>
    `${String(p.high)} must not lie below ${String(p.low)}; ${quoted(p.from)} and ${quoted(p.to)} leave nothing between them.`,
  pair_shortens: (p: Record<string, unknown>) =>
    `Film never needs less time than metered; ${readable(Number(p.correctedS))} s was given for ${readable(Number(p.meteredS))} s.`,
  pairs_not_rising: (p: Record<string, unknown>) =>
    `Both times rise from pair to pair; ${readable(Number(p.given))} s comes after ${readable(Number(p.before))} s.`,
  focus_inside_lens: (p: Record<string, unknown>) =>
    `A lens of ${readable(Number(p.focalLengthMm))} mm focuses on nothing nearer than ${readable(Number(p.focalLengthMm) / 1000)} m; ${readable(Number(p.distanceM))} m was given.`,
  sensor_side_missing: (p: Record<string, unknown>) =>
    `The circle of confusion follows from both sides of the sensor; only the ${String(p.given)} was given.`,
} as const;
