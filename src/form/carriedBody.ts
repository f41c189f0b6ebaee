import { parseInput, type AnyCalculator } from '../../shared/contract/defineCalculator';
import type { Body } from './body';
import type { Asked, CarryRule } from './carryRules';

function withoutEmpty(body: Body): Body {
  const filled = Object.entries(body).filter(([, value]) => value !== undefined && value !== null);
  return Object.fromEntries(
    filled.map(([name, value]) => [
      name,
      typeof value === 'object' && !Array.isArray(value) ? withoutEmpty(value as Body) : value,
    ]),
  );
}

/** An example with carried values in it; what only the example says the other way makes room. */
function mixed(example: Body, carried: Body, dropped: string | null): Body {
  const kept = Object.entries(example).filter(([name]) => name !== dropped);
  return { ...Object.fromEntries(kept), ...carried };
}

/**
 * A question for another calculator with the values that go over, the rest as in its examples: the first example with
 * which the calculator takes it, if need be without one of the example's own values. Null where nothing goes over.
 */
export function carriedBody(calculator: AnyCalculator, rule: CarryRule, asked: Asked): Body | null {
  const carried = withoutEmpty(rule.carry(asked));
  if (Object.keys(carried).length === 0) return null;
  const takes = (body: Body) => 'input' in parseInput(calculator, body);
  const examples = calculator.examples.map(({ input }) => input as Body);
  for (const example of examples) {
    const own = Object.keys(example).filter((name) => !(name in carried));
    const found = [null, ...own].map((dropped) => mixed(example, carried, dropped)).find(takes);
    if (found) return found;
  }
  return null;
}
