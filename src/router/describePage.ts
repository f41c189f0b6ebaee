const NAME = 'Evenfall';

/** Title and description of the page that is shown. */
export function describePage(title?: string, description?: string): void {
  document.title = title ? `${title} · ${NAME}` : NAME;
  const meta = document.querySelector<HTMLMetaElement>('meta[name=description]');
  if (meta) meta.content = description ?? 'Know the next exposure before the light gets there.';
}
