import {
  computed,
  inject,
  provide,
  shallowRef,
  type ComputedRef,
  type InjectionKey,
  type ShallowRef,
} from 'vue';
import type { Answer } from '../../shared/contract/answer';
import { answerFor, parseInput, type AnyCalculator } from '../../shared/contract/defineCalculator';
import { pointerOf, type Fault } from '../../shared/contract/faults';
import type { Reading } from '../../shared/contract/settings';
import { valueAt, withValueAt, type Body, type Path } from '../form/body';
import { faultsByPointer, strayFaults } from '../form/faultPlaces';
import { readingOf } from '../form/readingOf';
import { clock } from './clock';

/** A calculator with the values it is asked about: what its form edits and its answer shows. */
export interface CalculatorForm {
  readonly calculator: AnyCalculator;
  readonly body: ShallowRef<Body>;
  /** How settings are read and on which scale sliders click. */
  readonly reading: ComputedRef<Reading>;
  /** The body with its defaults, where it has no fault. */
  readonly input: ComputedRef<unknown>;
  readonly answer: ComputedRef<Answer<unknown> | null>;
  readonly faults: ComputedRef<readonly Fault[]>;
  /** Faults of names that no field of the form has, as an address may bring them. */
  readonly stray: ComputedRef<readonly Fault[]>;
  valueAt(path: Path): unknown;
  faultsAt(path: Path): readonly Fault[];
  set(path: Path, value: unknown): void;
  replace(body: Body): void;
}

const KEY: InjectionKey<CalculatorForm> = Symbol('calculator form');

/** The state of a calculator's form. Everything follows from the body, at once and in the browser. */
export function createCalculatorForm(calculator: AnyCalculator, initial: Body): CalculatorForm {
  const body = shallowRef(initial);
  const parsed = computed(() => parseInput(calculator, body.value));
  const input = computed(() => ('input' in parsed.value ? parsed.value.input : undefined));
  const faults = computed(() => ('faults' in parsed.value ? parsed.value.faults : []));
  const byPointer = computed(() => faultsByPointer(faults.value));
  return {
    calculator,
    body,
    input,
    faults,
    reading: computed(() => readingOf(body.value, calculator.fields)),
    answer: computed(() =>
      input.value === undefined ? null : answerFor(calculator, input.value, { now: clock.now() }),
    ),
    stray: computed(() => strayFaults(faults.value, calculator.fields)),
    valueAt: (path) => valueAt(body.value, path),
    faultsAt: (path) => byPointer.value.get(pointerOf(path)) ?? [],
    set: (path, value) => (body.value = withValueAt(body.value, path, value)),
    replace: (next) => (body.value = next),
  };
}

export function provideCalculatorForm(form: CalculatorForm): void {
  provide(KEY, form);
}

/** The form that the component stands in. */
export function useCalculatorForm(): CalculatorForm {
  const form = inject(KEY);
  if (!form) throw new Error('A form field stands outside a calculator form');
  return form;
}
