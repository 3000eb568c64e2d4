import { type ReactNode } from 'react';
import { Link } from 'react-router';
import { type SectionVersion } from '#server/contracts/sections.ts';

interface StandingProps {
  readonly version: Pick<SectionVersion, 'status' | 'statusAt' | 'statusBy' | 'statusReason'>;
  /** What the versions are of: "section" or "cut sheet". */
  readonly noun: string;
  readonly pathOf: (number: number) => string;
  /** Number of the version in force, null when none is, undefined while it is not known. */
  readonly inForce: number | null | undefined;
}

const DAY = new Intl.DateTimeFormat(undefined, { day: 'numeric', month: 'short', year: 'numeric' });

/** Says in a sentence whether this version may be cut, since when, why, and which one is in force instead. */
export function Standing({ version, noun, pathOf, inForce }: StandingProps) {
  const since = version.statusAt === null ? '' : ` on ${DAY.format(new Date(version.statusAt))}`;
  const by = version.statusBy === null ? '' : ` by ${version.statusBy.name}`;
  const reason = version.statusReason === '' ? '' : ` ${asSentence(version.statusReason)}`;
  const instead = <InForce noun={noun} pathOf={pathOf} inForce={inForce} />;
  switch (version.status) {
    case 'released':
      return (
        <Line className="border-spruce">
          In force: released{since}
          {by}.{reason}
        </Line>
      );
    case 'superseded':
      return (
        <Line className="border-amber">
          Superseded{since}: do not cut from this version any more. {instead}
        </Line>
      );
    case 'withdrawn':
      return (
        <Line className="border-brick">
          Withdrawn{since}
          {by}: do not cut it.{reason} {instead}
        </Line>
      );
    case 'draft':
      return (
        <Line className="border-rule">
          Not released: a draft for the drawing office, not for the machines. {instead}
        </Line>
      );
  }
}

function Line({ className, children }: { readonly className: string; readonly children: ReactNode }) {
  return <p className={`border-l-[3px] py-1 pl-3 print:hidden ${className}`}>{children}</p>;
}

function InForce({ noun, pathOf, inForce }: Omit<StandingProps, 'version'>) {
  if (inForce === undefined) return null;
  if (inForce === null) return <>No version of this {noun} is in force.</>;
  return (
    <>
      <Link className="font-semibold underline underline-offset-4" to={pathOf(inForce)}>
        Version {inForce}
      </Link>{' '}
      is in force.
    </>
  );
}

export function versionPath(sectionId: string, number: number): string {
  return `/sections/${sectionId}/versions/${number}`;
}

function asSentence(text: string): string {
  return /[.!?]$/.test(text) ? text : `${text}.`;
}
