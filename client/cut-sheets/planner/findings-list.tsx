import { type Finding, type Severity } from '#geometry/cutting/findings.ts';

interface FindingsListProps {
  readonly findings: readonly Finding[];
  /** Nothing has been worked out yet. */
  readonly pending: boolean;
  readonly stale: boolean;
  readonly selected: Finding | null;
  readonly onSelect: (finding: Finding | null) => void;
}

const ORDER: readonly Severity[] = ['error', 'warning', 'note'];
const WORDS: Readonly<Record<Severity, string>> = { error: 'Error', warning: 'Caution', note: 'Note' };
const COLOURS: Readonly<Record<Severity, string>> = {
  error: 'text-brick',
  warning: 'text-amber',
  note: 'text-graphite',
};

/** What there is to know about the plan, gravest first; each is a button that shows the place it speaks of. */
export function FindingsList({ findings, pending, stale, selected, onSelect }: FindingsListProps) {
  const sorted = ORDER.flatMap((severity) => findings.filter((finding) => finding.severity === severity));
  return (
    <section aria-label="Findings" aria-busy={stale}>
      <div className="mb-1 flex items-end justify-between gap-2 border-b border-rule pb-1 text-xs text-graphite">
        <h2 className="font-semibold tracking-wide uppercase">Findings</h2>
        <span role="status">{pending ? 'working out…' : shortWords(findings)}</span>
      </div>
      {!pending && findings.length === 0 && <p className="text-spruce">Nothing speaks against this plan.</p>}
      <ul className={`text-xs ${stale ? 'opacity-60' : ''}`}>
        {sorted.map((finding, i) => (
          <li key={`${finding.code} ${finding.path} ${i}`} className="border-b border-hair">
            <button
              type="button"
              aria-pressed={sameFinding(finding, selected)}
              onClick={() => onSelect(sameFinding(finding, selected) ? null : finding)}
              className="grid w-full grid-cols-[1.25rem_minmax(0,1fr)] gap-x-1 py-1.5 pr-1 text-left hover:bg-sheet aria-pressed:bg-sheet pointer-coarse:min-h-11"
            >
              <SeverityGlyph severity={finding.severity} />
              <span>
                <span
                  className={`font-semibold ${COLOURS[finding.severity]}`}
                >{`${WORDS[finding.severity]}. `}</span>
                {finding.message}
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}

export function sameFinding(a: Finding, b: Finding | null): boolean {
  return b !== null && a.code === b.code && a.path === b.path && a.message === b.message;
}

/** The two gravest kinds: there is no room for more. */
function shortWords(findings: readonly Finding[]): string {
  return countWords(findings).split(', ').slice(0, 2).join(', ');
}

/** "1 caution, 2 notes"; "no findings". */
export function countWords(findings: readonly Finding[]): string {
  const counts = ORDER.flatMap((severity) => {
    const count = findings.filter((finding) => finding.severity === severity).length;
    return count === 0 ? [] : [`${count} ${WORDS[severity].toLowerCase()}${count === 1 ? '' : 's'}`];
  });
  return counts.length === 0 ? 'no findings' : counts.join(', ');
}

/** A shape for each: a square with a bar, a triangle, a dot. */
function SeverityGlyph({ severity }: { severity: Severity }) {
  return (
    <svg
      viewBox="0 0 12 12"
      aria-hidden="true"
      className={`mt-0.75 size-3 fill-current ${COLOURS[severity]}`}
    >
      {severity === 'error' && <path fillRule="evenodd" d="M0 0H12V12H0ZM2.5 5V7H9.5V5Z" />}
      {severity === 'warning' && <path d="M6 0.5 12 11.5H0Z" />}
      {severity === 'note' && <circle cx="6" cy="6" r="2" />}
    </svg>
  );
}
