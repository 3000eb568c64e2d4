import { type ReactNode, useState } from 'react';
import {
  type FlightCondition,
  type FlightFigures,
  flightFigures,
  speedRange,
} from '#geometry/flow/flight-condition.ts';
import { formatNumber, formatPercent, useUnits } from '#client/app/units.ts';
import { Caution } from '#client/ui/caution.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { formatFlight, readFlight } from './quantities.ts';
import { ReynoldsTable } from './reynolds-table.tsx';

/** Lift coefficients of a small wing at the stall and in fast flight, to begin with: common practice, no measurement. */
const ASSUMED = { highest: 1.2, lowest: 0.2 };
/** Lift coefficients that an assumption can have. */
const LIFT = { min: 0.02, max: 4 };
/** Reynolds numbers that the estimates are made for. */
const ESTIMATED = { min: 60_000, max: 3_000_000 };
/** Above this speed the air's compressibility begins to count [common practice]. */
const COMPRESSIBLE_MACH = 0.3;

/** Quieter, but still to be read. */
const OLDER = 'text-graphite italic';

/** What follows from a flight condition, live; `older` says that the form cannot be read at the moment. */
export function Figures({ condition, older }: { condition: FlightCondition; older: boolean }) {
  const units = useUnits();
  const lift = useAssumedLift();
  const figures = flightFigures(condition);
  const range = speedRange(condition, lift.highest, lift.lowest);
  return (
    <section aria-label="What follows" className="flex min-w-0 flex-col gap-4">
      <Caution>
        Estimates of two-dimensional theory, no proof of strength or airworthiness. Follow local aviation
        rules.
      </Caution>
      <p role="status" className="-my-2 min-h-8 text-xs text-amber sm:min-h-4">
        {older && 'The form cannot be read at the moment: these are the last figures that it gave.'}
      </p>
      <div className={`flex flex-col gap-4 ${older ? OLDER : ''}`}>
        <Flight figures={figures} />
        <Block title="Reynolds number">
          <dl>
            <Fact label={`Root, ${formatFlight(condition.rootChordMm, 'chord', units)}`}>
              {grouped(figures.reynoldsRoot)}
            </Fact>
            <Fact label={`Mean, ${formatFlight(figures.meanChordMm, 'chord', units)}`}>
              {grouped(figures.reynoldsMean)}
            </Fact>
            <Fact label={`Tip, ${formatFlight(condition.tipChordMm, 'chord', units)}`}>
              {grouped(figures.reynoldsTip)}
            </Fact>
          </dl>
        </Block>
        <Block title="Speed range in level flight">
          <dl>
            <Fact label={`Stall, at lift coefficient ${formatNumber(lift.highest, 2)}`}>
              {speedText(range.stallMS)}
            </Fact>
            <Fact label={`Fast, at lift coefficient ${formatNumber(lift.lowest, 2)}`}>
              {speedText(range.fastMS)}
            </Fact>
          </dl>
        </Block>
      </div>
      <Block title="Lift coefficients assumed for it, not kept">
        <AssumedLift {...lift} />
      </Block>
      <Findings figures={figures} {...lift} />
      <div className={older ? OLDER : ''}>
        <ReynoldsTable condition={condition} figures={figures} range={range} />
      </div>
    </section>
  );
}

function Flight({ figures }: { figures: FlightFigures }) {
  const { air, criticalN } = figures;
  const station = (trip: number) => (trip === 1 ? 'free' : `at ${formatPercent(trip, 1)} of chord`);
  return (
    <Block title="Level flight">
      <dl>
        <Fact label="Speed">{speedText(figures.speedMS)}</Fact>
        <Fact label="Lift coefficient needed">{formatNumber(figures.liftCoefficient, 3)}</Fact>
        <Fact label="Wing area">{formatNumber(figures.areaM2, 4)} m²</Fact>
        <Fact label="Wing loading">{formatNumber(figures.wingLoading, 2)} kg/m²</Fact>
        <Fact label="Air temperature">{formatNumber(air.temperatureK - 273.15, 1)} °C</Fact>
        <Fact label="Density">{formatNumber(air.density, 4)} kg/m³</Fact>
        <Fact label="Dynamic pressure">{formatNumber(figures.dynamicPressure, 1)} Pa</Fact>
        <Fact label="Mach number">{formatNumber(figures.mach, 3)}</Fact>
        <Fact label="Critical N of transition">{formatNumber(criticalN, 1)}</Fact>
        <Fact label="Transition, upper">{station(figures.tripUpper)}</Fact>
        <Fact label="Transition, lower">{station(figures.tripLower)}</Fact>
      </dl>
    </Block>
  );
}

