import { useQuery, useQueryClient } from '@tanstack/react-query';
import { type SheetFile, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { sheetDownloadsQuery, sheetFilesQuery, sheetFileUrl } from '#client/api/cut-sheets.ts';
import { useMay } from '#client/app/session.tsx';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { Button } from '#client/ui/button.tsx';
import { Caution } from '#client/ui/caution.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { DownloadReport } from '#client/versions/download-state.tsx';
import { useDownload } from '#client/versions/use-download.ts';

const WHAT: Readonly<Record<string, string>> = {
  'root.dxf': 'root outline, in step with the tip',
  'tip.dxf': 'tip outline, in step with the root',
  'core.nc': 'machine program of the core',
  'root.dat': 'root section, coordinates',
  'tip.dat': 'tip section, coordinates',
  'templates.pdf': 'templates at true size',
  'cut-sheet.pdf': 'drawing, settings, inspection table',
  'all.zip': 'all of them, with manifest',
};

function whatOf(name: string): string {
  const ribs = /^ribs-(\d+)\.dxf$/.exec(name);
  return ribs ? `ribs, sheet ${ribs[1] ?? ''}` : (WHAT[name] ?? '');
}

type FilesOf = Pick<SheetVersion, 'sheetId' | 'number' | 'status' | 'parts'>;

interface FilesPanelProps {
  readonly version: FilesOf;
  readonly inForce: number | null | undefined;
}

/** The files of a version, each with one press; what must be minded stands before them. */
export function FilesPanel({ version, inForce }: FilesPanelProps) {
  const seesDrafts = useMay('cut-sheets.read');
  if (!seesDrafts && version.status !== 'released') {
    return (
      <p className="text-brick">
        This version is {version.status} and must not be cut.{' '}
        {typeof inForce === 'number'
          ? `Version ${String(inForce)} is in force.`
          : 'No version of this cut sheet is in force.'}
      </p>
    );
  }
  return (
    <>
      {version.status !== 'released' && (
        <p className="text-amber">This version is not in force: its files say so. Do not cut from them.</p>
      )}
      <SheetCautions version={version} />
      <Files version={version} />
    </>
  );
}

function Files({ version }: { readonly version: FilesOf }) {
  const { sheetId, number } = version;
  const files = useQuery(sheetFilesQuery(sheetId, number));
  const client = useQueryClient();
  const announce = useAnnounce();
  const download = useDownload((fileName) => {
    announce(`${fileName} is saved.`);
    void client.invalidateQueries({ queryKey: sheetDownloadsQuery(sheetId, number).queryKey });
  });
  if (files.isPending) return <Skeleton className="h-64 w-full" />;
  if (files.isError) {
    const retry = () => void files.refetch();
    return <ErrorState title="The files could not be made." error={files.error} retry={retry} />;
  }
  const busy = download.state.step === 'running';
  return (
    <>
      <ul className="divide-y divide-hair">
        {files.data.map((file) => (
          <FileRow
            key={file.name}
            file={file}
            busy={busy}
            onTake={() => void download.start(sheetFileUrl(sheetId, number, file.name))}
          />
        ))}
      </ul>
      <DownloadReport state={download.state} />
    </>
  );
}

interface FileRowProps {
  readonly file: SheetFile;
  readonly busy: boolean;
  readonly onTake: () => void;
}

function FileRow({ file, busy, onTake }: FileRowProps) {
  const seesDrafts = useMay('cut-sheets.read');
  return (
    <li className="flex items-center gap-3 py-1.5">
      <div className="min-w-0 flex-1">
        <p className={`font-semibold ${seesDrafts ? '' : 'text-lg'}`}>{file.name}</p>
        <p className="text-xs text-graphite">
          {whatOf(file.name)}, {(file.bytes / 1000).toFixed(file.bytes < 100_000 ? 1 : 0)} kB,{' '}
          <span title={file.checksum}>{file.checksum.slice(0, 12)}</span>
        </p>
      </div>
      <Button
        size={seesDrafts ? 'normal' : 'large'}
        variant={file.name === 'all.zip' ? 'primary' : 'plain'}
        disabled={busy}
        aria-label={`Download ${file.name}`}
        onClick={onTake}
      >
        Download
      </Button>
    </li>
  );
}

/** What can hurt, before the file that does it is taken. */
function SheetCautions({ version }: { readonly version: FilesOf }) {
  const has = (part: SheetVersion['parts'][number]) => version.parts.includes(part);
  return (
    <Caution className="flex flex-col gap-1.5">
      {has('core') && (
        <>
          <p>
            A hot wire burns, and hot polystyrene gives off styrene: ventilate, use the lowest heat that cuts,
            keep an extinguisher at hand.
          </p>
          <p>Check units and origin, run the program once with a cold wire, emergency stop in reach.</p>
        </>
      )}
      {has('ribs') && (
        <p>Laser and router: cut only materials you know, with extraction, and keep watch while it runs.</p>
      )}
      {has('templates') && <p>Print templates at 100 % and measure both scale bars before you cut.</p>}
    </Caution>
  );
}
