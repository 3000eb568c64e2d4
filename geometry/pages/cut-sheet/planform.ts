import { type Box, boxOf } from '../../cutting/arrays.ts';
import { type PlacedFeature } from '../../cutting/features.ts';
import { ENDS, type End } from '../../cutting/plan.ts';
import { type CorePlan } from '../../cutting/planner.ts';
import { fixed } from '../../formats/text.ts';
import { type Point } from '../../point.ts';
import { dimension } from '../dimension.ts';
import { LETTER, textBox } from '../lettering.ts';
import { WIDTH, area, circle, line, segment, text } from '../marks.ts';
import { type Occupied, occupied } from '../occupied.ts';
import { type Mark, type Rect } from '../page.ts';
import { type View, scaleText, viewOf } from '../view.ts';

/** Room around the planform for dimensions and its name, mm of the page. */
export const PLANFORM_INSET = { left: 32, right: 38, top: 16, bottom: 16 } as const;
/** From one dimension line to the next, mm. */
const LEVEL = 7;
/** What a text beyond the end of a dimension and the span's dimension below it need, mm. */
const OUTSIDE_TEXT_MM = 27;
/** So many features are dimensioned; the others stand in the table. */
const DIMENSIONED = 2;

/** The extent of the planform: the span to the right, the chord downwards. */
export function planformExtent({ plan, core }: CorePlan): Box {
  const x = ENDS.flatMap((end) => [noseOf(core.panel[end]), tailOf(core.panel[end])]);
  return { minX: 0, maxX: plan.panel.spanMm, minY: -Math.max(...x), maxY: -Math.min(...x) };
}

type Panel = CorePlan['core']['panel'];

function noseOf({ toPanel }: Panel[End]): number {
  return toPanel({ x: 0, y: 0 }).x;
}

function tailOf({ toPanel }: Panel[End]): number {
  return toPanel({ x: 1, y: 0 }).x;
}

/** Draws the panel from above at a scale: core and finished outline, features with the numbers of their table, ribs and dimensions. */
export function planformMarks(plan: CorePlan, room: Rect, scale: number): Mark[] {
  const { left, right, top, bottom } = PLANFORM_INSET;
  const inner: Rect = {
    x: room.x + left,
    y: room.y + top,
    width: room.width - left - right,
    height: room.height - top - bottom,
  };
  const view = viewOf(planformExtent(plan), inner, scale);
  const taken = occupied();
  const washout = Number(plan.plan.panel.washoutDeg.toFixed(2));
  const title = `Planform ${scaleText(scale)}${washout === 0 ? '' : `, washout ${washout}°`}`;
  return [
    text({ x: room.x + 3, y: room.y + 6.5 }, title, LETTER.title, { weight: 600 }),
    ...outlines(plan, view),
    ...plan.features.flatMap((feature) => featureLines(feature, plan.plan.panel.spanMm, view)),
    ...ribLines(plan, view, taken),
    ...plan.features.flatMap((feature) => balloonOn(feature, plan.plan.panel.spanMm, view, taken)),
    ...dimensions(plan, view, room.y + room.height - OUTSIDE_TEXT_MM),
  ];
}

/** Does the panel become a foam core, or do ribs alone stand in it? */
function isFoam({ plan, ribs }: CorePlan): boolean {
  return plan.block !== null || ribs === null;
}

function outlines(plan: CorePlan, view: View): Mark[] {
  const { core } = plan;
  const span = plan.plan.panel.spanMm;
  const quad = (edges: Readonly<Record<End, readonly [number, number]>>): Point[] => [
    at(view, 0, edges.root[0]),
    at(view, span, edges.tip[0]),
    at(view, span, edges.tip[1]),
    at(view, 0, edges.root[1]),
  ];
  const section = (end: End) => [noseOf(core.panel[end]), tailOf(core.panel[end])] as const;
  const finished = quad({ root: section('root'), tip: section('tip') });
  if (!isFoam(plan)) return [line(finished, { closed: true, widthMm: WIDTH.wide })];
  const foam = (end: End) => {
    const { minX, maxX } = boxOf(core[end].core);
    return [minX, maxX] as const;
  };
  const cut = quad({ root: foam('root'), tip: foam('tip') });
  return [
    area(cut, 'foam'),
    line(finished, { closed: true, type: 'long-dash-double-dot' }),
    line(cut, { closed: true, widthMm: WIDTH.wide }),
  ];
}

/** A place by its distance from the root face and along the chord. */
function at({ toPage }: View, spanMm: number, x: number): Point {
  return toPage({ x: spanMm, y: -x });
}

/** Both edges: dashed where they are hidden from above. A tube has its axis too. */
function featureLines({ feature, root, tip }: PlacedFeature, span: number, view: View): Mark[] {
  const [a, b] = [boxOf(root.outline), boxOf(tip.outline)];
  const seen =
    feature.kind === 'strip' ||
    (feature.kind === 'slot' && feature.surface === 'upper') ||
    (feature.kind === 'hinge' && feature.hingeSurface === 'lower');
  const run = (from: number, to: number, type: 'continuous' | 'dashed' | 'long-dash-dot') =>
    line([at(view, 0, from), at(view, span, to)], { type });
  const type = seen ? 'continuous' : 'dashed';
  const edges = [run(a.minX, b.minX, type), run(a.maxX, b.maxX, type)];
  if (feature.kind !== 'tube') return edges;
  return [...edges, run((a.minX + a.maxX) / 2, (b.minX + b.maxX) / 2, 'long-dash-dot')];
}

