import { Fragment, type ReactNode } from 'react';

/** Names at the left, values in step at the right. */
export function FactList({
  facts,
}: {
  readonly facts: readonly (readonly [name: string, value: ReactNode])[];
}) {
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1">
      {facts.map(([name, value]) => (
        <Fragment key={name}>
          <dt>{name}</dt>
          <dd className="min-w-0 text-right font-semibold break-words">{value}</dd>
        </Fragment>
      ))}
    </dl>
  );
}
