import { describe, expect, it } from 'vitest';
import { useApi } from '../support/api.ts';
import { makePerson, PASSWORD } from '../support/people.ts';

const api = useApi();

/** The last letter of a kind, as it waits to be sent. */
async function lastLetter(kind: string, to: string): Promise<{ link: string }> {
  const row = await api
    .db('letters')
    .where({ kind: kind as never, recipient: to })
    .orderBy('created_at', 'desc')
    .first();
  return row?.fields as { link: string };
}

function tokenOf(link: string): string {
  return new URL(link).searchParams.get('token')!;
}

describe('registering', () => {
  it('signs the new account in, unverified, and writes a letter whose link confirms the address once', async () => {
    const browser = api.visitor();
    const draft = { name: 'Ada Low', email: 'Ada@House.example', password: 'ten characters' };
    const made = await browser.post('/api/people/register').send(draft).expect(201);
    expect(made.body.user).toMatchObject({ email: 'ada@house.example', verified: false, roles: [] });

    const { link } = await lastLetter('verify', 'ada@house.example');
    await api
      .visitor()
      .post('/api/people/verify')
      .send({ token: tokenOf(link) })
      .expect(200);
    await api
      .visitor()
      .post('/api/people/verify')
      .send({ token: tokenOf(link) })
      .expect(410);

    const session = await browser.get('/api/session').expect(200);
    expect(session.body.user.verified).toBe(true);
  });

  it('refuses a short password and a second account at their fields', async () => {
    const short = { name: 'Bo', email: 'bo@house.example', password: 'short' };
    const refused = await api.visitor().post('/api/people/register').send(short).expect(400);
    expect(refused.body).toMatchObject({ code: 'request.invalid', faults: [{ path: 'password' }] });

    const { email } = await makePerson(api.db);
    const twice = { name: 'Bo', email, password: 'ten characters' };
    const taken = await api.visitor().post('/api/people/register').send(twice).expect(409);
    expect(taken.body.code).toBe('people.email_taken');
  });
});

describe('signing in', () => {
  it('changes the number of the session, keeps what the visitor said of their age, and ends at sign-out', async () => {
    const { email } = await makePerson(api.db, { ageConfirmed: false });
    const browser = api.visitor();
    const before = await browser.post('/api/session/age').send({ oldEnough: true }).expect(200);
    const after = await browser.post('/api/session').send({ email, password: PASSWORD }).expect(200);
    expect(after.body.ageConfirmed).toBe(true);
    expect(after.headers['set-cookie']![0]!.split(';')[0]).not.toBe(before.headers['set-cookie']![0]!.split(';')[0]);
    expect(after.headers['set-cookie']![0]).toMatch(/HttpOnly; SameSite=Lax/);

    await browser.delete('/api/session').expect(200);
    expect((await browser.get('/api/session')).body.user).toBeNull();
  });

  it('counts failures only, and makes the next try wait after five of them, in whichever process they came', async () => {
    const { email } = await makePerson(api.db);
    for (let tries = 0; tries < 5; tries += 1)
      await api.visitor().post('/api/session').send({ email, password: 'wrong' }).expect(401);
    const refused = await api.visitor().post('/api/session').send({ email, password: PASSWORD }).expect(429);
    expect(refused.body.code).toBe('request.limited');
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
    expect(await api.db('failure_limits').whereLike('key' as never, `sign-in:${email}%`)).toHaveLength(1);
  });

  it('answers an unknown address as it answers a wrong password', async () => {
    const { email } = await makePerson(api.db);
    const known = await api.visitor().post('/api/session').send({ email, password: 'wrong' });
    const unknown = await api.visitor().post('/api/session').send({ email: 'nobody@house.example', password: 'wrong' });
    expect([known.status, known.body]).toEqual([unknown.status, unknown.body]);
  });
});

