import { numberOfLabel } from '../../shared/math/marks';

/** The digits of a label as a number, as they are typed into a request. */
export const digitsOf = (label: string) => numberOfLabel(label.replace(/^f\//, '').replace(/s$/, ''));
