import { useState } from 'react';
import { kerfFromWidths, type MeasuredKerf } from '#geometry/cutting/kerf.ts';
import { STRIP_WIDTHS_MM } from '#geometry/cutting/test-strip.ts';
import { shopEndpoints } from '#server/contracts/shop-endpoints.ts';
import { type Machine, type Material } from '#server/contracts/shop.ts';
import { fileUrl } from '#client/api/request.ts';
import { formatLength, useUnits } from '#client/app/units.ts';
import { Button } from '#client/ui/button.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { DownloadReport } from '#client/versions/download-state.tsx';
import { useDownload } from '#client/versions/use-download.ts';
import { readShopQuantity } from './quantities.ts';

interface KerfStripProps {
  readonly machine: Machine;
  readonly material: Material;
  readonly onKerf: (kerfMm: number) => void;
}

/** The test strip: its file, and the widths that the pieces measure; their mean difference is the kerf. */
export function KerfStrip({ machine, material, onKerf }: KerfStripProps) {
  const download = useDownload(() => undefined);
  const name = fileOf(machine);
  const place = { machineId: machine.id, materialId: material.id };
  return (
    <fieldset className="flex flex-col gap-3 border-t border-rule pt-3">
      <legend className="pr-2 text-xs font-semibold tracking-wide text-graphite uppercase">Test strip</legend>
      <p>
        Three pieces with {STRIP_WIDTHS_MM.join(', ')} mm between their cuts. Each measures less by one kerf.
        {STAND[machine.settings.kind]}
      </p>
      {name !== null && (
        <>
          <Button
            className="self-start"
            busy={download.state.step === 'running'}
            onClick={() =>
              void download.start(fileUrl(shopEndpoints.kerfStripFile, { ...place, name }, undefined))
            }
          >
            Download {name}
          </Button>
          <DownloadReport state={download.state} />
        </>
      )}
      <MeasuredWidths onKerf={onKerf} />
    </fieldset>
  );
}

/** What the strip is cut from. */
const STAND: Readonly<Record<Machine['settings']['kind'], string>> = {
  wire: ' Low foam stands on edge; the program’s header states the size of the piece.',
  bow: ' By hand: cut three pieces along straight battens this far apart.',
  laser: '',
  router: '',
};

function fileOf({ settings }: Machine): 'strip.nc' | 'strip.dxf' | null {
  if (settings.kind === 'wire') return 'strip.nc';
  return settings.kind === 'bow' ? null : 'strip.dxf';
}

function MeasuredWidths({ onKerf }: Pick<KerfStripProps, 'onKerf'>) {
  const units = useUnits();
  const [texts, setTexts] = useState<readonly string[]>(STRIP_WIDTHS_MM.map(() => ''));
  const [errors, setErrors] = useState<ReadonlyMap<number, string>>(new Map());
  const [kerf, setKerf] = useState<MeasuredKerf | null>(null);
  const compute = () => {
    const read = texts.map((text) => readShopQuantity(text, 'length', units));
    const unread = read.flatMap(({ error }, i) => (error === undefined ? [] : [[i, error] as const]));
    const found = kerfFromWidths(
      STRIP_WIDTHS_MM,
      read.map(({ value }) => value ?? Number.NaN),
      'measured',
    );
    const refused = found.findings.map(({ path, message }) => [Number(path.split('.')[1]), message] as const);
    setErrors(new Map(unread.length > 0 ? unread : refused));
    setKerf(unread.length > 0 ? null : found.kerf);
    if (unread.length === 0 && found.kerf) onKerf(found.kerf.kerfMm);
  };
  return (
    <>
      {STRIP_WIDTHS_MM.map((widthMm, i) => (
        <TextField
          key={widthMm}
          label={`Measured width of the ${String(widthMm)} mm piece`}
          autoComplete="off"
          inputMode="decimal"
          value={texts[i] ?? ''}
          error={errors.get(i)}
          onChange={(event) => setTexts(texts.map((text, k) => (k === i ? event.target.value : text)))}
        />
      ))}
      <Button className="self-start" onClick={compute}>
        Take the kerf from these widths
      </Button>
      <p role="status" className="min-h-5">
        {kerf !== null &&
          `Kerf ${formatLength(kerf.kerfMm, units)}, the pieces differ by ${formatLength(kerf.spreadMm, units)}. Save it below.`}
      </p>
    </>
  );
}
