import { LENGTH_LIMITS } from '#geometry/formats/options.ts';
import { useInfiniteQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { Link, useSearchParams } from 'react-router';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { downloadsQuery } from '#client/api/sections.ts';
import { useMay, useMe } from '#client/app/session.tsx';
import { formatLength, useUnits } from '#client/app/units.ts';
import { drawSection } from '#client/drawing/section-drawing.ts';
import { StaticSheet, type TitleBlockFields } from '#client/drawing/static-sheet.tsx';
import { MeasuredValues } from '#client/sections/editor/measured-values.tsx';
import { comparePath } from '#client/compare/choice.ts';
import { Button, buttonClass } from '#client/ui/button.tsx';
import { QuantityField } from '#client/ui/quantity-field.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { DownloadsList } from './downloads-list.tsx';
import { ExportPanel } from './export-panel.tsx';
import { Part } from './part.tsx';
import { ReleaseDialog, WithdrawDialog } from './release-dialog.tsx';
import { ShapeValues } from './shape-values.tsx';
import { Standing, versionPath } from './standing.tsx';
import { VersionRecord } from './version-record.tsx';

interface VersionViewProps {
  readonly version: SectionVersion;
  /** Number of the version in force, null when none is, undefined while it is not known. */
  readonly inForce: number | null | undefined;
}
type OpenDialog = 'export' | 'release' | 'withdraw' | null;

/** One immutable version: its drawing, what it measures, who made it and why, its standing and its files. */
export function VersionView({ version, inForce }: VersionViewProps) {
  const [open, setOpen] = useState<OpenDialog>(null);
  const [chordMm, setChordMm] = useChord();
  const units = useUnits();
  const readsDownloads = useMay('downloads.read');
  const owner = useMe().workshop.name;
  const drawing = useMemo(() => drawSection(version.shape), [version.shape]);
  const close = () => setOpen(null);
  return (
    <div data-page="flowing" className="grid flex-1 lg:grid-cols-[minmax(0,1fr)_22rem] print:block">
      <title>{`${version.sectionName} v${version.number} · Ribwright`}</title>
      <div className="flex min-w-0 flex-col gap-3 p-4 print:p-0">
        <Head version={version} inForce={inForce} chordMm={chordMm} onOpen={setOpen} />
        <Standing
          version={version}
          noun="section"
          pathOf={(number) => versionPath(version.sectionId, number)}
          inForce={inForce}
        />
        <div className="lg:max-w-[calc((100dvh-11rem)*1.5)] print:max-w-none">
          <StaticSheet shape={version.shape} chordMm={chordMm} title={titleOf(version, owner)} />
        </div>
      </div>
      <aside
        className="flex flex-col gap-5 md:max-lg:grid md:max-lg:grid-cols-2 md:max-lg:gap-x-8 border-t border-rule p-4 lg:border-t-0 lg:border-l print:hidden"
        aria-label="About this version"
      >
        <Part title="Shape">
          <QuantityField
            secondary={formatLength(chordMm, units === 'mm' ? 'inch' : 'mm')}
            label="Chord shown"
            kind="length"
            chordMm={chordMm}
            value={chordMm}
            min={LIMITS.min}
            max={LIMITS.max}
            decimals={2}
            onCommit={setChordMm}
          />
          <ShapeValues shape={version.shape} chordMm={chordMm} units={units} />
        </Part>
        <Part title="Measured on the contour">
          <MeasuredValues drawing={drawing} chordMm={chordMm} units={units} station={SPAR_STATION} />
        </Part>
        <Part title="Record">
          <VersionRecord version={version} />
        </Part>
        {readsDownloads && <Downloads version={version} />}
      </aside>
      {open === 'export' && <ExportPanel version={version} chordMm={chordMm} onClose={close} />}
      {open === 'release' && <ReleaseDialog version={version} onClose={close} />}
      {open === 'withdraw' && <WithdrawDialog version={version} onClose={close} />}
    </div>
  );
}

function titleOf(version: SectionVersion, owner: string): TitleBlockFields {
  return {
    title: version.sectionName,
    designation: version.description,
    version: String(version.number),
    status: version.status,
    author: version.author.name,
    date: version.createdAt,
    checksum: version.checksum,
    owner,
  };
}

/** This version and the one in force, or the one it was based on; alone when there is neither. */
function comparedWith({ sectionId, number, basedOn }: SectionVersion, inForce: VersionViewProps['inForce']) {
  const other = typeof inForce === 'number' && inForce !== number ? inForce : basedOn;
  return [number, ...(other === null ? [] : [other])].map((one) => ({ sectionId, number: one }));
}

interface HeadProps extends VersionViewProps {
  readonly chordMm: number;
  readonly onOpen: (dialog: OpenDialog) => void;
}

function Head({ version, inForce, chordMm, onOpen }: HeadProps) {
  const mayRelease = useMay('versions.release');
  const mayDownload = useMay('files.download');
  const seesAll = useMay('sections.read');
  const size = seesAll ? 'normal' : 'large';
  // Who sees released versions only sees a section while one of its versions is in force.
  const seesSection = seesAll || typeof inForce === 'number';
  return (
    <header className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 print:hidden">
      <div className="flex min-w-0 flex-wrap items-baseline gap-x-3">
        <h1 className="min-w-0 text-xl font-extrabold break-words">
          {seesSection ? (
            <Link className="hover:underline" to={`/sections/${version.sectionId}`}>
              {version.sectionName}
            </Link>
          ) : (
            version.sectionName
          )}{' '}
          v{version.number}
        </h1>
        <span className="text-graphite">{version.description}</span>
        <StatusMark status={version.status} />
      </div>
      <div className="flex flex-wrap gap-2">
        <Button size={size} onClick={() => window.print()}>
          Print
        </Button>
        {seesAll && (
          <Link
            className={buttonClass('plain', size)}
            to={comparePath(comparedWith(version, inForce), chordMm)}
          >
            Compare…
          </Link>
        )}
        {mayRelease && version.status === 'released' && (
          <Button size={size} variant="danger" onClick={() => onOpen('withdraw')}>
            Withdraw…
          </Button>
        )}
        {mayRelease && version.status === 'draft' && (
          <Button size={size} onClick={() => onOpen('release')}>
            Release…
          </Button>
        )}
        {mayDownload && (
          <Button size={size} variant="primary" onClick={() => onOpen('export')}>
            Export…
          </Button>
        )}
      </div>
    </header>
  );
}

function Downloads({ version }: { readonly version: SectionVersion }) {
  const query = useInfiniteQuery(downloadsQuery(version.sectionId, version.number));
  return (
    <Part title="Downloads">
      <DownloadsList query={query} />
    </Part>
  );
}

const LIMITS = LENGTH_LIMITS.chordMm;
const FIRST_CHORD_MM = 220;
/** Where the thickness is read off beside the sheet: about where the spar of most wings stands. */
const SPAR_STATION = 0.3;

/** The chord that the sheet is drawn at, kept in the address so that a link shows the same sheet. */
function useChord(): readonly [number, (chordMm: number) => void] {
  const [search, setSearch] = useSearchParams();
  const asked = Number(search.get('chord') ?? Number.NaN);
  const chordMm = asked >= LIMITS.min && asked <= LIMITS.max ? asked : FIRST_CHORD_MM;
  const setChord = (next: number) => {
    setSearch(
      (before) => {
        before.set('chord', String(next));
        return before;
      },
      { replace: true },
    );
  };
  return [chordMm, setChord];
}
