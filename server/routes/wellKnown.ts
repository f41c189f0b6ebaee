import { Router } from 'express';
import type { AnyCalculator } from '../../shared/contract/defineCalculator';

const EXPIRES_IN_MS = 180 * 24 * 3_600_000;

interface Dependencies {
  readonly publicUrl: string;
  readonly contact: string;
  readonly calculators: readonly AnyCalculator[];
  readonly now: () => Date;
}

function securityText({ publicUrl, contact, now }: Dependencies): string {
  // To the day, so that the text stays the same through a day; RFC 9116 wants an expiry under a year.
  const expires = new Date(now().getTime() + EXPIRES_IN_MS).toISOString().slice(0, 10);
  return [
    `Contact: mailto:${contact}`,
    `Expires: ${expires}T00:00:00.000Z`,
    'Preferred-Languages: en',
    `Canonical: ${publicUrl}/.well-known/security.txt`,
    '',
  ].join('\n');
}

function modelText({ publicUrl, calculators }: Dependencies): string {
  const lines = calculators.map(
    ({ id, title, summary }) =>
      `- [${title}](${publicUrl}/v1/calculators/${id}/input.schema.json): POST /v1/${id}. ${summary}`,
  );
  return `# Evenfall

> An HTTP API for the exposure mathematics of photographs that mix available light with flash while the daylight goes.

Calls are POST with a JSON body (GET with a query where all required fields are scalars), with the header "Authorization: Bearer <key>". Answers are {"result", "notes", "cautions"}; faults are problem details (RFC 9457) that name every field at fault.

## Reference

- [OpenAPI 3.1](${publicUrl}/openapi.json): every call with examples
- [Reference pages](${publicUrl}/docs)
- [Problems](${publicUrl}/problems): each code with its cause and cure
- [Calculators](${publicUrl}/v1/calculators): the list as JSON

## Calculators

${lines.join('\n')}
`;
}

/** Plain files for people who look for flaws and programs that look for a summary. */
export function wellKnown(dependencies: Dependencies): Router {
  const router = Router();
  const models = modelText(dependencies);
  router.get('/.well-known/security.txt', (_request, response) => {
    response.type('text/plain; charset=utf-8').send(securityText(dependencies));
  });
  router.get('/llms.txt', (_request, response) => {
    response.set('Cache-Control', 'public, max-age=300').type('text/plain; charset=utf-8').send(models);
  });
  return router;
}
