import { TOOLS } from './step-words.ts';
import type { Transcript } from './tokens.ts';

const PATTERN = new RegExp(`\\b(${TOOLS.join('|')})\\b`, 'gi');

/** The tools that are named, each once; the longest name of a place is taken. */
export function toolsIn(text: string): string[] {
  return [...new Set((text.match(PATTERN) ?? []).map((name) => name.toLowerCase()))];
}

export function readEquipment({ cues }: Transcript): string[] {
  return toolsIn(cues.map((cue) => cue.text).join(' '));
}
