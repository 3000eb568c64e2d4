import { type Problem } from '#server/contracts/common.ts';

/** The server understood and said no: problem details of RFC 9457. */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';
  readonly problem: Problem;
  readonly status: number;
  /** Seconds to wait before trying again, from Retry-After; null when the server named none. */
  readonly retryAfterSeconds: number | null;
  /** The whole answer, for problems that carry more than the standard members (a version conflict). */
  readonly body: unknown;

  constructor(
    problem: Problem,
    { retryAfterSeconds = null, body = problem }: { retryAfterSeconds?: number | null; body?: unknown } = {},
  ) {
    super(problem.detail ?? problem.title);
    this.problem = problem;
    this.status = problem.status;
    this.retryAfterSeconds = retryAfterSeconds;
    this.body = body;
  }
}

/** No answer at all: no network, or the server is not running. Nothing was changed as far as anybody knows. */
export class OfflineError extends Error {
  override readonly name = 'OfflineError';
  constructor(options?: ErrorOptions) {
    super('The server cannot be reached.', options);
  }
}

/** The server answered with something this version of the screens does not understand. */
export class ReplyError extends Error {
  override readonly name = 'ReplyError';
  readonly requestId: string | null;
  constructor(requestId: string | null, options?: ErrorOptions) {
    super(
      'The server answered in a form that this page does not understand. Reload the page to get its newest version.',
      options,
    );
    this.requestId = requestId;
  }
}

/** The messages of a problem by field path, the first of each; empty when the problem names no field. */
export function fieldErrors(error: unknown): ReadonlyMap<string, string> {
  const messages = new Map<string, string>();
  if (!(error instanceof ProblemError)) return messages;
  for (const { path, message } of error.problem.errors ?? []) {
    if (!messages.has(path)) messages.set(path, message);
  }
  return messages;
}
