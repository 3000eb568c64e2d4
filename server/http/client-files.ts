import express, { type RequestHandler, Router } from 'express';
import { Refusal } from '#server/refusal.ts';

const YEAR_SECONDS = 31_536_000;

const index: RequestHandler = (request, response, next) => {
  const reads = request.method === 'GET' || request.method === 'HEAD';
  const hasExtension = /\.[a-z0-9]+$/i.test(request.path);
  if (!reads || hasExtension || !request.accepts('html')) return next(new Refusal('not-found'));
  response.sendFile(
    'index.html',
    { root: response.locals['clientFolder'] as string, cacheControl: false },
    (error) => {
      if (error && !response.headersSent) next(new Refusal('not-found'));
    },
  );
};

/**
 * The built client. Files under assets/ carry a sum of their content in their name and are kept for a year; all others
 * are asked for again each time. Every address that is not a file is a screen of the client.
 */
export function clientFiles(folder: string): Router {
  const router = Router();
  const files = express.static(folder, {
    index: false,
    redirect: false,
    setHeaders: (response, path) => {
      const isHashed = /[\\/]assets[\\/]/.test(path.slice(folder.length));
      response.setHeader(
        'Cache-Control',
        isHashed ? `public, max-age=${YEAR_SECONDS}, immutable` : 'no-cache',
      );
    },
  });
  router.use(files);
  router.use((_request, response, next) => {
    response.locals['clientFolder'] = folder;
    response.setHeader('Cache-Control', 'no-cache');
    next();
  }, index);
  return router;
}
