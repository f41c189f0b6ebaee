import type { Fault } from '../../../shared/contract/faults';
import { ProblemError } from '../../http/ProblemError';

/** A refusal with every fault of the input. */
export function invalidInput(faults: readonly Fault[]): ProblemError {
  const many = faults.length > 1 ? `${faults.length} faults; the first: ` : '';
  return new ProblemError('invalid_input', `${many}${faults[0]?.detail ?? ''}`, { errors: faults });
}
