import { performance } from 'node:perf_hooks';
import { getTimes } from 'suncalc';
import { dayCrossings } from '../../shared/math/dayCrossings';
import { solarDay } from '../../shared/math/solarDay';
import { SUNRISE_DEG } from '../../shared/math/sunAltitudes';
import { sunCrossings } from '../../shared/math/sunCrossings';
import { sunEvents } from '../../shared/math/sunEvents';
import { engineCrossings } from '../support/engineSun';
import type { BenchLine } from './benchLine';
import { median } from './statistics';

const DAY_MS = 86_400_000;
const ROUNDS = 25;

/** Places up to 60 degrees and days of one year, spread evenly: the same for both. */
const SAMPLES = Array.from({ length: 1000 }, (_, index) => ({
  place: {
    latitude: -60 + 120 * ((index * 0.754877666) % 1),
    longitude: -180 + 360 * ((index * 0.569840291) % 1),
  },
  noonMs: Date.UTC(2026, 0, 1, 12) + ((index * 139) % 365) * DAY_MS,
}));
const ROUND = [...SAMPLES, ...SAMPLES, ...SAMPLES, ...SAMPLES];

/**
 * The line `twilight-vs-suncalc`: a whole day's events in the process, against suncalc's getTimes, interleaved in one
 * run and compared by medians; and how far the events are from astronomy-engine's SearchAltitude.
 */
export async function benchTwilight(): Promise<BenchLine[]> {
  return Promise.resolve([speed(), ...accuracy()]);
}

function speed(): BenchLine {
  const own: number[] = [];
  const other: number[] = [];
  let sink = 0;
  for (let round = 0; round < ROUNDS; round += 1) {
    own.push(timed(() => (sink += ownDays())));
    other.push(timed(() => (sink += suncalcDays())));
  }
  if (!Number.isFinite(sink)) throw new Error('a day without a noon');
  return { name: 'twilight-vs-suncalc', value: median(other) / median(own), unit: '×', goal: '≥ 2' };
}

/** Solar noon and six altitudes, morning and evening, of which eight come with their azimuth: thirteen events. */
function ownDays(): number {
  let sum = 0;
  for (const { place, noonMs } of ROUND) {
    const day = solarDay(place, noonMs);
    for (const event of sunEvents(day, 0)) sum += event.atMs ?? 0;
    for (const altitudeDeg of [-4, 6]) sum += Number(dayCrossings(day, altitudeDeg).morning === 0);
  }
  return sum;
}

/** Solar noon, midnight and six altitudes, morning and evening: fourteen events. */
function suncalcDays(): number {
  let sum = 0;
  for (const { place, noonMs } of ROUND) {
    sum += getTimes(new Date(noonMs), place.latitude, place.longitude).solarNoon.getTime();
  }
  return sum;
}

/** Worst distance from SearchAltitude below 60 degrees, which itself stops within 0.1 s; and counts everywhere. */
function accuracy(): BenchLine[] {
  let worstS = 0;
  let different = 0;
  for (const [index, { place, noonMs }] of SAMPLES.slice(0, 300).entries()) {
    const isHigh = index % 3 === 0;
    const where = isHigh ? { ...place, latitude: Math.sign(place.latitude) * (60 + (index % 30)) } : place;
    for (const altitudeDeg of [-18, -12, -6, SUNRISE_DEG]) {
      const own = sunCrossings(where, altitudeDeg, noonMs, noonMs + DAY_MS);
      const engine = engineCrossings(where, altitudeDeg, noonMs, noonMs + DAY_MS);
      different += Math.abs(own.length - engine.length);
      if (isHigh) continue;
      own.forEach(({ atMs }, event) => {
        worstS = Math.max(worstS, Math.abs(atMs - (engine[event]?.atMs ?? Infinity)) / 1000);
      });
    }
  }
  return [
    { name: 'twilight-worst-below-60', value: worstS, unit: 's', goal: '≤ 0.1' },
    { name: 'twilight-missed-or-invented', value: different, unit: 'events', goal: '0' },
  ];
}

function timed(work: () => void): number {
  const startMs = performance.now();
  work();
  return performance.now() - startMs;
}
