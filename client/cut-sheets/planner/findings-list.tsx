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
  const groups = groupsOf(findings);
  return (
    <section aria-label="Findings" aria-busy={stale}>
      <div className="mb-1 flex items-end justify-between gap-2 border-b border-rule pb-1 text-xs text-graphite">
        <h2 className="font-semibold tracking-wide uppercase">Findings</h2>
        <span role="status">{pending ? 'working out…' : shortWords(findings)}</span>
      </div>
      {!pending && findings.length === 0 && <p className="text-spruce">Nothing speaks against this plan.</p>}
      <ul className={`text-xs ${stale ? 'text-graphite' : ''}`}>
        {groups.map(([first, ...more], i) => (
          <li key={i} className="border-b border-hair">
            <FindingButton finding={first} selected={selected} onSelect={onSelect} />
            {more.length > 0 && (
              <details className="pb-1.5 pl-6">
                <summary className="min-h-6 py-0.5 text-graphite pointer-coarse:min-h-11">
                  {`${more.length} more of the same`}
                </summary>
                {more.map((finding) => (
                  <FindingButton
                    key={finding.message}
                    finding={finding}
                    selected={selected}
                    onSelect={onSelect}
                  />
                ))}
              </details>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}

interface FindingButtonProps extends Pick<FindingsListProps, 'selected' | 'onSelect'> {
  readonly finding: Finding;
}

function FindingButton({ finding, selected, onSelect }: FindingButtonProps) {
  const { severity, message } = finding;
  const pressed = sameFinding(finding, selected);
  return (
    <button
      type="button"
      aria-pressed={pressed}
      onClick={() => onSelect(pressed ? null : finding)}
      className="grid w-full grid-cols-[1.25rem_minmax(0,1fr)] gap-x-1 py-1.5 pr-1 text-left hover:bg-sheet aria-pressed:bg-sheet pointer-coarse:min-h-11"
    >
      <SeverityGlyph severity={severity} />
      <span>
        <span className={`font-semibold ${COLOURS[severity]}`}>{`${WORDS[severity]}. `}</span>
        {message}
      </span>
    </button>
  );
}

type FindingGroup = readonly [Finding, ...Finding[]];

/** The gravest first; those that say the same of several lines of the program stand together. */
export function groupsOf(findings: readonly Finding[]): readonly FindingGroup[] {
  const groups: [Finding, ...Finding[]][] = [];
  for (const severity of ORDER) {
    for (const finding of findings.filter((of) => of.severity === severity)) {
      const group =
        finding.at?.line === undefined
          ? undefined
          : groups.find(([first]) => first.at?.line !== undefined && first.code === finding.code);
      if (group) group.push(finding);
      else groups.push([finding]);
    }
  }
  return groups;
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
