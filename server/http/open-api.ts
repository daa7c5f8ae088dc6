import * as z from 'zod';
import { problem } from '../../shared/contracts/common';
import type { Route } from './route';

type JsonObject = Record<string, unknown>;

const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): JsonObject => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { target: 'draft-2020-12', io, unrepresentable: 'any' });
  return rest;
};

function parametersOf(route: Route): JsonObject[] {
  const described = (schema: z.ZodType | undefined, place: 'path' | 'query'): JsonObject[] => {
    const { properties = {}, required = [] } = (schema === undefined ? {} : schemaOf(schema, 'input')) as {
      properties?: Record<string, JsonObject>;
      required?: string[];
    };
    return Object.entries(properties).map(([name, inner]) => ({
      name,
      in: place,
      required: place === 'path' || required.includes(name),
      schema: inner,
    }));
  };
  const version = { name: 'If-Match', in: 'header', required: true, schema: { type: 'string' }, description: 'ETag of the version you read' };
  const repetition = { name: 'Idempotency-Key', in: 'header', required: false, schema: { type: 'string', minLength: 8, maxLength: 200 }, description: 'A repetition with the same key gets the first answer' };
  return [
    ...described(route.params, 'path'),
    ...described(route.query, 'query'),
    ...(route.versioned ? [version] : []),
    ...(route.idempotent ? [repetition] : []),
  ];
}

function requestBodyOf(route: Route): JsonObject {
  if (route.upload !== undefined) {
    const fields = route.body === undefined ? {} : (schemaOf(route.body, 'input')['properties'] as JsonObject);
    const files = { type: 'array', maxItems: route.upload.maxFiles, items: { type: 'string', contentMediaType: 'application/octet-stream' } };
    return { required: true, content: { 'multipart/form-data': { schema: { type: 'object', properties: { ...fields, files } } } } };
  }
  return { required: true, content: { 'application/json': { schema: schemaOf(route.body as z.ZodType, 'input') } } };
}

function successOf(route: Route): JsonObject {
  const content: JsonObject = {};
  if (route.reply !== undefined) content['application/json'] = { schema: schemaOf(route.reply, 'output') };
  for (const mediaType of route.bytes ?? []) content[mediaType] = { schema: {} };
  return { description: 'Done', ...(Object.keys(content).length > 0 ? { content } : {}) };
}

function refusalsOf(route: Route): JsonObject {
  const hasInput = route.params !== undefined || route.query !== undefined || route.body !== undefined;
  const statuses = [
    ...(route.policy.kind === 'signed-in' ? ['401', '403'] : []),
    ...(route.path.includes(':') ? ['404'] : []),
    ...(route.idempotent ? ['409'] : []),
    ...(route.versioned ? ['412', '428'] : []),
    ...(route.body !== undefined || route.upload !== undefined ? ['413', '415'] : []),
    ...(hasInput ? ['422'] : []),
    '429',
  ];
  return Object.fromEntries(statuses.map((status) => [status, { $ref: '#/components/responses/Problem' }]));
}

function operationOf(route: Route): JsonObject {
  const takesBody = route.body !== undefined || route.upload !== undefined;
  const success = String(route.status ?? (route.reply === undefined && route.bytes === undefined ? 204 : 200));
  const scope = route.policy.kind === 'signed-in' ? route.policy.scope : null;
  return {
    summary: route.summary,
    ...(route.policy.kind === 'signed-in' && route.policy.roles ? { description: `Needs the role ${route.policy.roles.join(' or ')}.` } : {}),
    tags: [route.path.split('/')[2] ?? 'api'],
    operationId: `${route.method} ${route.path}`.replace(/^(\w+) \/api\//, '$1-').replace(/[/:.]+/g, '-'),
    parameters: parametersOf(route),
    ...(takesBody ? { requestBody: requestBodyOf(route) } : {}),
    responses: { [success]: successOf(route), ...refusalsOf(route) },
    security: scope === null ? [] : [{ session: [] }, { personalToken: [scope] }],
  };
}

/** OpenAPI 3.1 from the very definitions that are mounted, so the two cannot differ. */
export function openApiDocument(routes: readonly Route[], version: string, accessCookie: string): JsonObject {
  const paths: Record<string, JsonObject> = {};
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: operationOf(route) };
  }
  return {
    openapi: '3.1.1',
    info: { title: 'Slantwise', version },
    jsonSchemaDialect: 'https://json-schema.org/draft/2020-12/schema',
    paths,
    components: {
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: accessCookie },
        personalToken: { type: 'http', scheme: 'bearer' },
      },
      responses: {
        Problem: { description: 'Refused', content: { 'application/problem+json': { schema: schemaOf(problem, 'output') } } },
      },
    },
  };
}
