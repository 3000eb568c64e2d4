import { type ErrorRequestHandler, type Response } from 'express';
import { ShapeError } from '#geometry/shapes/error.ts';
import { type ProblemCode, problems } from '#server/contracts/problems.ts';
import { isUnavailable } from '#server/database/errors.ts';
import { Refusal } from '#server/refusal.ts';

/** When to come back after the database was away. */
const RETRY_AFTER_SECONDS = 5;

/** What body-parser and the router throw, by their own names. */
const readErrors: Readonly<Record<string, ProblemCode>> = {
  'entity.parse.failed': 'malformed',
  'request.size.invalid': 'malformed',
  'request.aborted': 'malformed',
  'entity.too.large': 'too-large',
  'parameters.too.many': 'too-large',
  'encoding.unsupported': 'unsupported-type',
  'charset.unsupported': 'unsupported-type',
};

/** The refusal an error stands for; `internal` for everything that nobody foresaw. */
function refusalOf(error: unknown): Refusal {
  if (error instanceof Refusal) return error;
  if (error instanceof ShapeError) return new Refusal('invalid', { errors: error.issues });
  if (isUnavailable(error)) {
    return new Refusal('unavailable', {
      detail: 'Nothing was lost on this side. Try again in a few seconds.',
      retryAfterSeconds: RETRY_AFTER_SECONDS,
    });
  }
  const type = error instanceof Error && 'type' in error ? String(error.type) : '';
  const read = readErrors[type];
  if (read !== undefined) return new Refusal(read);
  if (error instanceof URIError) return new Refusal('not-found');
  return new Refusal('internal', {
    detail:
      'The server has kept a record under the request id. Try again; if it happens again, name that id.',
  });
}

/** Sends a refusal as problem details (RFC 9457). `type` points to the code's entry in the OpenAPI document. */
function sendProblem(response: Response, refusal: Refusal): void {
  const { code, details } = refusal;
  const { status, title } = problems[code];
  const { detail, errors, retryAfterSeconds, members } = details;
  if (retryAfterSeconds !== undefined) response.setHeader('Retry-After', String(retryAfterSeconds));
  response.removeHeader('Content-Disposition');
  response.removeHeader('ETag');
  response
    .status(status)
    .setHeader('Cache-Control', 'private, no-store')
    .type('application/problem+json')
    .send(
      JSON.stringify({
        ...members,
        type: `/api/openapi.json#/x-problems/${code}`,
        title,
        status,
        code,
        detail,
        requestId: String(response.req.id),
        errors,
      }),
    );
}

/** The one place where errors become answers. The unforeseen are logged and shown without anything from inside. */
export const problemHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  const refusal = refusalOf(error);
  if (problems[refusal.code].status >= 500) request.log.error({ err: error }, refusal.code);
  if (response.headersSent) return next(error);
  sendProblem(response, refusal);
};
