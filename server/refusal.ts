import { type ProblemCode } from '#server/contracts/problems.ts';

/** One field at fault: its path in the request, such as `shape.maxThickness`, and a sentence for people. */
export interface FieldIssue {
  readonly path: string;
  readonly message: string;
}

interface RefusalDetails {
  readonly detail?: string;
  readonly errors?: readonly FieldIssue[];
  readonly retryAfterSeconds?: number;
  /** Further members of the answer, such as the version that came in between. */
  readonly members?: Readonly<Record<string, unknown>>;
}

/** The expected way to say no, from rules, stores and routes alike; one handler turns it into an answer. */
export class Refusal extends Error {
  override readonly name = 'Refusal';
  readonly code: ProblemCode;
  readonly details: RefusalDetails;

  constructor(code: ProblemCode, details: RefusalDetails = {}) {
    super(details.detail ?? code);
    this.code = code;
    this.details = details;
  }
}

/** A refusal of one field of the request. */
export function refuseField(path: string, message: string): Refusal {
  return new Refusal('invalid', { errors: [{ path, message }] });
}
