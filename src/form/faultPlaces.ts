import type { Fault } from '../../shared/contract/faults';
import type { Field } from '../../shared/contract/field';

/** Faults by the pointer to their field. */
export function faultsByPointer(faults: readonly Fault[]): ReadonlyMap<string, readonly Fault[]> {
  const map = new Map<string, Fault[]>();
  for (const fault of faults) map.set(fault.pointer, [...(map.get(fault.pointer) ?? []), fault]);
  return map;
}

/** Whether a pointer leads to a field that the form shows. */
function leadsToField(parts: readonly string[], fields: readonly Field[]): boolean {
  const [name, ...rest] = parts;
  const field = fields.find((one) => one.name === name);
  if (!field) return false;
  return rest.length === 0 || leadsWithin(rest, field);
}

function leadsWithin(parts: readonly string[], field: Field): boolean {
  if (field.kind === 'group') return leadsToField(parts, field.fields ?? []);
  const [index, ...rest] = parts;
  if (!field.item) return false;
  if (index === undefined || !/^\d+$/.test(index)) return leadsWithin(parts, field.item);
  return rest.length === 0 || leadsWithin(rest, field.item);
}

/** Faults that stand at no field: names that the calculator does not know. They are told above the form. */
export function strayFaults(faults: readonly Fault[], fields: readonly Field[]): Fault[] {
  return faults.filter(({ pointer }) => !leadsToField(pointer.split('/').slice(1), fields));
}

/** Whether any of the faults stands at one of these fields or inside it. */
export function anyFaultIn(faults: readonly Fault[], pointers: readonly string[]): boolean {
  return faults.some(({ pointer }) =>
    pointers.some((one) => pointer === one || pointer.startsWith(`${one}/`)),
  );
}
