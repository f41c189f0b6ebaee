import { amount } from './format';

/** An amount of stops without a sign, to a hundredth: "1 stop", "2.25 stops". */
export function stopsOf(value: number): string {
  return amount(Number(value.toFixed(2)), 'stops');
}
