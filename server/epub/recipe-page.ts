import type { BoundRecipe } from '../../shared/contracts/editions.ts';
import type { RecipeLine } from '../../shared/contracts/recipe-document.ts';
import { GUIDANCE, WORDING } from '../../shared/wording/en.ts';
import { add, addHtml, legal, makePage, type Element } from './page.ts';
import type { BoundPicture } from './pictures.ts';
import { duration, durations, figureText, measure, numbers } from './wording.ts';

type Pictures = ReadonlyMap<string, BoundPicture>;

/** One recipe as a page: what the reading room shows, without what is only for the screen. */
export function recipePage(recipe: BoundRecipe, pictures: Pictures, hasPage: (slug: string) => boolean): string {
  const { document, html } = recipe;
  return makePage(document.title, 'chapter', (body) => {
    add(body, 'p', WORDING.kind[document.kind], { class: 'small' });
    add(body, 'h1', document.title);
    addPicture(body, document.leadPlateId, pictures);
    addHtml(body.ele('div').att({ class: 'headnote' }), html.headnote);
    addFacts(body, recipe);
    addMeasures(body, recipe, hasPage);
    addMethod(body, recipe, pictures);
    addCautions(body, recipe);
    addNotes(body, 'Notes', html.tips);
    addNotes(body, 'Variations', html.variations);
  });
}

function addPicture(parent: Element, id: string | null, pictures: Pictures): void {
  const picture = id === null ? undefined : pictures.get(id);
  if (!picture) return;
  const figure = parent.ele('figure');
  figure.ele('img').att({ src: picture.name, alt: legal(picture.alt) });
  const caption = [picture.caption, picture.credit].filter(Boolean).join(' ');
  if (caption) add(figure, 'figcaption', caption);
}

function addFacts(body: Element, { document, figures }: BoundRecipe): void {
  const { yield: made, keeping } = document;
  const facts: [string, string | null][] = [
    [
      'Yield',
      figureText(figures.yieldMl, (range) => `${numbers(range)}\u00a0ml`) ??
        (made.stated && measure(made.stated.amount, made.stated.unit)),
    ],
    ['Servings', made.servings === null ? null : String(made.servings)],
    [
      'Strength',
      figureText(figures.strength, (range) => `${numbers(range, 1)}\u00a0%\u00a0vol`) ??
        (figures.band && WORDING.band[figures.band]),
    ],
    ['Hands-on', figureText(figures.times.handsOn, durations)],
    ['Waiting', figures.times.waiting.known && figures.times.waiting.max > 0 ? durations(figures.times.waiting) : null],
    ['Keeping', keeping && keepingText(keeping)],
    ['Glass', document.glass],
    ['Ice', document.ice],
    ['Garnish', document.garnish],
  ];
  const list = body.ele('dl').att({ class: 'facts' });
  for (const [label, text] of facts) {
    if (!text) continue;
    add(list, 'dt', label);
    add(list, 'dd', text);
  }
}

function keepingText({
  place,
  days,
  temperature,
  basis,
  note,
}: NonNullable<BoundRecipe['document']['keeping']>): string {
  const time = days ? durations({ min: days.min * 86_400, max: days.max * 86_400 }) : null;
  const degrees = temperature ? `${numbers(temperature)}\u00a0°C` : null;
  return [time, WORDING.keeping[place], degrees, `(${WORDING.keepingBasis[basis]})`, note].filter(Boolean).join(' ');
}

function addMeasures(body: Element, recipe: BoundRecipe, hasPage: (slug: string) => boolean): void {
  add(body, 'h2', 'Measures');
  for (const section of recipe.document.sections) {
    if (section.lines.length === 0) continue;
    if (section.title) add(body, 'h3', section.title);
    const table = body.ele('table').att({ class: 'measures' }).ele('tbody');
    for (const line of section.lines) addLine(table.ele('tr'), line, recipe, hasPage);
  }
}

function addLine(
  row: Element,
  line: RecipeLine,
  { components }: BoundRecipe,
  hasPage: (slug: string) => boolean,
): void {
  add(row, 'td', line.amount ? measure(line.amount, line.unit) : 'to taste', { class: 'amount' });
  const cell = row.ele('td');
  const component = line.componentId === null ? undefined : components[line.componentId];
  if (component && hasPage(component.slug)) add(cell, 'a', line.name, { href: `${component.slug}.xhtml` });
  else cell.txt(legal(line.name));
  const after = [line.prep && `, ${line.prep}`, line.optional && ' (optional)'].filter(Boolean).join('');
  if (after) cell.txt(legal(after));
  if (line.note) add(cell, 'small', ` ${line.note}`);
}

function addMethod(body: Element, { document, html }: BoundRecipe, pictures: Pictures): void {
  if (document.steps.length === 0) return;
  add(body, 'h2', 'Method');
  const list = body.ele('ol').att({ class: 'method' });
  document.steps.forEach((step, index) => {
    const item = list.ele('li');
    const beside = [
      step.duration &&
        (step.duration.min === step.duration.max ? duration(step.duration.max) : durations(step.duration)),
      step.attention === 'waiting' ? 'waiting' : 'hands-on',
      step.temperature && `${numbers(step.temperature)}\u00a0°C`,
    ].filter(Boolean);
    add(item, 'p', beside.join(', '), { class: 'small' });
    addHtml(item.ele('div'), html.steps[index] ?? '');
    addPicture(item, step.plateId, pictures);
  });
}

function addCautions(body: Element, { figures }: BoundRecipe): void {
  const box = body.ele('section').att({ class: 'cautions' });
  add(box, 'h2', 'Cautions');
  const names = figures.allergens.map(({ allergen }) => WORDING.allergen[allergen]);
  const partly =
    figures.allergensUnknownFor.length > 0 ? ' Some ingredients are not in the larder: read their labels.' : '';
  addCaution(
    box,
    'Allergens',
    `${names.length > 0 ? `Contains ${names.join(', ')}.` : 'No listed allergen found.'}${partly}`,
  );
  for (const { caution } of figures.cautions)
    addCaution(box, WORDING.caution[caution].title, WORDING.caution[caution].text);
  add(box, 'p', GUIDANCE, { class: 'small' });
}

function addCaution(box: Element, title: string, text: string): void {
  const line = box.ele('p');
  add(line, 'strong', `${title}. `);
  line.txt(text);
}

function addNotes(body: Element, title: string, html: string): void {
  if (html.trim() === '') return;
  add(body, 'h2', title);
  addHtml(body.ele('div'), html);
}
