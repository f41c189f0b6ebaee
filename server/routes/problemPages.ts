import { Router } from 'express';
import { PROBLEM_CODES } from '../../shared/contract/problems';
import { problems } from '../../shared/text';
import { ProblemError } from '../http/ProblemError';

const STYLE =
  'body{font:1.05rem/1.6 "Fira Sans",system-ui,sans-serif;max-width:38rem;margin:3rem auto;padding:0 1rem;color:#2b2622;background:#faf7f2}a{color:#7a4409}code{background:#efe6d8;padding:.1em .3em}@media(prefers-color-scheme:dark){body{color:#e9e2d8;background:#17191d}a{color:#e0a45c}code{background:#2a2d33}}';

const escape = (text: string) => text.replaceAll('&', '&amp;').replaceAll('<', '&lt;');

function page(title: string, body: string): string {
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width,initial-scale=1"><title>${escape(title)} · Evenfall</title><style>${STYLE}</style></head><body><main>${body}</main></body></html>`;
}

function problemPage(code: keyof typeof problems): string {
  const { status, title, cause, cure } = problems[code];
  return page(
    title,
    `<p><a href="/problems">All problems</a></p><h1>${escape(title)}</h1><p>Status ${status}, code <code>${code}</code></p><h2>Why</h2><p>${escape(cause)}</p><h2>What to do</h2><p>${escape(cure)}</p>`,
  );
}

/** A page for each problem code, which the problems' `type` leads to: cause and cure. */
export function problemPages(): Router {
  const router = Router();
  const rows = PROBLEM_CODES.map(
    (code) =>
      `<li>${problems[code].status} <a href="/problems/${code}">${code}</a>: ${escape(problems[code].title)}</li>`,
  );
  const list = page('Problems', `<h1>Problems</h1><ul>${rows.join('')}</ul>`);
  router.get('/', (_request, response) => void response.type('html').send(list));
  router.get('/:code', (request, response) => {
    const code = PROBLEM_CODES.find((known) => known === request.params.code);
    if (!code) throw new ProblemError('not_found', 'There is no such problem code.');
    response.type('html').send(problemPage(code));
  });
  return router;
}
