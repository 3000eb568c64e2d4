import { Link } from 'react-router';
import { useUnits } from '#client/app/units.ts';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { type StoredCondition } from '#server/contracts/flight-conditions.ts';
import { linkIdOf, searchOf } from './address.ts';
import { formatFlight } from './quantities.ts';

interface ConditionListProps {
  /** Null while they are on their way: skeletons of the true size stand in. */
  conditions: readonly StoredCondition[] | null;
  chosen: string | null;
  archive: boolean;
}

/** The flight conditions of the workshop, the default first. */
export function ConditionList({ conditions, chosen, archive }: ConditionListProps) {
  const units = useUnits();
  if (conditions === null) return <ListSkeleton />;
  return (
    <ul aria-label="Flight conditions">
      {conditions.map((one) => (
        <li
          key={one.id}
          className={`relative min-h-16 border-b border-rule px-2 py-2 hover:bg-sheet focus-within:bg-sheet ${one.id === chosen ? 'bg-sheet shadow-[inset_3px_0_0_var(--wire)]' : ''}`}
        >
          <Link
            id={linkIdOf(one.id)}
            to={searchOf(one.id, archive)}
            preventScrollReset
            aria-current={one.id === chosen ? 'true' : undefined}
            title={one.name}
            className="block truncate font-semibold after:absolute after:inset-0"
          >
            {one.name}
          </Link>
          <span className="block text-xs text-graphite">
            {formatFlight(one.settings.massKg, 'mass', units)}, {flightWords(one, units)}
          </span>
          {(one.isDefault || one.archived) && (
            <span className="block text-xs text-graphite">
              {one.isDefault ? '● default of the workshop' : 'in the archive'}
            </span>
          )}
        </li>
      ))}
    </ul>
  );
}

function flightWords({ settings }: StoredCondition, units: 'mm' | 'inch'): string {
  const { flight, altitudeM } = settings;
  const at =
    flight.kind === 'speed'
      ? formatFlight(flight.speedMS, 'speed', units)
      : `lift coefficient ${formatFlight(flight.liftCoefficient, 'lift', units)}`;
  return `${at}, altitude ${formatFlight(altitudeM, 'altitude', units)}`;
}

function ListSkeleton() {
  return (
    <ul aria-label="Flight conditions" aria-busy="true">
      {[0, 1, 2].map((row) => (
        <li key={row} className="min-h-16 border-b border-rule px-2 py-2">
          <Skeleton className="h-5 w-3/5" />
          <Skeleton className="mt-1 h-4 w-4/5" />
        </li>
      ))}
    </ul>
  );
}
