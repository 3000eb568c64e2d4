import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Endpoint } from '#server/contracts/endpoint.ts';
import { endpoints } from '#server/contracts/endpoints.ts';
import { problems } from '#server/contracts/problems.ts';
import { startApi, type TestApi } from './support/api.ts';

interface Operation {
  operationId: string;
  parameters: { name: string; in: string; required: boolean; schema: object }[];
  requestBody?: { content: Record<string, { schema: object }> };
  responses: Record<string, { description: string; content?: Record<string, { schema: object }> }>;
}
interface Document {
  openapi: string;
  info: { title: string; version: string };
  paths: Record<string, Record<string, Operation>>;
  components: { schemas: Record<string, object> };
  'x-problems': Record<string, object>;
}

let api: TestApi;
let document: Document;
beforeAll(async () => {
  api = await startApi();
  const response = await api.anonymous().fetch('/api/openapi.json');
  expect(response.headers.get('content-type')).toMatch(/^application\/json/);
  document = (await response.json()) as Document;
});
afterAll(() => api.close());

const operations = () =>
  Object.entries(document.paths).flatMap(([path, item]) =>
    Object.entries(item).map(([method, operation]) => ({ path, method, operation })),
  );

describe('the OpenAPI document', () => {
  it('has every endpoint of the table once, and no other', () => {
    const described = operations().map(
      ({ path, method, operation }) => `${operation.operationId} ${method} ${path}`,
    );
    const table = Object.entries(endpoints).map(
      ([name, { method, path }]) => `${name} ${method.toLowerCase()} ${path.replace(/:(\w+)/g, '{$1}')}`,
    );
    expect(described.sort()).toEqual(table.sort());
  });

  it('is of version 3.1 and names its parts as that demands', () => {
    expect(document.openapi).toMatch(/^3\.1\.\d+$/);
    expect(document.info.title).not.toBe('');
    expect(document.info.version).toMatch(/^\d/);
    for (const { path, operation } of operations()) {
      const inPath = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name);
      const declared = operation.parameters.filter((parameter) => parameter.in === 'path');
      expect(declared.map(({ name }) => name).sort()).toEqual(inPath.sort());
      expect(declared.every(({ required }) => required)).toBe(true);
      expect(new Set(operation.parameters.map(({ name, in: place }) => `${place} ${name}`)).size).toBe(
        operation.parameters.length,
      );
      for (const [status, response] of Object.entries(operation.responses)) {
        expect(status).toMatch(/^[2345]\d\d$/);
        expect(response.description).not.toBe('');
      }
    }
  });

  it('has every reference it makes', () => {
    const references = [...JSON.stringify(document).matchAll(/"\$ref":"([^"]+)"/g)].map(
      ([, reference]) => reference!,
    );
    expect(references.length).toBeGreaterThan(20);
    for (const reference of references) {
      const target = reference
        .slice(2)
        .split('/')
        .reduce<unknown>((at, key) => (at as Record<string, unknown>)?.[key], document);
      expect([reference, typeof target]).toEqual([reference, 'object']);
    }
  });

  it.each(Object.entries(endpoints) as [string, Endpoint][])(
    'describes %s: what it takes and what it answers',
    (name, endpoint) => {
      const { operation } = operations().find((one) => one.operation.operationId === name)!;
      const success = Object.entries(operation.responses).find(([status]) => status.startsWith('2'))!;
      expect(success[0]).toBe(String(endpoint.reply === null ? 204 : (endpoint.status ?? 200)));
      expect(Object.keys(success[1].content ?? {})).toEqual(
        endpoint.reply === null ? [] : [endpoint.file ?? 'application/json'],
      );
      const taken = endpoint.body ? ['application/json'] : endpoint.upload ? ['multipart/form-data'] : [];
      expect(Object.keys(operation.requestBody?.content ?? {})).toEqual(taken);
      expect('401' in operation.responses).toBe(endpoint.permission !== 'public');
      expect(operation.parameters.some((parameter) => parameter.in === 'query')).toBe(
        endpoint.query !== undefined,
      );
    },
  );

  it('describes the shapes with their ranges', () => {
    const body = document.paths['/api/sections']!['post']!.requestBody!.content['application/json']!.schema;
    const text = JSON.stringify(body);
    expect(text).toContain('"const":"naca4"');
    expect(text).toContain('"maximum":0.4');
    expect(text).toContain('"additionalProperties":false');
  });

  it('lists every code of refusal under the address that problems point to', () => {
    expect(document['x-problems']).toEqual(problems);
  });
});
