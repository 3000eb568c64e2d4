import { type Box, type Polyline, at, boxOf } from '../../cutting/arrays.ts';
import { type BlockPlace, toBlock } from '../../cutting/block.ts';
import { type PlacedFeature } from '../../cutting/features.ts';
import { type End } from '../../cutting/plan.ts';
import { type CorePlan } from '../../cutting/planner.ts';
import { fixed } from '../../formats/text.ts';
import { type Point } from '../../point.ts';
import { dimension } from '../dimension.ts';
import { LETTER, fittedText, textBox } from '../lettering.ts';
import { WIDTH, area, line, outlined, segment, text } from '../marks.ts';
import { type Occupied, occupied } from '../occupied.ts';
import { type Mark, type Rect } from '../page.ts';
import { type View, scaleText, viewOf } from '../view.ts';
import { balloon } from './planform.ts';
import { type WireInFace, wireAt } from './wire-at.ts';

/** Room around a face for dimensions, numbers and its name, mm of the page. */
export const FACE_INSET = { left: 26, right: 22, top: 20, bottom: 22 } as const;
const LEVEL = 7;

/** One core as it stands in a face of the block: at the second core of a pair the tip stands at the first one's root. */
interface CoreInFace {
  readonly end: End;
  readonly place: Omit<BlockPlace, 'mirrored'>;
  readonly index: number;
}

const UNMOVED = { xMm: 0, yMm: 0, tiltDeg: 0 } as const;

function coresAt({ fit }: CorePlan, end: End): CoreInFace[] {
  if (!fit) return [{ end, place: UNMOVED, index: 0 }];
  const other = end === 'root' ? 'tip' : 'root';
  return fit.places.map((place, index) => ({ end: place.mirrored ? other : end, place, index }));
}

/** The extent of a face: block and wire, or the section alone, mm. */
export function faceExtent(plan: CorePlan, end: End): Box {
  const { block } = plan.plan;
  const wires = coresAt(plan, end).flatMap(({ index }) => wireAt(plan, end, index)?.line ?? []);
  const cores = coresAt(plan, end).flatMap((of) => [contour(plan, of), foam(plan, of)]);
  const box = boxOf(...wires, ...cores);
  if (!block) return box;
  return {
    minX: Math.min(0, box.minX),
    maxX: Math.max(block.lengthMm, box.maxX),
    minY: Math.min(0, box.minY),
    maxY: Math.max(block.heightMm, box.maxY),
  };
}

function contour({ core }: CorePlan, { end, place }: CoreInFace): Polyline {
  return toBlock(place, core.panel.chain[end]);
}

function foam({ core }: CorePlan, { end, place }: CoreInFace): Polyline {
  return toBlock(place, core[end].core);
}

/** Draws the face of the block at one end at a scale: core, features, the wire's path and the core's place. */
export function faceMarks(plan: CorePlan, end: End, room: Rect, scale: number): Mark[] {
  const { left, right, top, bottom } = FACE_INSET;
  const inner: Rect = {
    x: room.x + left,
    y: room.y + top,
    width: room.width - left - right,
    height: room.height - top - bottom,
  };
  const view = viewOf(faceExtent(plan, end), inner, scale);
  const cores = coresAt(plan, end);
  const title = fittedText(`${nameOf(plan, end)} ${scaleText(scale)}`, room.width - 6, LETTER.title);
  return [
    text({ x: room.x + 3, y: room.y + 6.5 }, title.text, title.heightMm, { weight: 600 }),
    ...cores.flatMap((of) => coreMarks(plan, of, view)),
    ...blockMarks(plan, view),
    ...wiresMarks(plan, end, cores, view),
    ...balloons(plan, end, view, room),
    ...dimensions(plan, cores[0], view),
  ];
}

function nameOf({ plan, ribs, fit }: CorePlan, end: End): string {
  const [name, other] = end === 'root' ? ['Root', 'tip'] : ['Tip', 'root'];
  if (!plan.block) return ribs ? `${name}, sheeting off` : `${name} face`;
  const pair = fit && fit.places.length > 1 ? `, above: ${other} of the second core` : '';
  return `${name} face in the block${pair}`;
}

