import { type z } from 'zod';

/** How much a finding weighs: an error keeps a sheet from being released, a warning wants a look, a note informs. */
export type Severity = 'error' | 'warning' | 'note';

/** A place that a finding speaks of. */
export interface FindingPlace {
  /** Line number in the machine program, counted from 1. */
  readonly line?: number;
  /** Chord station, 0 … 1. */
  readonly station?: number;
  /** Distance from the root face along the span, mm. */
  readonly spanMm?: number;
  readonly end?: 'root' | 'tip';
}

/** Something to know about a plan. Bad values are findings too: nothing in geometry/cutting throws because of a plan's values. */
export interface Finding {
  readonly severity: Severity;
  readonly code: string;
  /** The field of the plan it is about, dotted: "features.1.rootStation". */
  readonly path: string;
  /** One plain sentence. */
  readonly message: string;
  readonly at?: FindingPlace;
}

function finding(severity: Severity) {
  return (code: string, path: string, message: string, at?: FindingPlace): Finding => ({
    severity,
    code,
    path,
    message,
    ...(at === undefined ? {} : { at }),
  });
}

export const error = finding('error');
export const warning = finding('warning');
export const note = finding('note');

export function hasErrors(findings: readonly Finding[]): boolean {
  return findings.some(({ severity }) => severity === 'error');
}

/** What the schema refused, as findings. An unknown key is reported under its own name. */
export function findingsOf(refusal: z.core.$ZodError): Finding[] {
  return refusal.issues.flatMap((issue): Finding[] => {
    const path = issue.path.map(String);
    if (issue.code !== 'unrecognized_keys')
      return [error('bad-value', path.join('.'), sentence(issue.message))];
    return issue.keys.map((key) =>
      error('bad-value', [...path, key].join('.'), `There is no field ${key} in a plan.`),
    );
  });
}

function sentence(text: string): string {
  const begun = text.charAt(0).toUpperCase() + text.slice(1);
  return begun.endsWith('.') ? begun : `${begun}.`;
}

/** A length for a message: at most `decimals` decimals, with the unit. */
export function mm(value: number, decimals = 2): string {
  return `${Number(value.toFixed(decimals))} mm`;
}

/** A chord station for a message, in per cent. */
export function stationText(station: number): string {
  return `${Number((station * 100).toFixed(1))} %`;
}
