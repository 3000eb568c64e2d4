import { type Polyline, polylineOf } from '#geometry/cutting/arrays.ts';
import { denseRows } from '#geometry/cutting/contour-rows.ts';
import { expectedCores } from '#geometry/cutting/expected-core.ts';
import { sectionContour } from '#geometry/cutting/files/section-file.ts';
import { offsetInStep } from '#geometry/cutting/offset.ts';
import { buildPanel } from '#geometry/cutting/panel.ts';
import { placeSection } from '#geometry/cutting/placing.ts';
import { type WirePlan, planSchema } from '#geometry/cutting/plan.ts';
import { type CorePlan, planCore } from '#geometry/cutting/planner.ts';
import { readProgram } from '#geometry/cutting/read-program.ts';
import { PART } from '#geometry/cutting/row.ts';
import { neckOf, tongueOf } from '#geometry/cutting/template-tongue.ts';
import { benchOf } from '#geometry/cutting/towers.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { SHEET } from './files/sheet-example.ts';
import { PLAN, RIBS, SLOT, TEMPLATE } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 3, checksum: SHEET.checksum, part: 'core' };
const plan = (): WirePlan => structuredClone({ ...PLAN, ribs: RIBS, template: TEMPLATE });
let kept: CorePlan | undefined;
/** Worked out once; what is frozen in it stays frozen for the calls that follow. */
function whole(): CorePlan {
  kept ??= planCore(plan(), IDENTITY).core ?? undefined;
  if (!kept) throw new Error('The plan has no core.');
  return kept;
}
const core = () => whole().core;
const features = () => whole().features;
const cut = () => whole().cut!;
const places = () => whole().fit!.places;
const panel = () => buildPanel(plan());
const sections = () => ({ root: placeSection(plan().panel, 'root'), tip: placeSection(plan().panel, 'tip') });
const rows = () => denseRows(plan(), sections());
const row = (part: number) => rows().find((of) => of.part === part);
const expected = () => expectedCores(plan(), core(), features(), places());
const moves = () => readProgram(cut().program.text, plan().machine).moves;
const faces = () => ({ left: cut().path.left, right: cut().path.right });
const line = (): Polyline => core().root.core;
const lines = () => ({ root: core().root.core, tip: core().tip.core });
const point = () => ({ x: 3, y: 4 });
const box = () =>
  polylineOf([
    { x: 0, y: 0 },
    { x: 90, y: 0 },
    { x: 90, y: 20 },
    { x: 0, y: 20 },
  ]);
const fineness = () => ({ radius: 0.4, tolerance: 0.01 });
const neck = () => neckOf(core(), lines());
const ribs = () => whole().ribs!;
const identity = () => structuredClone(SHEET);
const strip = () => ({
  machine: plan().machine,
  material: plan().material,
  block: { lengthMm: 120, heightMm: 100, spanMm: 600 },
  widthsMm: [10, 20],
  kerfMm: 0.8,
  clearanceMm: 10,
  warmUpS: 3,
});
const sheet = () => ({
  kind: 'laser',
  machineName: 'Laser',
  materialName: 'Balsa',
  sheet: { widthMm: 300, heightMm: 200 },
  widthsMm: [10, 20],
});

