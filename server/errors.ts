import type { ErrorCode, FieldFault } from '../shared/contracts/errors.ts';

/** What a refusal may carry beside its sentence; all of it is shown to the person. */
export interface RefusalDetails {
  detail?: string;
  faults?: FieldFault[];
  context?: Record<string, unknown>;
  headers?: Record<string, string>;
}

/** An expected refusal with a permanent code; anything else that is thrown is a fault of ours. */
export class Refusal extends Error {
  readonly code: ErrorCode;
  readonly status: number;
  readonly details: RefusalDetails;

  constructor(code: ErrorCode, status: number, message: string, details: RefusalDetails, cause?: unknown) {
    super(message, { cause });
    this.name = 'Refusal';
    this.code = code;
    this.status = status;
    this.details = details;
  }
}

/** Declares a refusal beside its feature; the returned function makes one. */
export function defineError(code: ErrorCode, status: number, message: string) {
  return (details: RefusalDetails = {}, cause?: unknown) => new Refusal(code, status, message, details, cause);
}
