import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useParams } from 'react-router';
import { inspectionRows } from '#geometry/cutting/inspection.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { sheetVersionQuery } from '#client/api/cut-sheets.ts';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { MeasureForm } from './measure-form.tsx';

/** Measuring a part of a cut sheet's version. */
export function Component() {
  const { sheetId = '', number = '' } = useParams();
  const version = useQuery(sheetVersionQuery(sheetId, Number(number)));
  const retry = () => void version.refetch();
  return (
    <div data-page="flowing" className="mx-auto flex w-full max-w-[80rem] flex-col gap-4 px-4 pt-4 pb-12">
      <title>Measure a part · Ribwright</title>
      {version.isPending && <Skeleton className="h-96 w-full" />}
      {version.isError && (
        <ErrorState title="The cut sheet could not be loaded." error={version.error} retry={retry} />
      )}
      {version.data && <Measured key={version.data.id} version={version.data} />}
    </div>
  );
}

function Measured({ version }: { readonly version: SheetVersion }) {
  const core = useMemo(() => {
    const identity = {
      sheetName: version.sheetName,
      versionNumber: version.number,
      checksum: version.checksum,
      part: 'core',
    };
    return planCore(version.pinned, identity).core;
  }, [version]);
  const rows = useMemo(() => (core ? inspectionRows(core.plan, core.core) : []), [core]);
  if (core === null || rows.length === 0) {
    return (
      <EmptyState title="There is nothing to measure.">
        The plan of this version names no station at which foam is left.
      </EmptyState>
    );
  }
  return <MeasureForm version={version} rows={rows} />;
}
