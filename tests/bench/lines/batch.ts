import type { BenchContext } from '../BenchContext';
import type { Measurement } from '../benchLine';
import { requestText } from '../load/requestText';
import { mixedCalls } from '../mixedCalls';
import { median, spread } from '../statistics';

const NAME = 'batch-vs-loop';
const CALLS = 1_000;
const ROUNDS = 7;
const ROUND_S = 1.5;
/** Two, so that one is read while another is computed. */
const CONNECTIONS = 2;

/** Calculations a second through batches of a thousand mixed calls, against the same in a loop without a service. */
export const batch: Measurement<BenchContext> = {
  names: [NAME],
  async measure(context) {
    const { port } = await context.service();
    const body = { calls: await mixedCalls(CALLS) };
    const request = requestText('POST', '/v1/batch', { key: await context.key(), body });
    const loop = await context.part('calculatorLoop', { count: CALLS });
    const served = async () => {
      const load = { ports: [port], request, status: 200, connections: CONNECTIONS, seconds: ROUND_S };
      return (await context.load(load)).perSecond * CALLS;
    };
    await served();
    await loop.ask<number>(null);
    const rates: [number, number][] = [];
    for (let round = 0; round < ROUNDS; round += 1)
      rates.push([await served(), await loop.ask<number>(null)]);
    context.note(
      `batch: ${spread(
        rates.map(([own]) => own),
        0,
      )} calculations/s`,
    );
    context.note(
      `loop: ${spread(
        rates.map(([, bare]) => bare),
        0,
      )} calculations/s`,
    );
    const value = median(rates.map(([own, bare]) => own / bare));
    return [{ name: NAME, value, unit: '', goal: '≥ 0.7' }];
  },
};
