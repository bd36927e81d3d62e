import { cp, mkdtemp, readFile, readdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { DemoContent, DemoRecipe } from '../../../seeds/content/content.ts';
import { readContent } from '../../../seeds/content/read-content.ts';
import { stableId } from '../../../seeds/content/stable-id.ts';
import { computeFigures } from '../../../shared/engine/figures.ts';
import { LARDER_BY_ID } from '../../../shared/larder/index.ts';

const CONTENT = join(import.meta.dirname, '../../../content');

const linesOf = ({ document }: DemoRecipe) => document.sections.flatMap((section) => section.lines);
const componentsOf = (recipe: DemoRecipe) => linesOf(recipe).flatMap(({ componentId }) => componentId ?? []);
const wordCount = (text: string) => text.split(/\s+/).filter(Boolean).length;

describe('the demo content', () => {
  let content: DemoContent;
  let inBook: DemoRecipe[];
  let byId: Map<string, DemoRecipe>;

  beforeAll(async () => {
    content = await readContent(CONTENT);
    inBook = content.recipes.filter((recipe) => recipe.chapter !== null);
    byId = new Map(content.recipes.map((recipe) => [recipe.id, recipe]));
  });

  it('is a book of five chapters with at least 24 released recipes', () => {
    expect(content.chapters).toHaveLength(5);
    expect(inBook.filter((recipe) => recipe.state === 'out').length).toBeGreaterThanOrEqual(24);
    for (const chapter of content.chapters) {
      const positions = inBook.filter((recipe) => recipe.chapter === chapter.slug).map((recipe) => recipe.position);
      expect(positions.length, chapter.title).toBeGreaterThanOrEqual(3);
      expect(positions, chapter.title).toEqual(positions.map((_, index) => index));
    }
  });

  it('introduces every chapter in 80 to 200 words', () => {
    for (const { title, introduction } of content.chapters) {
      expect(wordCount(introduction), title).toBeGreaterThanOrEqual(80);
      expect(wordCount(introduction), title).toBeLessThanOrEqual(200);
    }
  });

  it('holds every kind that the book promises', () => {
    const kinds = new Set(inBook.map(({ document }) => document.kind));
    expect([...kinds].sort()).toEqual(
      ['bitters', 'cordial', 'drink', 'garnish', 'infusion', 'liqueur', 'shrub', 'syrup', 'technique'].sort(),
    );
  });

  it('makes its drinks from its own syrups, cordials and infusions', () => {
    const drinks = inBook.filter(({ document }) => document.kind === 'drink');
    const kindsUsed = drinks.flatMap(componentsOf).map((id) => byId.get(id)?.document.kind);

    expect(drinks.filter((drink) => componentsOf(drink).length > 0).length).toBeGreaterThanOrEqual(8);
    expect(kindsUsed).toEqual(expect.arrayContaining(['syrup', 'cordial', 'shrub', 'infusion', 'liqueur', 'bitters']));
    expect(kindsUsed).not.toContain(undefined);
  });

  it('never lets a released recipe rest on one that is not', () => {
    const released = content.recipes.filter((recipe) => recipe.state === 'out');
    const below = released.flatMap(componentsOf).map((id) => byId.get(id));
    expect(below.filter((component) => component?.state !== 'out').map((component) => component?.slug)).toEqual([]);
  });

  it('shows every rule of access, and every tier opens more than the one below', () => {
    const rules = inBook.map((recipe) => {
      const chapter = content.chapters.find(({ slug }) => slug === recipe.chapter);
      return recipe.access ?? chapter?.access ?? content.book.access;
    });
    const ranks = rules.flatMap((rule) => (rule.kind === 'tier' ? [rule.rank] : []));

    expect(rules.filter((rule) => rule.kind === 'open').length).toBeGreaterThanOrEqual(3);
    expect(rules.filter((rule) => rule.kind === 'account').length).toBeGreaterThanOrEqual(1);
    expect([...new Set(ranks)].sort()).toEqual(content.tiers.map((tier) => tier.rank));
  });

  it('prices the tiers in pence', () => {
    expect(content.tiers.map(({ name, monthly, yearly }) => ({ name, monthly, yearly }))).toEqual([
      { name: 'Paperbound', monthly: 400, yearly: 4000 },
      { name: 'Sewn', monthly: 700, yearly: 7000 },
      { name: 'Clothbound', monthly: 1200, yearly: 12_000 },
    ]);
  });

  it('leaves nothing out of a recipe that stands in the book', () => {
    for (const recipe of inBook) {
      const { document } = recipe;
      expect(document.headnote, recipe.slug).not.toBe('');
      expect(document.yield.stated, recipe.slug).not.toBeNull();
      expect(document.keeping, recipe.slug).not.toBeNull();
      expect(document.leadPlateId, recipe.slug).not.toBeNull();
      expect(document.steps.length, recipe.slug).toBeGreaterThanOrEqual(2);
      for (const line of linesOf(recipe))
        expect(line.amount !== null || line.scaling.rule === 'to-taste', `${recipe.slug}: ${line.name}`).toBe(true);
    }
  });

  it('uses every line of a finished recipe in a step, and gives every step its time', () => {
    for (const recipe of inBook) {
      const used = new Set(recipe.document.steps.flatMap((step) => step.uses));
      expect(
        linesOf(recipe)
          .filter((line) => !used.has(line.id))
          .map((line) => line.name),
        recipe.slug,
      ).toEqual([]);
      const untimed = recipe.document.steps.filter(
        (step) => step.duration === null && recipe.document.kind !== 'drink',
      );
      expect(
        untimed.map((step) => step.text),
        recipe.slug,
      ).toEqual([]);
    }
  });

  it('keeps fresh syrups and cordials no longer than three weeks, and always cold', () => {
    // One to three weeks in a refrigerator: common practice for home-made syrups without preservative.
    const fresh = inBook.filter(({ document }) => ['syrup', 'cordial'].includes(document.kind));
    for (const { slug, document } of fresh) {
      expect(document.keeping?.place, slug).toBe('refrigerator');
      expect(document.keeping?.days?.max, slug).toBeLessThanOrEqual(21);
      expect(document.keeping?.temperature?.max, slug).toBeLessThanOrEqual(5);
    }
  });

  it.each([
    // Density of sucrose solutions at 20 °C by the CRC Handbook's table: 50 % by mass 1.2296 g/ml, 66.7 % 1.332 g/ml.
    { slug: 'headland-rosemary-syrup', grams: 800, density: 1.2296 },
    { slug: 'two-to-one', grams: 900, density: 1.332 },
  ])('measures a yield of $slug that its sugar and water can give', ({ slug, grams, density }) => {
    const measured = content.recipes.find((recipe) => recipe.slug === slug)?.document.yield.measured;
    expect(measured?.unit).toBe('ml');
    expect(measured?.amount).toBeLessThanOrEqual(grams / density);
    expect(measured?.amount).toBeGreaterThanOrEqual((grams / density) * 0.93);
  });

  const figuresOf = (slug: string) => {
    const components = new Map(content.recipes.map((recipe) => [recipe.id, recipe.document]));
    const recipe = content.recipes.find((candidate) => candidate.slug === slug);
    return recipe && computeFigures(recipe.document, { larder: LARDER_BY_ID, components });
  };

  it.each([
    { slug: 'whitecap-sour', allergen: 'egg' },
    { slug: 'walnut-bitters', allergen: 'nuts' },
    { slug: 'boathouse', allergen: 'nuts' },
    { slug: 'clear-harbour', allergen: 'milk' },
    { slug: 'shingle', allergen: 'sulphites' },
    { slug: 'raspberry-dulse-cordial', allergen: 'crustaceans' },
  ])('names $allergen in $slug', ({ slug, allergen }) => {
    expect(figuresOf(slug)?.allergens.map((found) => found.allergen)).toContain(allergen);
  });

  it.each([
    { slug: 'whitecap-sour', caution: 'raw-egg' },
    { slug: 'lifeboat-toddy', caution: 'spirit-near-heat' },
    { slug: 'buckthorn-cordial', caution: 'hot-sugar' },
    { slug: 'peel-syrup', caution: 'fresh-keeping' },
    { slug: 'kelp-vermouth', caution: 'harmful-botanical' },
    { slug: 'headland-tonic', caution: 'grapefruit-medicines' },
  ])('warns of $caution in $slug', ({ slug, caution }) => {
    expect(figuresOf(slug)?.cautions.map((found) => found.caution)).toContain(caution);
  });

  it('knows the allergens of every line in the book', () => {
    for (const { slug } of inBook) expect(figuresOf(slug)?.allergensUnknownFor, slug).toEqual([]);
  });

  it('has working copies on the way to the book, one with an open query', () => {
    const loose = content.recipes.filter((recipe) => recipe.chapter === null);
    expect(loose.map((recipe) => recipe.state)).toEqual(expect.arrayContaining(['draft', 'on-trial', 'with-editor']));
    expect(loose.filter((recipe) => recipe.queries.length > 0)).toHaveLength(1);
  });

  it('describes and credits every plate, and uses each of them', async () => {
    const used = new Set([content.book.coverPlateFile, ...content.recipes.map((recipe) => recipe.plateFile)]);
    expect(content.plates.length).toBeGreaterThanOrEqual(18);
    for (const plate of content.plates) {
      expect(wordCount(plate.alt), plate.file).toBeGreaterThanOrEqual(6);
      expect(plate.credit).toBe('Rendered for Ebbfold Press');
      expect(used, plate.file).toContain(plate.file);
      // The first bytes of a JPEG file: ITU-T T.81, start of image.
      expect([...(await readFile(plate.path)).subarray(0, 3)], plate.file).toEqual([0xff, 0xd8, 0xff]);
    }
  });

  it('points from every line of a filmed recipe at the cue that names it', () => {
    const filmed = content.recipes.filter((recipe) => recipe.shoot !== null);
    expect(filmed).toHaveLength(2);
    for (const recipe of filmed) {
      const shoot = content.shoots.find(({ slug }) => slug === recipe.shoot);
      const cues = shoot?.notesText.split(/\n\n/).filter((block) => block.includes(' --> ')) ?? [];
      const sourced = linesOf(recipe).filter((line) => line.source);
      expect(sourced.length, recipe.slug).toBeGreaterThanOrEqual(6);
      for (const line of sourced) {
        const said = cues[line.source?.cue ?? -1]?.toLowerCase() ?? '';
        const named = line.name
          .toLowerCase()
          .split(/\W+/)
          .filter((word) => word.length > 3);
        expect(
          named.some((word) => said.includes(word)),
          `${line.name} in "${said}"`,
        ).toBe(true);
      }
    }
  });

  it('keeps one shoot back for a first draft, its notes with times', () => {
    const drafted = new Set(content.recipes.map((recipe) => recipe.shoot));
    const fresh = content.shoots.filter(({ slug }) => !drafted.has(slug));
    expect(content.shoots.map(({ notesName }) => notesName.split('.').at(-1)).sort()).toEqual(['srt', 'txt', 'vtt']);
    expect(fresh).toHaveLength(1);
    expect(
      fresh[0]?.notesText
        .trim()
        .split('\n')
        .every((text) => /^\d+:\d\d \S/.test(text)),
    ).toBe(true);
  });

  it('is written in Latin letters', async () => {
    const names = await readdir(CONTENT, { recursive: true });
    for (const name of names.filter((entry) => /\.(?:md|yaml|vtt|srt|txt)$/.test(entry))) {
      const letters = (await readFile(join(CONTENT, name), 'utf8')).match(/\p{L}/gu) ?? [];
      expect(
        letters.filter((letter) => !/\p{Script=Latin}/u.test(letter)),
        name,
      ).toEqual([]);
    }
  });
});

describe('a fault in the content', () => {
  let copy: string;

  afterEach(() => rm(copy, { recursive: true, force: true }));

  const TWO_TO_ONE = 'slack-water/01-low-water/02-two-to-one.md';
  const COFFEE = 'slack-water/04-ebb/01-nightwatch-coffee-liqueur.md';

  it.each([
    {
      fault: 'an ingredient that is not in the larder',
      file: TWO_TO_ONE,
      from: 'larder: demerara-sugar',
      to: 'larder: moon-sugar',
      line: 13,
      says: 'no "moon-sugar" in the larder',
    },
    {
      fault: 'a component that nobody wrote',
      file: TWO_TO_ONE,
      from: 'larder: demerara-sugar',
      to: 'component: moon-syrup',
      line: 13,
      says: 'no recipe "moon-syrup"',
    },
    {
      fault: 'components in a circle',
      file: 'slack-water/01-low-water/01-toasting-whole-spice.md',
      from: 'larder: cloves',
      to: 'component: storm-spice-syrup',
      line: 2,
      says: 'toasting-whole-spice, storm-spice-syrup, toasting-whole-spice',
    },
    {
      fault: 'a misspelt key',
      file: TWO_TO_ONE,
      from: 'method: Warmed',
      to: 'methud: Warmed',
      line: 4,
      says: 'methud',
    },
    {
      fault: 'a unit without its amount',
      file: TWO_TO_ONE,
      from: '{ amount: 600, unit',
      to: '{ unit',
      line: 13,
      says: 'A unit needs an amount',
    },
    {
      fault: 'an unknown unit',
      file: TWO_TO_ONE,
      from: '{ amount: 600, unit: g',
      to: '{ amount: 600, unit: firkin',
      line: 13,
      says: 'unit',
    },
    {
      fault: 'a plate that is not there',
      file: TWO_TO_ONE,
      from: 'plate: cover-pale-bottle-herbs.jpg',
      to: 'plate: moon.jpg',
      line: 6,
      says: 'not among the plates',
    },
    {
      fault: 'a step that uses what is not there',
      file: TWO_TO_ONE,
      from: 'uses: [1, 2], minutes: 2',
      to: 'uses: [moon], minutes: 2',
      line: 16,
      says: 'No line is called "moon"',
    },
    {
      fault: 'a time at which nobody spoke',
      file: COFFEE,
      from: 'at: "0:22"',
      to: 'at: "0:23"',
      line: 13,
      says: 'No cue',
    },
    {
      fault: 'YAML that cannot be read',
      file: TWO_TO_ONE,
      from: 'tags: [foundation',
      to: 'tags: [[foundation',
      line: 6,
      says: 'Flow sequence',
    },
    { fault: 'no front matter', file: TWO_TO_ONE, from: '---\ntitle', to: 'title', line: 1, says: 'front matter' },
  ])('is told with file, line and place: $fault', async ({ file, from, to, line, says }) => {
    copy = await mkdtemp(join(tmpdir(), 'content-'));
    await cp(CONTENT, copy, { recursive: true });
    const path = join(copy, file);
    const text = await readFile(path, 'utf8');
    const changed = text.replace(from, to);
    expect(changed).not.toBe(text);
    await writeFile(path, changed);

    const told = await readContent(copy).then(
      () => 'nothing',
      (error: unknown) => String(error),
    );

    expect(told).toContain(`${file}:${line}:`);
    expect(told).toContain(says);
  });
});

describe('stable ids', () => {
  it('follow the version 5 example of RFC 9562, appendix A.4', () => {
    const dns = '6ba7b810-9dad-11d1-80b4-00c04fd430c8';
    expect(stableId(dns, 'www.example.com')).toBe('2ed6657d-e927-568b-95e1-2665a8aea6a2');
  });
});