function onPage({ x, y }: Polyline, { toPage }: View): Point[] {
  return Array.from(x, (value, i) => toPage({ x: value, y: at(y, i) }));
}

function blockMarks({ plan }: CorePlan, view: View): Mark[] {
  if (!plan.block) return [];
  const corner = view.toPage({ x: 0, y: plan.block.heightMm });
  const { lengthMm, heightMm } = plan.block;
  const rect = { ...corner, width: lengthMm * view.scale, height: heightMm * view.scale };
  return [outlined(rect, { type: 'long-dash-double-dot' })];
}

function coreMarks(plan: CorePlan, of: CoreInFace, view: View): Mark[] {
  const { toPanel } = plan.core.panel[of.end];
  const outline = onPage(foam(plan, of), view);
  const chord = [-0.04, 1.04].map((x) => toPanel({ x, y: 0 }));
  const { upperMm, lowerMm } = plan.plan.allowances;
  const skinned = upperMm + lowerMm > 0;
  return [
    ...(plan.plan.block || !plan.ribs ? [area(outline, 'foam')] : []),
    ...(skinned
      ? [line(onPage(contour(plan, of), view), { closed: true, widthMm: WIDTH.hair, ink: 'graphite' })]
      : []),
    line(outline, { closed: true, widthMm: WIDTH.edge }),
    ...plan.features.flatMap((feature) => featureMarks(feature, of, view)),
    line(onPage(toBlock(of.place, { x: xs(chord), y: ys(chord) }), view), {
      type: 'long-dash-dot',
      ink: 'graphite',
      widthMm: WIDTH.hair,
    }),
  ];
}

function xs(points: readonly Point[]): Float64Array {
  return Float64Array.from(points, ({ x }) => x);
}

function ys(points: readonly Point[]): Float64Array {
  return Float64Array.from(points, ({ y }) => y);
}

/** The foam taken out, open where it reaches the surface. */
function featureMarks(feature: PlacedFeature, { end, place }: CoreInFace, view: View): Mark[] {
  const ring = onPage(toBlock(place, feature[end].outline), view);
  const mouths = feature.feature.kind === 'tube' ? [] : feature[end].mouths;
  return [
    area(ring, 'paper'),
    line(ring, { closed: true, widthMm: WIDTH.edge }),
    ...mouths.map(({ edges }) =>
      line(onPage(toBlock(place, { x: xs(edges), y: ys(edges) }), view), {
        widthMm: WIDTH.wide,
        ink: 'paper',
      }),
    ),
  ];
}

const ARROW = { length: 3, halfWidth: 0.8 } as const;

/** The wires of all cores; where two begin so close that their words would overlap, only the first has them. */
function wiresMarks(plan: CorePlan, end: End, cores: readonly CoreInFace[], view: View): Mark[] {
  const taken = occupied();
  return cores.flatMap(({ index }) => {
    const wire = wireAt(plan, end, index);
    return wire ? wireMarks(wire, view, taken) : [];
  });
}

function wireMarks(wire: WireInFace, view: View, taken: Occupied): Mark[] {
  const points = onPage(wire.line, view);
  const first = points[0];
  if (!first) return [];
  const words = text({ x: first.x + 1, y: first.y - 1.2 }, 'wire in', LETTER.small, { ink: 'wire' });
  const free = taken.isFree(textBox(words));
  if (free) taken.take(textBox(words));
  return [
    line(points, { ink: 'wire' }),
    ...wire.arrows.flatMap((i) => arrowBetween(points[i - 1], points[i])),
    ...(free ? [words] : []),
  ];
}

/** An arrowhead in the middle between two points. */
function arrowBetween(from: Point | undefined, to: Point | undefined): Mark[] {
  if (!from || !to) return [];
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  if (length === 0) return [];
  const [ux, uy] = [(to.x - from.x) / length, (to.y - from.y) / length];
  const [x, y] = [(from.x + to.x) / 2, (from.y + to.y) / 2];
  const place = (along: number, aside: number): Point => ({
    x: x + along * ux - aside * uy,
    y: y + along * uy + aside * ux,
  });
  const [half, side] = [ARROW.length / 2, ARROW.halfWidth];
  return [area([place(half, 0), place(-half, side), place(-half, -side)], 'wire')];
}

