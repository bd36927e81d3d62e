import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, it } from 'vitest';
import type { RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import { useApi } from '../support/api.ts';
import { makeDocument, makeLine, makePlate, makeRecipe } from '../support/factories.ts';
import { makePerson } from '../support/people.ts';

const api = useApi();
let editor: TestAgent;
let creator: TestAgent;

beforeAll(async () => {
  editor = await api.as({ roles: ['editor'], name: 'Edda' });
  creator = await api.as({ roles: ['creator'], name: 'Cato' });
});

const save = (agent: TestAgent, id: string, version: number, document: RecipeDocument, note = '') =>
  agent.put(`/api/recipes/${id}`).set('If-Match', `"${version}"`).send({ document, note });

describe('beginning a recipe', () => {
  it('begins a blank one as a draft that says what it lacks', async () => {
    const answer = await creator.post('/api/recipes').send({ from: 'blank', title: 'Salt Marsh', kind: 'cordial' });

    expect(answer.status).toBe(201);
    expect(answer.headers.etag).toBe('"1"');
    expect(answer.body).toMatchObject({
      slug: 'salt-marsh',
      state: 'draft',
      revision: 1,
      version: 1,
      updatedBy: 'Cato',
      missing: ['headnote', 'lines', 'steps', 'yield', 'keeping', 'lead-plate'],
      transitions: ['on-trial', 'withdrawn'],
      figures: { yieldMl: { known: false } },
    });
  });

  it('gives recipes of one title different addresses, and plain ones to letters with marks', async () => {
    const begin = async (title: string) => {
      const { body } = await creator.post('/api/recipes').send({ from: 'blank', title, kind: 'syrup' }).expect(201);
      return (body as { slug: string }).slug;
    };

    expect(await begin('Crème Brûlée & Ærø')).toBe('creme-brulee-aero');
    expect(await begin('Creme brulee: aero')).toBe('creme-brulee-aero-2');
    expect(await begin('Crème Brûlée Ærø!')).toBe('creme-brulee-aero-3');
    expect(await begin('酢')).toBe('recipe');
  });

  it('gives eight recipes that are begun at once eight addresses', async () => {
    const answers = await Promise.all(
      Array.from({ length: 8 }, () =>
        creator.post('/api/recipes').send({ from: 'blank', title: 'All at Once', kind: 'drink' }),
      ),
    );

    expect(answers.map(({ status }) => status)).toEqual(Array.from({ length: 8 }, () => 201));
    expect(new Set(answers.map(({ body }) => (body as { slug: string }).slug)).size).toBe(8);
  });

  it('copies a recipe with its whole text into a draft of its own', async () => {
    const original = await makeRecipe(api.db, { title: 'Kelp Gimlet', state: 'out', tips: 'Chill the glass.' });

    const { body } = await editor.post('/api/recipes').send({ from: 'copy', recipeId: original.id }).expect(201);

    const { body: source } = await editor.get(`/api/recipes/${original.id}`).expect(200);
    expect(body).toMatchObject({ state: 'draft', revision: 1, slug: 'kelp-gimlet-copy', updatedBy: 'Edda' });
    expect(body.id).not.toBe(original.id);
    expect(body.document).toEqual({ ...source.document, title: 'Kelp Gimlet (copy)' });
    const { body: history } = await editor.get(`/api/recipes/${body.id}/revisions`).expect(200);
    expect(history.revisions).toMatchObject([{ number: 1, note: 'Copied from Kelp Gimlet, revision 1' }]);
    expect(source).toMatchObject({ state: 'out', version: 1 });
  });

  it('refuses to copy what is not there, and a shoot that is not there', async () => {
    const nowhere = '00000000-0000-4000-8000-000000000000';

    const copy = await editor.post('/api/recipes').send({ from: 'copy', recipeId: nowhere });
    expect(copy.status).toBe(404);
    expect(copy.body.code).toBe('recipes.not_found');

    const draft = await editor.post('/api/recipes').send({ from: 'shoot', shootId: nowhere, document: makeDocument() });
    expect(draft.status).toBe(400);
    expect(draft.body.faults).toEqual([{ path: 'shootId', message: 'There is no such shoot.' }]);
  });
});

describe('saving', () => {
  it('makes every save a numbered revision, works the figures out and keeps the address', async () => {
    const recipe = await makeRecipe(api.db, { title: 'Harbour Sour' });
    const document = makeDocument({
      title: 'Harbour Sour No. 2',
      lines: [makeLine({ name: 'gin', larderId: 'gin', amount: { min: 50, max: 50 } })],
      yield: { stated: null, measured: null, servings: 1, servingSize: null },
    });

    const answer = await save(editor, recipe.id, 1, document, 'Gin, not rum').expect(200);

    expect(answer.headers.etag).toBe('"2"');
    expect(answer.body).toMatchObject({ revision: 2, version: 2, slug: 'harbour-sour', updatedBy: 'Edda', document });
    expect(answer.body.figures.strength.known).toBe(true);
    const { body } = await editor.get(`/api/recipes/${recipe.id}/revisions`).expect(200);
    expect(body.revisions).toMatchObject([
      { number: 2, note: 'Gin, not rum', savedBy: 'Edda' },
      { number: 1, note: '' },
    ]);
  });

  it('tells the second of two editors who came first, and loses neither text', async () => {
    const recipe = await makeRecipe(api.db, { title: 'Two Hands' });
    await save(editor, recipe.id, 1, makeDocument({ title: 'Two Hands', headnote: 'Edda wrote this.' })).expect(200);

    const second = await save(
      creator,
      recipe.id,
      1,
      makeDocument({ title: 'Two Hands', headnote: 'Cato wrote this.' }),
    );

    expect(second.status).toBe(412);
    expect(second.body).toMatchObject({
      code: 'request.version_conflict',
      context: { version: 2, revision: 2, savedBy: 'Edda', state: 'draft' },
    });
    expect(Date.parse(second.body.context.savedAt as string)).toBeGreaterThan(0);
    const { body: theirs } = await creator.get(`/api/recipes/${recipe.id}/revisions/2`).expect(200);
    expect(theirs.document.headnote).toBe('Edda wrote this.');
    const { version } = second.body.context as { version: number };
    const merged = makeDocument({ title: 'Two Hands', headnote: 'Edda wrote this. Cato wrote this.' });
    await save(creator, recipe.id, version, merged).expect(200);
  });

  it('lets exactly one of eight simultaneous saves through for each version', async () => {
    const recipe = await makeRecipe(api.db);
    for (const version of [1, 2, 3]) {
      const answers = await Promise.all(
        Array.from({ length: 8 }, (_, hand) =>
          save(hand % 2 ? editor : creator, recipe.id, version, makeDocument({ headnote: `By hand ${hand}.` })),
        ),
      );
      const won = answers.filter(({ status }) => status === 200);
      expect(won).toHaveLength(1);
      expect(answers.filter(({ status }) => status === 412)).toHaveLength(7);
      const { body } = await editor.get(`/api/recipes/${recipe.id}`).expect(200);
      expect(body).toMatchObject({ version: version + 1, revision: version + 1 });
      expect(body.document.headnote).toBe(won[0]!.body.document.headnote);
    }
  });

  it('asks which version is changed', async () => {
    const recipe = await makeRecipe(api.db);
    const answer = await editor.put(`/api/recipes/${recipe.id}`).send({ document: makeDocument() });
    expect(answer.status).toBe(428);
    expect(answer.body.code).toBe('request.precondition_required');
  });

  it('refuses an unknown unit at its field and keeps what was there', async () => {
    const recipe = await makeRecipe(api.db);
    const document = makeDocument({ lines: [makeLine(), { ...makeLine(), unit: 'hogshead' as never }] });

    const answer = await save(editor, recipe.id, 1, document);

    expect(answer.status).toBe(400);
    expect(answer.body.code).toBe('request.invalid');
    expect(answer.body.faults).toMatchObject([{ path: 'document.sections.0.lines.1.unit' }]);
    const { body } = await editor.get(`/api/recipes/${recipe.id}`);
    expect(body).toMatchObject({ version: 1, revision: 1 });
  });

  it('refuses a field that no recipe has, and a text with a character that cannot be kept', async () => {
    const recipe = await makeRecipe(api.db);

    const misspelt = await save(editor, recipe.id, 1, { ...makeDocument(), titel: 'x' } as never);
    expect(misspelt.body.faults).toMatchObject([{ path: 'document.titel' }]);

    for (const character of ['\u0000', '\ud83c']) {
      const answer = await save(editor, recipe.id, 1, makeDocument({ headnote: `before${character}after` }));
      expect(answer.status).toBe(400);
      expect(answer.body.code).toBe('request.invalid');
    }
  });

  it('takes a recipe of two thousand lines', async () => {
    const recipe = await makeRecipe(api.db);
    const lines = Array.from({ length: 2000 }, (_, index) =>
      makeLine({ name: `ingredient ${index}`, note: 'x'.repeat(200) }),
    );
    const { body } = await save(editor, recipe.id, 1, makeDocument({ lines })).expect(200);
    expect(body.document.sections[0].lines).toHaveLength(2000);
  });

  it('refuses plates that are not there, at their fields', async () => {
    const recipe = await makeRecipe(api.db);
    const nowhere = '00000000-0000-4000-8000-000000000000';
    const answer = await save(editor, recipe.id, 1, makeDocument({ leadPlateId: nowhere }));
    expect(answer.status).toBe(400);
    expect(answer.body.faults).toEqual([{ path: 'document.leadPlateId', message: 'There is no such plate.' }]);
  });

  it.each(['cleared', 'out'] as const)('returns a recipe that was %s to draft', async (state) => {
    const recipe = await makeRecipe(api.db, { state });
    const { body } = await save(editor, recipe.id, 1, makeDocument()).expect(200);
    expect(body.state).toBe('draft');
  });

  it.each(['on-trial', 'with-editor', 'withdrawn'] as const)(
    'leaves a recipe that is %s where it is',
    async (state) => {
      const recipe = await makeRecipe(api.db, { state });
      const { body } = await save(editor, recipe.id, 1, makeDocument()).expect(200);
      expect(body.state).toBe(state);
    },
  );
});

describe('revisions', () => {
  it('restores an earlier text as the next revision', async () => {
    const recipe = await makeRecipe(api.db, { title: 'First', headnote: 'As it was.' });
    await save(editor, recipe.id, 1, makeDocument({ title: 'Second', headnote: 'As it became.' })).expect(200);
    const restore = (version: number) =>
      creator.post(`/api/recipes/${recipe.id}/revisions/1/restore`).set('If-Match', `"${version}"`);

    await restore(1).expect(412);
    const { body } = await restore(2).expect(200);

    expect(body).toMatchObject({ revision: 3, version: 3, document: { title: 'First', headnote: 'As it was.' } });
    const { body: history } = await editor.get(`/api/recipes/${recipe.id}/revisions`).expect(200);
    expect(history.revisions.map(({ note }: { note: string }) => note)).toEqual(['Restored from revision 1', '', '']);
    await editor.get(`/api/recipes/${recipe.id}/revisions/2`).expect(200);
    await editor.get(`/api/recipes/${recipe.id}/revisions/4`).expect(404);
  });

  it('never changes once it is saved', async () => {
    const recipe = await makeRecipe(api.db);
    await expect(api.db('revisions').where({ recipe_id: recipe.id }).update({ note: 'other' })).rejects.toThrow(
      'never changes',
    );
  });
});

describe('the list', () => {
  it('narrows by kind, state and the beginnings of words', async () => {
    await makeRecipe(api.db, { title: 'Quince & Cobnut Ratafia', kind: 'liqueur', state: 'on-trial' });
    await makeRecipe(api.db, { title: 'Quince shrub', kind: 'shrub' });
    const titles = async (query: string) => {
      const { body } = await editor.get(`/api/recipes?${query}`).expect(200);
      expect(body.total).toBe(body.recipes.length);
      return body.recipes.map(({ title }: { title: string }) => title).sort();
    };

    expect(await titles('find=quin')).toEqual(['Quince & Cobnut Ratafia', 'Quince shrub']);
    expect(await titles('find=rata%20quince')).toEqual(['Quince & Cobnut Ratafia']);
    expect(await titles('find=quince&kind=shrub')).toEqual(['Quince shrub']);
    expect(await titles('find=quince&state=on-trial')).toEqual(['Quince & Cobnut Ratafia']);
    expect(await titles('find=%27%20%7C%20!(&kind=liqueur')).toEqual([]);
    await editor.get('/api/recipes?kind=soup').expect(400);
  });

  it('counts the queries that are open', async () => {
    const recipe = await makeRecipe(api.db, { title: 'Counted' });
    const { id } = await makePerson(api.db, { roles: ['editor'] });
    for (const state of ['open', 'open', 'answered', 'closed'] as const)
      await api.db('recipe_queries').insert({ recipe_id: recipe.id, question: 'How much?', asked_by: id, state });

    const { body } = await editor.get('/api/recipes?find=counted').expect(200);

    expect(body.recipes).toMatchObject([{ id: recipe.id, openQueries: 2, missing: ['lead-plate'], revision: 1 }]);
  });

  it('notices that a lead plate has been given its words', async () => {
    const plate = await makePlate(api.db, { alt: '' });
    const recipe = await makeRecipe(api.db, { title: 'Wordless', leadPlateId: plate.id });
    expect(recipe.missing).toEqual(['lead-plate-alt']);

    await editor
      .put(`/api/plates/${plate.id}`)
      .set('If-Match', '"1"')
      .send({ alt: 'A coupe on slate', caption: '', credit: '' })
      .expect(200);

    const { body } = await editor.get('/api/recipes?find=wordless').expect(200);
    expect(body.recipes[0].missing).toEqual([]);
  });
});

it('is closed to members and to visitors', async () => {
  const recipe = await makeRecipe(api.db, { headnote: 'canary' });
  const member = await api.as({});
  for (const path of [
    '',
    `/${recipe.id}`,
    `/${recipe.id}/revisions`,
    `/${recipe.id}/revisions/1`,
    `/${recipe.id}/queries`,
  ]) {
    const asMember = await member.get(`/api/recipes${path}`).expect(403);
    const asVisitor = await api.visitor().get(`/api/recipes${path}`).expect(401);
    expect(asMember.text + asVisitor.text).not.toContain('canary');
  }
  await save(member, recipe.id, 1, makeDocument()).expect(403);
});