describe('a forgotten password', () => {
  it('is replaced by the letter’s link, which ends every session and works once', async () => {
    const { email } = await makePerson(api.db);
    const browser = api.visitor();
    await browser.post('/api/session').send({ email, password: PASSWORD }).expect(200);
    await api.visitor().post('/api/people/forgot').send({ email }).expect(200);
    await api.visitor().post('/api/people/forgot').send({ email: 'nobody@house.example' }).expect(200);

    const token = tokenOf((await lastLetter('reset', email)).link);
    await api.visitor().post('/api/people/reset').send({ token, password: 'another password' }).expect(200);
    await api.visitor().post('/api/people/reset').send({ token, password: 'a third password' }).expect(410);
    expect((await browser.get('/api/session')).body.user).toBeNull();
    await api.visitor().post('/api/session').send({ email, password: 'another password' }).expect(200);
  });
});

describe('changing the e-mail address', () => {
  it('asks the new address, tells both before and after, and wants the password', async () => {
    const { email } = await makePerson(api.db);
    const browser = api.visitor();
    await browser.post('/api/session').send({ email, password: PASSWORD }).expect(200);
    const wish = { email: 'moved@house.example', password: PASSWORD };
    await browser
      .post('/api/account/email')
      .send({ ...wish, password: 'wrong' })
      .expect(403);
    await browser.post('/api/account/email').send(wish).expect(200);
    expect((await browser.get('/api/session')).body.user.email).toBe(email);

    const token = tokenOf((await lastLetter('email-change', wish.email)).link);
    await api.visitor().post('/api/people/confirm-email').send({ token }).expect(200);
    expect((await browser.get('/api/session')).body.user.email).toBe(wish.email);
    const told = await api.db('letters').whereIn('kind', ['email-changing', 'email-changed']).pluck('recipient');
    expect(told.sort()).toEqual([email, email, wish.email].sort());
  });
});

describe('roles', () => {
  it('are given by an admin on the version they saw, and the last admin stays', async () => {
    const admin = await api.as({ roles: ['admin'], email: 'only-admin@house.example' });
    const { id } = await makePerson(api.db, { email: 'new-editor@house.example' });
    const given = await admin
      .put(`/api/office/people/${id}/roles`)
      .set('If-Match', '"1"')
      .send({ roles: ['editor'] })
      .expect(200);
    expect(given.body.roles).toEqual(['editor']);
    await admin.put(`/api/office/people/${id}/roles`).set('If-Match', '"1"').send({ roles: [] }).expect(412);
    await admin.put(`/api/office/people/${id}/roles`).send({ roles: [] }).expect(428);

    const { body } = await admin.get('/api/office/people?role=admin').expect(200);
    const last = await admin
      .put(`/api/office/people/${body.people[0].id}/roles`)
      .set('If-Match', `"${body.people[0].version}"`)
      .send({ roles: [] })
      .expect(409);
    expect(last.body.code).toBe('people.last_admin');
  });

  it('two admins who depose each other at once leave one', async () => {
    await api.db('people').update({ roles: [] });
    const pair = await Promise.all([
      makePerson(api.db, { roles: ['admin'] }),
      makePerson(api.db, { roles: ['admin'] }),
    ]);
    const browsers = await Promise.all(
      pair.map(async ({ email }) => {
        const browser = api.visitor();
        await browser.post('/api/session').send({ email, password: PASSWORD }).expect(200);
        return browser;
      }),
    );
    await Promise.all(
      browsers.map((browser, index) =>
        browser
          .put(`/api/office/people/${pair[1 - index]!.id}/roles`)
          .set('If-Match', '"1"')
          .send({ roles: [] }),
      ),
    );
    expect(await api.db('people').whereRaw(`'admin' = any (roles)`)).toHaveLength(1);
  });
});

describe('changes from elsewhere', () => {
  it('are refused without our own origin, whoever is signed in', async () => {
    const browser = await api.as({ roles: ['admin'] });
    const foreign = await browser.delete('/api/session').set('Origin', 'https://elsewhere.example').expect(403);
    expect(foreign.body.code).toBe('request.foreign_origin');
    expect((await browser.get('/api/session')).body.user).not.toBeNull();
  });
});
