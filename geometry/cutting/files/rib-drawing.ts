import { type DxfDocument, type DxfEntity } from '../../formats/dxf-document.ts';
import { textsBelow } from '../../formats/text-block.ts';
import { type Point } from '../../point.ts';
import { type Polyline, at, polylineOf } from '../arrays.ts';
import { type RibPlace } from '../packing.ts';
import { type CorePlan } from '../planner.ts';
import { type RibsPlan } from '../plan.ts';
import { type Rib, type RibSet } from '../ribs.ts';
import { type SheetIdentity } from './identity.ts';
import { RIB_LAYERS } from './layers.ts';
import { ribLines, ribStationLines } from './words.ts';

/** A sheet of ribs, as they lie on it, its lower left corner at the origin. */
interface RibSheet {
  readonly document: DxfDocument;
  readonly numbers: readonly number[];
}

/**
 * One drawing for each sheet: edges, tube holes and lightening holes on CUT, level lines, hidden surfaces and numbers on ENGRAVE, the sheet on
 * REFERENCE. Ribs that no sheet holds are in none; the plan's findings name them.
 */
export function ribSheets(core: CorePlan, identity: SheetIdentity): readonly RibSheet[] {
  const { ribs, plan } = core;
  if (!ribs || !plan.ribs) return [];
  const { sheet } = plan.ribs;
  return Array.from({ length: ribs.layout.sheets }, (_, index) =>
    ribSheet(core, identity, ribs, sheet, index),
  );
}

/** The lines are about twice as long as those that suit the whole width. */
const TEXT_SHARE = 0.5;

function ribSheet(
  core: CorePlan,
  identity: SheetIdentity,
  { ribs, layout }: RibSet,
  { widthMm, heightMm }: RibsPlan['sheet'],
  index: number,
): RibSheet {
  const placed = layout.places
    .filter(({ sheet }) => sheet === index)
    .flatMap((place) => {
      const rib = ribs.find(({ number }) => number === place.number);
      return rib ? [{ rib, place }] : [];
    });
  const here = placed.map(({ rib }) => rib);
  const lines = ribLines(core, identity, { number: index + 1, count: layout.sheets, ribs: here });
  const texts = textsBelow(lines, widthMm * TEXT_SHARE, { x: 0, y: 0 });
  const document = {
    comments: [...lines, ...ribStationLines(here)],
    layers: RIB_LAYERS,
    entities: [
      ...placed.flatMap(({ rib, place }) => ribEntities(rib, place)),
      polyline('REFERENCE', rectangle(widthMm, heightMm), true),
      ...texts.map((text): DxfEntity => ({ kind: 'text', layer: 'TEXT', text })),
    ],
    extents: { minX: 0, maxX: widthMm, minY: 0, maxY: heightMm },
  };
  return { document, numbers: here.map(({ number }) => number) };
}

function ribEntities(rib: Rib, place: RibPlace): DxfEntity[] {
  const cut = [...rib.tubes, ...rib.outlines].map((line) => polyline('CUT', onSheet(place, line), true));
  const holes = rib.holes.map(({ x, y, radius }): DxfEntity => ({
    kind: 'circle',
    layer: 'CUT',
    center: pointOnSheet(place, { x, y }),
    radius,
  }));
  const engraved = rib.engraved
    .filter(({ x }) => x.length > 1)
    .map((line) => polyline('ENGRAVE', onSheet(place, line), false));
  // Holes come before the edge, so that a rib still hangs in its sheet while they are cut.
  return [...engraved, ...holes, ...cut];
}

function polyline(layer: string, chain: Polyline, closed: boolean): DxfEntity {
  return { kind: 'polyline', layer, chain, closed };
}

function pointOnSheet({ turned, dx, dy }: RibPlace, { x, y }: Point): Point {
  return turned ? { x: dx - y, y: dy + x } : { x: dx + x, y: dy + y };
}

function onSheet(place: RibPlace, { x, y }: Polyline): Polyline {
  return polylineOf(Array.from(x, (value, i) => pointOnSheet(place, { x: value, y: at(y, i) })));
}

function rectangle(width: number, height: number): Polyline {
  return { x: Float64Array.of(0, width, width, 0), y: Float64Array.of(0, 0, height, height) };
}
