import { z } from 'zod';
import { problem } from '../../shared/contracts/errors.ts';
import type { AccessRule, Route } from './registry.ts';

type Json = Record<string, unknown>;

const WHO: Record<AccessRule, string> = {
  anyone: 'Anyone.',
  reader: 'Readers past the age check; the gate decides what they get.',
  account: 'Whoever is signed in.',
  staff: 'Creator, editor or admin.',
  issuer: 'Creator or admin.',
  admin: 'Admin.',
  signed: 'The payment service, by its signature.',
  'local-demo': 'The demonstration, from the same machine.',
};

/** The API as OpenAPI 3.1, made from the registered routes. */
export function describeApi(routes: readonly Route[]): Json {
  const paths: Record<string, Json> = {};
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: describeRoute(route) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Steep & Bind',
      version: '1',
      description: 'A members’ book of drinks: workroom, reading room, office.',
    },
    paths,
    components: {
      schemas: { Problem: schemaOf(problem) },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'steep' } },
    },
  };
}

function describeRoute(route: Route): Json {
  return {
    operationId: route.id,
    summary: route.summary,
    description: WHO[route.access],
    ...(route.access === 'anyone' || route.access === 'signed' ? {} : { security: [{ session: [] }] }),
    parameters: [
      ...parametersOf(route.params, 'path'),
      ...parametersOf(route.query, 'query'),
      ...(route.versioned === 'required'
        ? [{ name: 'If-Match', in: 'header', required: true, schema: { type: 'string' } }]
        : []),
    ],
    ...bodyOf(route),
    responses: {
      [route.status ?? 200]: { description: 'Done.', content: answerOf(route) },
      default: {
        description: 'Refused.',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  };
}

function bodyOf(route: Route): Json {
  if (route.upload) {
    const schema = {
      type: 'object',
      additionalProperties: { type: 'string', contentMediaType: 'application/octet-stream' },
    };
    return { requestBody: { required: true, content: { 'multipart/form-data': { schema } } } };
  }
  if (!route.body) return {};
  return {
    requestBody: { required: true, content: { 'application/json': { schema: schemaOf(route.body, 'input') } } },
  };
}

function answerOf(route: Route): Json {
  if (route.answer === 'file') return { 'application/octet-stream': {} };
  return { 'application/json': { schema: schemaOf(route.answer) } };
}

function parametersOf(contract: z.ZodType | undefined, place: 'path' | 'query'): Json[] {
  if (!contract) return [];
  const { properties = {}, required = [] } = schemaOf(contract, 'input') as { properties?: Json; required?: string[] };
  return Object.entries(properties).map(([name, schema]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema,
  }));
}

function schemaOf(contract: z.ZodType, io: 'input' | 'output' = 'output'): Json {
  const { $schema: _dialect, ...schema } = z.toJSONSchema(contract, { io, unrepresentable: 'any' }) as Json;
  return schema;
}
