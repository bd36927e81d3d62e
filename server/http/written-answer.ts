import type { z } from 'zod';

/** An answer that was cut to its contract and written as JSON before it was asked for. */
export class WrittenAnswer {
  readonly bytes: Buffer;

  constructor(contract: z.ZodType, value: unknown) {
    this.bytes = Buffer.from(JSON.stringify(contract.parse(value)));
  }
}
