import { caughtLetters, type CaughtLetter } from '../../shared/contracts/letters.ts';
import { serverUnready } from '../http/http.errors.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { lettersLocalOnly } from '../letters/letters.errors.ts';

export const demoLetterRoutes: Route[] = [
  defineRoute({
    id: 'listCaughtLetters',
    method: 'get',
    path: '/api/demo/letters',
    access: 'local-demo',
    summary: 'Letters that the mail catcher of the demonstration holds, newest first.',
    answer: caughtLetters,
    handler: async ({ ctx }) => ({ letters: await fetchLetters(ctx.settings.mail.caughtAt) }),
  }),
];

async function fetchLetters(caughtAt: string | null): Promise<CaughtLetter[]> {
  if (!caughtAt) throw lettersLocalOnly();
  try {
    const response = await fetch(new URL('/letters', caughtAt), { signal: AbortSignal.timeout(5000) });
    if (!response.ok) throw new Error(`the mail catcher answered ${response.status}`);
    return caughtLetters.shape.letters.parse(await response.json());
  } catch (error) {
    throw serverUnready({ detail: 'The mail catcher does not answer.' }, error);
  }
}
