import { simpleParser } from 'mailparser';

/** A caught letter as the catcher hands it out. */
export interface Letter {
  id: string;
  /** When it was caught, ISO 8601 in UTC. */
  at: string;
  from: string;
  /** Who it was really sent to: the envelope, blind copies included. */
  to: string[];
  subject: string;
  text: string;
  html: string;
  /** Addresses of the web found in both bodies, each once, in their order. */
  links: string[];
}

const ENTITIES: Record<string, string> = { '&amp;': '&', '&quot;': '"', '&#39;': "'", '&lt;': '<', '&gt;': '>' };

/** The web addresses in a letter: of its anchors first, then of its plain text. */
export function linksIn(html: string, text: string): string[] {
  const anchors = [...html.matchAll(/href\s*=\s*["'](https?:[^"']+)["']/gi)].map(([, url = '']) =>
    url.replaceAll(/&(amp|quot|#39|lt|gt);/g, (entity) => ENTITIES[entity] ?? entity),
  );
  // A full stop or bracket after an address belongs to the sentence.
  const written = [...text.matchAll(/https?:\/\/[^\s<>"']+/g)].map(([url]) => url.replace(/[).,;:!?\]]+$/, ''));
  return [...new Set([...anchors, ...written])];
}

/** Reads a message as it came over SMTP (RFC 5322 with MIME). */
export async function readLetter(source: Buffer, { id, at, to }: Pick<Letter, 'id' | 'at' | 'to'>): Promise<Letter> {
  const mail = await simpleParser(source, { skipTextToHtml: true });
  const html = mail.html || '';
  const text = mail.text ?? '';
  return {
    id,
    at,
    from: mail.from?.text ?? '',
    to,
    subject: mail.subject ?? '',
    text,
    html,
    links: linksIn(html, text),
  };
}
