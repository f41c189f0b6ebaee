import { availableParallelism } from 'node:os';
import type { BenchContext } from '../BenchContext';
import type { Measurement } from '../benchLine';
import { median } from '../statistics';
import { metered } from './targets';

const NAME = 'processes-2-vs-1';
/** Two servers, the database and the asking side. */
const CORES_NEEDED = 4;
const ROUNDS = 7;
const CONNECTIONS = 32;

/** Two server processes over one database against one; says nothing where they would share a core. */
export const processes: Measurement<BenchContext> = {
  names: [NAME],
  async measure(context) {
    const line = { name: NAME, unit: '×', goal: '≥ 1.7' };
    const cores = availableParallelism();
    if (cores < CORES_NEEDED) {
      context.note(`${NAME}: needs ${CORES_NEEDED} cores, here are ${cores}`);
      return [{ ...line, value: null }];
    }
    const one = await metered(context);
    const { port } = await context.startService(2);
    const load = async (ports: readonly number[]) =>
      (await context.load({ ...one, ports, connections: CONNECTIONS / ports.length, seconds: 1 })).perSecond;
    const two = [...one.ports, port];
    await load(two);
    const ratios: number[] = [];
    for (let round = 0; round < ROUNDS; round += 1) {
      const single = await load(one.ports);
      ratios.push((await load(two)) / single);
    }
    return [{ ...line, value: median(ratios) }];
  },
};
