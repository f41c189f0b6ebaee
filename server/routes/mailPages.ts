import { Router } from 'express';
import { ProblemError } from '../http/ProblemError';
import type { LocalMessage, ReadableMailbox } from '../services/console/openLocalMailbox';

const STYLE =
  'body{font:1.05rem/1.6 "Fira Sans",system-ui,sans-serif;max-width:42rem;margin:3rem auto;padding:0 1rem;color:#2b2622;background:#faf7f2}a{color:#7a4409}pre{white-space:pre-wrap;background:#efe6d8;padding:1rem;font:inherit}li{margin:.4em 0}@media(prefers-color-scheme:dark){body{color:#e9e2d8;background:#17191d}a{color:#e0a45c}pre{background:#2a2d33}}';

const escape = (text: string) =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');

function page(title: string, body: string): string {
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width,initial-scale=1"><title>${escape(title)} · Evenfall</title><style>${STYLE}</style></head><body><main>${body}</main></body></html>`;
}

/** Addresses in a text as links. */
function linked(text: string): string {
  return escape(text).replace(/https?:\/\/[^\s<]+/g, (address) => `<a href="${address}">${address}</a>`);
}

function listPage(mails: readonly LocalMessage[]): string {
  const rows = mails.map(
    ({ id, to, subject }) => `<li><a href="/mail/${id}">${escape(subject)}</a><br>to ${escape(to)}</li>`,
  );
  const list = rows.length > 0 ? `<ul>${rows.join('')}</ul>` : '<p>No mail yet. Load this page again.</p>';
  const about = 'Mails of this service stay on this machine while no SMTP_URL is set.';
  return page('Mail', `<h1>Mail</h1><p>${about}</p>${list}`);
}

function mailPage({ id, to, subject, text }: LocalMessage): string {
  const head = `<p><a href="/mail">All mails</a></p><h1>${escape(subject)}</h1><p>to ${escape(to)}</p>`;
  return page(subject, `${head}<pre>${linked(text)}</pre><p><a href="/mail/${id}/html">As HTML</a></p>`);
}

/** The mails that stay on this machine, as plain pages. Where there is no such mailbox there are no such pages. */
export function mailPages(mailbox: ReadableMailbox): Router {
  const router = Router();
  const find = (id: string): LocalMessage => {
    const mail = mailbox.list().find((one) => String(one.id) === id);
    if (!mail) throw new ProblemError('not_found');
    return mail;
  };
  router.use((_request, response, next) => {
    response.set({
      'Cache-Control': 'no-store',
      'Content-Security-Policy': "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'none'",
    });
    next();
  });
  router.get('/', (_request, response) => void response.type('html').send(listPage(mailbox.list())));
  router.get('/:id', (request, response) => {
    response.type('html').send(mailPage(find(request.params.id)));
  });
  router.get('/:id/html', (request, response) => {
    response.type('html').send(find(request.params.id).html);
  });
  return router;
}
