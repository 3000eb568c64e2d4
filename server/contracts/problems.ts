/**
 * Every refusal the API knows: the code for programs, the HTTP status, and the title that never varies. What happened
 * this time stands in `detail`, the fields at fault in `errors`.
 */
export const problems = {
  malformed: { status: 400, title: 'The request could not be read' },
  unauthenticated: { status: 401, title: 'Sign in first' },
  forbidden: { status: 403, title: 'Your role may not do this' },
  'cross-site': { status: 403, title: 'The request came from another site' },
  'not-found': { status: 404, title: 'There is nothing here' },
  'method-not-allowed': { status: 405, title: 'This address does not take that method' },
  'version-conflict': { status: 409, title: 'Another version was saved in between' },
  'revision-conflict': { status: 409, title: 'Somebody else changed this in between' },
  'key-reused': { status: 409, title: 'This key was used for something else' },
  'status-conflict': { status: 409, title: 'The status of the version does not allow this' },
  archived: { status: 409, title: 'This is in the archive' },
  'too-large': { status: 413, title: 'The request is too large' },
  'unsupported-type': { status: 415, title: 'The body is of a type that is not taken here' },
  invalid: { status: 422, title: 'Some values cannot be taken' },
  'too-many': { status: 429, title: 'Too many attempts' },
  internal: { status: 500, title: 'Something went wrong on the server' },
  unavailable: { status: 503, title: 'The service is not available at the moment' },
} as const satisfies Record<string, { status: number; title: string }>;
export type ProblemCode = keyof typeof problems;
