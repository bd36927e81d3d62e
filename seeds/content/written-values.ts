import { z } from 'zod';
import type { Access } from '../../shared/contracts/access.ts';
import type { Range } from '../../shared/contracts/primitives.ts';
import type { LineScaling, Operation } from '../../shared/contracts/recipe-document.ts';
import { unit } from '../../shared/contracts/words.ts';

const NUMBER = String.raw`-?\d+(?:\.\d+)?`;
const RANGE = new RegExp(`^(?<min>${NUMBER})(?:-(?<max>${NUMBER}))?$`);

/** `45` or `"40-50"`, also below zero: `"-20--16"`. */
export const writtenRange = z.union([z.number(), z.string()]).transform((written, context): Range => {
  const found = RANGE.exec(String(written))?.groups;
  if (!found) {
    context.addIssue({
      code: 'custom',
      message: `"${written}" is neither a number nor two with a hyphen between them.`,
    });
    return z.NEVER;
  }
  const min = Number(found['min']);
  return { min, max: found['max'] === undefined ? min : Number(found['max']) };
});

/** An amount with its unit in one: `"660-680 ml"`, `1 drink`. */
export const writtenMeasure = z
  .string()
  .regex(/^\S+ \S+$/, 'Write an amount, a space and a unit.')
  .transform((written): unknown => written.split(' '))
  .pipe(z.tuple([writtenRange, unit]))
  .transform(([amount, measuredIn]) => ({ amount, unit: measuredIn }));

/** `open`, `account` or `tier 2`. */
export const writtenAccess = z
  .string()
  .regex(/^(?:open|account|tier [1-9]\d?)$/, 'Write open, account, or tier and its rank.')
  .transform((written): Access => {
    if (written === 'open' || written === 'account') return { kind: written };
    return { kind: 'tier', rank: Number(written.slice('tier '.length)) };
  });

/** `linear`, `whole`, `fixed`, `to-taste`, or `power 0.85`. */
export const writtenScaling = z
  .string()
  .regex(
    /^(?:linear|whole|fixed|to-taste|power (?:0(?:\.\d+)?|1))$/,
    'Write linear, whole, fixed, to-taste, or power and an exponent from 0 to 1.',
  )
  .transform((written): LineScaling => {
    if (written.startsWith('power ')) return { rule: 'power', exponent: Number(written.slice('power '.length)) };
    return { rule: written as Exclude<LineScaling['rule'], 'power'> };
  });

/** Minutes and seconds of the film, `"2:14"`, as seconds. */
export const writtenTime = z
  .string()
  .regex(/^\d+:[0-5]\d$/, 'Write the time as minutes:seconds.')
  .transform((written) => {
    const [minutes, seconds] = written.split(':');
    return Number(minutes) * 60 + Number(seconds);
  });

/** What an operation means where the file gives only its name or leaves parameters out. */
const OPERATION_DEFAULTS: Record<string, object> = {
  heat: { covered: false, liveliness: 'warm' },
  reduce: { to: null },
  strain: { lossShare: null },
  bottle: { sealed: true },
};

/** `shake`, or `{ kind: heat, liveliness: simmer }` with what differs from the usual. */
export const writtenOperation = z
  .union([z.string().transform((kind) => ({ kind })), z.looseObject({ kind: z.string() })])
  .transform((written) => ({ ...OPERATION_DEFAULTS[written.kind], ...written }) as unknown as Operation);
