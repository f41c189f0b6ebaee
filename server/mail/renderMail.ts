import type { MailWords } from '../../shared/text/en/mails';

const STYLE = {
  body: 'margin:0;padding:24px;background:#faf7f2;color:#2b2622;font:16px/1.6 "Fira Sans",system-ui,sans-serif',
  column: 'max-width:34rem;margin:0 auto',
  button:
    'display:inline-block;padding:12px 20px;background:#7a4409;color:#ffffff;text-decoration:none;border-radius:4px',
  small: 'font-size:14px;color:#5b524a',
};

export interface RenderedMail {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

const escape = (text: string) =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');

/** Sets a mail as text and as HTML; both say the same, and neither loads anything from anywhere. */
export function renderMail({ subject, paragraphs, action }: MailWords): RenderedMail {
  const sign = 'Evenfall';
  const lines = [...paragraphs];
  if (action) lines.splice(paragraphs.length - 1, 0, `${action.label}:\n${action.link}`);
  const blocks = paragraphs.map((line) => `<p>${escape(line)}</p>`);
  if (action) {
    const link = escape(action.link);
    const button = `<p><a href="${link}" style="${escape(STYLE.button)}">${escape(action.label)}</a></p>`;
    const plain = `<p style="${STYLE.small}">Or open this address: <a href="${link}">${link}</a></p>`;
    blocks.splice(paragraphs.length - 1, 0, button, plain);
  }
  const html = `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width,initial-scale=1"><title>${escape(subject)}</title></head><body style="${escape(STYLE.body)}"><div style="${STYLE.column}">${blocks.join('')}<p style="${STYLE.small}">${sign}</p></div></body></html>`;
  return { subject, text: `${[...lines, `-- \n${sign}`].join('\n\n')}\n`, html };
}
