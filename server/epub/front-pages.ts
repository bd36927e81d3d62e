import type { Snapshot } from '../../shared/contracts/editions.ts';
import { GUIDANCE, SENSIBLY } from '../../shared/wording/en.ts';
import { add, legal, makePage } from './page.ts';
import type { BoundPicture } from './pictures.ts';

export function coverPage({ book }: Snapshot, cover: BoundPicture): string {
  return makePage(book.title, 'cover', (body) => {
    const figure = body.ele('figure').att({ class: 'cover' });
    figure.ele('img').att({ src: cover.name, alt: legal(cover.alt) });
  });
}

export function titlePage({ book, imprint, number }: Snapshot): string {
  return makePage(book.title, 'titlepage', (body) => {
    add(body, 'h1', book.title, { class: 'book' });
    if (book.subtitle) add(body, 'p', book.subtitle, { class: 'subtitle' });
    add(body, 'p', `${imprint.name}, edition ${number}`, { class: 'small' });
  });
}

/** Who made it, which edition it is, and whose rules come first. */
export function colophonPage({ imprint, number }: Snapshot, hash: string): string {
  return makePage('Colophon', 'colophon', (body) => {
    add(body, 'h1', 'Colophon');
    add(body, 'p', `Edition ${number} of ${imprint.name}, sewn with Steep & Bind.`);
    add(body, 'p', GUIDANCE);
    add(body, 'p', `For readers of ${imprint.ageLimit} and older. ${SENSIBLY}`);
    add(body, 'p', `This edition is known by its SHA-256: ${hash}`, { class: 'small hash' });
  });
}
