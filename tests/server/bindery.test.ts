import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, it } from 'vitest';
import { canonicalHash } from '../../server/editions/canonical-hash.ts';
import { pressEdition } from '../../server/editions/press.job.ts';
import { useApi } from '../support/api.ts';
import { makeDocument, makeRecipe } from '../support/factories.ts';
import { makeBook, makeIssuedBook, makePicture } from '../support/issued-book.ts';

const api = useApi();
let editor: TestAgent;
let creator: TestAgent;
beforeAll(async () => {
  editor = await api.as({ roles: ['editor'] });
  creator = await api.as({ roles: ['creator'] });
});

const etag = (version: number) => `"${version}"`;

describe('the running order', () => {
  it('is laid anew as a whole, across chapters, and read back as it was laid', async () => {
    const { book, chapter, recipes } = await makeBook(api.db, { recipes: [{}, {}, {}] });
    const second = await editor
      .post(`/api/bindery/books/${book.id}/chapters`)
      .send({ title: 'Second', introduction: '', access: null })
      .expect(201);
    const [one, two, three] = recipes.map((recipe) => recipe.id);
    const wanted = [
      { id: second.body.chapters[1].id, recipes: [three, one] },
      { id: chapter.id, recipes: [two] },
    ];
    const laid = await editor
      .put(`/api/bindery/books/${book.id}/order`)
      .set('If-Match', etag(second.body.version))
      .send({ chapters: wanted })
      .expect(200);
    const order = laid.body.chapters.map((each: { id: string; recipes: { recipeId: string }[] }) => ({
      id: each.id,
      recipes: each.recipes.map(({ recipeId }) => recipeId),
    }));
    expect(order).toEqual(wanted);
  });

  it('of eight editors who lay it at once from the same version, one is taken and seven are told', async () => {
    const { book, chapter, recipes } = await makeBook(api.db, { recipes: [{}, {}] });
    const order = { chapters: [{ id: chapter.id, recipes: recipes.map((recipe) => recipe.id).reverse() }] };
    const answers = await Promise.all(
      Array.from({ length: 8 }, () =>
        editor.put(`/api/bindery/books/${book.id}/order`).set('If-Match', etag(book.version)).send(order),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, ...Array(7).fill(412)]);
  });

  it('that leaves a recipe out, or names one twice, is refused whole', async () => {
    const { book, chapter, recipes } = await makeBook(api.db, { recipes: [{}, {}] });
    const [first] = recipes.map((recipe) => recipe.id);
    for (const named of [[first], [first, first]]) {
      const refused = await editor
        .put(`/api/bindery/books/${book.id}/order`)
        .set('If-Match', etag(book.version))
        .send({ chapters: [{ id: chapter.id, recipes: named }] })
        .expect(409);
      expect(refused.body.code).toBe('chapters.order_stale');
    }
  });

  it('takes a recipe once in a book', async () => {
    const { chapter, recipes } = await makeBook(api.db, { recipes: [{}] });
    const refused = await editor
      .post(`/api/bindery/chapters/${chapter.id}/recipes`)
      .send({ recipeId: recipes[0]!.id })
      .expect(409);
    expect(refused.body.code).toBe('chapters.recipe_placed');
  });
});

describe('pressing', () => {
  it('is refused while a recipe is not cleared, and names it', async () => {
    const { book } = await makeBook(api.db, { recipes: [{ title: 'Not yet', state: 'draft' }, {}] });
    const refused = await editor.post(`/api/bindery/books/${book.id}/editions`).expect(422);
    expect(refused.body).toMatchObject({ code: 'editions.not_cleared', detail: 'Not yet' });
  });

  it('binds revisions as they stand: what is edited afterwards stays out of the edition and its hash', async () => {
    const { book, recipes, edition } = await makeIssuedBook(api.ctx, {
      slug: 'bound',
      access: { kind: 'open' },
      recipes: [{ slug: 'first', title: 'First' }],
    });
    expect(edition.hash).toMatch(/^[0-9a-f]{64}$/);
    const { snapshot } = (await api.db('editions').where({ id: edition.id }).first('snapshot'))!;
    expect(canonicalHash(snapshot)).toBe(edition.hash);

    const { body: now } = await editor.get(`/api/recipes/${recipes[0]!.id}`).expect(200);
    expect(now.state).toBe('out');
    const changed = { ...now.document, title: 'Changed since' };
    const saved = await editor
      .put(`/api/recipes/${recipes[0]!.id}`)
      .set('If-Match', etag(now.version))
      .send({ document: changed, note: '' })
      .expect(200);
    expect(saved.body.state).toBe('draft');

    const visitor = api.visitor();
    await visitor.post('/api/session/age').send({ oldEnough: true });
    expect((await visitor.get('/api/reading/bound/first').expect(200)).body.title).toBe('First');
    expect((await editor.get(`/api/bindery/books/${book.id}/galley/first`).expect(200)).body.title).toBe(
      'Changed since',
    );
    await expect(
      api
        .db('editions')
        .where({ id: edition.id })
        .update({ hash: '0'.repeat(64) }),
    ).rejects.toThrow(/never changes/);
  });

  it('killed before its last step shows nothing, and is finished by the next try', async () => {
    const { book } = await makeBook(api.db, {
      slug: 'killed',
      recipes: [{}, { leadPlateId: (await makePicture(api.ctx)).id }],
    });
    const { body: edition } = await editor.post(`/api/bindery/books/${book.id}/editions`).expect(202);
    // The files fail after the snapshot was taken, as if the process had ended there.
    const broken = { ...api.ctx, files: { ...api.ctx.files, keep: () => Promise.reject(new Error('killed')) } };
    await expect(pressEdition(broken, { editionId: edition.id }, { last: false })).rejects.toThrow('killed');

    const between = await editor.get(`/api/bindery/editions/${edition.id}`).expect(200);
    expect(between.body).toMatchObject({ state: 'pressing', hash: null, fault: 'killed' });
    expect(await api.db('bound_recipes').where({ edition_id: edition.id })).toHaveLength(0);
    await creator.post(`/api/bindery/editions/${edition.id}/issue`).send({}).expect(409);
    await editor.post(`/api/bindery/books/${book.id}/editions`).expect(409);

    await Promise.all([1, 2].map(() => pressEdition(api.ctx, { editionId: edition.id }, { last: false })));
    const after = await editor.get(`/api/bindery/editions/${edition.id}`).expect(200);
    expect(after.body).toMatchObject({ state: 'pressed', progress: 100, fault: null, recipeCount: 2 });
    expect(await api.db('bound_recipes').where({ edition_id: edition.id })).toHaveLength(2);
  });

  it('that fails at its last try says why and leaves its number free', async () => {
    const { book } = await makeBook(api.db, { recipes: [{}] });
    const { body: edition } = await editor.post(`/api/bindery/books/${book.id}/editions`).expect(202);
    const broken = { ...api.ctx, files: { ...api.ctx.files, keep: () => Promise.reject(new Error('disk full')) } };
    await expect(pressEdition(broken, { editionId: edition.id }, { last: true })).rejects.toThrow('disk full');
    const failed = await editor.get(`/api/bindery/editions/${edition.id}`).expect(200);
    expect(failed.body).toMatchObject({ state: 'failed', fault: 'disk full' });
    const again = await editor.post(`/api/bindery/books/${book.id}/editions`).expect(202);
    expect(again.body.number).toBe(edition.number);
  });
});

