import { TOOLS } from './step-words.ts';
import type { Transcript } from './tokens.ts';

const PATTERN = new RegExp(`\\b(${TOOLS.join('|')})\\b`, 'gi');

/** The tools that are named, each once; the longest name of a place is taken. */
export function readEquipment({ cues }: Transcript): string[] {
  const text = cues.map((cue) => cue.text).join(' ');
  return [...new Set((text.match(PATTERN) ?? []).map((name) => name.toLowerCase()))];
}
