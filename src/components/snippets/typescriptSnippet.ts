import { KEY_VARIABLE, urlOf, type SnippetCall } from './snippetCall';

const PLAIN_NAME = /^[A-Za-z_$][\w$]*$/;

function quoted(text: string): string {
  return `'${JSON.stringify(text).slice(1, -1).replaceAll('\\"', '"').replaceAll("'", "\\'")}'`;
}

/** A value as a TypeScript literal, objects over several lines. */
function literal(value: unknown, indent: string): string {
  if (typeof value === 'string') return quoted(value);
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  const deeper = `${indent}  `;
  const lines = Array.isArray(value)
    ? value.map((item) => literal(item, deeper))
    : Object.entries(value).map(
        ([name, item]) => `${PLAIN_NAME.test(name) ? name : quoted(name)}: ${literal(item, deeper)}`,
      );
  const [open, close] = Array.isArray(value) ? '[]' : '{}';
  if (lines.length === 0) return `${open}${close}`;
  return `${open}\n${lines.map((line) => `${deeper}${line},\n`).join('')}${indent}${close}`;
}

/** The call for TypeScript or JavaScript with the platform's own fetch. */
export function typescriptSnippet(call: SnippetCall): string {
  return `const response = await fetch(${quoted(urlOf(call))}, {
  method: 'POST',
  headers: {
    Authorization: \`Bearer \${process.env.${KEY_VARIABLE}}\`,
    'Content-Type': 'application/json',
  },
  body: JSON.stringify(${literal(call.body, '  ')}),
});
if (!response.ok) throw new Error((await response.json()).detail);
const { result, notes, cautions } = await response.json();
console.log(result);`;
}
