import { randomUUID } from 'node:crypto';
import { type IncomingMessage } from 'node:http';
import { type RequestHandler } from 'express';
import { type Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** The address without what was searched for; neither headers nor network addresses are logged. */
function pathOf(request: IncomingMessage): string {
  return (request.url ?? '').split('?', 1)[0] ?? '';
}

/** Gives every request an id, answers it as X-Request-Id and logs one line for each answer. */
export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    serializers: {
      req: (request: { id: string; method: string; raw: IncomingMessage }) => ({
        id: request.id,
        method: request.method,
        path: pathOf(request.raw),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
    customLogLevel: (_request, response, error) => {
      if (error || response.statusCode >= 500) return 'error';
      return response.statusCode === 429 ? 'warn' : 'info';
    },
  });
}
