/** The three appearances: for daylight, for the evening, and for eyes that are used to the dark. */
export const APPEARANCES = ['day', 'dusk', 'dark-adapted'] as const;

export type Appearance = (typeof APPEARANCES)[number];

/** Colours of one appearance, by what they are for; all text colours reach 4.5:1 on all three grounds. */
export interface Palette {
  readonly scheme: 'light' | 'dark';
  /** Grounds: the page, what lies on it, and what is let into it. */
  readonly page: string;
  readonly panel: string;
  readonly sunken: string;
  readonly ink: string;
  readonly quiet: string;
  /** Ruling that only divides. */
  readonly line: string;
  /** Edges by which a control is found; 3:1. */
  readonly edge: string;
  readonly accent: string;
  readonly onAccent: string;
  readonly fault: string;
  /** Seven tones, each lighter than the one before by one even step; the fourth is the middle tone. */
  readonly tones: readonly [string, string, string, string, string, string, string];
}

/**
 * Slate and brass, after an engraved rule. Computed in OKLCH with even steps of lightness and brought into sRGB;
 * hue 245 for the grounds, 66 to 80 for the brass. Dark-adapted uses the red primary alone, since green and blue
 * light undo the eye's adaptation.
 */
export const palettes: Record<Appearance, Palette> = {
  day: {
    scheme: 'light',
    page: '#e9eef0',
    panel: '#f8fafc',
    sunken: '#dee4e7',
    ink: '#15212a',
    quiet: '#46555f',
    line: '#cbd2d7',
    edge: '#707c85',
    accent: '#88520a',
    onAccent: '#fdfcf8',
    fault: '#a51d2b',
    tones: ['#1d2023', '#3d4043', '#5f6265', '#828588', '#a7abae', '#cfd3d6', '#f8fcff'],
  },
  dusk: {
    scheme: 'dark',
    page: '#0d171f',
    panel: '#16222c',
    sunken: '#070f16',
    ink: '#ebe8df',
    quiet: '#a7b3bc',
    line: '#303c47',
    edge: '#667785',
    accent: '#efbf6c',
    onAccent: '#1d1406',
    fault: '#fb9795',
    tones: ['#07090b', '#25282a', '#484b4d', '#6d7173', '#95999c', '#bfc3c6', '#ebeff2'],
  },
  'dark-adapted': {
    scheme: 'dark',
    page: '#000000',
    panel: '#080000',
    sunken: '#0d0000',
    ink: '#f40000',
    quiet: '#ee0000',
    line: '#5a0000',
    edge: '#c40000',
    accent: '#f40000',
    onAccent: '#000000',
    fault: '#f40000',
    tones: ['#1c0000', '#410000', '#660000', '#8b0000', '#b00000', '#d50000', '#fa0000'],
  },
};
