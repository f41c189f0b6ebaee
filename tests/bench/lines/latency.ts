import type { BenchContext } from '../BenchContext';
import type { Measurement } from '../benchLine';
import { median, quantile } from '../statistics';
import { expressEcho, metered, type Target } from './targets';

const NAME = 'metered-p99-ratio';
const CONNECTIONS = 32;
const TOP_S = 3;
const ROUNDS = 5;
const ROUND_S = 3;

/** The 99th percentile from due to answered, of the metered call and of a bare echo, both at half of the echo's top rate. */
export const latency: Measurement<BenchContext> = {
  names: [NAME],
  async measure(context) {
    const echo = await expressEcho(context);
    const own = await metered(context);
    const load = (target: Target, seconds: number, rate?: number) =>
      context.load({ ...target, connections: CONNECTIONS, seconds, rate });
    await load(own, 1);
    const { perSecond } = await load(echo, TOP_S);
    const rate = perSecond / 2;
    const p99 = async (target: Target) => quantile((await load(target, ROUND_S, rate)).latenciesMs, 0.99);
    const ratios: number[] = [];
    for (let round = 0; round < ROUNDS; round += 1) {
      const [owns, echos] = [await p99(own), await p99(echo)];
      context.note(`p99 at ${Math.round(rate)} calls/s: ${owns.toFixed(2)} ms, echo ${echos.toFixed(2)} ms`);
      ratios.push(owns / echos);
    }
    return [{ name: NAME, value: median(ratios), unit: '', goal: '≤ 1.0' }];
  },
};
