import MarkdownIt from 'markdown-it';
import sanitizeHtml from 'sanitize-html';

const markdown = new MarkdownIt({ html: false, linkify: false, typographer: true });

const allowed: sanitizeHtml.IOptions = {
  allowedTags: ['p', 'br', 'em', 'strong', 'a', 'ul', 'ol', 'li', 'h2', 'h3', 'h4', 'blockquote', 'code', 'hr', 's'],
  allowedAttributes: { a: ['href', 'rel'] },
  allowedSchemes: ['http', 'https', 'mailto'],
  transformTags: {
    // A page has one main heading, and it is not the author's.
    h1: 'h2',
    a: (tagName, attribs) => ({ tagName, attribs: { ...attribs, rel: 'nofollow noopener' } }),
  },
};

/** Markdown (CommonMark) to HTML that holds nothing but text structure. */
export function renderMarkdown(source: string): string {
  return sanitizeHtml(markdown.render(source), allowed).trim();
}

/** Markdown to the words alone, for lists and letters. */
export function plainText(source: string): string {
  return sanitizeHtml(markdown.render(source), { allowedTags: [], allowedAttributes: {} })
    .replace(/&(amp|lt|gt|quot);/g, (_, name: string) => ({ amp: '&', lt: '<', gt: '>', quot: '"' })[name] ?? '')
    .replace(/\s+/g, ' ')
    .trim();
}
