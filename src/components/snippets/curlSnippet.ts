import { KEY_VARIABLE, urlOf, type SnippetCall } from './snippetCall';

/** Text in single quotes of a POSIX shell; a quote inside closes, escapes and opens again. */
function shellQuoted(text: string): string {
  return `'${text.replaceAll("'", "'\\''")}'`;
}

/** The call for a shell. */
export function curlSnippet(call: SnippetCall): string {
  return [
    `curl ${shellQuoted(urlOf(call))} \\`,
    `  -H "Authorization: Bearer $${KEY_VARIABLE}" \\`,
    "  -H 'Content-Type: application/json' \\",
    `  -d ${shellQuoted(JSON.stringify(call.body))}`,
  ].join('\n');
}
