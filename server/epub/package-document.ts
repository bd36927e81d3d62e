import { create } from 'xmlbuilder2';
import type { Snapshot } from '../../shared/contracts/editions.ts';
import { legal } from './page.ts';
import type { BoundPicture } from './pictures.ts';

/** A page of the book by its file name; the navigation document has no body of its own here. */
export interface Part {
  name: string;
  title: string;
  body: string;
}

export const CONTAINER = create({ version: '1.0', encoding: 'UTF-8' })
  .ele('urn:oasis:names:tc:opendocument:xmlns:container', 'container')
  .att({ version: '1.0' })
  .ele('rootfiles')
  .ele('rootfile')
  .att({ 'full-path': 'OEBPS/package.opf', 'media-type': 'application/oebps-package+xml' })
  .end();

interface PackageWish {
  hash: string;
  modified: Date;
  parts: readonly Part[];
  pictures: ReadonlyMap<string, BoundPicture>;
}

/** The package document (EPUB 3): metadata, every file, and the reading order. */
export function packageDocument(snapshot: Snapshot, { hash, modified, parts, pictures }: PackageWish): string {
  const root = create({ version: '1.0', encoding: 'UTF-8' })
    .ele('http://www.idpf.org/2007/opf', 'package')
    .att({ version: '3.0', 'unique-identifier': 'edition' });
  const metadata = root.ele('metadata').att('xmlns:dc', 'http://purl.org/dc/elements/1.1/');
  const dc = (name: string, text: string, attributes: Record<string, string> = {}) =>
    metadata.ele('http://purl.org/dc/elements/1.1/', `dc:${name}`).att(attributes).txt(legal(text));
  dc('identifier', `urn:sha256:${hash}`, { id: 'edition' });
  dc('title', snapshot.book.title);
  dc('language', 'en-GB');
  dc('publisher', snapshot.imprint.name);
  if (snapshot.book.subtitle) dc('description', snapshot.book.subtitle);
  for (const [property, text] of metaOf(modified)) metadata.ele('meta').att({ property }).txt(text);

  const manifest = root.ele('manifest');
  for (const { name } of parts) {
    const properties = name === 'nav.xhtml' ? { properties: 'nav' } : {};
    manifest.ele('item').att({ id: idOf(name), href: name, 'media-type': 'application/xhtml+xml', ...properties });
  }
  manifest.ele('item').att({ id: 'styles', href: 'styles.css', 'media-type': 'text/css' });
  for (const picture of pictures.values()) {
    const properties = picture.id === snapshot.book.coverPlateId ? { properties: 'cover-image' } : {};
    manifest.ele('item').att({ id: idOf(picture.name), href: picture.name, 'media-type': 'image/jpeg', ...properties });
  }

  const spine = root.ele('spine');
  for (const { name } of inReadingOrder(parts)) spine.ele('itemref').att({ idref: idOf(name) });
  return root.end();
}

function metaOf(modified: Date): [property: string, text: string][] {
  return [
    ['dcterms:modified', modified.toISOString().replace(/\.\d{3}Z$/, 'Z')],
    ['schema:accessMode', 'textual'],
    ['schema:accessMode', 'visual'],
    ['schema:accessModeSufficient', 'textual'],
    ['schema:accessibilityFeature', 'alternativeText'],
    ['schema:accessibilityFeature', 'tableOfContents'],
    ['schema:accessibilityFeature', 'readingOrder'],
    ['schema:accessibilityHazard', 'none'],
  ];
}

/** The contents stand after cover and title. */
function inReadingOrder(parts: readonly Part[]): Part[] {
  const nav = parts.filter(({ name }) => name === 'nav.xhtml');
  const rest = parts.filter(({ name }) => name !== 'nav.xhtml');
  const title = rest.findIndex(({ name }) => name === 'title.xhtml');
  return [...rest.slice(0, title + 1), ...nav, ...rest.slice(title + 1)];
}

function idOf(name: string): string {
  return `f-${name.replace(/[^a-z0-9]+/gi, '-')}`;
}