/** From the top of the face to the middle of the numbers, mm. */
const BALLOON_UP = 6;
const BALLOON_STEP = 6.5;

/** Numbers of the features above the face, each with a line to its feature; where they crowd they move aside. */
function balloons(plan: CorePlan, end: End, view: View, room: Rect): Mark[] {
  const of = coresAt(plan, end).at(-1);
  if (!of) return [];
  const top = view.toPage({ x: 0, y: faceExtent(plan, end).maxY }).y;
  const taken = occupied();
  const title = text({ x: room.x, y: room.y + 6.5 }, 'Root face in the block 1 : 200', LETTER.title);
  taken.take(textBox(title));
  return plan.features.flatMap((feature) => {
    const box = boxOf(toBlock(of.place, feature[of.end].outline));
    const foot = view.toPage({ x: (box.minX + box.maxX) / 2, y: (box.minY + box.maxY) / 2 });
    for (const step of [0, 1, -1, 2, -2, 3, -3, 4, -4]) {
      const centre = { x: foot.x + step * BALLOON_STEP, y: top - BALLOON_UP };
      const around = { x: centre.x - 3, y: centre.y - 3, width: 6, height: 6 };
      const outside = around.x < room.x + 1 || around.x + 6 > room.x + room.width - 1;
      if (outside || !taken.isFree(around)) continue;
      taken.take(around);
      return [
        segment(centre.x, centre.y, foot.x, foot.y, { ink: 'graphite', widthMm: WIDTH.hair }),
        ...balloon(centre, feature.index + 1),
      ];
    }
    return [];
  });
}

function dimensions(plan: CorePlan, of: CoreInFace | undefined, view: View): Mark[] {
  if (!of) return [];
  const { block } = plan.plan;
  const { toPanel } = plan.core.panel[of.end];
  const ends = [toPanel({ x: 0, y: 0 }), toPanel({ x: 1, y: 0 })];
  const [nose, tail] = onPage(toBlock(of.place, { x: xs(ends), y: ys(ends) }), view);
  if (!nose || !tail) return [];
  const box = faceExtent(plan, of.end);
  const [low, left] = [view.toPage({ x: 0, y: box.minY }).y, view.toPage({ x: box.minX, y: 0 }).x];
  const mm = (page: number) => fixed(Math.abs(page) / view.scale, 1);
  if (!block) {
    const section = boxOf(contour(plan, of));
    const [under, over] = [view.toPage({ x: 0, y: section.minY }), view.toPage({ x: 0, y: section.maxY })];
    const high = { from: { ...over, x: nose.x }, to: { ...under, x: nose.x }, at: left - LEVEL };
    return [
      ...dimension({
        from: nose,
        to: tail,
        direction: 'level',
        at: low + LEVEL,
        text: fixed(plan.core.panel[of.end].chordMm, 1),
      }),
      ...dimension({ ...high, direction: 'upright', text: mm(under.y - over.y) }),
    ];
  }
  const [front, rear] = [view.toPage({ x: 0, y: 0 }), view.toPage({ x: block.lengthMm, y: 0 })];
  const above = view.toPage({ x: 0, y: block.heightMm });
  return [
    ...dimension({ from: front, to: nose, direction: 'level', at: low + LEVEL, text: mm(nose.x - front.x) }),
    ...dimension({
      from: front,
      to: rear,
      direction: 'level',
      at: low + 2 * LEVEL,
      text: mm(rear.x - front.x),
    }),
    ...dimension({
      from: nose,
      to: front,
      direction: 'upright',
      at: left - LEVEL,
      text: mm(front.y - nose.y),
    }),
    ...dimension({
      from: above,
      to: front,
      direction: 'upright',
      at: left - 2 * LEVEL,
      text: mm(front.y - above.y),
    }),
  ];
}
