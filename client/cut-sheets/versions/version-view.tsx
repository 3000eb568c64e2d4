import { useInfiniteQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { Link } from 'react-router';
import { planCore } from '#geometry/cutting/planner.ts';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { sheetDownloadsQuery } from '#client/api/cut-sheets.ts';
import { useMay } from '#client/app/session.tsx';
import { Button, buttonClass } from '#client/ui/button.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { DownloadsList } from '#client/versions/downloads-list.tsx';
import { Part } from '#client/versions/part.tsx';
import { Standing } from '#client/versions/standing.tsx';
import { sheetPath, sheetVersionPath } from '../paths.ts';
import { StaleNotice } from '../source-words.tsx';
import { PlanSheet } from '../views/static-plan.tsx';
import { FilesPanel } from './files-panel.tsx';
import { FindingSentences } from './finding-sentences.tsx';
import { ReleaseSheetDialog, WithdrawSheetDialog } from './sheet-status-dialogs.tsx';
import { SheetRecord } from './sheet-record.tsx';

interface SheetVersionViewProps {
  readonly version: SheetVersion;
  /** Number of the version in force, null when none is, undefined while it is not known. */
  readonly inForce: number | null | undefined;
}
type OpenDialog = 'release' | 'withdraw' | null;

/** One immutable version of a cut sheet: its drawing, its files, what it is made from, how it stands. */
export function SheetVersionView({ version, inForce }: SheetVersionViewProps) {
  const [open, setOpen] = useState<OpenDialog>(null);
  const readsDownloads = useMay('downloads.read');
  const planned = useMemo(() => planCore(version.pinned, identityOf(version)), [version]);
  const close = () => setOpen(null);
  return (
    <div data-page="flowing" className="grid flex-1 lg:grid-cols-[minmax(0,1fr)_24rem] print:block">
      <title>{`${version.sheetName} v${String(version.number)} · Ribwright`}</title>
      <div className="flex min-w-0 flex-col gap-3 p-4 print:p-0">
        <Head version={version} onOpen={setOpen} />
        <Standing
          version={version}
          noun="cut sheet"
          pathOf={(number) => sheetVersionPath(version.sheetId, number)}
          inForce={inForce}
        />
        <StaleNotice ends={version} />
        {planned.core !== null && <PlanSheet core={planned.core} version={version} />}
        <FindingSentences findings={planned.findings} />
      </div>
      <aside
        className="flex flex-col gap-5 border-t border-rule p-4 md:max-lg:grid md:max-lg:grid-cols-2 md:max-lg:gap-x-8 lg:border-t-0 lg:border-l print:hidden"
        aria-label="About this version"
      >
        <Part title="Files">
          <FilesPanel version={version} inForce={inForce} />
        </Part>
        <Part title="Record">
          <SheetRecord version={version} />
        </Part>
        {readsDownloads && <Downloads version={version} />}
      </aside>
      {open === 'release' && <ReleaseSheetDialog version={version} onClose={close} />}
      {open === 'withdraw' && <WithdrawSheetDialog version={version} onClose={close} />}
    </div>
  );
}

/** What the machine program says of itself. */
function identityOf(version: SheetVersion) {
  return {
    sheetName: version.sheetName,
    versionNumber: version.number,
    checksum: version.checksum,
    part: 'core',
  };
}

interface HeadProps {
  readonly version: SheetVersion;
  readonly onOpen: (dialog: OpenDialog) => void;
}

function Head({ version, onOpen }: HeadProps) {
  const mayRelease = useMay('cut-sheets.release');
  const mayWrite = useMay('cut-sheets.write');
  const size = mayWrite ? 'normal' : 'large';
  return (
    <header className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 print:hidden">
      <div className="flex min-w-0 flex-wrap items-baseline gap-x-3">
        <h1 className="min-w-0 text-xl font-extrabold break-words">
          {mayWrite ? (
            <Link className="hover:underline" to={sheetPath(version.sheetId)}>
              {version.sheetName}
            </Link>
          ) : (
            version.sheetName
          )}{' '}
          v{version.number}
        </h1>
        <StatusMark status={version.status} />
        <span className="text-graphite">code {version.shortCode}</span>
      </div>
      <div className="flex flex-wrap gap-2">
        <Button size={size} onClick={() => window.print()}>
          Print
        </Button>
        {version.status === 'released' && (
          <Link
            className={buttonClass('plain', size)}
            to={`/cutting-list/inspect/${version.sheetId}/${String(version.number)}`}
          >
            Measure a part…
          </Link>
        )}
        {mayRelease && version.status === 'released' && (
          <Button size={size} variant="danger" onClick={() => onOpen('withdraw')}>
            Withdraw…
          </Button>
        )}
        {mayRelease && version.status === 'draft' && (
          <Button size={size} variant="primary" onClick={() => onOpen('release')}>
            Release…
          </Button>
        )}
      </div>
    </header>
  );
}

function Downloads({ version }: { readonly version: SheetVersion }) {
  const query = useInfiniteQuery(sheetDownloadsQuery(version.sheetId, version.number));
  return (
    <Part title="Downloads">
      <DownloadsList query={query} />
    </Part>
  );
}
