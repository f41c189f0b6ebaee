import { onBeforeUnmount, watch } from 'vue';
import { useRoute, useRouter, type LocationQuery } from 'vue-router';
import type { Field } from '../../shared/contract/field';
import { decodeQuery, encodeQuery } from '../../shared/contract/queryCodec';
import type { Body } from '../form/body';
import type { CalculatorForm } from './useCalculatorForm';

/** Browsers refuse a page that rewrites its address on every step of a slider. */
const REST_MS = 250;

/** What an address says, as a request body; undefined where it says nothing. */
export function bodyOfQuery(query: LocationQuery, fields: readonly Field[]): Body | undefined {
  const pairs = Object.entries(query).flatMap(([name, held]) =>
    [held].flat().map((text): [string, string] => [name, text ?? '']),
  );
  return pairs.length > 0 ? decodeQuery(pairs, fields) : undefined;
}

const asQuery = (body: Body): Record<string, string> => Object.fromEntries(encodeQuery(body));

const isSame = (a: LocationQuery, b: Record<string, string>) =>
  Object.keys(a).length === Object.keys(b).length &&
  Object.entries(b).every(([name, text]) => a[name] === text);

/**
 * Keeps a form and the page's address together. Changes replace the address once they rest, so that going back
 * leaves the page rather than undoing a slider; another address for the same page fills the form anew.
 */
export function useAddressBody(form: CalculatorForm, initial: Body): void {
  const route = useRoute();
  const router = useRouter();
  const path = route.path;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let written = asQuery(form.body.value);

  function write(): void {
    timer = undefined;
    written = asQuery(form.body.value);
    if (route.path === path && !isSame(route.query, written))
      void router.replace({ query: written, hash: route.hash });
  }

  watch(form.body, () => {
    clearTimeout(timer);
    timer = setTimeout(write, REST_MS);
  });
  watch(
    () => route.query,
    (query) => {
      if (route.path !== path || timer !== undefined || isSame(query, written)) return;
      form.replace(bodyOfQuery(query, form.calculator.fields) ?? initial);
    },
  );
  onBeforeUnmount(() => clearTimeout(timer));
}
