import { type Contour } from '../../contour/contour.ts';
import { type DxfDocument, type DxfEntity } from '../../formats/dxf-document.ts';
import { textsBelow } from '../../formats/text-block.ts';
import { type Point } from '../../point.ts';
import { type Box, type Polyline, at, boxOf, polylineOf } from '../arrays.ts';
import { type BlockPlace } from '../block.ts';
import { type PlacedFeature } from '../features.ts';
import { type CorePlan } from '../planner.ts';
import { type BlockPlan, type End } from '../plan.ts';
import { type SheetIdentity } from './identity.ts';
import { pairsInStep, pick } from './in-step.ts';
import { END_LAYERS } from './layers.ts';
import { tickMarks } from './tick-marks.ts';
import { endLines, featureLines } from './words.ts';

/**
 * The core at one end, in the panel's frame, which root and tip share: the finished foam on CUT and what is taken out of it on SLOT, both vertex by
 * vertex in step with the other end; level line and the template's ticks on ENGRAVE; section, chord line and block on REFERENCE.
 *
 * @param contour the whole section at its chord, not yet in its place
 */
export function endDrawing(core: CorePlan, identity: SheetIdentity, end: End, contour: Contour): DxfDocument {
  const outline = pick(core.core[end].core, pairsInStep(core.core));
  const drawn = [
    ...polylines('CUT', [outline], true),
    ...slots(core.features, end),
    ...polylines('ENGRAVE', engraved(core, end, outline), false),
    ...reference(core, end, contour),
  ];
  const box = boxOfEntities(drawn);
  const lines = endLines(core, identity, end);
  const texts = textsBelow(lines, core.plan.panel[end].chordMm * TEXT_SHARE, { x: box.minX, y: box.minY });
  return {
    comments: [...lines, ...featureLines(core.features)],
    layers: END_LAYERS,
    entities: [...drawn, ...texts.map((text): DxfEntity => ({ kind: 'text', layer: 'TEXT', text }))],
    extents: box,
  };
}

/** The lines are about twice as long as those that suit the whole chord. */
const TEXT_SHARE = 0.5;

function polylines(layer: string, chains: readonly Polyline[], closed: boolean): DxfEntity[] {
  const keepRepeats = layer === 'CUT' || layer === 'SLOT';
  return chains.map((chain) => ({ kind: 'polyline', layer, chain, closed, keepRepeats }));
}

/** What is taken out of the foam, and the middle of the slit through which the wire enters a tube. */
function slots(features: readonly PlacedFeature[], end: End): DxfEntity[] {
  return features.flatMap(({ feature, [end]: cutout }): DxfEntity[] => {
    const outline = polylines('SLOT', [cutout.outline], true);
    const [mouth] = cutout.mouths;
    if (feature.kind !== 'tube' || !mouth) return outline;
    const [a, b] = mouth.edges;
    const from = { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 };
    const to = { x: at(cutout.outline.x, 0), y: at(cutout.outline.y, 0) };
    return [...outline, { kind: 'line', layer: 'SLOT', from, to }];
  });
}

function engraved(
  { plan, core, features, templates }: CorePlan,
  end: End,
  outline: Polyline,
): readonly Polyline[] {
  const { y } = core.panel[end].toPanel({ x: plan.panel.washoutStation, y: 0 });
  const level = levelLine(outline, y);
  const template = templates.find((of) => of.end === end);
  if (!template || !plan.template) return level;
  // The template's edge is the wire's path less the wire's radius; the foam's outline is the path less half the kerf.
  const inset = plan.kerfMm[end] / 2 - plan.template.wireDiameterMm / 2;
  const taken = [...level, ...features.map((feature) => feature[end].outline)].map((of) => boxOf(of));
  return [...level, ...tickMarks(template.ticks, outline, inset, taken)];
}

/** The level line at a height, from the foremost to the rearmost point where it meets the outline; none when it misses. */
function levelLine(outline: Polyline, y: number): Polyline[] {
  const crossings: number[] = [];
  for (let b = 0, a = outline.x.length - 1; b < outline.x.length; a = b++) {
    const [ay, by] = [at(outline.y, a), at(outline.y, b)];
    if (ay > y === by > y) continue;
    crossings.push(at(outline.x, a) + ((y - ay) / (by - ay)) * (at(outline.x, b) - at(outline.x, a)));
  }
  if (crossings.length < 2) return [];
  return [
    polylineOf([
      { x: Math.min(...crossings), y },
      { x: Math.max(...crossings), y },
    ]),
  ];
}

function reference({ plan, core, fit }: CorePlan, end: End, contour: Contour): DxfEntity[] {
  const section = core.panel[end];
  const { chordMm } = section;
  const points = Array.from(contour.x, (x, i) =>
    section.toPanel({ x: x / chordMm, y: at(contour.y, i) / chordMm }),
  );
  const [place] = fit?.places ?? [];
  return [
    ...polylines('REFERENCE', [polylineOf(points)], true),
    {
      kind: 'line',
      layer: 'REFERENCE',
      from: section.toPanel({ x: 0, y: 0 }),
      to: section.toPanel({ x: 1, y: 0 }),
    },
    ...(plan.block && place ? polylines('REFERENCE', [blockCorners(plan.block, place)], true) : []),
  ];
}

/** The block's corners in the panel's frame: the way back from the core's place in the block. */
function blockCorners({ lengthMm, heightMm }: BlockPlan, { xMm, yMm, tiltDeg }: BlockPlace): Polyline {
  const angle = (tiltDeg * Math.PI) / 180;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  const corners = [
    [0, 0],
    [lengthMm, 0],
    [lengthMm, heightMm],
    [0, heightMm],
  ] as const;
  return polylineOf(
    corners.map(([x, y]): Point => {
      const [along, up] = [x - xMm, y - yMm];
      return { x: cos * along - sin * up, y: sin * along + cos * up };
    }),
  );
}

function boxOfEntities(entities: readonly DxfEntity[]): Box {
  return boxOf(...entities.map(chainOf));
}

function chainOf(entity: DxfEntity): Polyline {
  if (entity.kind === 'polyline')
    return { x: Float64Array.from(entity.chain.x), y: Float64Array.from(entity.chain.y) };
  return entity.kind === 'line' ? polylineOf([entity.from, entity.to]) : polylineOf([]);
}
