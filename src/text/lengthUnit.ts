export type LengthUnit = 'metres' | 'feet';

/** The international foot, exactly (agreed on in 1959). */
const FOOT_M = 0.3048;
/** What is typed in feet comes back as it was typed; what was given in metres shows no tail of decimals. */
const SHOWN_FIGURES = 6;
const HELD_FIGURES = 9;

const toFigures = (value: number, figures: number) => Number(value.toPrecision(figures));

/** Metres as a reader measures. */
export const lengthOf = (metres: number, measure: LengthUnit): number =>
  measure === 'feet' ? toFigures(metres / FOOT_M, SHOWN_FIGURES) : metres;

/** What a reader gave, in metres. */
export const metresOf = (length: number, measure: LengthUnit): number =>
  measure === 'feet' ? toFigures(length * FOOT_M, HELD_FIGURES) : length;

/** How a unit is written for a reader who measures so; only metres differ. */
export const unitShown = <U extends string | undefined>(unit: U, measure: LengthUnit): U | 'ft' =>
  unit === 'm' && measure === 'feet' ? 'ft' : unit;
