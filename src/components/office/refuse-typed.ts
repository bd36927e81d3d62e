import type { FieldFault } from '@shared/contracts/errors.ts';
import { ApiProblem } from '@/api/problem.ts';

/** What cannot be sent as it was typed, told like a refusal of the server: on top of the form and at each field. */
export function refuseTyped(faults: FieldFault[]): ApiProblem {
  return new ApiProblem({ code: 'request.invalid', status: 0, faults });
}
