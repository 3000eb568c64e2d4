import { type BlockFit, type BlockPlace, type FoamAmounts, fitBlock, foamAmounts } from './block.ts';
import { type Core, buildCore } from './core.ts';
import { expectedCores } from './expected-core.ts';
import { type MeltReport, feedFindings, meltReport } from './feed.ts';
import { type PlacedFeature, placeFeatures } from './features.ts';
import { type Finding, findingsOf, hasErrors } from './findings.ts';
import { type InspectionRow, inspectionFindings, inspectionRows } from './inspection.ts';
import { buildPanel } from './panel.ts';
import { checkParts } from './parts.ts';
import { type Plan, type WirePlan, hasFoam, hasWire, planSchema } from './plan.ts';
import { type Program, type ProgramIdentity, writeProgram } from './program.ts';
import { type Simulation, simulate } from './simulate.ts';
import { type RibSet, buildRibs } from './ribs.ts';
import { type Template, buildTemplates } from './template.ts';
import { checkBench } from './towers.ts';
import { type WirePath, buildWirePath } from './wire-path.ts';

/** A core panel worked out as far as its plan allows. */
export interface CorePlan {
  readonly plan: Plan;
  readonly core: Core;
  readonly features: readonly PlacedFeature[];
  /** Null when the plan has no block. */
  readonly fit: BlockFit | null;
  /** Null when the plan has no block or no material. */
  readonly foam: FoamAmounts | null;
  /** Null when the plan asks for no ribs. */
  readonly ribs: RibSet | null;
  /** Root and tip; none when the plan asks for none. */
  readonly templates: readonly Template[];
  /** What the caliper must show at root and tip. */
  readonly inspection: readonly InspectionRow[];
  /** Null without a machine, and while the panel does not stand between its towers. */
  readonly cut: Cut | null;
}

/** The cut on a wire machine. */
export interface Cut {
  readonly path: WirePath;
  readonly program: Program;
  readonly melt: MeltReport;
  readonly simulation: Simulation;
}

export interface Planned {
  /** Null when the values of the plan themselves are refused, or nothing is left between the skins. */
  readonly core: CorePlan | null;
  readonly findings: readonly Finding[];
}

/**
 * Works out a panel: contours in step, skins and kerf, features, place in the block, ribs and templates if wanted, wire path, machine program, and
 * that program read back and simulated. What the plan does not have (machine, foam, ribs, templates) is null. Never throws because of a
 * plan's values: what is wrong with them is among the findings.
 */
export function planCore(values: unknown, identity: ProgramIdentity): Planned {
  const parsed = planSchema.safeParse(values);
  if (!parsed.success) return { core: null, findings: findingsOf(parsed.error) };
  const plan = parsed.data;
  const bench = hasWire(plan) ? checkBench(plan) : [];
  const before = [...checkParts(plan), ...bench];
  const built = buildCore(plan, buildPanel(plan));
  if (!built.core) return { core: null, findings: [...before, ...built.findings] };
  const { core } = built;
  const placed = placeFeatures(plan, core);
  const fit = plan.block && fitBlock(plan, plan.block, core);
  const ribs = plan.ribs && buildRibs(plan, core, placed.features, plan.ribs);
  const templates = plan.template && buildTemplates(plan, core, plan.template);
  const cut =
    hasWire(plan) && fit && !hasErrors(bench)
      ? cutOf(plan, core, placed.features, fit.places, identity)
      : null;
  const whole: CorePlan = {
    plan,
    core,
    features: placed.features,
    fit,
    foam: hasFoam(plan) ? foamAmounts(plan, core, placed.features) : null,
    ribs: ribs?.set ?? null,
    templates: templates?.templates ?? [],
    inspection: inspectionRows(plan, core),
    cut: cut?.cut ?? null,
  };
  const findings = [
    ...before,
    ...built.findings,
    ...placed.findings,
    ...(fit?.findings ?? []),
    ...(ribs?.findings ?? []),
    ...(templates?.findings ?? []),
    ...inspectionFindings(plan, core, placed.features),
    ...(cut?.findings ?? []),
  ];
  return { core: whole, findings };
}

/** The machine's part: path, program, and the program simulated. */
function cutOf(
  plan: WirePlan,
  core: Core,
  features: readonly PlacedFeature[],
  places: readonly BlockPlace[],
  identity: ProgramIdentity,
): { readonly cut: Cut; readonly findings: readonly Finding[] } {
  const path = buildWirePath(plan, core, features, places);
  const program = writeProgram(plan, path, identity);
  const melt = meltReport(plan, path, program.seconds);
  const expected = expectedCores(plan, core, features, places);
  const simulation = simulate(program.text, plan, expected);
  return {
    cut: { path, program, melt, simulation },
    findings: [...feedFindings(plan, melt), ...simulation.findings],
  };
}
