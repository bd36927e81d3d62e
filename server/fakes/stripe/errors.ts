import type { z } from 'zod';

export interface FaultBody {
  type: 'api_error' | 'card_error' | 'idempotency_error' | 'invalid_request_error';
  message: string;
  code?: string;
  param?: string;
  decline_code?: string;
  payment_intent?: object;
}

interface FaultOptions {
  /** What was changed before the refusal stays: a declined charge is a fact. */
  keepsState?: boolean;
  headers?: Record<string, string>;
}

/** A refusal in the shape of the API: `{ error: { type, code, message, param } }` under an HTTP status. */
export class Fault extends Error {
  readonly status: number;
  readonly body: FaultBody;
  readonly keepsState: boolean;
  readonly headers: Record<string, string>;

  constructor(status: number, body: FaultBody, { keepsState = false, headers = {} }: FaultOptions = {}) {
    super(body.message);
    this.status = status;
    this.body = body;
    this.keepsState = keepsState;
    this.headers = headers;
  }
}

export function invalid(message: string, param?: string, code?: string): Fault {
  return new Fault(400, {
    type: 'invalid_request_error',
    message,
    ...(code === undefined ? {} : { code }),
    ...(param === undefined ? {} : { param }),
  });
}

export function missing(kind: string, id: string, param = 'id'): Fault {
  const message = `No such ${kind}: '${id}'`;
  return new Fault(404, { type: 'invalid_request_error', code: 'resource_missing', message, param });
}

/** `['items', 0, 'price']` as the API writes it: `items[0][price]`. */
function paramName(path: PropertyKey[]): string {
  const [first, ...rest] = path.map(String);
  return (first ?? '') + rest.map((part) => `[${part}]`).join('');
}

/** Turns the first finding of a parameter check into the refusal the API would give. */
export function faultOfIssue(issue: z.core.$ZodIssue, before: PropertyKey[] = []): Fault {
  const path = [...before, ...issue.path];
  if (issue.code === 'unrecognized_keys') {
    const name = paramName([...path, ...issue.keys.slice(0, 1)]);
    return invalid(`Received unknown parameter: ${name}`, name, 'parameter_unknown');
  }
  if (issue.code === 'invalid_union') {
    const inner = issue.errors.at(-1)?.[0];
    if (inner) return faultOfIssue(inner, path);
  }
  const name = paramName(path);
  if (issue.code === 'invalid_type' && issue.input === undefined) {
    return invalid(`Missing required param: ${name}.`, name, 'parameter_missing');
  }
  return invalid(`Invalid ${name}: ${issue.message}`, name);
}
