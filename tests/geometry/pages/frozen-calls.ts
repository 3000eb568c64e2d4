import { down } from '#geometry/pages/templates/tick-marks.ts';
import { contentOf } from '#geometry/pages/templates/template-drawing.ts';
import { tilingOf } from '#geometry/pages/templates/tiles.ts';
import { tableColumn } from '#geometry/pages/blocks.ts';
import { occupied } from '#geometry/pages/occupied.ts';
import { text } from '#geometry/pages/marks.ts';
import { DETAILS, PLANS, SHEET, planned } from './samples.ts';

const planning = () => planned({ ...PLANS['tapered and swept'] });
const plan = () => planning().plan;
const template = () => plan().templates[0]!;
const at = () => ({ x: 1, y: 2 });
const points = () => [at(), { x: 30, y: 2 }, { x: 5, y: 20 }];
const rect = () => ({ x: 0, y: 0, width: 200, height: 100 });
const box = () => ({ minX: 0, maxX: 20, minY: 0, maxY: 9 });
const words = () => text(at(), 'Marsh', 2.5);
const tiling = () => tilingOf(contentOf(template()), rect());
const sheet = () => structuredClone(SHEET);
const details = () => structuredClone(DETAILS);
const sheetWords = () => ({ owner: '', documentType: '', scale: '', paper: 'A4', number: 1, of: 1 });
const table = () => ({
  kind: 'table',
  title: 'Table',
  columns: [tableColumn('One', 1)],
  rows: [['1'], ['2']],
  byHand: false,
});
const band = () => ({
  title: '',
  part: '',
  status: '',
  lines: [''],
  shortCode: '',
  checksum: '',
  address: '',
  sheet: '',
  tile: '',
});

/** A call of each function of geometry/pages that is given objects. */
export const pageCalls: Readonly<Record<string, () => readonly unknown[]>> = {
  area: () => [points(), 'ink'],
  balloon: () => [at(), 1],
  cautionNotes: () => [plan()],
  circle: () => [at(), 2, { ink: 'wire' }],
  cleanIdentity: () => [sheet()],
  clippedLine: () => [points(), true, rect()],
  contentOf: () => [template()],
  corners: () => [rect()],
  cutSheetPages: () => [plan(), planning().findings, sheet(), details()],
  dimension: () => [{ from: at(), to: at(), direction: 'level', at: 5, text: '1' }],
  down: () => [at()],
  drawTemplate: () => [template(), [at(), at()], tiling(), ['ROOT']],
  faceExtent: () => [plan(), 'root'],
  faceMarks: () => [plan(), 'root', rect(), 0.5],
  featureTable: () => [plan()],
  findingNotes: () => [[...planning().findings]],
  fits: () => [words(), points(), { ...occupied() }],
  inspectionTable: () => [plan()],
  isInside: () => [at(), points()],
  isWithin: () => [rect(), rect()],
  line: () => [points(), { closed: true }],
  outlined: () => [rect(), { closed: true }],
  overlaps: () => [rect(), rect()],
  planformExtent: () => [plan()],
  planformMarks: () => [plan(), rect(), 0.2],
  qrMarks: () => [details().qr, rect()],
  ribTable: () => [plan()],
  scaleBar: () => [at(), 'level'],
  scaleFor: () => [box(), rect()],
  sectionLine: () => [sheet(), 'root'],
  segment: () => [1, 2, 3, 4, { closed: false }],
  setBlocks: () => [[[table()]], [rect()]],
  settingsTable: () => [plan(), sheet()],
  statusLine: () => [sheet()],
  templateBand: () => [
    band(),
    { tiling: tiling(), tile: tiling().tiles[0], outline: points() },
    details(),
    rect(),
  ],
  templatePages: () => [plan(), sheet(), 'A4', details()],
  text: () => [at(), 'Marsh', 2.5, { turned: true }],
  textBox: () => [words()],
  tickMarks: () => [template().ticks.map((of) => ({ ...of })), points().map(down), { ...occupied() }],
  tilingOf: () => [box(), rect()],
  titleBlock: () => [sheet(), sheetWords(), rect()],
  touches: () => [rect(), points()],
  usedTiles: () => [template(), tiling().tiles],
  viewOf: () => [box(), rect(), 2],
  wireAt: () => [plan(), 'root', 0],
};

/** Those that are given numbers or text only. */
export const pageCallsWithoutObjects = [
  'checksumText',
  'dayOf',
  'fittedText',
  'frameOf',
  'occupied',
  'plainText',
  'rowLetters',
  'scaleText',
  'sheetFrame',
  'tableColumn',
  'textWidth',
  'timeText',
  'wrappedText',
];
