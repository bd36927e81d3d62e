import supertest from 'supertest';
import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, it } from 'vitest';
import { allRoutes } from '../../server/routes.ts';
import type { Role } from '../../shared/contracts/words.ts';
import { PUBLIC_URL, useApi } from '../support/api.ts';
import { makeLine, makeStep } from '../support/factories.ts';
import { makeIssuedBook, makePicture } from '../support/issued-book.ts';
import { makeMembership, type MembershipWish } from '../support/members.ts';
import { makePerson, PASSWORD } from '../support/people.ts';

/** Stands in every field of a gated recipe that a teaser keeps back, and in what only staff may see. */
const CANARY = 'quillfeather';

/**
 * What each route is for, stated here by hand: a route that is not listed, or whose rule differs, fails. `reader` routes
 * are walked a second time, by what the gate lets each viewer see.
 */
const EXPECTED: Record<string, string> = {
  readSession: 'anyone',
  signIn: 'anyone',
  signOut: 'anyone',
  confirmAge: 'anyone',
  listDemoAccounts: 'anyone',
  register: 'anyone',
  verifyEmail: 'anyone',
  resendVerification: 'account',
  forgotPassword: 'anyone',
  resetPassword: 'anyone',
  changePassword: 'account',
  changeName: 'account',
  startEmailChange: 'account',
  confirmEmailChange: 'anyone',
  listPeople: 'admin',
  changeRoles: 'admin',
  readImprint: 'anyone',
  readImprintSettings: 'admin',
  saveImprintSettings: 'admin',
  listLarder: 'staff',
  listPlates: 'staff',
  keepPlates: 'staff',
  readPlate: 'staff',
  savePlateWords: 'staff',
  removePlate: 'staff',
  readRendition: 'staff',
  listShoots: 'staff',
  makeShoot: 'staff',
  readShoot: 'staff',
  saveShoot: 'staff',
  uploadNotes: 'staff',
  pasteNotes: 'staff',
  readDraft: 'staff',
  listRecipes: 'staff',
  startRecipe: 'staff',
  readRecipe: 'staff',
  saveRecipe: 'staff',
  moveRecipe: 'staff',
  listRevisions: 'staff',
  readRevision: 'staff',
  restoreRevision: 'staff',
  listRecipeQueries: 'staff',
  raiseQuery: 'staff',
  answerQuery: 'staff',
  closeQuery: 'staff',
  listBooks: 'staff',
  makeBook: 'staff',
  readBook: 'staff',
  saveBook: 'staff',
  saveRunningOrder: 'staff',
  addChapter: 'staff',
  saveChapter: 'staff',
  removeChapter: 'staff',
  placeRecipe: 'staff',
  setRecipeAccess: 'staff',
  takeRecipeOut: 'staff',
  listEditions: 'staff',
  pressEdition: 'staff',
  readEdition: 'staff',
  issueEdition: 'issuer',
  releaseLeaf: 'issuer',
  readShelf: 'anyone',
  readCover: 'anyone',
  readContents: 'reader',
  readBookRecipe: 'reader',
  readBookPlate: 'reader',
  downloadEpub: 'reader',
  readGalley: 'staff',
  readGalleyRecipe: 'staff',
  listTiers: 'anyone',
  listOfficeTiers: 'admin',
  makeTier: 'admin',
  saveTier: 'admin',
  closeTier: 'admin',
  startCheckout: 'account',
  finishCheckout: 'account',
  receivePaymentEvent: 'signed',
  convergeMember: 'admin',
  readAccount: 'account',
  cancelMembership: 'account',
  resumeMembership: 'account',
  changeCard: 'account',
  listCaughtLetters: 'local-demo',
  describeApi: 'anyone',
};

interface WalkedViewer {
  name: string;
  roles?: Role[];
  verified?: boolean;
  visitor?: true;
  membership?: MembershipWish;
  /** Whether the gate opens a recipe of tier 2 to them. */
  opens: boolean;
}

const past = new Date(Date.now() - 86_400_000);
const VIEWERS: WalkedViewer[] = [
  { name: 'visitor', visitor: true, opens: false },
  { name: 'unverified account', verified: false, opens: false },
  { name: 'verified account', opens: false },
  { name: 'member of tier 1', membership: { rank: 1 }, opens: false },
  { name: 'member of tier 2, active', membership: { rank: 2 }, opens: true },
  { name: 'member of tier 2, trialing', membership: { rank: 2, state: 'trialing', paidUntil: null }, opens: true },
  {
    name: 'member of tier 2, past due in grace',
    membership: { rank: 2, state: 'past_due', pastDueSince: past },
    opens: true,
  },
  {
    name: 'member of tier 2, past due beyond grace',
    membership: { rank: 2, state: 'past_due', pastDueSince: new Date(Date.now() - 30 * 86_400_000) },
    opens: false,
  },
  {
    name: 'member of tier 2, cancelled within the paid period',
    membership: { rank: 2, state: 'canceled', endsAt: past },
    opens: true,
  },
  {
    name: 'member of tier 2, cancelled and over',
    membership: { rank: 2, state: 'canceled', endsAt: past, paidUntil: past },
    opens: false,
  },
  { name: 'member of tier 3', membership: { rank: 3 }, opens: true },
  { name: 'editor', roles: ['editor'], opens: true },
  { name: 'creator', roles: ['creator'], opens: true },
  { name: 'admin', roles: ['admin'], opens: true },
];

