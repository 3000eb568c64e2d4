import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { lazy, Suspense } from 'react';
import { Navigate, useParams } from 'react-router';
import { type CutSheet } from '#server/contracts/cut-sheets.ts';
import { cutSheetQuery, sheetDraftQuery, sheetVersionQuery } from '#client/api/cut-sheets.ts';
import { useMay } from '#client/app/session.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { PlannerSkeleton } from './planner/planner-skeleton.tsx';
import { sheetVersionPath } from './paths.ts';

const Planner = lazy(async () => ({ default: (await import('./planner/planner.tsx')).Planner }));

/** One cut sheet: its planner for who may write, its version in force for everybody else. */
export function Component() {
  const { sheetId = '' } = useParams();
  return <SheetScreen key={sheetId} sheetId={sheetId} />;
}

function SheetScreen({ sheetId }: { readonly sheetId: string }) {
  const sheet = useQuery(cutSheetQuery(sheetId));
  const mayWrite = useMay('cut-sheets.write');
  if (sheet.data && mayWrite) return <OpenedSheet sheet={sheet.data} />;
  if (sheet.data) return <Navigate to={sheetVersionPath(sheetId, sheet.data.latest.number)} replace />;
  if (sheet.isError) {
    const retry = () => void sheet.refetch();
    return (
      <div className="p-4">
        <ErrorState title="The cut sheet could not be loaded." error={sheet.error} retry={retry} />
      </div>
    );
  }
  return <PlannerSkeleton />;
}

/** Fetches the person's unsaved plan once; what happens to it afterwards is the planner's own. */
function OpenedSheet({ sheet }: { readonly sheet: CutSheet }) {
  const draft = useQuery({ ...sheetDraftQuery(sheet.id), staleTime: Infinity, gcTime: 0 });
  const number = draft.data?.basedOn ?? sheet.latest.number;
  // While another version is looked up, as after a save, the planner stays.
  const version = useQuery({
    ...sheetVersionQuery(sheet.id, number),
    enabled: draft.data !== undefined,
    placeholderData: keepPreviousData,
  });
  const error = draft.error ?? version.error;
  if (draft.data !== undefined && version.data) {
    return (
      <Suspense fallback={<PlannerSkeleton />}>
        <Planner sheet={sheet} version={version.data} draft={draft.data} mayWrite={!sheet.archived} />
      </Suspense>
    );
  }
  if (error !== null) {
    const retry = () => void Promise.all([draft.refetch(), version.refetch()]);
    return (
      <div className="p-4">
        <ErrorState title="The plan could not be loaded." error={error} retry={retry} />
      </div>
    );
  }
  return <PlannerSkeleton />;
}
