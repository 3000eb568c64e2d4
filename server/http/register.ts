import express, { type RequestHandler, type Response, Router } from 'express';
import { type Authenticate } from '#server/account/session.ts';
import { type Endpoint } from '#server/contracts/endpoint.ts';
import { type EndpointName, endpoints } from '#server/contracts/endpoints.ts';
import { may } from '#server/contracts/permissions.ts';
import { Refusal } from '#server/refusal.ts';
import { sendFile } from './file.ts';
import { type Call, type FileReply, type Handlers } from './handlers.ts';
import { inputOf } from './input.ts';
import { readUpload } from './upload.ts';

/** The longest body a request may have; the largest shape takes about one kilobyte. */
const BODY_LIMIT = '32kb';

const readJson = express.json({ limit: BODY_LIMIT });

/** Takes JSON and nothing else: a form of another site cannot send it without asking. */
const jsonBody: RequestHandler = (request, response, next) => {
  // Some programs state the length of a body that is not there.
  const isEmpty = request.get('content-length') === '0';
  if (!isEmpty && request.is('application/json') === false) throw new Refusal('unsupported-type');
  readJson(request, response, next);
};

/** Nobody gets further than here without a session and the permission of the endpoint. */
function guard(endpoint: Endpoint, authenticate: Authenticate): RequestHandler {
  return async (request, response, next) => {
    if (endpoint.permission !== 'public') {
      const person = await authenticate(request);
      if (!person) throw new Refusal('unauthenticated');
      if (!may(person.role, endpoint.permission)) throw new Refusal('forbidden');
      response.locals['person'] = person;
    }
    next();
  };
}

function sendReply(response: Response, endpoint: Endpoint, reply: unknown): void {
  if (endpoint.reply === null) return void response.status(204).end();
  if (endpoint.status) response.status(endpoint.status);
  response.json(reply);
}

function answer(name: EndpointName, handlers: Handlers): RequestHandler {
  const endpoint: Endpoint = endpoints[name];
  const handle = handlers[name] as (call: Call<EndpointName>) => Promise<unknown>;
  return async (request, response) => {
    response.setHeader('Cache-Control', 'private, no-store');
    const person = (response.locals['person'] ?? null) as Call<EndpointName>['person'];
    const upload: unknown = response.locals['upload'];
    const call = { ...inputOf(endpoint, request), upload, person, now: new Date(), request, response };
    const reply = await handle(call as Call<EndpointName>);
    if (endpoint.file) return sendFile(request, response, reply as FileReply);
    sendReply(response, endpoint, reply);
  };
}

/** The routes of the API, made from the table of endpoints: guard, body, input, handler, reply. */
export function apiRoutes(handlers: Handlers, authenticate: Authenticate): Router {
  const router = Router({ caseSensitive: true, strict: true });
  const methods = new Map<string, string[]>();
  for (const name of Object.keys(endpoints) as EndpointName[]) {
    const { method, path, upload }: Endpoint = endpoints[name];
    const verb = method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
    const readBody = upload ? readUpload(upload.maxBytes) : jsonBody;
    router[verb](path, guard(endpoints[name], authenticate), readBody, answer(name, handlers));
    methods.set(path, [...(methods.get(path) ?? []), ...(method === 'GET' ? ['GET', 'HEAD'] : [method])]);
  }
  for (const [path, allowed] of methods) {
    router.all(path, (_request, response) => {
      response.setHeader('Allow', allowed.join(', '));
      throw new Refusal('method-not-allowed');
    });
  }
  return router;
}
