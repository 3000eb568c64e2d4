import { z } from 'zod';
import { problemSchema } from './contracts/common.ts';
import { type Endpoint } from './contracts/endpoint.ts';
import { type EndpointName, endpoints } from './contracts/endpoints.ts';
import { permissions } from './contracts/permissions.ts';
import { problems, type ProblemCode } from './contracts/problems.ts';
import { sheetConflictSchema } from './contracts/cut-sheets.ts';
import { versionConflictSchema } from './contracts/sections.ts';

type Json = Record<string, unknown>;

function jsonSchema(schema: z.ZodType, io: 'input' | 'output'): Json {
  const whole = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Json;
  const { $schema: _dialect, $defs: _recursive, ...rest } = whole;
  // Only “any JSON value” refers to itself, which an empty schema says as well.
  return JSON.parse(JSON.stringify(rest), (_, value: unknown) =>
    typeof value === 'object' && value !== null && '$ref' in value ? {} : value,
  ) as Json;
}

/** The members of an object schema as parameters of a request. */
function parametersOf(schema: z.ZodType | undefined, place: 'path' | 'query'): Json[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = jsonSchema(schema, 'input') as {
    properties?: Record<string, Json>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, member]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: member,
  }));
}

function successOf(endpoint: Endpoint): Json {
  if (endpoint.reply === null) return { 204: { description: 'Done' } };
  const type = endpoint.file ?? 'application/json';
  const content = { [type]: { schema: jsonSchema(endpoint.reply, 'output') } };
  if (!endpoint.file) return { [endpoint.status ?? 200]: { description: 'Done', content } };
  const text = { schema: { type: 'string' } };
  const headers = { ETag: text, 'X-Checksum-Sha256': text, 'Content-Disposition': text };
  return { 200: { description: 'The file', headers, content }, 304: { description: 'Still the same' } };
}

/** The refusals that an endpoint of this make can answer with. */
function refusalsOf(endpoint: Endpoint): number[] {
  const statuses: number[] = [500, 503];
  if (endpoint.permission !== 'public') statuses.push(401, 403);
  if (endpoint.params) statuses.push(404);
  if (endpoint.query) statuses.push(422);
  if (endpoint.body || endpoint.upload) statuses.push(400, 409, 413, 415, 422);
  if (endpoint.file) statuses.push(409, 422);
  return [...new Set(statuses)].sort((a, b) => a - b);
}

/** What a save answers when another version came in between. */
const conflicts: Partial<Record<EndpointName, string>> = {
  saveVersion: 'VersionConflict',
  saveSheetVersion: 'SheetVersionConflict',
};

function problemResponse(name: EndpointName, status: number): Json {
  const titles = Object.values(problems).filter((problem) => problem.status === status);
  const reference = { $ref: '#/components/schemas/Problem' };
  const conflict = status === 409 ? conflicts[name] : undefined;
  const schema = conflict ? { anyOf: [reference, { $ref: `#/components/schemas/${conflict}` }] } : reference;
  return {
    description: titles.map(({ title }) => title).join('; '),
    content: { 'application/problem+json': { schema } },
  };
}

/** What an endpoint takes as a body: JSON, or one file of a form. */
function requestBodyOf({ body, upload }: Endpoint): Json {
  if (body) {
    const content = { 'application/json': { schema: jsonSchema(body, 'input') } };
    return { requestBody: { required: true, content } };
  }
  if (!upload) return {};
  const file = { type: 'string', format: 'binary', description: `At most ${upload.maxBytes} bytes` };
  const schema = { type: 'object', properties: { file }, required: ['file'], additionalProperties: false };
  return { requestBody: { required: true, content: { 'multipart/form-data': { schema } } } };
}

function operationOf(name: EndpointName): Json {
  const endpoint: Endpoint = endpoints[name];
  const isPublic = endpoint.permission === 'public';
  const refusals = refusalsOf(endpoint).map((status) => [String(status), problemResponse(name, status)]);
  return {
    operationId: name,
    summary: endpoint.summary,
    ...(endpoint.permission === 'public'
      ? {}
      : { description: `For: ${permissions[endpoint.permission].join(', ')}.` }),
    security: isPublic ? [] : [{ session: [] }],
    parameters: [...parametersOf(endpoint.params, 'path'), ...parametersOf(endpoint.query, 'query')],
    ...requestBodyOf(endpoint),
    responses: { ...successOf(endpoint), ...Object.fromEntries(refusals) },
  };
}

/** The API as an OpenAPI 3.1 document, made from the table of endpoints. */
export function openApiDocument(version: string): Json {
  const paths: Record<string, Json> = {};
  for (const name of Object.keys(endpoints) as EndpointName[]) {
    const { path, method } = endpoints[name];
    const template = path.replace(/:(\w+)/g, '{$1}');
    paths[template] = { ...paths[template], [method.toLowerCase()]: operationOf(name) };
  }
  const codes = Object.keys(problems) as ProblemCode[];
  return {
    openapi: '3.1.0',
    info: {
      title: 'Ribwright',
      version,
      description: 'Wing sections, their versions and cut files. Lengths of shapes are fractions of chord.',
    },
    jsonSchemaDialect: 'https://json-schema.org/draft/2020-12/schema',
    paths,
    components: {
      schemas: {
        Problem: jsonSchema(problemSchema, 'output'),
        VersionConflict: jsonSchema(problemSchema.extend(versionConflictSchema.shape), 'output'),
        SheetVersionConflict: jsonSchema(problemSchema.extend(sheetConflictSchema.shape), 'output'),
      },
      securitySchemes: {
        session: {
          type: 'apiKey',
          in: 'cookie',
          name: 'authjs.session-token',
          description: 'Set by POST /auth/callback/credentials; under https with the prefix __Secure-.',
        },
      },
    },
    'x-problems': Object.fromEntries(codes.map((code) => [code, problems[code]])),
  };
}
