import { expect, it } from 'vitest';
import { allRoutes } from '../../server/routes.ts';
import { useApi } from '../support/api.ts';

const api = useApi();

interface Described {
  openapi: string;
  paths: Record<
    string,
    Record<string, { operationId: string; parameters: { name: string; in: string; required: boolean }[] }>
  >;
}

it('describes every route of the registry, its path parameters, and the version that a change must name', async () => {
  const { body } = await api.visitor().get('/api/openapi.json').expect(200);
  const { openapi, paths } = body as Described;
  expect(openapi).toBe('3.1.0');
  const operations = Object.entries(paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, { operationId }]) => `${operationId} ${method} ${path}`),
  );
  const registered = allRoutes.map(({ id, method, path }) => `${id} ${method} ${path.replace(/:(\w+)/g, '{$1}')}`);
  expect(operations.sort()).toEqual(registered.sort());

  for (const { path, method, versioned } of allRoutes) {
    const { parameters } = paths[path.replace(/:(\w+)/g, '{$1}')]![method]!;
    const named = parameters.filter((parameter) => parameter.in === 'path').map(({ name }) => name);
    expect(named.sort()).toEqual([...path.matchAll(/:(\w+)/g)].map((match) => match[1]!).sort());
    expect(parameters.some(({ name, required }) => name === 'If-Match' && required)).toBe(versioned === 'required');
  }
});

it('answers what is not there, and what cannot be read, as problem details (RFC 9457)', async () => {
  const missing = await api.visitor().get('/api/nowhere').expect(404);
  expect(missing.headers['content-type']).toContain('application/problem+json');
  expect(missing.body).toMatchObject({ status: 404, code: 'request.not_found', instance: '/api/nowhere' });

  const torn = await api.visitor().post('/api/session').type('json').send('{"email":').expect(400);
  expect(torn.body.code).toBe('request.invalid');
  const unknown = await api
    .visitor()
    .post('/api/session')
    .send({ email: 'a@b.example', password: 'x', colour: 'red' })
    .expect(400);
  expect(unknown.body.faults).toEqual([{ path: 'colour', message: 'This field is not known here.' }]);
});

it('sends a strict content-security policy and no sign of its make', async () => {
  const { headers } = await api.visitor().get('/api/imprint').expect(200);
  expect(headers['content-security-policy']).toContain("default-src 'none'");
  expect(headers['content-security-policy']).toMatch(/script-src 'self'(;|$)/);
  expect(headers['x-powered-by']).toBeUndefined();
});
