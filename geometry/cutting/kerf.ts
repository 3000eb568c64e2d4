import { type Finding, error, mm } from './findings.ts';
import { PLAN_LIMITS } from './plan.ts';

/** The kerf that test pieces gave. */
export interface MeasuredKerf {
  /** Mean of the single kerfs, mm. */
  readonly kerfMm: number;
  /** Largest less smallest single kerf, mm. */
  readonly spreadMm: number;
  /** Commanded less measured width of each piece, mm. */
  readonly singleMm: readonly number[];
}

/** A smaller difference can't be told from none with a caliper, mm. */
const LEAST_KERF_MM = 0.01;
/** A single kerf this far from the middle one is taken for a mistake: in mm, or as a share of it where that is more. Our choice. */
const ODD = { mm: 0.2, share: 0.5 } as const;

/**
 * The kerf from the widths of test pieces that were cut on both sides: each lost half a kerf on either. Widths that can't be right are refused with
 * their field; then there is no kerf.
 * @param commandedMm distances between the two cuts of each piece
 * @param measuredMm widths by caliper, in the same order
 * @param field name of the measured widths in the findings
 */
export function kerfFromWidths(
  commandedMm: readonly number[],
  measuredMm: readonly number[],
  field = 'measuredMm',
): { readonly kerf: MeasuredKerf | null; readonly findings: readonly Finding[] } {
  const refused = (path: string, message: string) => error('implausible-width', path, message);
  if (commandedMm.length !== measuredMm.length || commandedMm.length === 0) {
    const message = `${measuredMm.length} widths are measured, but ${commandedMm.length} were commanded.`;
    return { kerf: null, findings: [refused(field, message)] };
  }
  const singleMm = commandedMm.map((commanded, i) => commanded - (measuredMm[i] ?? NaN));
  const findings = commandedMm.flatMap((commanded, i): Finding[] => {
    if (!(commanded > 0 && Number.isFinite(commanded)))
      return [refused(`commandedMm.${i}`, `The commanded width of piece ${i + 1} is no length.`)];
    const message = faultOf(commanded, measuredMm[i] ?? NaN);
    return message === null ? [] : [refused(`${field}.${i}`, `Piece ${i + 1} ${message}`)];
  });
  if (findings.length > 0) return { kerf: null, findings };
  const odd = oddOnes(singleMm, field);
  if (odd.length > 0) return { kerf: null, findings: odd };
  const kerfMm = singleMm.reduce((sum, single) => sum + single, 0) / singleMm.length;
  return {
    kerf: { kerfMm, spreadMm: Math.max(...singleMm) - Math.min(...singleMm), singleMm },
    findings: [],
  };
}

/** What is wrong with one width, as the rest of a sentence. */
function faultOf(commanded: number, measured: number): string | null {
  if (!(measured > 0 && Number.isFinite(measured))) return 'needs a measured width above 0 mm.';
  const kerf = commanded - measured;
  if (kerf < LEAST_KERF_MM)
    return `measures ${mm(measured)}, not less than the ${mm(commanded)} commanded: there would be no kerf.`;
  const { max } = PLAN_LIMITS.kerfMm;
  return kerf > max ? `gives a kerf of ${mm(kerf)}, more than the ${mm(max)} that a plan takes.` : null;
}

/** Findings for the kerfs that lie far from the middle one; of two that differ neither is known to be right. */
function oddOnes(singleMm: readonly number[], field: string): Finding[] {
  const sorted = [...singleMm].sort((a, b) => a - b);
  const [low, high] = [sorted[(sorted.length - 1) >> 1] ?? NaN, sorted[sorted.length >> 1] ?? NaN];
  const middle = (low + high) / 2;
  return singleMm.flatMap((single, i): Finding[] => {
    if (Math.abs(single - middle) <= Math.max(ODD.mm, ODD.share * low)) return [];
    const message = `Piece ${i + 1} gives a kerf of ${mm(single)}, but the middle one is ${mm(middle)}: measure it again.`;
    return [error('implausible-width', `${field}.${i}`, message)];
  });
}

/** The kerfs at both ends of the wire from pieces that both towers cut at the same speed. */
export interface KerfOfEnds {
  readonly left: MeasuredKerf;
  readonly right: MeasuredKerf;
  /** Mean of both ends, mm. */
  readonly kerfMm: number;
  /** Kerf at the right less that at the left: what the wire itself melts unevenly, mm. */
  readonly differenceMm: number;
}

/** The kerf from the widths at the left and the right end of each piece; fields in findings are `leftMm` and `rightMm`. */
export function kerfFromEnds(
  commandedMm: readonly number[],
  leftMm: readonly number[],
  rightMm: readonly number[],
): { readonly kerf: KerfOfEnds | null; readonly findings: readonly Finding[] } {
  const left = kerfFromWidths(commandedMm, leftMm, 'leftMm');
  const right = kerfFromWidths(commandedMm, rightMm, 'rightMm');
  const findings = [...left.findings, ...right.findings];
  if (!left.kerf || !right.kerf) return { kerf: null, findings };
  const [a, b] = [left.kerf.kerfMm, right.kerf.kerfMm];
  return { kerf: { left: left.kerf, right: right.kerf, kerfMm: (a + b) / 2, differenceMm: b - a }, findings };
}
