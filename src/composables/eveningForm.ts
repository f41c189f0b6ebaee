import { computed, shallowRef, type ComputedRef } from 'vue';
import type { Answer } from '../../shared/contract/answer';
import {
  answerFor,
  parseInput,
  type AnyCalculator,
  type Parsed,
} from '../../shared/contract/defineCalculator';
import { pointerOf, type Fault } from '../../shared/contract/faults';
import { valueAt, withValueAt, type Body } from '../form/body';
import type { DayAnswer, LadderAnswer } from '../text/eveningAnswers';
import { isUnjudged, questionOf } from '../form/eveningBody';
import { faultsByPointer, strayFaults } from '../form/faultPlaces';
import { readingOf } from '../form/readingOf';
import { clock } from './clock';
import type { CalculatorForm } from './useCalculatorForm';

/** The evening page's form: one body for two calculators, the day's light and the ladder. */
export interface EveningForm extends CalculatorForm {
  readonly day: ComputedRef<Answer<DayAnswer> | null>;
  /** Null where no test frame is given yet, or something is at fault. */
  readonly ladder: ComputedRef<Answer<LadderAnswer> | null>;
  /** What the ladder is asked, with whole instants; the thing that is saved. */
  readonly question: ComputedRef<Body>;
  readonly dayCalculator: AnyCalculator;
}

const NO_FAULTS: Parsed = { faults: [] };

/** Lamps without any time are none. */
function tidied(body: Body): Body {
  const { lamps, ...rest } = body;
  const isEmpty = typeof lamps === 'object' && lamps !== null && Object.keys(lamps).length === 0;
  return isEmpty ? rest : body;
}

const faultsIn = (parsed: Parsed) => ('faults' in parsed ? parsed.faults : []);

/** The same fault of a field that both take is told once. */
function once(faults: readonly Fault[]): Fault[] {
  return faults.filter(
    ({ pointer, code }, i) =>
      faults.findIndex((other) => other.pointer === pointer && other.code === code) === i,
  );
}

function answerOf<R>(calculator: AnyCalculator, parsed: Parsed): Answer<R> | null {
  if (!('input' in parsed)) return null;
  return answerFor(calculator, parsed.input, { now: clock.now() }) as Answer<R>;
}

export function createEveningForm(
  dayCalculator: AnyCalculator,
  ladderCalculator: AnyCalculator,
  initial: Body,
): EveningForm {
  const isOf = (calculator: AnyCalculator, name: string) =>
    calculator.fields.some((field) => field.name === name);
  const fields = [
    ...dayCalculator.fields,
    ...ladderCalculator.fields.filter(({ name }) => !isOf(dayCalculator, name)),
  ];
  const body = shallowRef(initial);
  const ask = (takes: (name: string) => boolean) => questionOf(body.value, takes, clock.now().getTime());

  // What nobody knows goes to the day, which refuses it by name.
  const dayParsed = computed(() =>
    parseInput(
      dayCalculator,
      ask((name) => isOf(dayCalculator, name) || !isOf(ladderCalculator, name)),
    ),
  );
  const question = computed(() => ask((name) => isOf(ladderCalculator, name)));
  const ladderParsed = computed(() =>
    body.value.testFrame === undefined ? NO_FAULTS : parseInput(ladderCalculator, question.value),
  );
  const faults = computed(() =>
    once([...faultsIn(dayParsed.value), ...faultsIn(ladderParsed.value)]).filter(
      ({ pointer }) => !isUnjudged(body.value, pointer),
    ),
  );
  const byPointer = computed(() => faultsByPointer(faults.value));
  const ladder = computed(() => answerOf<LadderAnswer>(ladderCalculator, ladderParsed.value));
  return {
    calculator: { ...ladderCalculator, fields },
    dayCalculator,
    body,
    question,
    faults,
    ladder,
    answer: ladder,
    day: computed(() => answerOf<DayAnswer>(dayCalculator, dayParsed.value)),
    input: computed(() => ('input' in ladderParsed.value ? ladderParsed.value.input : undefined)),
    reading: computed(() => readingOf(body.value, fields)),
    stray: computed(() => strayFaults(faults.value, fields)),
    valueAt: (path) => valueAt(body.value, path),
    faultsAt: (path) => byPointer.value.get(pointerOf(path)) ?? [],
    set: (path, value) => (body.value = tidied(withValueAt(body.value, path, value))),
    replace: (next) => (body.value = next),
  };
}
