import { expect, it } from 'vitest';
import { curlSnippet } from '../../../../src/components/snippets/curlSnippet';
import { pythonSnippet } from '../../../../src/components/snippets/pythonSnippet';
import { typescriptSnippet } from '../../../../src/components/snippets/typescriptSnippet';

// That they run and send what they show is tried in tests/examples, where curl and Python are at hand.
const call = {
  baseUrl: 'https://evenfall.example',
  id: 'exposure/value',
  body: { aperture: 'f/8', "it's": [1, true, null] },
};

it('the call for a shell fits four lines and takes the key from the environment', () => {
  expect(curlSnippet(call).split('\n')).toEqual([
    "curl 'https://evenfall.example/v1/exposure/value' \\",
    '  -H "Authorization: Bearer $EVENFALL_KEY" \\',
    "  -H 'Content-Type: application/json' \\",
    `  -d '{"aperture":"f/8","it'\\''s":[1,true,null]}'`,
  ]);
});

it('the call in TypeScript writes the values as a person would', () => {
  const code = typescriptSnippet(call);
  expect(code).toContain(
    "JSON.stringify({\n    aperture: 'f/8',\n    'it\\'s': [\n      1,\n      true,\n      null,\n    ],\n  })",
  );
  expect(code).toContain('process.env.EVENFALL_KEY');
});

it('the call in Python writes the values in Python’s words', () => {
  const code = pythonSnippet(call);
  expect(code).toContain(
    '"aperture": "f/8",\n    "it\'s": [\n        1,\n        True,\n        None,\n    ],',
  );
  expect(code).toContain("os.environ['EVENFALL_KEY']");
});

it('no snippet holds a key', () => {
  for (const code of [curlSnippet(call), typescriptSnippet(call), pythonSnippet(call)])
    expect(code).not.toMatch(/evenfall_(server|page)_/);
});
