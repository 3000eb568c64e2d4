import { type SheetIdentity } from '../../cutting/files/identity.ts';
import { type Finding } from '../../cutting/findings.ts';
import { ENDS, type End } from '../../cutting/plan.ts';
import { type CorePlan } from '../../cutting/planner.ts';
import { singleLine } from '../../formats/text.ts';
import { type Block, setBlocks } from '../blocks.ts';
import { LETTER, fittedText, wrappedText } from '../lettering.ts';
import { text } from '../marks.ts';
import { type Mark, type Page, type Rect, type PageDetails } from '../page.ts';
import { qrMarks } from '../qr.ts';
import { SHEETS, type SheetSize, frameOf, sheetFrame } from '../sheet-frame.ts';
import { TITLE_BLOCK, titleBlock } from '../title-block.ts';
import { scaleFor, scaleText } from '../view.ts';
import { cleanIdentity, statusLine } from '../words.ts';
import { FACE_INSET, faceExtent, faceMarks } from './face.ts';
import { PLANFORM_INSET, planformExtent, planformMarks } from './planform.ts';
import { settingsTable } from './settings-table.ts';
import { SIGNATURES, cautionNotes, featureTable, findingNotes, inspectionTable, ribTable } from './tables.ts';

/** The views on the first sheet: where they stand and at what scale. */
interface Views {
  readonly planform: { readonly room: Rect; readonly scale: number };
  readonly faces: Readonly<Record<End, Rect>>;
  readonly faceScale: number;
}

/** On a small sheet the views are no smaller than this. */
const SMALL_SHEET_SCALE = 1 / 2;
/** Parts of the height that the planform may take. */
const SPLITS = [0.4, 0.45, 0.5, 0.55, 0.6, 0.65, 0.7] as const;
/** Between the frame and tables, mm. */
const PAD = 5;

/**
 * The cut sheet: planform and both faces of the block with dimensions on the first page; settings, features, ribs, findings and
 * cautions, and the inspection to be filled in by hand on the next ones. A3 lying, A4 when the views are at least half their size there.
 */
export function cutSheetPages(
  plan: CorePlan,
  findings: readonly Finding[],
  identity: SheetIdentity,
  details: PageDetails,
): Page[] {
  const clean = cleanIdentity(identity);
  const small = viewsOn(plan, 'A4');
  const size: SheetSize = Math.min(small.planform.scale, small.faceScale) >= SMALL_SHEET_SCALE ? 'A4' : 'A3';
  const views = size === 'A4' ? small : viewsOn(plan, size);
  const first = [
    ...planformMarks(plan, views.planform.room, views.planform.scale),
    ...ENDS.flatMap((end) => faceMarks(plan, end, views.faces[end], views.faceScale)),
    ...footMarks(plan, clean, details, frameOf(size)),
  ];
  const scales = [...new Set([views.planform.scale, views.faceScale])].map(scaleText).join(', ');
  const bodies = [
    { marks: first, scale: scales },
    ...setBlocks(blocksOf(plan, findings, clean), columnsOf(size)).map((marks) => ({ marks, scale: '–' })),
  ];
  return bodies.map(({ marks, scale }, i) =>
    sheetPage(size, marks, clean, {
      owner: singleLine(details.owner),
      documentType: 'Cut sheet',
      scale,
      paper: size,
      number: i + 1,
      of: bodies.length,
    }),
  );
}

function sheetPage(
  size: SheetSize,
  marks: readonly Mark[],
  identity: SheetIdentity,
  words: Parameters<typeof titleBlock>[1],
): Page {
  const frame = frameOf(size);
  const corner = {
    x: frame.x + frame.width - TITLE_BLOCK.width,
    y: frame.y + frame.height - TITLE_BLOCK.height,
  };
  return {
    ...SHEETS[size],
    frame,
    marks: [...marks, ...titleBlock(identity, words, corner), ...sheetFrame(size)],
  };
}

