import { useQuery } from '@tanstack/react-query';
import { conditionsQuery } from '#client/api/flight-conditions.ts';
import { useMay } from '#client/app/session.tsx';
import { Button } from '#client/ui/button.tsx';
import { CheckboxField } from '#client/ui/checkbox-field.tsx';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { ErrorState, sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { type StoredCondition } from '#server/contracts/flight-conditions.ts';
import { linkIdOf, useConditionAddress } from './address.ts';
import { ConditionList } from './condition-list.tsx';
import { ConditionSide, Frame } from './condition-side.tsx';

/** Flight conditions of the workshop: the list, and beside it the chosen one or the default. */
export function Component() {
  const { place, archive, go } = useConditionAddress();
  const mayWrite = useMay('flight-conditions.write');
  const { data, error, refetch } = useQuery(conditionsQuery());
  // Where there is room for one of them only, the chosen one stands in the place of the list.
  const chosen = place !== null;
  const shownId = place ?? data?.find(({ isDefault }) => isDefault)?.id ?? null;
  const archived = data?.filter((one) => one.archived).length ?? 0;
  return (
    <div data-page="flowing" className="mx-auto w-full max-w-[100rem] px-4 pt-4 pb-10">
      <title>Flight conditions · Ribwright</title>
      <div className="grid gap-x-8 lg:grid-cols-[18rem_minmax(0,1fr)]">
        <div className="min-w-0">
          <div className="mb-3 flex min-h-8 flex-wrap items-center justify-between gap-2">
            <h1 className="text-xl font-extrabold">Flight conditions</h1>
            {mayWrite && (
              <Button
                id={linkIdOf('new')}
                onClick={() => {
                  go('new');
                }}
              >
                New
              </Button>
            )}
          </div>
          <div className={chosen ? 'max-lg:hidden' : ''}>
            {error && <Failure error={error} loaded={data !== undefined} retry={() => void refetch()} />}
            {data?.length === 0 && <NoCondition mayWrite={mayWrite} />}
            {(data ?? !error) && (
              <ConditionList
                conditions={data?.filter((one) => archive || !one.archived) ?? null}
                chosen={shownId}
                archive={archive}
              />
            )}
            {archived > 0 && (
              <CheckboxField
                label={`Show the archive (${String(archived)})`}
                checked={archive}
                onChange={(event) => {
                  go(place, { archive: event.target.checked, replace: true });
                }}
              />
            )}
          </div>
        </div>
        <div className={`min-w-0 lg:border-l lg:border-rule lg:pl-5 ${chosen ? '' : 'max-lg:hidden'}`}>
          {data && shownId !== null && (
            <Shown {...{ shownId, wanted: chosen, conditions: data, mayWrite, go }} />
          )}
        </div>
      </div>
    </div>
  );
}

function Failure({ error, loaded, retry }: { error: Error; loaded: boolean; retry: () => void }) {
  if (loaded) return <Notice tone="error">{sentenceOf(error)} What is shown was loaded before.</Notice>;
  return <ErrorState title="Flight conditions could not be loaded." error={error} retry={retry} />;
}

interface ShownProps {
  shownId: string;
  wanted: boolean;
  conditions: readonly StoredCondition[];
  mayWrite: boolean;
  go: ReturnType<typeof useConditionAddress>['go'];
}

function Shown({ shownId, wanted, conditions, mayWrite, go }: ShownProps) {
  const stored = conditions.find(({ id }) => id === shownId) ?? null;
  const close = () => {
    go(null);
  };
  if (stored === null && (shownId !== 'new' || !mayWrite)) {
    return (
      <Frame title="There is no such condition" under={null} wanted returnTo="" onClose={close}>
        <p>The address leads to nothing of this workshop that you can see here.</p>
      </Frame>
    );
  }
  return (
    <ConditionSide
      // The default that stands there of itself is left like any other: what was typed goes with the form.
      key={`${shownId} ${wanted ? 'chosen' : ''}`}
      stored={stored}
      wanted={wanted}
      mayWrite={mayWrite}
      onClose={close}
      onSaved={(now) => {
        if (stored === null) go(now.id, { replace: true });
      }}
    />
  );
}

function NoCondition({ mayWrite }: { mayWrite: boolean }) {
  return (
    <EmptyState title="No flight condition yet.">
      {mayWrite
        ? 'Make the one that the aircraft flies most: the form begins with plausible values.'
        : 'An owner or designer enters how the aircraft fly.'}
    </EmptyState>
  );
}
