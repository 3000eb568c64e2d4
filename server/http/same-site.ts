import { type RequestHandler } from 'express';
import { Refusal } from '#server/refusal.ts';

const harmless = new Set(['GET', 'HEAD', 'OPTIONS']);

function isSameHost(origin: string, host: string | undefined): boolean {
  return URL.canParse(origin) && host !== undefined && new URL(origin).host === host.toLowerCase();
}

/**
 * Refuses writes that a page of another site makes a browser send. Browsers say where a request comes from in
 * Sec-Fetch-Site, older ones in Origin; programs say neither and have no cookie to abuse.
 */
export const sameSiteOnly: RequestHandler = (request, _response, next) => {
  if (harmless.has(request.method)) return next();
  const site = request.get('sec-fetch-site');
  const origin = request.get('origin');
  if (site !== undefined && site !== 'same-origin' && site !== 'none') throw new Refusal('cross-site');
  if (origin !== undefined && !isSameHost(origin, request.host)) throw new Refusal('cross-site');
  next();
};
