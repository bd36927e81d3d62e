import { caughtLetters, type CaughtLetter } from '@shared/contracts/letters.ts';
import { request } from './request.ts';

/** The letters that the demonstration's mail catcher holds, newest first. */
export async function fetchCaughtLetters(): Promise<CaughtLetter[]> {
  return (await request('GET', '/api/demo/letters', caughtLetters)).data.letters;
}
