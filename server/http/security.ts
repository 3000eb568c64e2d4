import { type RequestHandler } from 'express';
import helmet from 'helmet';

/** Security headers. Everything comes from this very server; no inline script, no inline style sheet, no frames. */
export function securityHeaders(isHttps: boolean): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(isHttps ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: isHttps,
    xFrameOptions: { action: 'deny' },
    referrerPolicy: { policy: 'same-origin' },
  });
}

/**
 * Drops what a client claims about a proxy when none is trusted: Auth.js reads these headers by itself, past Express'
 * own setting.
 */
export function believeProxiesOnlyIf(trusted: boolean): RequestHandler {
  return (request, _response, next) => {
    delete request.headers['x-forwarded-host'];
    if (trusted) request.headers['x-forwarded-proto'] = request.protocol;
    else delete request.headers['x-forwarded-proto'];
    next();
  };
}
