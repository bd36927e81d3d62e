import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import supertest from 'supertest';
import type TestAgent from 'supertest/lib/agent.js';
import { afterAll, beforeAll } from 'vitest';
import { makeApp } from '../../server/app.ts';
import { makeContext, type AppContext } from '../../server/context.ts';
import { readSettings } from '../../server/settings.ts';
import { useDatabase, type TestDatabase } from './database.ts';
import { makePerson, PASSWORD, type PersonWish } from './people.ts';

export const PUBLIC_URL = 'http://house.example';

export interface TestApi extends TestDatabase {
  ctx: AppContext;
  /** The address of the listening server. */
  origin: string;
  /** A browser of nobody: cookies kept, `Origin` sent. */
  visitor: () => TestAgent;
  /** A browser of a new person with these roles (or wishes), signed in and past the age check. */
  as: (wish: PersonWish) => Promise<TestAgent>;
}

/** The whole house behind HTTP on a database of its own, without worker; filled in before the first test. */
export function useApi(env: Record<string, string> = {}, overrides: Partial<AppContext> = {}): TestApi {
  const api = useDatabase() as TestApi;
  let close = async (): Promise<void> => undefined;

  beforeAll(async () => {
    const dataDir = await mkdtemp(join(tmpdir(), 'steep-files-'));
    api.ctx = makeContext(testSettings({ DATABASE_URL: api.url, DATA_DIR: dataDir, ...env }), {
      db: api.db,
      ...overrides,
    });
    const app = makeApp(api.ctx);
    const server = await listen(app.express);
    api.origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
    api.visitor = () => supertest.agent(api.origin).set('Origin', PUBLIC_URL);
    api.as = async (wish) => {
      const person = await makePerson(api.db, wish);
      const agent = api.visitor();
      await agent.post('/api/session').send({ email: person.email, password: PASSWORD }).expect(200);
      return agent;
    };
    close = async () => {
      await new Promise((resolve) => server.close(resolve));
      await app.close();
      await rm(dataDir, { recursive: true, force: true });
    };
  });
  afterAll(() => close());
  return api;
}

/** Settings as a test needs them; `env` overrides each. */
export function testSettings(env: Record<string, string>) {
  return readSettings({
    MODE: 'test',
    PORT: '0',
    SESSION_SECRET: 'a secret that only tests know, long enough',
    STRIPE_SECRET_KEY: 'sk_test_nobody',
    STRIPE_WEBHOOK_SECRET: 'whsec_nobody',
    STRIPE_API_BASE: 'http://127.0.0.1:9',
    SMTP_URL: 'smtp://127.0.0.1:9',
    PUBLIC_URL,
    ...env,
  });
}

function listen(app: ReturnType<typeof makeApp>['express']): Promise<Server> {
  return new Promise((resolve, reject) => {
    const server = app.listen(0, '127.0.0.1', (error?: Error) => (error ? reject(error) : resolve(server)));
  });
}
