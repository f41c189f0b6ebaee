/** What a peg stands for; each kind has a shape of its own. */
export type PegKind = 'light' | 'camera' | 'subject' | 'flash' | 'lamps' | 'later';

/** Something that stands at one place on the light scale. */
export interface Peg {
  readonly id: string;
  readonly title: string;
  readonly stops: number;
  readonly kind: PegKind;
  /** Stands on the axis without words; the text alternative names it all the same. */
  readonly isUnlabelled?: boolean;
}

/** Something that reaches from one place on the light scale to another. */
export interface Span {
  readonly id: string;
  readonly title: string;
  readonly fromStops: number;
  readonly toStops: number;
  /** Lit stretches are filled, unlit ones hatched. */
  readonly isLit: boolean;
  /** Words beside the stretch, which then has a lane of its own. */
  readonly label?: string;
  /** What it says, where its ends on the axis are not what they stand for. */
  readonly words?: string;
}

/** A caption under the axis, by which the numbers get a meaning. */
export interface Landmark {
  readonly title: string;
  readonly stops: number;
}

/** A peg that can be moved along the axis in thirds. */
export interface Movable {
  readonly title: string;
  readonly stops: number;
  readonly valueText: string;
}

/** Outlines around the origin, about 12 px across. */
export const PEG_SHAPES: Record<PegKind, string> = {
  light: 'M-6 0a6 6 0 1 0 12 0a6 6 0 1 0-12 0z',
  camera: 'M0-7 7 0 0 7-7 0z',
  subject: 'M-5-5H5V5H-5z',
  flash: 'M0-7 7 6H-7z',
  lamps: 'M-7-2H-2V-7H2V-2H7V2H2V7H-2V2H-7z',
  later: 'M-4 0a4 4 0 1 0 8 0a4 4 0 1 0-8 0z',
};
