import { describe, expect, it } from 'vitest';
import { APPEARANCES, palettes, type Palette } from '../../../src/styles/appearance';
import { appearanceCss } from '../../../src/styles/appearanceCss';

/** Relative luminance and contrast ratio, WCAG 2.2, definitions. */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const channel = parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(one: string, other: string): number {
  const [low = 0, high = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (high + 0.05) / (low + 0.05);
}

const GROUNDS = ['page', 'panel', 'sunken'] as const;
/** WCAG 2.2, 1.4.3: text 4.5:1; 1.4.11: what tells a control or a drawing 3:1. */
const ON_GROUNDS: readonly (readonly [keyof Palette & string, number])[] = [
  ['ink', 4.5],
  ['quiet', 4.5],
  ['accent', 4.5],
  ['fault', 4.5],
  ['edge', 3],
];

it('the contrast formula gives the ratios that WCAG names', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10);
  // #767676 is the lightest grey that passes on white; widely published.
  expect(contrast('#767676', '#ffffff')).toBeCloseTo(4.54, 2);
});

describe.each(APPEARANCES)('%s', (name) => {
  const palette = palettes[name];

  it.each(ON_GROUNDS)('has enough contrast for %s on every ground', (colour, least) => {
    for (const ground of GROUNDS)
      expect(contrast(palette[colour] as string, palette[ground]), ground).toBeGreaterThanOrEqual(least);
  });

  it('has enough contrast on the accent and on what is chosen', () => {
    expect(contrast(palette.onAccent, palette.accent)).toBeGreaterThanOrEqual(4.5);
    expect(contrast(palette.page, palette.ink)).toBeGreaterThanOrEqual(4.5);
  });

  it('has seven tones, each lighter than the one before', () => {
    const lights = palette.tones.map(luminance);
    expect(lights).toHaveLength(7);
    lights.slice(1).forEach((light, i) => expect(light).toBeGreaterThan(lights[i] ?? 1));
  });

  it('hands every colour to the page', () => {
    const css = appearanceCss();
    const rule = css.slice(css.indexOf(`[data-appearance=${name}]`)).split('}')[0] ?? '';
    const { scheme, tones, ...colours } = palette;
    expect(rule).toContain(`color-scheme:${scheme}`);
    for (const colour of [...Object.values(colours), ...tones]) expect(rule).toContain(`:${colour}`);
  });
});

it('dark-adapted emits red light alone', () => {
  const { scheme, tones, ...colours } = palettes['dark-adapted'];
  expect(scheme).toBe('dark');
  for (const colour of [...Object.values(colours), ...tones]) expect(colour).toMatch(/^#[0-9a-f]{2}0000$/);
});
