import { palettes, type Appearance, type Palette } from './appearance';

function variablesOf({ scheme, tones, ...colours }: Palette): string {
  const named = Object.entries(colours).map(([name, colour]) => `--colour-${kebab(name)}:${colour}`);
  const toned = tones.map((colour, i) => `--tone-${i}:${colour}`);
  return [`color-scheme:${scheme}`, ...named, ...toned].join(';');
}

const kebab = (name: string) => name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);

const rule = (selector: string, appearance: Appearance) =>
  `${selector}{${variablesOf(palettes[appearance])}}`;

/**
 * The appearances as CSS variables. It stands in the page's head, so that the first paint has the right ground:
 * a white flash beside the camera costs half an hour of dark adaptation.
 */
export function appearanceCss(): string {
  return [
    rule(':root', 'day'),
    `@media (prefers-color-scheme:dark){${rule(':root', 'dusk')}}`,
    rule(':root[data-appearance=day]', 'day'),
    rule(':root[data-appearance=dusk]', 'dusk'),
    rule(':root[data-appearance=dark-adapted]', 'dark-adapted'),
    'html{background:var(--colour-page)}',
  ].join('\n');
}