function viewsOn(plan: CorePlan, size: SheetSize): Views {
  const frame = frameOf(size);
  const height = frame.height - TITLE_BLOCK.height;
  const all = SPLITS.map((split): Views => {
    const room: Rect = { ...frame, height: split * height };
    const below: Rect = {
      ...frame,
      y: frame.y + room.height,
      width: frame.width / 2,
      height: height - room.height,
    };
    const planform = scaleFor(planformExtent(plan), within(room, PLANFORM_INSET), 1);
    const faces = ENDS.map((end) => scaleFor(faceExtent(plan, end), within(below, FACE_INSET), 2));
    return {
      planform: { room, scale: planform },
      faces: { root: below, tip: { ...below, x: below.x + below.width } },
      faceScale: Math.min(...faces),
    };
  });
  const worth = ({ planform, faceScale }: Views) => planform.scale * faceScale;
  return all.reduce((best, of) => (worth(of) > worth(best) ? of : best));
}

function within(room: Rect, inset: Record<'left' | 'right' | 'top' | 'bottom', number>) {
  return { width: room.width - inset.left - inset.right, height: room.height - inset.top - inset.bottom };
}

/** Columns for tables: two on A3, the right one ending above the title block; one on A4. */
function columnsOf(size: SheetSize): Rect[] {
  const frame = frameOf(size);
  const [x, y] = [frame.x + PAD, frame.y + PAD];
  const above = frame.height - TITLE_BLOCK.height - 2 * PAD;
  if (size === 'A4') return [{ x, y, width: frame.width - 2 * PAD, height: above }];
  const width = TITLE_BLOCK.width - PAD;
  const left = { x, y, width, height: frame.height - 2 * PAD };
  return [left, { x: frame.x + frame.width - PAD - width, y, width, height: above }];
}

function blocksOf(plan: CorePlan, findings: readonly Finding[], identity: SheetIdentity): Block[][] {
  return [
    [cautionNotes(plan), findingNotes(findings), settingsTable(plan, identity)],
    [featureTable(plan), ribTable(plan), inspectionTable(plan), SIGNATURES],
  ].map((group) => group.filter((of) => of !== null));
}

const QR_MM = 36;
const LINE_MM = 2.9;
/** Cautions stand on the first sheet too where the foot is as wide as this, mm. */
const WIDE_FOOT_MM = 120;

/** What the lines of the views mean. */
function legendOf({ plan, cut }: CorePlan): string {
  const { upperMm, lowerMm } = plan.allowances;
  return [
    'Dimensions in mm; chords are true lengths of the finished section. Do not measure the drawing.',
    ...(upperMm + lowerMm > 0 ? ['Thin line: finished section.'] : []),
    ...(plan.block ? ['Dash-double-dot: finished outline, block.'] : []),
    ...(cut ? ['Orange: middle of the wire.'] : []),
  ].join(' ');
}

/** Beside the title block: the QR code and what it says, and what has to be known to read the drawing. */
function footMarks(plan: CorePlan, identity: SheetIdentity, details: PageDetails, frame: Rect): Mark[] {
  const top = frame.y + frame.height - TITLE_BLOCK.height;
  const x = frame.x + QR_MM + 1;
  const width = frame.width - TITLE_BLOCK.width - QR_MM - 4;
  const released = identity.status === 'released';
  const state = fittedText(statusLine(identity), width, LETTER.large);
  const start = top + (released ? 5 : 13);
  const cautions = width < WIDE_FOOT_MM ? [] : cautionNotes(plan).sentences.map(({ words }) => words);
  const room = Math.floor((TITLE_BLOCK.height - (start - top) - 1) / LINE_MM);
  const lines = [...cautions, legendOf(plan)].flatMap((of) => wrappedText(of, width, LETTER.small));
  const address = wrappedText(identity.address, width, LETTER.least);
  return [
    ...qrMarks(details.qr, {
      x: frame.x,
      y: top + (TITLE_BLOCK.height - QR_MM) / 2,
      width: QR_MM,
      height: QR_MM,
    }),
    ...(released ? [] : [text({ x, y: top + 8 }, state.text, state.heightMm, { weight: 800 })]),
    ...[
      ...lines.map((words) => ({ words, heightMm: LETTER.small })),
      ...address.map((words) => ({ words, heightMm: LETTER.least })),
    ]
      .slice(0, room)
      .map(({ words, heightMm }, i) =>
        text({ x, y: start + i * LINE_MM }, words, heightMm, { ink: 'graphite' }),
      ),
  ];
}
