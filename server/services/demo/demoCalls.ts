import type { FinishedCall } from '../usage/UsageRecorder';

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;
const DAYS = 35;

interface Habit {
  readonly keyId: string;
  /** Calls in a busy hour of a working day. */
  readonly busy: number;
  readonly calculators: readonly (readonly [name: string, units: number])[];
}

/** Numbers in [0, 1) that are the same each time: Park and Miller's generator (Comm. ACM 31, 1988). */
function numbers(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48_271) % 2_147_483_647;
    return state / 2_147_483_647;
  };
}

/** How busy a place is by the hour (UTC): most before dusk, nothing at night. */
function shareOf(hour: number): number {
  return hour < 6 || hour > 21 ? 0 : Math.exp(-(((hour - 17) / 4) ** 2));
}

function callAt(at: Date, { keyId, calculators }: Habit, random: () => number, no: number): FinishedCall {
  const [calculator, units] = calculators[Math.floor(random() ** 2 * calculators.length)] ?? ['usage', 0];
  const isFaulty = random() < 0.04;
  return {
    keyId,
    calculator,
    at,
    status: isFaulty ? 422 : 200,
    code: isFaulty ? 'invalid_input' : undefined,
    units: isFaulty ? 0 : units,
    // Most answers take a fraction of a millisecond, a few take long.
    ms: 0.3 + 0.6 * random() + (random() < 0.02 ? 20 * random() : 0),
    requestId: `maren-heights-${keyId.slice(0, 8)}-${no.toString(36)}`,
  };
}

/** Five weeks of calls that end at `now`, in order of time. */
export function demoCalls(habits: readonly Habit[], now: Date): FinishedCall[] {
  const firstHour = Math.floor((now.getTime() - DAYS * DAY_MS) / HOUR_MS) * HOUR_MS;
  const calls = habits.flatMap((habit, i) => {
    const random = numbers(1_009 + i);
    const made: FinishedCall[] = [];
    for (let hourMs = firstHour; hourMs < now.getTime(); hourMs += HOUR_MS) {
      const hour = new Date(hourMs);
      const isWeekend = hour.getUTCDay() % 6 === 0;
      const wanted =
        habit.busy * shareOf(hour.getUTCHours()) * (isWeekend ? 0.3 : 1) * (0.6 + 0.8 * random());
      for (let k = 0; k < Math.round(wanted); k++) {
        const at = new Date(hourMs + random() * HOUR_MS);
        if (at < now) made.push(callAt(at, habit, random, made.length));
      }
    }
    return made;
  });
  return calls.sort((a, b) => a.at.getTime() - b.at.getTime());
}