const speedText = (speedMS: number) =>
  `${formatNumber(speedMS, 1)} m/s (${formatNumber(speedMS * 3.6, 0)} km/h)`;

/** "278 000": three digits that mean something, grouped. */
function grouped(reynolds: number): string {
  return Number(reynolds.toPrecision(3)).toLocaleString('en').replaceAll(',', '\u202f');
}

function Block({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section>
      <h3 className="mb-1 border-b border-rule pb-1 text-xs font-semibold text-graphite uppercase">
        {title}
      </h3>
      {children}
    </section>
  );
}

function Fact({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="flex justify-between gap-4 py-0.5">
      <dt className="text-graphite">{label}</dt>
      <dd className="text-right font-semibold whitespace-nowrap">{children}</dd>
    </div>
  );
}

/** The lift coefficients that the speed range stands on, as typed, and the last pair that could be read. */
function useAssumedLift() {
  const [texts, setTexts] = useState({
    highest: formatNumber(ASSUMED.highest, 2),
    lowest: formatNumber(ASSUMED.lowest, 2),
  });
  const [last, setLast] = useState(ASSUMED);
  const errors = liftErrors(texts);
  const type = (end: 'highest' | 'lowest', text: string) => {
    const next = { ...texts, [end]: text };
    setTexts(next);
    const [highest, lowest] = [next.highest, next.lowest].map((one) => readFlight(one, 'lift', 'mm').value);
    if (highest !== undefined && lowest !== undefined && Object.keys(liftErrors(next)).length === 0) {
      setLast({ highest, lowest });
    }
  };
  return { ...last, texts, errors, type };
}

function liftErrors(texts: { highest: string; lowest: string }): { highest?: string; lowest?: string } {
  const errors: { highest?: string; lowest?: string } = {};
  const values = { highest: 0, lowest: 0 };
  for (const end of ['highest', 'lowest'] as const) {
    const read = readFlight(texts[end], 'lift', 'mm');
    if (read.error !== undefined) errors[end] = read.error;
    else if (!(read.value >= LIFT.min && read.value <= LIFT.max)) {
      errors[end] = `The lift coefficient must be between ${String(LIFT.min)} and ${String(LIFT.max)}.`;
    } else values[end] = read.value;
  }
  if (Object.keys(errors).length === 0 && values.highest <= values.lowest) {
    errors.highest = 'It must be above that of fast flight.';
  }
  return errors;
}

function AssumedLift({ texts, errors, type }: ReturnType<typeof useAssumedLift>) {
  return (
    <div className="grid grid-cols-2 items-start gap-3">
      <TextField
        label="At the stall"
        autoComplete="off"
        value={texts.highest}
        error={errors.highest}
        onChange={(event) => {
          type('highest', event.target.value);
        }}
      />
      <TextField
        label="In fast flight"
        autoComplete="off"
        value={texts.lowest}
        error={errors.lowest}
        onChange={(event) => {
          type('lowest', event.target.value);
        }}
      />
    </div>
  );
}

/** What a person should know before relying on the figures. */
interface FindingsProps {
  figures: FlightFigures;
  highest: number;
  lowest: number;
}

function Findings({ figures, highest, lowest }: FindingsProps) {
  const numbers = [figures.reynoldsRoot, figures.reynoldsMean, figures.reynoldsTip];
  const outside = Math.min(...numbers) < ESTIMATED.min || Math.max(...numbers) > ESTIMATED.max;
  return (
    <>
      {figures.liftCoefficient > highest && (
        <Notice tone="error">
          This flight needs a lift coefficient of {formatNumber(figures.liftCoefficient, 2)}, above the{' '}
          {formatNumber(highest, 2)} assumed at the stall: the aircraft cannot fly level like this.
        </Notice>
      )}
      {figures.liftCoefficient < lowest && (
        <Notice tone="caution">
          This flight needs a lift coefficient of {formatNumber(figures.liftCoefficient, 2)}, below the{' '}
          {formatNumber(lowest, 2)} assumed in fast flight: the section must still have little drag there.
        </Notice>
      )}
      {outside && (
        <Notice tone="caution">
          A Reynolds number lies outside 60 000 to 3 000 000, for which the estimates are made.
        </Notice>
      )}
      {figures.mach > COMPRESSIBLE_MACH && (
        <Notice tone="caution">Above Mach 0.3 the air is compressed: the estimates are less sure.</Notice>
      )}
    </>
  );
}
