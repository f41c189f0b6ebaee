import { watch } from 'vue';
import type { LocationQuery } from 'vue-router';
import type { Field } from '../../shared/contract/field';
import { decodeQuery, encodeQuery } from '../../shared/contract/queryCodec';
import type { Body } from '../form/body';
import { keep, kept } from './useKept';
import { bodyOfQuery } from './useAddressBody';
import type { CalculatorForm } from './useCalculatorForm';

const NAME = 'evenfall.evening';

/** What was on the page last, and the address that stood above it then. */
interface KeptEvening {
  readonly address: string;
  readonly query: string;
}

function keptEvening(): KeptEvening | null {
  try {
    const held: unknown = JSON.parse(kept(NAME) ?? 'null');
    const isKept = typeof held === 'object' && held !== null && 'address' in held && 'query' in held;
    return isKept ? { address: String(held.address), query: String(held.query) } : null;
  } catch {
    return null;
  }
}

/**
 * The body to begin with: the address's, or where it says nothing, the one that was on the page last. The address
 * follows a change a moment later; after a reload within that moment, what was kept is newer.
 */
export function firstBody(query: LocationQuery, fields: readonly Field[]): Body | undefined {
  const last = keptEvening();
  const isOwn = Object.keys(query).length === 0 || last?.address === location.search;
  if (last && isOwn && last.query !== '') return decodeQuery([...new URLSearchParams(last.query)], fields);
  const body = bodyOfQuery(query, fields);
  if (!body || body.latitude !== undefined || !last) return body;
  // A recipe says nothing of the place: it goes on where the last evening was.
  const { latitude, longitude, timeZone, horizonDeg, skyline } = decodeQuery(
    [...new URLSearchParams(last.query)],
    fields,
  );
  const there = Object.entries({ latitude, longitude, timeZone, horizonDeg, skyline });
  return { ...Object.fromEntries(there.filter(([, value]) => value !== undefined)), ...body };
}

/** Keeps every change at once, for the next visit and for a reload. */
export function keepEvening(form: CalculatorForm): void {
  const text = () => new URLSearchParams(encodeQuery(form.body.value)).toString();
  watch(form.body, () => keep(NAME, JSON.stringify({ address: location.search, query: text() })), {
    immediate: true,
  });
}
