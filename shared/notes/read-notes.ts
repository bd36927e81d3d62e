import { parseCaptions } from './caption-parser.ts';
import type { ShootCue } from '../contracts/shoots.ts';
import type { NotesRefusal } from './decode-notes.ts';

export type NotesFormat = 'webvtt' | 'subrip' | 'timed-text' | 'prose';

export interface Notes {
  ok: true;
  format: NotesFormat;
  cues: ShootCue[];
  /** What was passed over on the way, in words. */
  warnings: string[];
}
export type ReadNotes = Notes | { ok: false; reason: NotesRefusal };

const ARROW = /^\s*(?:\d+:)?\d{1,2}:\d{2}[.,]\d{1,3}\s*-->/m;
const TIMED = /^\s*\[?((?:\d{1,2}:)?\d{1,3}:\d{2})\]?[\s–-]+(.+)$/;

/**
 * A shoot's notes as cues: WebVTT (W3C) and SubRip by their own rules, lines that begin with `m:ss` or `h:mm:ss`, or prose, a
 * cue for each row or paragraph. A file that says it is WebVTT, or that looks like captions, and holds no cue is refused.
 */
export async function readNotes(text: string): Promise<ReadNotes> {
  const clean = text.replace(/^\uFEFF/, '').replace(/\r\n?/g, '\n');
  if (clean.trim() === '') return { ok: false, reason: 'empty' };
  if (/^WEBVTT(?:[ \t\n]|$)/.test(clean)) return readCaptions(clean, 'webvtt');
  if (ARROW.test(clean)) return readCaptions(clean, 'subrip');
  const lines = clean.split('\n');
  const said = lines.filter((line) => line.trim() !== '');
  return said.filter((line) => TIMED.test(line)).length >= said.length / 2 ? readTimed(said) : readProse(lines);
}

async function readCaptions(text: string, format: 'webvtt' | 'subrip'): Promise<ReadNotes> {
  const type = format === 'webvtt' ? 'vtt' : 'srt';
  const { cues, errors } = await parseCaptions(text, { type, errors: true });
  const read = withoutRolling(
    cues.map((cue) => ({ startMs: toMs(cue.startTime), endMs: toMs(cue.endTime), lines: plainLines(cue.text) })),
  ).filter((cue) => cue.text !== '');
  if (read.length === 0) return { ok: false, reason: 'no-cues' };
  const warnings = errors.map((error) => `${error.message}${error.line > 0 ? ` (line ${error.line})` : ''}`);
  return { ok: true, format, cues: read.map((cue, index) => ({ index, ...cue })), warnings: warnings.slice(0, 20) };
}

interface Lines {
  startMs: number;
  endMs: number;
  lines: string[];
}

/** Rolling captions leave no pause between their cues, in milliseconds. */
const ROLLING = 500;

/** Automatic captions show every line twice as they roll; the lines that the cue before ended with are taken off. */
function withoutRolling(cues: readonly Lines[]) {
  return cues.map(({ startMs, endMs, lines }, index) => {
    const before = cues[index - 1];
    const seen = before && startMs - before.endMs < ROLLING ? sharedLines(before.lines, lines) : 0;
    return { startMs, endMs, text: lines.slice(seen).join(' ') };
  });
}

/** How many lines at the end of one cue begin the next. */
function sharedLines(before: readonly string[], lines: readonly string[]): number {
  for (let count = Math.min(before.length, lines.length); count > 0; count -= 1)
    if (before.slice(-count).every((line, index) => line === lines[index])) return count;
  return 0;
}

function readTimed(lines: readonly string[]): Notes {
  const warnings: string[] = [];
  const cues: ShootCue[] = [];
  for (const line of lines) {
    const [, time, words] = TIMED.exec(line) ?? [];
    const last = cues.at(-1);
    if (time && words) cues.push({ index: cues.length, startMs: clockToMs(time), endMs: null, text: words.trim() });
    else if (last) last.text = `${last.text} ${line.trim()}`;
    else warnings.push(`A line before the first time was left out: ${line.trim().slice(0, 60)}`);
  }
  cues.forEach((cue, index) => (cue.endMs = cues[index + 1]?.startMs ?? null));
  return { ok: true, format: 'timed-text', cues, warnings };
}

/** A line this long was wrapped; a shorter one ends where its writer ended it. */
const WRAPPED = 45;
const COLUMNS = /\S(\t| {2,})\S/;
const BULLET = /^\s*([-*•·–]|\d+[.)])\s/;

function readProse(lines: readonly string[]): Notes {
  const rows: string[] = [];
  lines.forEach((line, index) => {
    if (line.trim() === '') return;
    const before = lines[index - 1] ?? '';
    const wrapped = before.trim().length >= WRAPPED && !COLUMNS.test(before);
    if (wrapped && !BULLET.test(line) && !COLUMNS.test(line)) rows.push(`${rows.pop() ?? ''} ${line.trim()}`.trim());
    else rows.push(line.trim());
  });
  const cues = rows.map((text, index) => ({ index, startMs: null, endMs: null, text }));
  return { ok: true, format: 'prose', cues, warnings: [] };
}

/** Lines of a cue without tags (`<v Speaker>`, `<00:01.000>`, `<b>`), their character references resolved. */
function plainLines(text: string): string[] {
  const names: Record<string, string> = { amp: '&', lt: '<', gt: '>', nbsp: ' ', lrm: '', rlm: '' };
  return text
    .replace(/<[^>]*>/g, '')
    .replace(/&(amp|lt|gt|nbsp|lrm|rlm);/g, (_, name: string) => names[name] ?? '')
    .split('\n')
    .map((line) => line.replace(/\s+/g, ' ').trim())
    .filter((line) => line !== '');
}

function toMs(seconds: number): number {
  return Math.round(seconds * 1000);
}

function clockToMs(clock: string): number {
  return clock.split(':').reduce((total, part) => total * 60 + Number(part), 0) * 1000;
}
