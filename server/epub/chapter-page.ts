import type { Snapshot } from '../../shared/contracts/editions.ts';
import { add, addHtml, makePage } from './page.ts';

export function chapterPage(chapter: Snapshot['chapters'][number]): string {
  return makePage(chapter.title, 'chapter', (body) => {
    add(body, 'h1', chapter.title);
    addHtml(body.ele('div'), chapter.introductionHtml);
    const list = body.ele('ol').att({ class: 'contents' });
    for (const recipe of chapter.recipes)
      add(list.ele('li'), 'a', recipe.document.title, { href: `${recipe.slug}.xhtml` });
  });
}
