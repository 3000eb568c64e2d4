import { useRef, useState } from 'react';
import { useNavigate } from 'react-router';
import { v4 } from 'uuid';
import { type InspectionRow } from '#geometry/cutting/inspection.ts';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { useAddInspection } from '#client/api/cutting-list.ts';
import { MM_PER_INCH, useUnits } from '#client/app/units.ts';
import { StaleNotice } from '#client/cut-sheets/source-words.tsx';
import { Button } from '#client/ui/button.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextAreaField, TextField } from '#client/ui/text-field.tsx';
import { judge, keyOf } from './reading.ts';
import { ReadingTable } from './reading-table.tsx';
import { StationDrawing } from './station-drawing.tsx';

interface MeasureFormProps {
  readonly version: SheetVersion;
  readonly rows: readonly InspectionRow[];
}

/** The readings of one part, station by station: Enter goes to the next; files what was measured. */
export function MeasureForm({ version, rows }: MeasureFormProps) {
  const { readings, setReading, judged, mark, setMark, note, setNote, file, problem, busy } = useMeasuring(
    version,
    rows,
  );
  const filled = judged.filter(({ state }) => state === 'within' || state === 'out').length;
  const out = judged.filter(({ state }) => state === 'out').length;
  return (
    <>
      <header className="flex flex-col gap-1">
        <h1 className="text-xl font-extrabold">
          Measure {version.sheetName} v{version.number}
        </h1>
        <p className="text-base text-graphite">
          {version.pinned.inspection.measured === 'core'
            ? 'Thickness of the bare core, square to the chord.'
            : 'Thickness with the skins on, square to the chord.'}{' '}
          Enter goes to the next station.
        </p>
      </header>
      <StaleNotice ends={version} large />
      <StationDrawing version={version} rows={rows} judged={judged} />
      <ReadingTable rows={rows} judged={judged} readings={readings} onReading={setReading} />
      <div className="grid gap-4 sm:grid-cols-[14rem_minmax(0,1fr)]">
        <TextField
          label="Mark on the part"
          placeholder="left 1"
          maxLength={40}
          value={mark}
          onChange={(event) => setMark(event.target.value)}
        />
        <TextAreaField
          label="Note (optional)"
          rows={2}
          maxLength={500}
          value={note}
          onChange={(event) => setNote(event.target.value)}
        />
      </div>
      {problem !== null && <Notice tone="error">{problem}</Notice>}
      <div className="flex flex-wrap items-center gap-4">
        <Button size="large" variant="primary" busy={busy} onClick={() => void file()}>
          File the inspection
        </Button>
        <p role="status" className="text-base">
          {filled} of {rows.length} measured
          {filled > 0 && (out === 0 ? ', all within tolerance' : `, ${String(out)} out of tolerance`)}
        </p>
      </div>
    </>
  );
}

function useMeasuring(version: SheetVersion, rows: readonly InspectionRow[]) {
  const units = useUnits();
  const navigate = useNavigate();
  const add = useAddInspection();
  const [readings, setReadings] = useState<ReadonlyMap<string, string>>(new Map());
  const [mark, setMark] = useState('');
  const [note, setNote] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  // One key for this part: pressing again after a lost answer files it once.
  const intended = useRef<{ key: string; as: string; at: string } | null>(null);
  const mmPerUnit = units === 'mm' ? 1 : MM_PER_INCH;
  const judged = rows.map((row) => judge(readings.get(keyOf(row)), row, mmPerUnit));
  const setReading = (row: InspectionRow, text: string) => {
    setReadings((before) => new Map(before).set(keyOf(row), text));
    setProblem(null);
  };
  const file = async () => {
    if (judged.some(({ state }) => state === 'unreadable')) {
      setProblem('One reading is no number. Mend it first.');
      return;
    }
    const measurements = rows.flatMap(({ end, station }, i) => {
      const reading = judged[i];
      return reading && 'measuredMm' in reading ? [{ end, station, measuredMm: reading.measuredMm }] : [];
    });
    if (measurements.length === 0) {
      setProblem('Measure at one station at least.');
      return;
    }
    const inspection = {
      sheetId: version.sheetId,
      versionNumber: version.number,
      mark,
      machineId: version.machine?.id ?? null,
      measurements,
      note,
    };
    const as = JSON.stringify(inspection);
    if (intended.current?.as !== as) intended.current = { key: v4(), as, at: new Date().toISOString() };
    try {
      const { key, at } = intended.current;
      const filed = await add.mutateAsync({ ...inspection, at, key });
      await navigate(`/inspections/${filed.id}`);
    } catch (error) {
      setProblem(`It was not filed; the readings are kept here. ${sentenceOf(error)}`);
    }
  };
  return { readings, setReading, judged, mark, setMark, note, setNote, file, problem, busy: add.isPending };
}
