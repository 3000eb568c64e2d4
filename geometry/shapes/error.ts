import { type z } from 'zod';

/** One reason why a shape is refused: the field (dotted, "upper.3") and a plain sentence. */
export interface ShapeIssue {
  readonly path: string;
  readonly message: string;
}

/** Thrown by geometry/ for values it cannot honour. Every issue names the field it is about. */
export class ShapeError extends Error {
  readonly issues: readonly ShapeIssue[];

  constructor(issues: readonly ShapeIssue[]) {
    super(issues.map((issue) => (issue.path ? `${issue.path}: ${issue.message}` : issue.message)).join('; '));
    this.name = 'ShapeError';
    this.issues = issues;
  }
}

/** A ShapeError about one field. */
export function shapeError(path: string, message: string): ShapeError {
  return new ShapeError([{ path, message }]);
}

/**
 * What zod found, by field in dots; an unknown key stands under its own name.
 * @param unknown the sentence for an unknown key
 */
export function issuesOf(error: z.core.$ZodError, unknown: (key: string) => string): ShapeIssue[] {
  return error.issues.flatMap((issue): ShapeIssue[] => {
    const path = issue.path.map(String);
    if (issue.code !== 'unrecognized_keys') return [{ path: path.join('.'), message: issue.message }];
    return issue.keys.map((key) => ({ path: [...path, key].join('.'), message: unknown(key) }));
  });
}

/** Turns what zod found in a shape into the error that names the fields. */
export function shapeErrorOf(error: z.core.$ZodError): ShapeError {
  return new ShapeError(issuesOf(error, (key) => `${key} is not a value of this shape`));
}