describe('issuing', () => {
  it('is the creator’s and the admin’s, once', async () => {
    const { book } = await makeBook(api.db, { recipes: [{}] });
    const { body: edition } = await editor.post(`/api/bindery/books/${book.id}/editions`).expect(202);
    await pressEdition(api.ctx, { editionId: edition.id }, { last: true });
    await editor.post(`/api/bindery/editions/${edition.id}/issue`).send({}).expect(403);
    await creator.post(`/api/bindery/editions/${edition.id}/issue`).send({}).expect(200);
    const twice = await creator.post(`/api/bindery/editions/${edition.id}/issue`).send({}).expect(409);
    expect(twice.body.code).toBe('editions.already_issued');
  });
});

describe('a leaf', () => {
  it('puts one recipe before readers ahead of the next edition, which then binds it', async () => {
    const { book, chapter } = await makeIssuedBook(api.ctx, {
      slug: 'leafy',
      access: { kind: 'open' },
      recipes: [{ slug: 'one' }],
    });
    const recipe = await makeRecipe(api.db, { slug: 'two', state: 'cleared', title: 'Two' });
    const { body: placed } = await editor
      .post(`/api/bindery/chapters/${chapter.id}/recipes`)
      .send({ recipeId: recipe.id })
      .expect(201);
    expect(placed.chapters[0].recipes).toHaveLength(2);
    const visitor = api.visitor();
    await visitor.post('/api/session/age').send({ oldEnough: true });
    await visitor.get('/api/reading/leafy/two').expect(404);

    await editor.post(`/api/recipes/${recipe.id}/leaf`).send({ bookId: book.id }).expect(403);
    await creator.post(`/api/recipes/${recipe.id}/leaf`).send({ bookId: book.id }).expect(201);
    const leaf = await visitor.get('/api/reading/leafy/two').expect(200);
    expect(leaf.body).toMatchObject({
      view: 'open',
      edition: { kind: 'leaf', number: 1 },
    });
    const contents = await visitor.get('/api/reading/leafy').expect(200);
    expect(contents.body.chapters[0].recipes.map(({ slug }: { slug: string }) => slug)).toEqual(['one', 'two']);
  });
});

describe('markdown in a chapter', () => {
  it('keeps text structure and nothing that runs', async () => {
    const { book } = await makeBook(api.db, { recipes: [] });
    const { body } = await editor
      .post(`/api/bindery/books/${book.id}/chapters`)
      .send({
        title: 'Tidy',
        introduction:
          '# Loud\n\n*Salt* <script>alert(1)</script> [here](javascript:alert(1)) [there](https://tide.example)\n',
        access: null,
      })
      .expect(201);
    const html: string = body.chapters.at(-1).introductionHtml;
    expect(html).toContain('<h2>Loud</h2>');
    expect(html).toContain('<em>Salt</em>');
    expect(html).toContain('href="https://tide.example"');
    expect(html).not.toMatch(/<script|href="javascript/);
  });
});

describe('a document', () => {
  it('with a unit that nobody knows is refused at its field', async () => {
    const document = makeDocument();
    const wrong = {
      ...document,
      sections: [{ ...document.sections[0]!, lines: [{ ...document.sections[0]!.lines[0]!, unit: 'thimble' }] }],
    };
    const recipe = await makeRecipe(api.db, {});
    const refused = await editor
      .put(`/api/recipes/${recipe.id}`)
      .set('If-Match', '"1"')
      .send({ document: wrong, note: '' })
      .expect(400);
    expect(refused.body.faults[0].path).toBe('document.sections.0.lines.0.unit');
  });
});
