import { type ExportFile } from '#geometry/formats/export.ts';
import { formatLength, useUnits } from '#client/app/units.ts';
import { FactList } from './fact-list.tsx';

interface FileFactsProps {
  /** The file as the browser would make it, or null while a field is refused. */
  readonly file: ExportFile | null;
  /** sha-256 of the bytes as the server announces it, or what is to be said in its place. */
  readonly checksum: string;
}

/** Measured on the file itself, before it is fetched. */
export function FileFacts({ file, checksum }: FileFactsProps) {
  const units = useUnits();
  const facts = file?.facts;
  const length = (mm: number | undefined, decimals: number) => {
    if (mm === undefined) return '–';
    return facts?.unit === 'chord' ? mm.toFixed(decimals + 3) : formatLength(mm, units, decimals);
  };
  return (
    <FactList
      facts={[
        ['Length', length(facts?.widthMm, 2)],
        ['Height', length(facts?.heightMm, 2)],
        ['Points', facts ? String(facts.points) : '–'],
        ['Arcs', facts ? String(facts.arcs) : '–'],
        ['Largest chordal error', length(facts?.largestErrorMm, 4)],
        ['sha-256 of the bytes', checksum],
      ]}
    />
  );
}
