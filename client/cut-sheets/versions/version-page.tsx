import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router';
import { sheetVersionSchema } from '#server/contracts/cut-sheets.ts';
import { cutSheetQuery, sheetVersionQuery } from '#client/api/cut-sheets.ts';
import { ProblemError } from '#client/api/request.ts';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { sheetVersionPath } from '../paths.ts';
import { SheetSkeleton } from '../sheet-skeleton.tsx';
import { SheetVersionView } from './version-view.tsx';

/** The route of one immutable version of a cut sheet. */
export function Component() {
  const { sheetId = '', number = '' } = useParams();
  const wanted = sheetVersionSchema.shape.number.min(1).safeParse(Number(number));
  if (!wanted.success) return <NoSuchVersion sheetId={sheetId} />;
  return <VersionByNumber key={`${sheetId} ${number}`} sheetId={sheetId} number={wanted.data} />;
}

function VersionByNumber({ sheetId, number }: { readonly sheetId: string; readonly number: number }) {
  const version = useQuery(sheetVersionQuery(sheetId, number));
  const sheet = useQuery(cutSheetQuery(sheetId));
  const isGone = sheet.error instanceof ProblemError && sheet.error.status === 404;
  const inForce = sheet.data ? sheet.data.releasedNumber : isGone ? null : undefined;
  if (version.data) return <SheetVersionView version={version.data} inForce={inForce} />;
  if (version.isPending) return <SheetSkeleton />;
  if (version.error instanceof ProblemError && [404, 422].includes(version.error.status)) {
    return <NoSuchVersion sheetId={sheetId} />;
  }
  const retry = () => void version.refetch();
  return (
    <div className="p-4">
      <ErrorState title="The version could not be loaded." error={version.error} retry={retry} />
    </div>
  );
}

/** A person who may read released versions only is led to the one in force. */
function NoSuchVersion({ sheetId }: { readonly sheetId: string }) {
  const sheet = useQuery({ ...cutSheetQuery(sheetId), retry: false });
  const inForce = sheet.data?.releasedNumber ?? null;
  const link =
    inForce === null
      ? { to: '/cut-sheets', text: 'All cut sheets' }
      : { to: sheetVersionPath(sheetId, inForce), text: `Version ${String(inForce)}, in force` };
  return (
    <div className="p-4">
      <EmptyState
        title="There is no such version to show here."
        action={
          <Link
            className="inline-flex min-h-12 items-center font-semibold underline underline-offset-4"
            to={link.to}
          >
            {link.text}
          </Link>
        }
      >
        Cut only from the version in force.
      </EmptyState>
    </div>
  );
}
