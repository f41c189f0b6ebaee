import { KEY_VARIABLE, urlOf, type SnippetCall } from './snippetCall';

const WORDS = new Map<unknown, string>([
  [true, 'True'],
  [false, 'False'],
  [null, 'None'],
]);

/** A value as a Python literal; JSON's strings and numbers are Python's too. */
function literal(value: unknown, indent: string): string {
  const word = WORDS.get(value);
  if (word) return word;
  if (typeof value !== 'object') return JSON.stringify(value);
  const deeper = `${indent}    `;
  const lines = Array.isArray(value)
    ? value.map((item) => literal(item, deeper))
    : Object.entries(value as object).map(
        ([name, item]) => `${JSON.stringify(name)}: ${literal(item, deeper)}`,
      );
  const [open, close] = Array.isArray(value) ? '[]' : '{}';
  if (lines.length === 0) return `${open}${close}`;
  return `${open}\n${lines.map((line) => `${deeper}${line},\n`).join('')}${indent}${close}`;
}

/** The call for Python 3 with nothing to install. */
export function pythonSnippet(call: SnippetCall): string {
  return `import json
import os
import urllib.request

question = ${literal(call.body, '')}
request = urllib.request.Request(
    ${JSON.stringify(urlOf(call))},
    data=json.dumps(question).encode(),
    headers={
        "Authorization": f"Bearer {os.environ['${KEY_VARIABLE}']}",
        "Content-Type": "application/json",
    },
)
with urllib.request.urlopen(request) as response:
    answer = json.load(response)
print(answer["result"])`;
}
