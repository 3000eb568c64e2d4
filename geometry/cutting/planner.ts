import { type BlockFit, type FoamAmounts, fitBlock, foamAmounts } from './block.ts';
import { type Core, buildCore } from './core.ts';
import { expectedCores } from './expected-core.ts';
import { type MeltReport, feedFindings, meltReport } from './feed.ts';
import { type PlacedFeature, placeFeatures } from './features.ts';
import { type Finding, findingsOf, hasErrors } from './findings.ts';
import { buildPanel } from './panel.ts';
import { type Plan, planSchema } from './plan.ts';
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
  readonly fit: BlockFit;
  readonly foam: FoamAmounts;
  /** Null when the plan asks for no ribs. */
  readonly ribs: RibSet | null;
  /** Root and tip; none when the plan asks for none. */
  readonly templates: readonly Template[];
  /** Null while the panel does not stand between the towers. */
  readonly cut: {
    readonly path: WirePath;
    readonly program: Program;
    readonly melt: MeltReport;
    readonly simulation: Simulation;
  } | null;
}

export interface Planned {
  /** Null when the values of the plan themselves are refused, or nothing is left between the skins. */
  readonly core: CorePlan | null;
  readonly findings: readonly Finding[];
}

/**
 * Works out a panel: contours in step, skins and kerf, features, place in the block, ribs and templates if wanted, wire path, machine program, and
 * that program read back and simulated. Never throws because of a plan's values: what is wrong with them is among the findings.
 */
export function planCore(values: unknown, identity: ProgramIdentity): Planned {
  const parsed = planSchema.safeParse(values);
  if (!parsed.success) return { core: null, findings: findingsOf(parsed.error) };
  const plan = parsed.data;
  const bench = checkBench(plan);
  const built = buildCore(plan, buildPanel(plan));
  if (!built.core) return { core: null, findings: [...bench, ...built.findings] };
  const { core } = built;
  const placed = placeFeatures(plan, core);
  const fit = fitBlock(plan, core);
  const ribs = plan.ribs && buildRibs(plan, core, placed.features, plan.ribs);
  const templates = plan.template && buildTemplates(plan, core, plan.template);
  const findings = [
    ...bench,
    ...built.findings,
    ...placed.findings,
    ...fit.findings,
    ...(ribs?.findings ?? []),
    ...(templates?.findings ?? []),
  ];
  const whole: CorePlan = {
    plan,
    core,
    features: placed.features,
    fit,
    foam: foamAmounts(plan, core, placed.features),
    ribs: ribs?.set ?? null,
    templates: templates?.templates ?? [],
    cut: null,
  };
  if (hasErrors(bench)) return { core: whole, findings };
  const path = buildWirePath(plan, core, placed.features, fit.places);
  const program = writeProgram(plan, path, identity);
  const melt = meltReport(plan, path, program.seconds);
  const expected = expectedCores(plan, core, placed.features, fit.places);
  const simulation = simulate(program.text, plan, expected);
  return {
    core: { ...whole, cut: { path, program, melt, simulation } },
    findings: [...findings, ...feedFindings(plan, melt), ...simulation.findings],
  };
}
