import { useQueryClient } from '@tanstack/react-query';
import { Fragment, useMemo, useRef } from 'react';
import { useForm, type UseFormReturn, useWatch } from 'react-hook-form';
import { sectionEndpoints } from '#server/contracts/section-endpoints.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { fileUrl } from '#client/api/request.ts';
import { downloadsQuery } from '#client/api/sections.ts';
import { useMay } from '#client/app/session.tsx';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { ExportCautions } from './cautions.tsx';
import { DownloadReport } from './download-state.tsx';
import { previewOf } from './export-facts.ts';
import { type ExportFields, exportResolver, queryOf, startingFields } from './export-fields.ts';
import { ExportForm } from './export-form.tsx';
import { FileFacts } from './file-facts.tsx';
import { useDownload } from './use-download.ts';
import { useFileChecksum } from './use-file-checksum.ts';

interface ExportPanelProps {
  readonly version: SectionVersion;
  /** Chord in mm that the form opens with. */
  readonly chordMm?: number;
  readonly onClose: () => void;
}

/** The technician's desk is read at arm's length on a tablet: every target is 48 px high. */
const armsLength =
  '[&_input:not([type=checkbox],[type=radio])]:h-12 [&_select]:h-12 [&_label:has(input[type=checkbox])]:min-h-12 [&_fieldset_label:has(input[type=radio])]:h-12';

/** Makes one file of a version: what it is to be at the left, what it will be and the button that fetches it at the right. */
export function ExportPanel({ version, chordMm = 220, onClose }: ExportPanelProps) {
  const form = useForm<ExportFields>({
    defaultValues: startingFields(chordMm),
    resolver: exportResolver,
    mode: 'onChange',
  });
  const larger = !useMay('sections.read');
  const panel = useRef<HTMLDivElement>(null);
  return (
    <Dialog title={`Export ${version.sectionName} v${String(version.number)}`} width="wide" onClose={onClose}>
      <div
        ref={panel}
        className={`grid gap-6 md:grid-cols-[minmax(0,1fr)_minmax(0,22rem)] ${larger ? armsLength : ''}`}
      >
        <ExportForm form={form} />
        <FileColumn version={version} form={form} focusRefused={() => focusInvalid(panel.current)} />
      </div>
    </Dialog>
  );
}

interface FileColumnProps {
  readonly version: SectionVersion;
  readonly form: UseFormReturn<ExportFields>;
  /** Moves the focus to text that a field could not read; false when there is none. */
  readonly focusRefused: () => boolean;
}

function FileColumn({ version, form, focusRefused }: FileColumnProps) {
  const fields = useWatch({ control: form.control }) as ExportFields;
  const { file, refusal } = useMemo(() => previewOf(version, fields), [version, fields]);
  const url = file ? urlOf(version, fields) : null;
  const checksum = useFileChecksum(url);
  const client = useQueryClient();
  const announce = useAnnounce();
  const download = useDownload((fileName) => {
    announce(`Saved ${fileName}.`);
    void client.invalidateQueries({ queryKey: downloadsQuery(version.sectionId, version.number).queryKey });
  });
  const unitChord = fields.format === 'dat' && fields.unitChord;
  return (
    <div className="flex min-w-0 flex-col gap-3">
      <div>
        <p className="flex flex-wrap items-baseline gap-x-3 text-xl">
          version {version.number} <StatusMark status={version.status} />
        </p>
        {/* Room for a name of two lines, so that nothing below moves while the chord is typed. */}
        <p className="mt-1 flex min-h-14 items-center text-xl font-extrabold">
          <span className="[overflow-wrap:anywhere]">
            {file ? <FileName name={file.fileName} /> : 'No file yet'}
          </span>
        </p>
      </div>
      <FileFacts file={file} checksum={checksum} />
      {refusal !== '' && <Notice tone="error">{refusal}</Notice>}
      {version.status !== 'released' && <Notice tone="caution">{notInForce[version.status]}</Notice>}
      <Button
        variant="primary"
        size="large"
        busy={download.state.step === 'running'}
        disabled={url === null}
        onClick={() => {
          if (url !== null && !focusRefused()) void download.start(url);
        }}
      >
        Download
      </Button>
      <DownloadReport state={url === null ? { step: 'idle' } : download.state} />
      <ExportCautions format={fields.format} unitChord={unitChord} />
    </div>
  );
}

/** A long name breaks between its parts. */
function FileName({ name }: { readonly name: string }) {
  return name.split(/(?<=[_-])/).map((part, index) => (
    <Fragment key={index}>
      {part}
      <wbr />
    </Fragment>
  ));
}

/** A field keeps text that it cannot read while the form keeps the value before: no file is made from that. */
function focusInvalid(panel: HTMLElement | null): boolean {
  const invalid = panel?.querySelector<HTMLElement>('[aria-invalid="true"]');
  invalid?.focus();
  return invalid !== null && invalid !== undefined;
}

const notInForce = {
  draft: 'This version is not released. The file says so; do not cut from it.',
  superseded: 'This version is superseded. Cut from the version in force instead.',
  withdrawn: 'This version is withdrawn. Do not cut from it.',
} as const;

const { datFile: dat, dxfFile: dxf, svgFile: svg } = sectionEndpoints;
const endpoints = { dat, dxf, svg } as const;

function urlOf(version: SectionVersion, fields: ExportFields): string {
  return fileUrl(
    endpoints[fields.format],
    { sectionId: version.sectionId, number: version.number },
    queryOf(fields) as never,
  );
}