const BALLOON_MM = 2.7;
/** Parts of the span at which a number may stand, best first. */
const BALLOON_PLACES = [0.5, 0.42, 0.58, 0.34, 0.66, 0.26, 0.74, 0.18, 0.82, 0.1, 0.9] as const;

/** The number of the feature in the table, in a circle on it. */
function balloonOn({ index, root, tip }: PlacedFeature, span: number, view: View, taken: Occupied): Mark[] {
  const [a, b] = [boxOf(root.outline), boxOf(tip.outline)];
  const [from, to] = [(a.minX + a.maxX) / 2, (b.minX + b.maxX) / 2];
  for (const share of BALLOON_PLACES) {
    const centre = at(view, share * span, from + share * (to - from));
    const box = {
      x: centre.x - BALLOON_MM,
      y: centre.y - BALLOON_MM,
      width: 2 * BALLOON_MM,
      height: 2 * BALLOON_MM,
    };
    if (!taken.isFree(box)) continue;
    taken.take(box);
    return balloon(centre, index + 1);
  }
  return [];
}

/** A number in a circle that covers what is under it (item references, ISO 6433). */
export function balloon(centre: Point, number: number): Mark[] {
  const ring = Array.from({ length: 24 }, (_, i) => ({
    x: centre.x + BALLOON_MM * Math.cos((i * Math.PI) / 12),
    y: centre.y + BALLOON_MM * Math.sin((i * Math.PI) / 12),
  }));
  return [
    area(ring, 'paper'),
    circle(centre, BALLOON_MM, { ink: 'graphite' }),
    text({ x: centre.x, y: centre.y + LETTER.small / 2 }, String(number), LETTER.small, {
      anchor: 'middle',
      weight: 600,
    }),
  ];
}

/** Ribs from edge to edge, their numbers in front of the leading edge where there is room. */
function ribLines(plan: CorePlan, view: View, taken: Occupied): Mark[] {
  const { panel } = plan.core;
  const span = plan.plan.panel.spanMm;
  const between = (of: (end: Panel[End]) => number, share: number) =>
    of(panel.root) + share * (of(panel.tip) - of(panel.root));
  return (plan.ribs?.ribs ?? []).flatMap(({ number, spanMm }): Mark[] => {
    const share = spanMm / span;
    const nose = at(view, spanMm, between(noseOf, share));
    const tail = at(view, spanMm, between(tailOf, share));
    const words = text({ x: nose.x, y: nose.y - 1.5 }, String(number), LETTER.small, { anchor: 'middle' });
    const free = taken.isFree(textBox(words), 0.6);
    if (free) taken.take(textBox(words));
    return [segment(nose.x, nose.y, tail.x, tail.y), ...(free ? [words] : [])];
  });
}

/** @param floor an upright dimension that ends below has no room for a text beyond its lower end */
function dimensions(plan: CorePlan, view: View, floor: number): Mark[] {
  const { panel } = plan.core;
  const { spanMm } = plan.plan.panel;
  const noses = { root: noseOf(panel.root), tip: noseOf(panel.tip) };
  const tails = { root: tailOf(panel.root), tip: tailOf(panel.tip) };
  const faces = { root: at(view, 0, 0).x, tip: at(view, spanMm, 0).x };
  const upright = (
    end: End,
    spanAt: number,
    [from, to]: readonly [number, number],
    level: number,
    length = Math.abs(to - from),
  ) =>
    dimension({
      from: at(view, spanAt, from),
      to: at(view, spanAt, to),
      direction: 'upright',
      at: faces[end] + (end === 'root' ? -1 : 1) * level * LEVEL,
      text: fixed(length, 1),
      outside: Math.max(at(view, spanAt, from).y, at(view, spanAt, to).y) > floor ? 'before' : 'beyond',
    });
  const places = plan.features.slice(0, DIMENSIONED);
  const along = ENDS.flatMap((end) => {
    const features = places.flatMap((feature, i) => {
      const { minX, maxX } = boxOf(feature[end].outline);
      return upright(end, end === 'root' ? 0 : spanMm, [noses[end], (minX + maxX) / 2], i + 1);
    });
    const chord = upright(
      end,
      end === 'root' ? 0 : spanMm,
      [noses[end], tails[end]],
      places.length + 1,
      panel[end].chordMm,
    );
    return [...features, ...chord];
  });
  const sweep = noses.tip - noses.root;
  const uprights = [
    ...along,
    ...(Math.abs(sweep) < 0.05 ? [] : upright('tip', spanMm, [noses.root, noses.tip], places.length + 2)),
  ];
  // Below the panel, and below the texts that did not fit between their arrows.
  const texts = uprights.flatMap((of) => (of.kind === 'text' ? [textBox(of)] : []));
  const lowest = Math.max(
    at(view, 0, tails.root).y,
    at(view, spanMm, tails.tip).y,
    ...texts.map(({ y, height }) => y + height - 4),
  );
  return [
    ...uprights,
    ...dimension({
      from: at(view, 0, tails.root),
      to: at(view, spanMm, tails.tip),
      direction: 'level',
      at: lowest + 9,
      text: fixed(spanMm, 1),
    }),
  ];
}
