import { extname } from 'node:path';
import express, { type RequestHandler, type Response, Router } from 'express';
import { Refusal } from '#server/refusal.ts';

const BROTLI = '.br';
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

function cacheControlOf(folder: string, path: string): string {
  const isHashed = /[\\/]assets[\\/]/.test(path.slice(folder.length));
  return isHashed ? `public, max-age=${YEAR_SECONDS}, immutable` : 'no-cache';
}

/** The brotli form that the build has laid beside a script or style, for those who take it. */
function compressedFiles(folder: string): RequestHandler {
  const files = express.static(folder, {
    index: false,
    redirect: false,
    setHeaders: (response: Response, path) => {
      response.type(extname(path.slice(0, -BROTLI.length)));
      response.vary('Accept-Encoding');
      response.setHeader('Content-Encoding', 'br');
      response.setHeader('Cache-Control', cacheControlOf(folder, path));
    },
  });
  return (request, response, next) => {
    const { url } = request;
    if (!/^\/assets\/[^/?]+\.(?:js|css)$/.test(url) || !request.acceptsEncodings('br')) return next();
    request.url = `${url}${BROTLI}`;
    files(request, response, (error?: unknown) => {
      request.url = url;
      next(error);
    });
  };
}

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
      response.setHeader('Cache-Control', cacheControlOf(folder, path));
    },
  });
  router.use(compressedFiles(folder));
  router.use(files);
  router.use((_request, response, next) => {
    response.locals['clientFolder'] = folder;
    response.setHeader('Cache-Control', 'no-cache');
    next();
  }, index);
  return router;
}