/** A call of each function of geometry/cutting that is given objects. */
export const cuttingCalls: Readonly<Record<string, () => readonly unknown[]>> = {
  at: () => [[1, 2], 1],
  between: () => [line(), line(), 0.5],
  areaOf: () => [line()],
  boxOf: () => [line()],
  polylineOf: () => [[point()]],
  toBlock: () => [{ xMm: 1, yMm: 2, tiltDeg: 3 }, line()],
  toMachine: () => [plan().machine, plan().block, line()],
  fitBlock: () => [plan(), plan().block, core()],
  foamAmounts: () => [plan(), core(), features()],
  denseRows: () => [plan(), sections()],
  denseSteps: () => [plan()],
  buildCore: () => [plan(), panel()],
  tailRows: () => [row(PART.upper), row(PART.lower), fineness()],
  cornerRows: () => [row(PART.upper), row(PART.lower), PART.tail, fineness()],
  noseRows: () => [row(PART.upper), row(PART.lower), fineness()],
  crossingsOf: () => [line()],
  expectedCores: () => [plan(), core(), features(), places()],
  inMouth: () => [box(), 3, 0.1],
  verticalCut: () => [line(), 40],
  slotAt: () => [core().root, 'upper', 60, 5, 3],
  stripAt: () => [core().root, 60, 5],
  tubeAt: () => [core().root, { x: 60, y: 4, slopeX: 0.1, slopeY: 0 }, 'lower', 5],
  hingeAt: () => [core().root, 'upper', 150, 30, 1],
  entryOf: () => [structuredClone(SLOT)],
  placeFeatures: () => [plan(), core()],
  stepLength: () => [line(), 1],
  moveSeconds: () => [{ feedMmMin: 200, machine: plan().machine }, 'cut', faces(), faces(), 3],
  meltReport: () => [plan(), cut().path, cut().program.seconds],
  feedFindings: () => [plan(), cut().melt],
  hasErrors: () => [planCore({ ...plan(), kerfMm: 1 }, IDENTITY).findings],
  findingsOf: () => [planSchema.safeParse({}).error],
  compareReading: () => [whole().inspection[0], 20],
  inspectionRows: () => [plan(), core()],
  inspectionFindings: () => [plan(), core(), features()],
  kerfFromWidths: () => [
    [10, 20],
    [9.2, 19.2],
  ],
  kerfFromEnds: () => [
    [10, 20],
    [9.2, 19.2],
    [9.1, 19.2],
  ],
  lighteningHoles: () => [box(), box(), [], { most: 2, minimumWebMm: 2, smallestDiameterMm: 3 }],
  roomsAlong: () => [box(), box()],
  limitBreaches: () => [plan(), moves(), facesOfMoves(), expected()],
  offsetInStep: () => [panel().chain.root, -1],
  roundOffset: () => [offsetInStep(panel().chain.root, -1), 0.4],
  withoutLoops: () => [line(), line()],
  packRibs: () => [ribs().ribs, structuredClone(RIBS.sheet)],
  buildPanel: () => [plan()],
  faceAt: () => [panel(), 0.3],
  ruledVolume: () => [line(), line(), 600],
  checkParts: () => [plan()],
  placeSection: () => [plan().panel, 'tip'],
  surfacePoint: () => [sections().tip, 'upper', 0.4],
  squareTipStation: () => [plan().panel, 0.3],
  hasFoam: () => [plan()],
  hasWire: () => [plan()],
  planCore: () => [plan(), { ...IDENTITY }],
  writeProgram: () => [plan(), cut().path, { ...IDENTITY }],
  programOf: () => [plan(), cut().path, ['(Test)']],
  setupComments: () => [plan()],
  feedWay: () => [plan().machine.controller, { left: 1, right: 2, all: 3 }],
  readProgram: () => [cut().program.text, plan().machine],
  notchOf: () => [line(), features().find(({ feature }) => feature.kind === 'slot'), 0.3, 0.1],
  tabOf: () => [line(), 40, 8, -30],
  withChanges: () => [line(), []],
  splitByStrips: () => [line(), [{ fore: 30, aft: 32 }]],
  withoutDoubles: () => [line()],
  buildRibs: () => [plan(), core(), features(), structuredClone(RIBS)],
  planSheetStrip: () => [sheet()],
  simulate: () => [cut().program.text, plan(), expected()],
  stationMap: () => [outlineOf(structuredClone(PLAN.panel.root.shape)).upper],
  strokeText: () => ['12', point(), 5],
  deviationAt: () => [cut().path.left, expected()[0], 0],
  offsetBoth: () => [panel(), { root: 0, tip: 0 }, [0.4]],
  neckOf: () => [core(), lines()],
  tongueOf: () => [core(), 'root', line(), neck(), structuredClone(TEMPLATE)],
  tongueFindings: () => [core(), 'root', tongueOf(core(), 'root', line(), neck(), TEMPLATE), neck()],
  buildTemplates: () => [plan(), core(), structuredClone(TEMPLATE)],
  planWireStrip: () => [strip()],
  thin: () => [rows(), 0.01, 50, { root: 0.4, tip: 0.4 }],
  benchOf: () => [plan()],
  toTowers: () => [benchOf(plan()), line(), core().tip.core],
  fromTowers: () => [benchOf(plan()), faces(), 100],
  checkBench: () => [plan()],
  alongWall: () => [point(), { x: 9, y: 4 }, 3],
  buildWirePath: () => [plan(), core(), features(), places()],
  pathOf: () => [cut().path.nodes],
  error: () => ['code', 'path', 'Message.', { line: 3 }],
  warning: () => ['code', 'path', 'Message.', { line: 3 }],
  note: () => ['code', 'path', 'Message.', { line: 3 }],
  cutFiles: () => [whole(), identity()],
  endDrawing: () => [whole(), identity(), 'root', sectionContour(whole(), 'root')],
  pairsInStep: () => [core()],
  pick: () => [line(), [1, 2, 3]],
  downloadNameOf: () => [identity(), plan().panel, 'root.dxf'],
  ribSheets: () => [whole(), identity()],
  sectionContour: () => [whole(), 'root'],
  sectionFile: () => [whole(), identity(), 'root', sectionContour(whole(), 'root')],
  sheetTitle: () => [identity()],
  endLines: () => [whole(), identity(), 'root'],
  featureLines: () => [features()],
  ribLines: () => [whole(), identity(), { number: 1, count: 1, ribs: ribs().ribs }],
  ribStationLines: () => [ribs().ribs],
  coordinatesTitle: () => [whole(), identity(), 'root', 0.01],
};

function facesOfMoves() {
  return {
    left: polylineOf(moves().map(({ leftX, leftY }) => ({ x: leftX, y: leftY }))),
    right: polylineOf(moves().map(({ rightX, rightY }) => ({ x: rightX, y: rightY }))),
  };
}

/** Given numbers and text alone. */
export const cuttingCallsWithoutObjects = [
  'segmentDistance',
  'squareDistance',
  'number',
  'length',
  'station',
  'whole',
  'mm',
  'stationText',
  'comment',
  'commentText',
  'decimal',
  'strokeWidth',
];
