import { type Request } from 'express';
import { z } from 'zod';
import { issuesOf } from '#geometry/shapes/error.ts';
import { type Endpoint } from '#server/contracts/endpoint.ts';
import { Refusal } from '#server/refusal.ts';

function parse(schema: z.ZodType, value: unknown): unknown {
  const result = schema.safeParse(value);
  if (!result.success) {
    throw new Refusal('invalid', { errors: issuesOf(result.error, (key) => `“${key}” is not known here.`) });
  }
  return result.data;
}

const nothing = z.strictObject({});

/** A path that cannot name anything names nothing: not found, rather than a complaint about its form. */
function paramsOf(endpoint: Endpoint, request: Request): unknown {
  if (!endpoint.params) return undefined;
  const result = endpoint.params.safeParse(request.params);
  if (!result.success) throw new Refusal('not-found');
  return result.data;
}

function bodyOf(endpoint: Endpoint, request: Request): unknown {
  if (!endpoint.body) return undefined;
  return parse(endpoint.body, request.body ?? {});
}

/**
 * Parses a request by its endpoint's schemas.
 * @throws Refusal `not-found` for the path, `invalid` with every field at fault for query and body
 */
export function inputOf(endpoint: Endpoint, request: Request) {
  const query = parse(endpoint.query ?? nothing, { ...request.query });
  return {
    params: paramsOf(endpoint, request),
    query: endpoint.query ? query : undefined,
    body: bodyOf(endpoint, request),
  };
}
