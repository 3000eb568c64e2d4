import { useState } from 'react';
import { Link } from 'react-router';
import { v4 } from 'uuid';
import { type CuttingListItem } from '#server/contracts/cutting-list.ts';
import { type CutLogInput } from '#client/api/cutting-list.ts';
import { useMay } from '#client/app/session.tsx';
import { formatLength, useUnits } from '#client/app/units.ts';
import { FilesPanel } from '#client/cut-sheets/versions/files-panel.tsx';
import { sheetVersionPath } from '#client/cut-sheets/paths.ts';
import { sourcesText, StaleNotice } from '#client/cut-sheets/source-words.tsx';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { Button, buttonClass } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { ScrapDialog } from './scrap-dialog.tsx';

interface JobRowProps {
  readonly item: CuttingListItem;
  readonly onLog: (log: CutLogInput) => void;
}
type Open = 'files' | 'scrap' | null;

/** One part of a released version: what it is, how many are left, its files, and what happened at the machine. */
export function JobRow({ item, onLog }: JobRowProps) {
  const [open, setOpen] = useState<Open>(null);
  const announce = useAnnounce();
  const log = (action: CutLogInput['action'], reason = '') => {
    onLog({
      sheetId: item.sheetId,
      versionNumber: item.versionNumber,
      part: item.part,
      action,
      reason,
      machineId: item.machine?.id ?? null,
      at: new Date().toISOString(),
      key: v4(),
    });
    announce(`${item.sheetName}, ${item.part}: ${action}.`);
  };
  return (
    <li className="flex flex-col gap-3 rounded border border-rule bg-sheet px-4 py-3">
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-2">
        <What item={item} />
        <Count item={item} />
      </div>
      <NotInForce item={item} />
      <StaleNotice ends={item} large />
      <Actions item={item} onOpen={setOpen} onLog={log} />
      {open === 'files' && <FilesDialog item={item} onClose={() => setOpen(null)} />}
      {open === 'scrap' && (
        <ScrapDialog
          what={`${item.sheetName}, ${item.part}`}
          onScrap={(reason) => log('scrapped', reason)}
          onClose={() => setOpen(null)}
        />
      )}
    </li>
  );
}

function What({ item }: { readonly item: CuttingListItem }) {
  const units = useUnits();
  const length = (mm: number) => formatLength(mm, units, 0);
  return (
    <div className="min-w-0">
      <Link
        to={sheetVersionPath(item.sheetId, item.versionNumber)}
        className="inline-flex min-h-12 items-center text-xl leading-tight font-semibold wrap-break-word hover:underline"
      >
        {item.sheetName} v{item.versionNumber}, {item.part}
      </Link>
      <p className="text-base">
        {length(item.rootChordMm)} → {length(item.tipChordMm)}, span {length(item.spanMm)}
      </p>
      <p className="text-sm text-graphite">
        {sourcesText(item)}, code {item.shortCode}
      </p>
    </div>
  );
}

function Count({ item }: { readonly item: CuttingListItem }) {
  return (
    <div className="text-right max-sm:text-left">
      <p className="text-xl font-semibold">
        {item.done} of {item.wanted} done
      </p>
      {item.scrapped > 0 && <p className="text-base text-graphite">{item.scrapped} scrapped</p>}
      {item.started !== null && (
        <p className="text-base">
          started by {item.started.by.name}, <Moment at={item.started.at} />
        </p>
      )}
    </div>
  );
}

function NotInForce({ item }: { readonly item: CuttingListItem }) {
  if (item.standing === 'released') return null;
  return (
    <p role="alert" className="border-l-[3px] border-brick py-1 pl-3 text-base text-brick">
      This version is {item.standing} since it was begun. Stop, ask the builder, and log what became of the
      part.
    </p>
  );
}

interface ActionsProps {
  readonly item: CuttingListItem;
  readonly onOpen: (open: Open) => void;
  readonly onLog: (action: CutLogInput['action']) => void;
}

function Actions({ item, onOpen, onLog }: ActionsProps) {
  const mayLog = useMay('cuts.log');
  const inForce = item.standing === 'released';
  const isStarted = item.started !== null;
  return (
    <div className="flex flex-wrap gap-2">
      {inForce && (
        <Button size="large" variant={isStarted ? 'plain' : 'primary'} onClick={() => onOpen('files')}>
          Files
        </Button>
      )}
      {mayLog && inForce && !isStarted && (
        <Button size="large" onClick={() => onLog('started')}>
          Start
        </Button>
      )}
      {mayLog && isStarted && (
        <Button size="large" variant="primary" onClick={() => onLog('done')}>
          Done
        </Button>
      )}
      {mayLog && (
        <Button size="large" variant="danger" onClick={() => onOpen('scrap')}>
          Scrapped…
        </Button>
      )}
      {item.part === 'core' && (
        <Link
          className={buttonClass('plain', 'large')}
          to={`/cutting-list/inspect/${item.sheetId}/${String(item.versionNumber)}`}
        >
          Measure…
        </Link>
      )}
    </div>
  );
}

function FilesDialog({ item, onClose }: { readonly item: CuttingListItem; readonly onClose: () => void }) {
  const version = {
    sheetId: item.sheetId,
    number: item.versionNumber,
    status: item.standing,
    parts: [item.part],
  };
  return (
    <Dialog title={`Files of ${item.sheetName} v${String(item.versionNumber)}`} onClose={onClose} light>
      <div className="flex flex-col gap-3">
        <FilesPanel version={version} inForce={item.versionNumber} />
      </div>
    </Dialog>
  );
}
