import * as z from 'zod';
import { openApiDocument } from './open-api';
import { openApiRoute } from './open-api-route';
import { defineRoute, type Route } from './route';

const reply = z.strictObject({ id: z.uuid(), note: z.string().nullable() });
const routes: readonly Route[] = [
  defineRoute({
    method: 'put',
    path: '/api/panels/:id/draft',
    summary: 'Save',
    policy: { kind: 'signed-in', roles: ['designer'], scope: 'design' },
    params: z.strictObject({ id: z.uuid() }),
    query: z.strictObject({ dry: z.enum(['yes', 'no']).optional() }),
    body: z.strictObject({ email: z.string().trim().toLowerCase().pipe(z.email()) }),
    reply,
    versioned: true,
    idempotent: true,
    handler: () => ({ id: '', note: null }),
  }),
  defineRoute({
    method: 'post',
    path: '/api/files',
    summary: 'Upload',
    policy: { kind: 'public' },
    upload: { maxFileBytes: 10, maxFiles: 3 },
    body: z.strictObject({ label: z.string() }),
    bytes: ['application/zip'],
    status: 202,
    handler: () => undefined as never,
  }),
  defineRoute({ method: 'delete', path: '/api/files', summary: 'Remove', policy: { kind: 'public' }, handler: () => undefined }),
];

type Operation = Record<string, unknown> & { parameters: { name: string; in: string; required: boolean }[]; responses: Record<string, unknown> };
const document = openApiDocument(routes, '1.2.3', 'cookie-name') as { openapi: string; info: object; paths: Record<string, Record<string, Operation>>; components: { securitySchemes: object } };
const operation = (method: string, path: string): Operation => document.paths[path]?.[method] as Operation;

describe('openApiDocument', () => {
  it('is OpenAPI 3.1 with both ways to sign in', () => {
    expect(document).toMatchObject({ openapi: '3.1.1', info: { title: 'Slantwise', version: '1.2.3' } });
    expect(document.components.securitySchemes).toEqual({
      session: { type: 'apiKey', in: 'cookie', name: 'cookie-name' },
      personalToken: { type: 'http', scheme: 'bearer' },
    });
  });

  it('names the parameters of path, query and header, and which must be there', () => {
    const parameters = operation('put', '/api/panels/{id}/draft').parameters.map(({ name, in: place, required }) => `${place} ${name}${required ? '!' : ''}`);
    expect(parameters).toEqual(['path id!', 'query dry', 'header If-Match!', 'header Idempotency-Key']);
  });

  it('says null as JSON Schema 2020-12 does', () => {
    const success = operation('put', '/api/panels/{id}/draft').responses['200'] as { content: Record<string, { schema: { properties: { note: unknown } } }> };
    expect(success.content['application/json']?.schema.properties.note).toEqual({ type: ['string', 'null'] });
    expect(JSON.stringify(document)).not.toContain('nullable');
  });

  it('lists what can be refused, each in the one form', () => {
    expect(Object.keys(operation('put', '/api/panels/{id}/draft').responses)).toEqual(['200', '401', '403', '404', '409', '412', '413', '415', '422', '428', '429']);
    expect(operation('put', '/api/panels/{id}/draft').responses['412']).toEqual({ $ref: '#/components/responses/Problem' });
    expect(Object.keys(operation('delete', '/api/files').responses)).toEqual(['204', '429']);
  });

  it('describes uploads as forms and downloads by their types', () => {
    const { requestBody, responses, security } = operation('post', '/api/files');
    expect(requestBody).toMatchObject({ content: { 'multipart/form-data': { schema: { properties: { label: { type: 'string' }, files: { type: 'array', maxItems: 3 } } } } } });
    expect(responses['202']).toMatchObject({ content: { 'application/zip': {} } });
    expect(security).toEqual([]);
  });

  it('describes its own address too', () => {
    expect(openApiRoute(routes, '1', 'c').path).toBe('/api/openapi.json');
  });
});
