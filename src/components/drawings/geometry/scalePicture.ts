import type { LengthUnit } from '../../../text/lengthUnit';
import type { Landmark, Peg, Span } from '../../scale/lightScale';

/** An answer laid out on the ruled scale. */
export interface ScalePicture {
  readonly title: string;
  readonly unit: string;
  readonly pegs: readonly Peg[];
  readonly spans: readonly Span[];
  readonly landmarks?: readonly Landmark[];
  /** Where a middle tone stands, if tones are to be seen. */
  readonly middleStops?: number;
  /** The ends of the axis. */
  readonly fromStops: number;
  readonly toStops: number;
  readonly read?: (place: number) => string;
  readonly towards?: string;
  readonly parts?: 1 | 3;
  /** What to look for, in one or two sentences. */
  readonly caption: string;
}

/** Makes pictures of an answer; none where the answer has nothing to show. */
export type PicturesOf = (input: unknown, result: unknown, measure: LengthUnit) => readonly ScalePicture[];
