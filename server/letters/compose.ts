import type { LetterFields, LetterKind } from './letter-kinds.ts';
import { accountWords } from './words/account-words.ts';
import type { Formats } from './words/formats.ts';
import { membershipWords } from './words/membership-words.ts';
import type { Part, Wording, Words } from './words/words.ts';

const words: Words = { ...accountWords, ...membershipWords };

/** Writes a letter in both forms that a mail program may show. */
export function composeLetter<K extends LetterKind>(
  kind: K,
  fields: LetterFields[K],
  formats: Formats,
): { subject: string; text: string; html: string } {
  const wording = words[kind](fields, formats);
  return { subject: wording.subject, text: toText(wording, formats), html: toHtml(wording, formats) };
}

function toText({ greeting, parts }: Wording, { imprint }: Formats): string {
  const lines = parts.map((part) => (typeof part === 'string' ? part : `${part.label}:\n${part.link}`));
  return [greeting, ...lines, imprint].join('\n\n') + '\n';
}

function toHtml({ subject, greeting, parts }: Wording, { imprint }: Formats): string {
  const paragraphs = [greeting, ...parts, imprint].map((part) => `<p>${partToHtml(part)}</p>`);
  return [
    '<!doctype html><html lang="en-GB"><head><meta charset="utf-8">',
    `<title>${escape(subject)}</title></head>`,
    '<body style="font-family: Georgia, serif; font-size: 16px; line-height: 1.5; color: #1f1b16; max-width: 34em">',
    ...paragraphs,
    '</body></html>',
  ].join('\n');
}

function partToHtml(part: Part): string {
  return typeof part === 'string' ? escape(part) : `<a href="${escape(part.link)}">${escape(part.label)}</a>`;
}

const ENTITIES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };

/** What people typed is never markup in a letter. */
function escape(text: string): string {
  return text.replace(/[&<>"]/g, (sign) => ENTITIES[sign] ?? sign);
}
