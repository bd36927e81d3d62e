import type { z } from 'zod';
import type { FieldFault } from '../../shared/contracts/errors.ts';
import { requestInvalid } from './http.errors.ts';

/** Checks a value against its contract; a fault names the field it belongs to. */
export function parse<T extends z.ZodType>(contract: T, value: unknown): z.output<T> {
  const result = contract.safeParse(value);
  if (result.success) return result.data;
  throw requestInvalid({ faults: result.error.issues.flatMap(toFaults) });
}

function toFaults(issue: z.core.$ZodIssue): FieldFault[] {
  const path = issue.path.map(String).join('.');
  if (issue.code === 'unrecognized_keys')
    return issue.keys.map((key) => ({ path: path ? `${path}.${key}` : key, message: 'This field is not known here.' }));
  return [{ path, message: issue.message }];
}
