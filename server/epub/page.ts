import { create } from 'xmlbuilder2';
import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces.js';

export type Element = XMLBuilder;

/**
 * One XHTML page; `build` fills its body. Text goes through the builder, which escapes it.
 */
export function makePage(title: string, type: string, build: (body: Element) => void): string {
  const html = create({ version: '1.0', encoding: 'UTF-8' })
    .dtd({ name: 'html' })
    .ele('http://www.w3.org/1999/xhtml', 'html')
    .att('xmlns:epub', 'http://www.idpf.org/2007/ops')
    .att({ lang: 'en-GB' })
    .att('http://www.w3.org/XML/1998/namespace', 'xml:lang', 'en-GB');
  const head = html.ele('head');
  head.ele('title').txt(legal(title));
  head.ele('link').att({ rel: 'stylesheet', type: 'text/css', href: 'styles.css' });
  const body = html.ele('body');
  const section = body.ele('section').att('http://www.idpf.org/2007/ops', 'epub:type', type);
  build(section);
  return html.end({ headless: false });
}

/** An element with text; the attributes are given as they are. */
export function add(parent: Element, name: string, text: string, attributes: Record<string, string> = {}): Element {
  return parent.ele(name).att(attributes).txt(legal(text));
}

/** Sanitised HTML of ours as elements: its tags are few and closed, so it reads as XML. */
export function addHtml(parent: Element, html: string): void {
  if (html.trim() === '') return;
  parent.ele(html.replace(/&nbsp;/g, '\u00a0'));
}

/** Characters that XML 1.0 does not know are left out. */
export function legal(text: string): string {
  // eslint-disable-next-line no-control-regex -- these are the characters in question
  return text.replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g, '');
}
