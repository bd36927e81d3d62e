import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, it } from 'vitest';
import { RECIPE_STATES, type RecipeState, type Role } from '../../shared/contracts/words.ts';
import { useApi } from '../support/api.ts';
import { makeDocument, makeLine, makePlate, makeRecipe, makeStep, type RecipeWish } from '../support/factories.ts';

const api = useApi();
const staff = {} as Record<Role, TestAgent>;
let ready: RecipeWish;

beforeAll(async () => {
  for (const role of ['creator', 'editor', 'admin'] as const) staff[role] = await api.as({ roles: [role] });
  ready = { leadPlateId: (await makePlate(api.db)).id };
});

const move = (agent: TestAgent, id: string, to: string, version = 1) =>
  agent.post(`/api/recipes/${id}/state`).set('If-Match', `"${version}"`).send({ to });

const ask = async (recipeId: string, question = 'How much bay?') => {
  const { body } = await staff.editor.post(`/api/recipes/${recipeId}/queries`).send({ question }).expect(201);
  return (body as { id: string }).id;
};

/** The path of a recipe as the house describes it; `editor` lacks what only creator and admin may do. */
const PATH: Record<RecipeState, { all: RecipeState[]; issuers: RecipeState[] }> = {
  draft: { all: ['on-trial'], issuers: ['withdrawn'] },
  'on-trial': { all: ['draft', 'with-editor'], issuers: ['withdrawn'] },
  'with-editor': { all: ['on-trial', 'cleared'], issuers: ['withdrawn'] },
  cleared: { all: ['with-editor'], issuers: ['withdrawn'] },
  out: { all: [], issuers: ['withdrawn'] },
  withdrawn: { all: [], issuers: ['draft'] },
};

function expectedStatus(from: RecipeState, to: RecipeState, role: Role): number {
  if (PATH[from].all.includes(to)) return 200;
  if (!PATH[from].issuers.includes(to)) return 409;
  return role === 'editor' ? 403 : 200;
}

describe.each(['creator', 'editor', 'admin'] as const)('the path for a person who is %s', (role) => {
  it.each(RECIPE_STATES)('from %s', async (from) => {
    for (const to of RECIPE_STATES) {
      const recipe = await makeRecipe(api.db, { ...ready, state: from });
      const answer = await move(staff[role], recipe.id, to);
      expect({ to, status: answer.status }).toEqual({ to, status: expectedStatus(from, to, role) });
      const { body } = await staff[role].get(`/api/recipes/${recipe.id}`).expect(200);
      expect(body).toMatchObject(answer.status === 200 ? { state: to, version: 2 } : { state: from, version: 1 });
      if (answer.status === 409) expect(answer.body.code).toBe('recipes.transition_refused');
      if (answer.status === 403) expect(answer.body.code).toBe('access.role');
    }
  });

  it.each(RECIPE_STATES)('offers from %s what it would let through', async (from) => {
    const recipe = await makeRecipe(api.db, { ...ready, state: from });
    const { body } = await staff[role].get(`/api/recipes/${recipe.id}`).expect(200);
    const open = RECIPE_STATES.filter((to) => expectedStatus(from, to, role) === 200);
    expect([...(body.transitions as RecipeState[])].sort()).toEqual([...open].sort());
  });
});

