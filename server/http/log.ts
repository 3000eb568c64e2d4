import { randomUUID } from 'node:crypto';
import { type IncomingMessage } from 'node:http';
import { type RequestHandler } from 'express';
import { type Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** The address without what was searched for; neither headers nor network addresses are logged. */
function pathOf(request: IncomingMessage): string {
  return (request.url ?? '').split('?', 1)[0] ?? '';
}

/**
 * An error as it may stand in a log. Database errors carry the statement with its values, names and addresses among
 * them, in message and stack; of those only the codes and the places in the program are kept.
 */
export function loggable(error: unknown): Readonly<Record<string, unknown>> {
  if (!(error instanceof Error)) return { type: typeof error };
  const places = (error.stack ?? '').split('\n').filter((line) => /^\s+at /.test(line));
  const code = 'code' in error ? { code: error.code } : {};
  const isOfDatabase = 'sql' in error || 'sqlState' in error;
  const message = isOfDatabase ? 'the database refused a statement' : error.message;
  return { type: error.name, ...code, message, stack: places.join('\n') };
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
      err: (error: { raw: unknown }) => loggable(error.raw),
    },
    customLogLevel: (_request, response, error) => {
      if (error || response.statusCode >= 500) return 'error';
      return response.statusCode === 429 ? 'warn' : 'info';
    },
  });
}
