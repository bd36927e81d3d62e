/** Why notes cannot be read, for the person who brought them. */
export type NotesRefusal = 'empty' | 'not-text' | 'no-cues';

export type Decoded = { ok: true; text: string } | { ok: false; reason: NotesRefusal };

/** Bytes of a notes file as text: UTF-8, or UTF-16 by its byte order mark. What holds control bytes is no text. */
export function decodeNotes(bytes: Uint8Array): Decoded {
  if (bytes.length === 0) return { ok: false, reason: 'empty' };
  const encoding = encodingOf(bytes);
  let text: string;
  try {
    text = new TextDecoder(encoding, { fatal: true }).decode(bytes);
  } catch {
    return { ok: false, reason: 'not-text' };
  }
  // eslint-disable-next-line no-control-regex -- control characters are what tells a binary file
  if (/[\u0000-\u0008\u000e-\u001f]/.test(text)) return { ok: false, reason: 'not-text' };
  if (text.trim() === '') return { ok: false, reason: 'empty' };
  return { ok: true, text };
}

function encodingOf(bytes: Uint8Array): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  return 'utf-8';
}