describe('clearing', () => {
  it('is refused with the fields that are missing', async () => {
    const lines = [makeLine({ amount: null, unit: null }), makeLine({ optional: true, amount: null, unit: null })];
    const bare: RecipeWish = { kind: 'syrup', headnote: '  ', steps: [], lines, state: 'with-editor' };
    const recipe = await makeRecipe(api.db, {
      ...bare,
      yield: { stated: null, measured: null, servings: null, servingSize: null },
    });

    const answer = await move(staff.admin, recipe.id, 'cleared');

    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({
      code: 'recipes.incomplete',
      context: { missing: ['headnote', 'amounts', 'steps', 'yield', 'keeping', 'lead-plate'] },
    });
    expect(answer.body.faults.map(({ path }: { path: string }) => path)).toEqual([
      'document.headnote',
      'document.sections',
      'document.steps',
      'document.yield',
      'document.keeping',
      'document.leadPlateId',
    ]);
  });

  it('asks that the lead plate has its alt text', async () => {
    const plate = await makePlate(api.db, { alt: ' ' });
    const recipe = await makeRecipe(api.db, { leadPlateId: plate.id, state: 'with-editor' });

    const answer = await move(staff.editor, recipe.id, 'cleared');

    expect(answer.body).toMatchObject({ code: 'recipes.incomplete', context: { missing: ['lead-plate-alt'] } });
  });

  it('lets lines without amounts pass that are to taste, and a technique without lines', async () => {
    const seasoned = makeLine({ amount: null, unit: null, scaling: { rule: 'to-taste' } });
    const drink = await makeRecipe(api.db, { ...ready, lines: [makeLine(), seasoned], state: 'with-editor' });
    await move(staff.creator, drink.id, 'cleared').expect(200);

    const technique = await makeRecipe(api.db, {
      ...ready,
      ...{ kind: 'technique', lines: [], steps: [makeStep()], state: 'with-editor' },
      yield: { stated: null, measured: null, servings: null, servingSize: null },
    });
    await move(staff.creator, technique.id, 'cleared').expect(200);
  });

  it('is refused while a query is open, and goes on once it is answered', async () => {
    const recipe = await makeRecipe(api.db, { ...ready, state: 'with-editor' });
    const query = await ask(recipe.id, 'Fresh bay or dried?');

    const answer = await move(staff.editor, recipe.id, 'cleared');
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({
      code: 'recipes.queries_open',
      context: { questions: ['Fresh bay or dried?'] },
    });

    await staff.creator.post(`/api/queries/${query}/answer`).send({ answer: 'Fresh.' }).expect(200);
    await move(staff.editor, recipe.id, 'cleared').expect(200);
  });

  it('of a recipe that somebody saved meanwhile is refused', async () => {
    const recipe = await makeRecipe(api.db, { ...ready, state: 'with-editor' });
    const document = makeDocument({ headnote: 'Other words.' });
    await staff.creator.put(`/api/recipes/${recipe.id}`).set('If-Match', '"1"').send({ document }).expect(200);

    const answer = await move(staff.editor, recipe.id, 'cleared', 1);

    expect(answer.status).toBe(412);
    expect(answer.body.context).toMatchObject({ version: 2, revision: 2 });
  });
});

describe('queries in the margin', () => {
  it('are asked, answered and closed by name', async () => {
    const creator = await api.as({ roles: ['creator'], name: 'Cato' });
    const editor = await api.as({ roles: ['editor'], name: 'Edda' });
    const recipe = await makeRecipe(api.db);
    const asked = await editor.post(`/api/recipes/${recipe.id}/queries`).send({ question: 'Which gin?' }).expect(201);
    expect(asked.body).toMatchObject({ state: 'open', question: 'Which gin?', askedBy: 'Edda', answer: null });

    const path = `/api/queries/${asked.body.id as string}`;
    const answered = await creator.post(`${path}/answer`).send({ answer: 'A dry one.' }).expect(200);
    expect(answered.body).toMatchObject({ state: 'answered', answer: 'A dry one.', answeredBy: 'Cato' });

    await creator.post(`${path}/close`).expect(403);
    const closed = await editor.post(`${path}/close`).expect(200);
    expect(closed.body).toMatchObject({ state: 'closed', answer: 'A dry one.' });

    const late = await creator.post(`${path}/answer`).send({ answer: 'No, a wet one.' });
    expect(late.status).toBe(409);
    expect(late.body.code).toBe('queries.state_refused');
    const { body } = await creator.get(`/api/recipes/${recipe.id}/queries`).expect(200);
    expect(body.queries).toEqual([closed.body]);
  });

  it('are refused where there is no such recipe or query', async () => {
    const nowhere = '00000000-0000-4000-8000-000000000000';
    await staff.editor.get(`/api/recipes/${nowhere}/queries`).expect(404);
    await staff.editor.post(`/api/recipes/${nowhere}/queries`).send({ question: 'Who?' }).expect(404);
    const answer = await staff.editor.post(`/api/queries/${nowhere}/answer`).send({ answer: 'Nobody.' });
    expect(answer.body.code).toBe('queries.not_found');
  });
});
