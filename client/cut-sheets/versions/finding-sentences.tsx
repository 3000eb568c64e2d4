import { type Finding, type Severity } from '#geometry/cutting/findings.ts';

const TONES: Readonly<Record<Severity, string>> = {
  error: 'border-brick text-brick',
  warning: 'border-amber text-amber',
  note: 'border-rule text-graphite',
};

/** What the plan's own check says, the gravest first; nothing when there is nothing to say. */
export function FindingSentences({ findings }: { readonly findings: readonly Finding[] }) {
  if (findings.length === 0) return null;
  const ordered = (['error', 'warning', 'note'] as const).flatMap((severity) =>
    findings.filter((finding) => finding.severity === severity),
  );
  return (
    <ul aria-label="Findings" className="flex flex-col gap-1">
      {ordered.map(({ severity, code, path, message }, i) => (
        <li key={`${code} ${path} ${String(i)}`} className={`border-l-2 pl-3 ${TONES[severity]}`}>
          <span className="font-semibold">{severity}</span> {message}
        </li>
      ))}
    </ul>
  );
}
