import type { ErrorCode, FieldFault } from '@shared/contracts/errors.ts';

/** Codes of what goes wrong on this side of the wire, beside the server's own. */
export type ClientCode = 'client.offline' | 'client.unreadable';

interface ProblemParts {
  code: ErrorCode | ClientCode;
  status: number;
  faults?: FieldFault[] | undefined;
  context?: Record<string, unknown> | undefined;
  etag?: string | null;
}

/**
 * A refusal of the server (RFC 9457), or a failure to reach or understand it.
 * `status` is 0 where there was no answer. The words for it stand in the catalogue under `errors.<code>`.
 */
export class ApiProblem extends Error {
  readonly code: ErrorCode | ClientCode;
  readonly status: number;
  readonly faults: FieldFault[];
  readonly context: Record<string, unknown>;
  /** The entity tag the server sent along, the current one after a version conflict. */
  readonly etag: string | null;

  constructor({ code, status, faults = [], context = {}, etag = null }: ProblemParts) {
    super(code);
    this.name = 'ApiProblem';
    this.code = code;
    this.status = status;
    this.faults = faults;
    this.context = context;
    this.etag = etag;
  }
}

export function hasCode(error: unknown, code: ErrorCode | ClientCode): error is ApiProblem {
  return error instanceof ApiProblem && error.code === code;
}
