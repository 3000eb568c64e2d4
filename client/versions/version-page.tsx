import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router';
import { type Section, versionSchema } from '#server/contracts/sections.ts';
import { ProblemError } from '#client/api/request.ts';
import { sectionQuery, versionQuery } from '#client/api/sections.ts';
import { useMay } from '#client/app/session.tsx';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { versionPath } from './standing.tsx';
import { VersionView } from './version-view.tsx';

/** The route of one immutable version. */
export function Component() {
  const { sectionId = '', number = '' } = useParams();
  const wanted = versionSchema.shape.number.min(1).safeParse(Number(number));
  if (!wanted.success) return <NoSuchVersion sectionId={sectionId} />;
  return <VersionByNumber key={`${sectionId} ${number}`} sectionId={sectionId} number={wanted.data} />;
}

function VersionByNumber({ sectionId, number }: { readonly sectionId: string; readonly number: number }) {
  const version = useQuery(versionQuery(sectionId, number));
  const section = useQuery(sectionQuery(sectionId));
  if (version.data) return <VersionView version={version.data} inForce={inForceOf(section)} />;
  if (version.isPending) return <VersionSkeleton />;
  if (version.error instanceof ProblemError && [404, 422].includes(version.error.status)) {
    return <NoSuchVersion sectionId={sectionId} number={number} />;
  }
  return (
    <div className="p-4">
      <ErrorState
        title="The version could not be loaded."
        error={version.error}
        retry={() => void version.refetch()}
      />
    </div>
  );
}

/** A section that a technician cannot see any more has no version in force; undefined while it is not known. */
function inForceOf({
  data,
  error,
}: {
  readonly data?: Section | undefined;
  readonly error: unknown;
}): number | null | undefined {
  if (data) return data.releasedNumber;
  return error instanceof ProblemError && error.status === 404 ? null : undefined;
}

/** A person who may read released versions only is led to the one in force. */
function NoSuchVersion({ sectionId, number }: { readonly sectionId: string; readonly number?: number }) {
  const section = useQuery({ ...sectionQuery(sectionId), retry: false });
  const seesAll = useMay('sections.read');
  const inForce = section.data?.releasedNumber ?? null;
  const title =
    number === undefined ? 'There is no such version.' : `There is no version ${number} to show here.`;
  const link =
    inForce === null
      ? { to: '/sections', text: 'All sections' }
      : { to: versionPath(sectionId, inForce), text: `Version ${inForce}, in force` };
  return (
    <div className="p-4">
      <EmptyState
        title={title}
        action={
          <Link
            className="inline-flex min-h-12 items-center font-semibold underline underline-offset-4"
            to={link.to}
          >
            {link.text}
          </Link>
        }
      >
        {seesAll ? 'The address may be mistyped.' : 'It is not in force. Cut only from the version in force.'}
      </EmptyState>
    </div>
  );
}

function VersionSkeleton() {
  return (
    <div
      className="grid gap-4 p-4 lg:grid-cols-[minmax(0,1fr)_22rem]"
      aria-busy="true"
      aria-label="Loading the version"
    >
      <div className="flex flex-col gap-4">
        <Skeleton className="h-8 w-80 max-w-full" />
        <Skeleton className="h-[70dvh] w-full" />
      </div>
      <Skeleton className="h-96 w-full" />
    </div>
  );
}