const api = useApi();
const agents = new Map<string, TestAgent>();
const ids: Record<string, string> = {};

beforeAll(async () => {
  const lead = await makePicture(api.ctx);
  const inside = await makePicture(api.ctx, { alt: `${CANARY} in the step` });
  const { book, chapter, recipes, edition } = await makeIssuedBook(api.ctx, {
    slug: 'walked',
    access: { kind: 'tier', rank: 2 },
    introduction: `A ${CANARY} in the introduction.`,
    coverPlateId: lead.id,
    recipes: [
      {
        slug: 'kept-back',
        title: 'Kept back',
        method: `${CANARY} method`,
        glass: `${CANARY} glass`,
        ice: `${CANARY} ice`,
        garnish: `${CANARY} garnish`,
        tags: [CANARY],
        tips: `A ${CANARY} tip`,
        variations: `A ${CANARY} variation`,
        leadPlateId: lead.id,
        lines: [makeLine({ name: `${CANARY} water`, prep: CANARY, note: CANARY, source: { cue: 7, startMs: 1234 } })],
        steps: [makeStep({ text: `Pour the ${CANARY}.`, tools: [CANARY], plateId: inside.id, duration: null })],
        keeping: { place: 'refrigerator', days: { min: 7, max: 7 }, temperature: null, basis: 'stated', note: CANARY },
      },
    ],
  });
  const creator = await makePerson(api.db, { roles: ['creator'] });
  const [shoot] = await api.db
    .table('shoots')
    .insert({
      title: 'A day',
      shot_on: '2026-11-02',
      notes_text: CANARY,
      cues: JSON.stringify([{ index: 0, startMs: 0, endMs: null, text: CANARY }]) as never,
      created_by: creator.id,
    })
    .returning('id');
  const [query] = await api.db
    .table('recipe_queries')
    .insert({ recipe_id: recipes[0]!.id, question: `Which ${CANARY}?`, asked_by: creator.id })
    .returning('id');
  Object.assign(ids, {
    book: book.id,
    chapter: chapter.id,
    recipe: recipes[0]!.id,
    edition: edition.id,
    plate: lead.id,
    inside: inside.id,
    shoot: shoot!.id,
    query: query!.id,
    person: creator.id,
    tier: (await api.db('tiers').first('id'))?.id ?? ids.book,
  });
  for (const viewer of VIEWERS) agents.set(viewer.name, await agentOf(viewer));
});

async function agentOf({ visitor, membership, roles = [], verified = true }: WalkedViewer): Promise<TestAgent> {
  const agent = supertest.agent(api.origin).set('Origin', PUBLIC_URL);
  if (visitor) await agent.post('/api/session/age').send({ oldEnough: true }).expect(200);
  else {
    const person = await makePerson(api.db, { roles, verified });
    if (membership) await makeMembership(api.db, person.id, membership);
    await agent.post('/api/session').send({ email: person.email, password: PASSWORD }).expect(200);
  }
  return agent;
}

/** The address of a route with every parameter pointing at the walked recipe and what belongs to it. */
function addressOf(path: string): string {
  const byPlace: [RegExp, string][] = [
    [/^\/api\/shoots/, 'shoot'],
    [/^\/api\/recipes/, 'recipe'],
    [/^\/api\/queries/, 'query'],
    [/^\/api\/plates/, 'plate'],
    [/^\/api\/bindery\/chapters/, 'chapter'],
    [/^\/api\/bindery\/editions/, 'edition'],
    [/^\/api\/bindery\/books/, 'book'],
    [/^\/api\/office\/(people|members)/, 'person'],
    [/^\/api\/office\/tiers/, 'tier'],
  ];
  const own = byPlace.find(([pattern]) => pattern.test(path))?.[1] ?? 'recipe';
  return path
    .replace('/api/reading/:book', '/api/reading/walked')
    .replace(/\/galley\/:recipe|(?<=walked)\/:recipe/, (part) => part.replace(':recipe', 'kept-back'))
    .replace(':recipe', ids.recipe!)
    .replace(':number', '1')
    .replace(':rendition', 'large.jpeg')
    .replace(/:(id|personId)/, ids[own]!)
    .replace(':plate', ids.plate!);
}

