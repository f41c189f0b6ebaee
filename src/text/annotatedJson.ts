import type { Field } from '../../shared/contract/field';

/** A line of JSON as it is printed, with what stands beside it in the margin. */
export interface JsonLine {
  readonly text: string;
  readonly note?: string;
}

/** A title that is only the name once more says nothing. */
function noteOf({ name, title, unit, description }: Field): string {
  const parts = [title === name ? '' : title, unit ?? ''].filter(Boolean);
  const measured = parts.join(', ');
  return measured && description ? `${measured}: ${description}` : (description ?? measured);
}

const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

/** A list of plain values stands on one line where it is short. */
const FITS = 60;

function write(value: unknown, before: string, after: string, indent: string, field?: Field): JsonLine[] {
  const note = field && noteOf(field);
  const flat = JSON.stringify(value);
  const hasChildren = isObject(value)
    ? Object.keys(value).length > 0
    : Array.isArray(value) && value.length > 0 && (flat.length > FITS || value.some(isObject));
  if (!hasChildren) return [{ text: `${indent}${before}${flat}${after}`, note }];
  const [open, close] = isObject(value) ? ['{', '}'] : ['[', ']'];
  const entries = isObject(value)
    ? Object.entries(value).map(([name, held]) => ({
        before: `${JSON.stringify(name)}: `,
        held,
        field: field?.fields?.find((one) => one.name === name),
      }))
    : (value as unknown[]).map((held, i) => ({
        before: '',
        held,
        // What an item is stands once, beside the first.
        field: i === 0 ? field?.item : field?.item && { ...field.item, title: '', description: undefined },
      }));
  const inner = entries.flatMap(({ before: name, held, field: its }, i) =>
    write(held, name, i < entries.length - 1 ? ',' : '', `${indent}  `, its),
  );
  return [{ text: `${indent}${before}${open}`, note }, ...inner, { text: `${indent}${close}${after}` }];
}

/** An answer's own parts, beside the result. */
const group = (name: string, title: string, fields?: readonly Field[]): Field => ({
  name,
  kind: 'group',
  required: true,
  title,
  advanced: false,
  fields,
});

/** The fields of an answer whose result has these. */
export function answerField(outputs: readonly Field[]): Field {
  return group('', '', [
    group('result', 'What was asked for', outputs),
    group('notes', 'What is worth knowing about this answer, by code'),
    group('cautions', 'What to take care of, by code'),
  ]);
}

const problem = (name: string, title: string): Field => ({ ...group(name, title), kind: 'text' });

/** The fields of a problem. */
export const PROBLEM_FIELD: Field = group('', '', [
  problem('type', 'Leads to a page on this problem'),
  problem('title', 'The problem in short'),
  problem('status', 'The status once more'),
  problem('detail', 'What is wrong with this call'),
  problem('instance', 'The request id, as a URN'),
  problem('code', 'For programs; it never changes'),
  problem('errors', 'Every fault of the input, with its place as a JSON Pointer'),
]);

/** JSON printed line by line, with the title and unit of each field that is known. */
export function annotatedJson(value: unknown, field?: Field): JsonLine[] {
  return write(value, '', '', '', field).map(({ text, note }) => (note ? { text, note } : { text }));
}
