import { thicknessAt } from '../contour/thickness.ts';
import { error, mm, note, stationText, warning, type Finding } from './findings.ts';
import { type OffsetLine, roundOffset } from './offset.ts';
import { type Panel } from './panel.ts';
import { ENDS, type End, type Plan } from './plan.ts';
import { offsetBoth } from './tail.ts';

/** One end of the core, in the panel's frame: the foam's outline and the path of the wire's centre round it. */
export interface CoreEnd {
  readonly core: OffsetLine;
  readonly path: OffsetLine;
  readonly halfKerfMm: number;
}

/** Where the core ends because the skins meet. */
export interface SkinsMeet {
  readonly end: End;
  /** Chord station, and its distance ahead of the section's trailing edge, mm. */
  readonly station: number;
  readonly aheadMm: number;
  /** Thickness of the finished section there, mm. */
  readonly thicknessMm: number;
}

/** The core's outlines at both ends, all in step. */
export interface Core {
  readonly panel: Panel;
  readonly root: CoreEnd;
  readonly tip: CoreEnd;
  readonly skinsMeet: readonly SkinsMeet[];
}

/** A core that ends further forward than this is warned of. */
const EXPECTED_STATION = 0.85;

/** The core between the skins and the wire's path round it. Without a core at either end there are only findings. */
export function buildCore(
  plan: Plan,
  panel: Panel,
): { readonly core: Core | null; readonly findings: Finding[] } {
  const keep = plan.features.map(({ rootStation }) => rootStation);
  const half = { root: plan.kerfMm.root / 2, tip: plan.kerfMm.tip / 2 };
  const cores = offsetBoth(panel, { root: 0, tip: 0 }, keep);
  const coreEnd = (end: End): CoreEnd | null => {
    const core = cores[end];
    const path = core && roundOffset(core, half[end]);
    return core && path ? { core, path, halfKerfMm: half[end] } : null;
  };
  const ends = { root: coreEnd('root'), tip: coreEnd('tip') };
  const { root, tip } = ends;
  if (!root || !tip) {
    const { upperMm, lowerMm } = plan.allowances;
    const path = `allowances.${upperMm >= lowerMm ? 'upperMm' : 'lowerMm'}`;
    const findings = ENDS.filter((end) => !ends[end]).map((end) =>
      error(
        'skin-thicker-than-section',
        path,
        `Nothing is left between skins of ${mm(upperMm)} and ${mm(lowerMm)} at the ${end}.`,
        { end },
      ),
    );
    return { core: null, findings };
  }
  const skinsMeet = ENDS.flatMap((end) => meeting(plan, panel, ends[end], end));
  const core: Core = { panel, root, tip, skinsMeet };
  return { core, findings: [...unusual(panel), ...skinsMeet.map(meetingFinding), ...thinEdges(plan, panel)] };
}

function meeting(plan: Plan, panel: Panel, end: CoreEnd | null, name: End): SkinsMeet[] {
  const tail = end?.core.tail;
  if (!tail || plan.allowances.upperMm + plan.allowances.lowerMm === 0) return [];
  const { outline, chordMm, toSheet } = panel[name];
  const station = Math.min(1, Math.max(0, toSheet(tail).x));
  return [
    {
      end: name,
      station,
      aheadMm: (1 - station) * chordMm,
      thicknessMm: thicknessAt(outline, station) * chordMm,
    },
  ];
}

function meetingFinding({ end, station, aheadMm, thicknessMm }: SkinsMeet): Finding {
  const kind = station < EXPECTED_STATION ? warning : note;
  const message = `At the ${end} the skins meet at ${stationText(station)} of the chord, ${mm(aheadMm, 1)} ahead of the trailing edge, where the section is ${mm(thicknessMm, 1)} thick: the core ends there.`;
  return kind('skins-meet', 'allowances.upperMm', message, { end, station });
}

function thinEdges(plan: Plan, panel: Panel): Finding[] {
  if (!plan.block) return [];
  if (plan.allowances.upperMm + plan.allowances.lowerMm > 0 || plan.stock.trailingEdgeStation !== null)
    return [];
  const least = plan.limits.minimumTrailingEdgeMm;
  return ENDS.flatMap((end) => {
    const { outline, chordMm } = panel[end];
    const thickness = thicknessAt(outline, 1) * chordMm;
    if (thickness >= least) return [];
    const message = `Bare foam runs out to ${mm(thickness)} at the ${end}’s trailing edge, less than ${mm(least)}.`;
    return [warning('thin-trailing-edge', `panel.${end}`, message, { end, station: 1 })];
  });
}

function unusual(panel: Panel): Finding[] {
  return ENDS.flatMap((end) =>
    panel[end].upper.monotone && panel[end].lower.monotone
      ? []
      : [
          note(
            'stations-of-construction',
            `panel.${end}.shape`,
            `A surface of the ${end} turns back along the chord, so its rulings follow the stations of its construction.`,
            { end },
          ),
        ],
  );
}