/** Whether a rule lets a viewer through to the handler. */
function admits(rule: string, { visitor, roles = [] }: WalkedViewer): boolean {
  switch (rule) {
    case 'account':
      return visitor !== true;
    case 'staff':
      return roles.length > 0;
    case 'issuer':
      return roles.some((role) => role !== 'editor');
    case 'admin':
      return roles.includes('admin');
    case 'local-demo':
      return false;
    default:
      return true;
  }
}

const mutates = (method: string) => method !== 'get';

describe('every registered route', () => {
  it('has a stated expectation, and no expectation is left without its route', () => {
    expect(Object.fromEntries(allRoutes.map(({ id, access }) => [id, access]))).toEqual(EXPECTED);
  });

  describe.each(VIEWERS)('as $name', (viewer) => {
    // What would change or end something is only tried by those it must refuse.
    const walked = allRoutes.filter((route) => !mutates(route.method) || !admits(route.access, viewer));

    it.each(walked)('$method $path ($access)', async (route) => {
      const response = await agents.get(viewer.name)![route.method](addressOf(route.path)).buffer(true);
      const said = `${response.text ?? ''}${String(response.body)}${JSON.stringify(response.headers)}`;
      if (admits(route.access, viewer)) expect([401, 403, 500]).not.toContain(response.status);
      else expect([401, 403, 404]).toContain(response.status);
      if (!viewer.opens) expect(said).not.toContain(CANARY);
    });
  });
});

describe('the gate on the walked recipe', () => {
  it.each(VIEWERS)('$name: open is $opens', async ({ name, opens }) => {
    const agent = agents.get(name)!;
    const read = await agent.get('/api/reading/walked/kept-back').expect(200);
    expect(read.body.view).toBe(opens ? 'open' : 'teaser');
    // The canary must be able to sing, or its silence says nothing.
    expect(read.text.includes(CANARY)).toBe(opens);

    const large = `/api/reading/walked/kept-back/plates/${ids.plate}/large.jpeg`;
    const step = `/api/reading/walked/kept-back/plates/${ids.inside}/small.jpeg`;
    const small = `/api/reading/walked/kept-back/plates/${ids.plate}/small.jpeg`;
    await agent.get(large).expect(opens ? 200 : 404);
    await agent.get(step).expect(opens ? 200 : 404);
    await agent.get(small).expect(200);
    await agent.get('/api/reading/walked/files/epub').expect(opens ? 200 : 404);
  });

  it('answers a closed plate, one of nobody and one of another recipe alike', async () => {
    const agent = agents.get('member of tier 1')!;
    const answers = await Promise.all(
      [
        `plates/${ids.plate}/large.jpeg`,
        `plates/${crypto.randomUUID()}/large.jpeg`,
        `plates/${ids.inside}/small.jpeg`,
      ].map((plate) => agent.get(`/api/reading/walked/kept-back/${plate}`)),
    );
    const shapes = answers.map(({ status, body }) => ({ status, code: body.code, title: body.title }));
    expect(new Set(shapes.map((shape) => JSON.stringify(shape))).size).toBe(1);
  });

  it('asks everyone but staff for their age first', async () => {
    const young = api.visitor();
    const refused = await young.get('/api/reading/walked/kept-back').expect(403);
    expect(refused.body.code).toBe('age.unconfirmed');
    expect(refused.text).not.toContain('Kept back');
    await young.get('/api/shelf').expect(200);
  });

  it('lets staff look as a visitor or as a tier, and nobody else', async () => {
    const as = async (name: string, rank: number) =>
      (await agents.get(name)!.get(`/api/reading/walked/kept-back?as=${rank}`)).body.view;
    expect(await as('editor', 0)).toBe('teaser');
    expect(await as('editor', 1)).toBe('teaser');
    expect(await as('editor', 2)).toBe('open');
    expect(await as('member of tier 1', 3)).toBe('teaser');
  });

  it('hides a withdrawn recipe from every reader at once, and only from readers', async () => {
    await api.db('recipes').where({ id: ids.recipe! }).update({ state: 'withdrawn', withdrawn_at: new Date() });
    try {
      await agents.get('member of tier 3')!.get('/api/reading/walked/kept-back').expect(404);
      await agents.get('creator')!.get('/api/reading/walked/kept-back').expect(200);
      const contents = await agents.get('member of tier 3')!.get('/api/reading/walked').expect(200);
      expect(contents.text).not.toContain('kept-back');
      // Taken up again as a draft, what was released before stays hidden until the next release.
      await api.db('recipes').where({ id: ids.recipe! }).update({ state: 'draft' });
      await agents.get('member of tier 3')!.get('/api/reading/walked/kept-back').expect(404);
    } finally {
      await api.db('recipes').where({ id: ids.recipe! }).update({ state: 'out', withdrawn_at: null });
    }
  });
});
