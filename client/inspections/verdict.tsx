import { type Judged } from './reading.ts';

/** In tolerance or not, in words and by shape; colour only helps. */
export function Verdict({ judged, deviation }: { readonly judged: Judged; readonly deviation: string }) {
  switch (judged.state) {
    case 'empty':
      return <span className="text-graphite">not measured</span>;
    case 'unreadable':
      return <span className="text-brick">{judged.message}</span>;
    case 'within':
      return (
        <span className="inline-flex items-center gap-2 text-spruce">
          <VerdictGlyph within /> within, {deviation}
        </span>
      );
    case 'out':
      return (
        <span className="inline-flex items-center gap-2 font-semibold text-brick">
          <VerdictGlyph within={false} /> out of tolerance, {deviation}
        </span>
      );
  }
}

export function VerdictGlyph({ within }: { readonly within: boolean }) {
  return (
    <svg viewBox="0 0 12 12" className="size-3 shrink-0 fill-none stroke-current stroke-2" aria-hidden="true">
      {within ? <path d="M1.5 6.5 4.5 9.5 10.5 2.5" /> : <path d="M2 2 10 10M10 2 2 10" />}
    </svg>
  );
}
