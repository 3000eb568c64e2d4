import { type KeyboardEvent, useMemo } from 'react';
import { formatNumber, MM_PER_INCH, type Units, useUnits } from '#client/app/units.ts';
import { Button } from '#client/ui/button.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { type CutModel } from '../views/plan-model.ts';
import { duration } from '../views/view-words.ts';
import { type WirePosition } from '../views/wire-position.ts';
import { type Speed, SPEEDS } from './player.ts';
import { type usePlayer } from './use-player.ts';

interface PlayerBarProps {
  readonly cut: CutModel | null;
  readonly control: ReturnType<typeof usePlayer>;
}

/** Runs the wire along the cut in all views, and says where in the program it is. Keeps its height without a cut. */
export function PlayerBar({ cut, control }: PlayerBarProps) {
  const units = useUnits();
  return (
    <section aria-label="Run of the wire" className="flex flex-col gap-1.5 print:hidden">
      {cut && control.position ? (
        <Run cut={cut} control={control} position={control.position} units={units} />
      ) : (
        <p className="flex min-h-14 items-center text-graphite">
          No wire runs: choose a foam, a block and a wire machine that holds the panel between its towers.
        </p>
      )}
    </section>
  );
}

interface RunProps {
  readonly cut: CutModel;
  readonly control: ReturnType<typeof usePlayer>;
  readonly position: WirePosition;
  readonly units: Units;
}

function Run({ cut, control, position, units }: RunProps) {
  const { player, calm, toggle, dispatch } = control;
  return (
    <>
      <div className="flex items-center gap-3">
        <Button onClick={toggle} title="Space" className="w-34">
          <Glyph playing={player.playing} />
          {calm ? 'next part' : player.playing ? 'stop the wire' : 'run the wire'}
        </Button>
        <TimeSlider cut={cut} control={control} position={position} />
        <span className="w-50 shrink-0 text-right whitespace-nowrap max-sm:hidden">
          {`${duration(player.seconds)} of ${duration(player.totalSeconds)}`}
        </span>
        {!calm && (
          <SelectField
            label="Speed of the run"
            hideLabel
            options={SPEEDS.map((speed) => ({ value: String(speed), label: `${speed}×` }))}
            value={String(player.speed)}
            onChange={(event) => dispatch({ type: 'speed', speed: Number(event.target.value) as Speed })}
            className="w-18 shrink-0"
          />
        )}
      </div>
      <p className="text-xs sm:hidden">{`${duration(player.seconds)} of ${duration(player.totalSeconds)}`}</p>
      <ProgramLine cut={cut} position={position} units={units} />
    </>
  );
}

function Glyph({ playing }: { playing: boolean }) {
  return (
    <svg viewBox="0 0 10 10" aria-hidden="true" className="size-2.5 fill-wire">
      <path d={playing ? 'M1 0H4V10H1ZM6 0H9V10H6Z' : 'M1 0 9 5 1 10Z'} />
    </svg>
  );
}

/** A native slider over the time of the cut; its arrows go from node to node of the wire's way. */
function TimeSlider({ cut, control, position }: Pick<RunProps, 'cut' | 'control' | 'position'>) {
  const { player, dispatch } = control;
  const times = cut.arrives;
  const keyDown = (event: KeyboardEvent) => {
    const by = STEPS[event.key];
    if (by === undefined) return;
    event.preventDefault();
    dispatch({ type: 'step', by, times });
  };
  return (
    <input
      type="range"
      aria-label="Time of the cut"
      aria-valuetext={`${duration(player.seconds)}, ${position.part}, line ${position.line}`}
      min={0}
      max={player.totalSeconds}
      step="any"
      value={player.seconds}
      onKeyDown={keyDown}
      onChange={(event) => dispatch({ type: 'seek', seconds: Number(event.target.value) })}
      className="h-7 min-w-0 flex-1 accent-wire pointer-coarse:h-11"
    />
  );
}

const STEPS: Readonly<Record<string, number>> = {
  ArrowRight: 1,
  ArrowUp: 1,
  ArrowLeft: -1,
  ArrowDown: -1,
  PageUp: 10,
  PageDown: -10,
};

/** The line of the program, what it does, and how fast the wire is at both faces. */
function ProgramLine({ cut, position, units }: Pick<RunProps, 'cut' | 'position' | 'units'>) {
  const { line, part, waits, leftFeed, rightFeed } = position;
  const text = useMemo(() => (line > 0 ? (cut.lines[line - 1] ?? '') : 'not begun'), [cut, line]);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_auto] items-baseline gap-x-4 text-xs max-sm:grid-cols-1">
      <p className="truncate">
        {`${waits ? `${part}, the wire warms up` : part} `}
        <span className="text-graphite">{`line ${line} of ${cut.lines.length} `}</span>
        <code className="font-semibold">{text}</code>
      </p>
      <p className="text-right max-sm:text-left">
        <span className="text-graphite">left </span>
        {feedText(leftFeed, units)}
        <span className="text-graphite"> right </span>
        {feedText(rightFeed, units)}
      </p>
    </div>
  );
}

/** "200 mm/min" in a width that stays. */
function feedText(mmMin: number, units: Units): string {
  return units === 'mm'
    ? `${formatNumber(mmMin, 0).padStart(4, '\u2007')} mm/min`
    : `${formatNumber(mmMin / MM_PER_INCH, 1).padStart(5, '\u2007')} in/min`;
}
