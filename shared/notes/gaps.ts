import type { Draft, DraftGap, DraftStep } from '../contracts/notes.ts';

/** What an editor would ask about: amounts, waits, the yield and the keeping that were never said. */
export function gapsOf({
  ingredients,
  steps,
  yields,
  storage,
}: Pick<Draft, 'ingredients' | 'steps' | 'yields' | 'storage'>): DraftGap[] {
  const gaps: DraftGap[] = ingredients
    .filter(({ amount }) => amount === null)
    .map(({ name, cue, at }) => ({
      kind: 'amount',
      subject: name,
      cue,
      at,
      message: `The amount of ${name} was never said.`,
    }));
  for (const { text, cue, at } of steps.filter(isUntimed))
    gaps.push({ kind: 'duration', subject: text, cue, at, message: `How long this takes was never said: ${text}` });
  if (yields.length === 0)
    gaps.push({ kind: 'yield', subject: '', cue: null, at: null, message: 'How much it makes was never said.' });
  if (storage.length === 0)
    gaps.push({
      kind: 'keeping',
      subject: '',
      cue: null,
      at: null,
      message: 'How long it keeps, and where, was never said.',
    });
  return gaps;
}

function isUntimed({ durationSec, passive, operation }: DraftStep): boolean {
  return durationSec === null && (passive || operation?.kind === 'heat');
}
