import { expect, it } from 'vitest';
import { loadCalculators } from '../../../shared/calculators';
import { createCalculatorForm } from '../../../src/composables/useCalculatorForm';

const calculators = await loadCalculators();
const formOf = (id: string, body: Record<string, unknown>) => {
  const calculator = calculators.find((one) => one.id === id);
  if (!calculator) throw new Error(`${id} is not in the list`);
  return createCalculatorForm(calculator, body);
};

it('an answer follows from the body at once, and again from every change', () => {
  const form = formOf('exposure/value', { aperture: 8, shutter: '1/125' });
  expect(form.answer.value?.result).toMatchObject({ ev100: 13 });
  form.set(['ndStops'], 3);
  expect(form.answer.value?.result).toMatchObject({ ev100: 16 });
});

it('a fault stands at its field and there is no answer until it is mended', () => {
  const form = formOf('exposure/difference', {
    from: { aperture: 8, shutter: '1/125', iso: 100 },
    to: { aperture: 'wide', shutter: '1/125', iso: 100 },
  });
  expect(form.answer.value).toBeNull();
  expect(form.faultsAt(['to', 'aperture'])).toHaveLength(1);
  expect(form.faultsAt(['from', 'aperture'])).toEqual([]);
  form.set(['to', 'aperture'], 'f/4');
  expect(form.faults.value).toEqual([]);
  expect(form.answer.value?.result).toMatchObject({ stops: 2 });
});

it('a name that no field has is told apart from faults at fields', () => {
  const form = formOf('exposure/value', { aperture: 8, shutter: 'x', izo: 1 });
  expect(form.stray.value.map(({ pointer }) => pointer)).toEqual(['/izo']);
});

it('sliders click on the scale that the body asks for', () => {
  const form = formOf('exposure/value', { aperture: 8, shutter: '1/125' });
  expect(form.reading.value.scale).toBe('third');
  form.set(['scale'], 'full');
  expect(form.reading.value.scale).toBe('full');
});
