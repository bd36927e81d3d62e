import type { Snapshot } from '../../shared/contracts/editions.ts';
import { add, makePage, type Element } from './page.ts';
import type { Part } from './package-document.ts';

const OPS = 'http://www.idpf.org/2007/ops';

/** The navigation document: contents by chapter, and landmarks. */
export function navigation(snapshot: Snapshot, parts: readonly Part[]): string {
  return makePage('Contents', 'frontmatter', (body) => {
    const contents = body.ele('nav').att(OPS, 'epub:type', 'toc').att({ id: 'toc' });
    add(contents, 'h1', 'Contents');
    const list = contents.ele('ol');
    snapshot.chapters.forEach((chapter, index) => {
      const item = link(list, `chapter-${index + 1}.xhtml`, chapter.title);
      const recipes = item.ele('ol');
      for (const recipe of chapter.recipes) link(recipes, `${recipe.slug}.xhtml`, recipe.document.title);
    });
    link(list, 'colophon.xhtml', 'Colophon');

    const landmarks = body.ele('nav').att(OPS, 'epub:type', 'landmarks').att({ hidden: 'hidden' });
    add(landmarks, 'h2', 'Landmarks');
    const marks = landmarks.ele('ol');
    if (parts.some(({ name }) => name === 'cover.xhtml')) landmark(marks, 'cover', 'cover.xhtml', 'Cover');
    landmark(marks, 'toc', 'nav.xhtml', 'Contents');
    landmark(marks, 'bodymatter', snapshot.chapters.length > 0 ? 'chapter-1.xhtml' : 'title.xhtml', 'The book');
  });
}

function link(list: Element, href: string, text: string): Element {
  const item = list.ele('li');
  add(item, 'a', text, { href });
  return item;
}

function landmark(list: Element, type: string, href: string, text: string): void {
  add(list.ele('li'), 'a', text, { href }).att(OPS, 'epub:type', type);
}
