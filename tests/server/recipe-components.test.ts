import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, it } from 'vitest';
import { loadComponentClosure } from '../../server/recipes/component-closure.ts';
import { findCurrentDocuments } from '../../server/recipes/recipes.queries.ts';
import { LARDER_BY_ID } from '../../shared/larder/index.ts';
import { useApi } from '../support/api.ts';
import { makeDocument, makeLine, makeRecipe } from '../support/factories.ts';

const api = useApi();
let editor: TestAgent;

beforeAll(async () => {
  editor = await api.as({ roles: ['editor'] });
});

const uses = (...ids: string[]) => ids.map((componentId) => makeLine({ componentId, name: 'a component' }));

const saveUsing = (id: string, title: string, ...used: string[]) =>
  editor
    .put(`/api/recipes/${id}`)
    .set('If-Match', '"1"')
    .send({ document: makeDocument({ title, lines: uses(...used) }) });

describe('references', () => {
  it('refuses what is not in the larder, at the line', async () => {
    const recipe = await makeRecipe(api.db);
    const document = makeDocument({ lines: [makeLine({ larderId: 'gin' }), makeLine({ larderId: 'moon-dust' })] });

    const answer = await editor.put(`/api/recipes/${recipe.id}`).set('If-Match', '"1"').send({ document });

    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({
      code: 'recipes.unknown_larder_item',
      faults: [{ path: 'document.sections.0.lines.1.larderId' }],
    });
  });

  it('refuses a component that is not there, at the line', async () => {
    const recipe = await makeRecipe(api.db);

    const answer = await saveUsing(recipe.id, 'Lost', '00000000-0000-4000-8000-000000000000');

    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({
      code: 'recipes.unknown_component',
      faults: [{ path: 'document.sections.0.lines.0.componentId' }],
    });
  });
});

describe('a ring of components', () => {
  it('is refused with the names of its recipes in order', async () => {
    const syrup = await makeRecipe(api.db, { title: 'Bay Syrup', kind: 'syrup' });
    const cordial = await makeRecipe(api.db, { title: 'Bay Cordial', kind: 'cordial', lines: uses(syrup.id) });
    const sour = await makeRecipe(api.db, { title: 'Bay Sour', lines: uses(cordial.id) });

    const answer = await saveUsing(syrup.id, 'Bay Syrup', sour.id);

    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({
      code: 'recipes.cycle',
      detail: 'Bay Syrup → Bay Sour → Bay Cordial → Bay Syrup',
      context: { names: ['Bay Syrup', 'Bay Sour', 'Bay Cordial'] },
    });
    const { body } = await editor.get(`/api/recipes/${syrup.id}`).expect(200);
    expect(body.version).toBe(1);
  });

  it('is refused where a recipe would go into itself', async () => {
    const recipe = await makeRecipe(api.db, { title: 'Solera' });
    const answer = await saveUsing(recipe.id, 'Solera', recipe.id);
    expect(answer.body).toMatchObject({ code: 'recipes.cycle', context: { names: ['Solera'] } });
  });

  it('is refused when an earlier revision would bring it back', async () => {
    const low = await makeRecipe(api.db, { title: 'Low' });
    const high = await makeRecipe(api.db, { title: 'High', lines: uses(low.id) });
    await saveUsing(high.id, 'High').expect(200);
    await saveUsing(low.id, 'Low', high.id).expect(200);

    const answer = await editor.post(`/api/recipes/${high.id}/revisions/1/restore`).set('If-Match', '"2"');

    expect(answer.body).toMatchObject({ code: 'recipes.cycle', context: { names: ['High', 'Low'] } });
  });

  it('is never made by eight saves at once that only together would close it', async () => {
    const ids: string[] = [];
    for (let number = 0; number < 8; number += 1) ids.push((await makeRecipe(api.db, { title: `Ring ${number}` })).id);

    const answers = await Promise.all(ids.map((id, at) => saveUsing(id, `Ring ${at}`, ids[(at + 1) % ids.length]!)));

    expect(answers.filter(({ status }) => status === 200)).toHaveLength(7);
    const refused = answers.filter(({ status }) => status !== 200);
    expect(refused).toHaveLength(1);
    expect(refused[0]!.body).toMatchObject({ code: 'recipes.cycle' });
    expect(refused[0]!.body.context.names).toHaveLength(8);
  });
});

describe('what a recipe is made of', () => {
  it('is loaded all the way down, each once', async () => {
    const sugar = await makeRecipe(api.db, { title: 'Sugar' });
    const syrup = await makeRecipe(api.db, { title: 'Syrup', lines: uses(sugar.id) });
    const shrub = await makeRecipe(api.db, { title: 'Shrub', lines: uses(syrup.id, sugar.id) });
    const punch = await makeRecipe(api.db, { title: 'Punch', lines: uses(shrub.id, syrup.id) });
    const { document } = (await findCurrentDocuments(api.db, [punch.id])).get(punch.id)!;

    const closure = await loadComponentClosure(api.db, [document]);

    expect([...closure.values()].map(({ title }) => title).sort()).toEqual(['Shrub', 'Sugar', 'Syrup']);
    expect([...closure.keys()].sort()).toEqual([sugar.id, syrup.id, shrub.id].sort());
  });

  it('gives its users new figures when it is saved', async () => {
    const base = await makeRecipe(api.db, { title: 'Base', kind: 'infusion', steps: [] });
    const drink = await makeRecipe(api.db, { title: 'Drink', lines: uses(base.id), steps: [] });
    const strengthOf = async () => {
      const { body } = await editor.get(`/api/recipes/${drink.id}`).expect(200);
      return { strength: body.figures.strength, version: body.version };
    };
    expect((await strengthOf()).strength.known).toBe(false);

    const lines = [makeLine({ larderId: 'gin', name: 'gin', amount: { min: 700, max: 700 } })];
    const document = makeDocument({ title: 'Base', kind: 'infusion', lines, steps: [] });
    await editor.put(`/api/recipes/${base.id}`).set('If-Match', '"1"').send({ document }).expect(200);

    const after = await strengthOf();
    expect(after.strength).toMatchObject({ known: true });
    expect(after.strength.min).toBeCloseTo(LARDER_BY_ID.get('gin')!.strength!.value, 1);
    expect(after.version).toBe(1);
  });
});
