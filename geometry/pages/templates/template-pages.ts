import { type SheetIdentity } from '../../cutting/files/identity.ts';
import { type CorePlan } from '../../cutting/planner.ts';
import { type Template } from '../../cutting/template.ts';
import { fixed } from '../../formats/text.ts';
import { type Point } from '../../point.ts';
import { clippedLine } from '../clip.ts';
import { textBox } from '../lettering.ts';
import { WIDTH, line, outlined } from '../marks.ts';
import { isWithin } from '../occupied.ts';
import { type Mark, type Page, type Rect, type PageDetails } from '../page.ts';
import { scaleBar } from '../scale-bar.ts';
import { cleanIdentity, plainText, sectionLine, statusLine } from '../words.ts';
import { BAND_MM, templateBand } from './template-band.ts';
import { type TemplateDrawing, contentOf, drawTemplate, usedTiles } from './template-drawing.ts';
import { type Tile, rowLetters, tilingOf } from './tiles.ts';

/** Papers that templates are printed on, lying: ISO 216, and Letter of ANSI/ASME Y14.1 (216 × 279 mm). */
export const PAPERS = {
  A4: { widthMm: 297, heightMm: 210 },
  A3: { widthMm: 420, heightMm: 297 },
  Letter: { widthMm: 279.4, heightMm: 215.9 },
} as const;
export type Paper = keyof typeof PAPERS;

/** Printers leave this much blank at the edge; common practice. */
const MARGIN_MM = 10;
/** At the left, for the upright scale bar. */
const STRIP_MM = 9;

/**
 * Root and tip template at true size, each spread over as many pages as it needs. Every page carries both scale bars, the QR code and the
 * short code of the version, where its tile lies, and the cautions. A plan without templates gives no pages.
 * @param paper printed lying, at 100 %
 */
export function templatePages(
  plan: CorePlan,
  identity: SheetIdentity,
  paper: Paper,
  details: PageDetails,
): Page[] {
  const clean = cleanIdentity(identity);
  const place = placeOn(paper);
  const parts = plan.templates.map((template) => {
    const spread = tilingOf(contentOf(template), place.window);
    const tiling = { ...spread, tiles: usedTiles(template, spread.tiles) };
    return { template, tiling, drawing: drawnTemplate(plan, clean, template, tiling) };
  });
  const total = parts.reduce((sum, { tiling }) => sum + tiling.tiles.length, 0);
  let number = 0;
  return parts.flatMap(({ template, tiling, drawing }) =>
    tiling.tiles.map((tile) => {
      number += 1;
      const content = {
        ...bandContent(plan, clean, template),
        sheet: `Sheet ${number} of ${total}`,
        tile: `${nameOf(template)} template: row ${rowLetters(tile.row)}, column ${tile.column + 1}`,
      };
      const map = { tiling, tile, outline: drawing.outline };
      return {
        ...PAPERS[paper],
        frame: place.frame,
        marks: [
          outlined(place.frame, { widthMm: WIDTH.edge }),
          ...tileMarks(drawing, tile, place.window),
          ...scaleBar({ x: place.frame.x + 7, y: place.window.y + place.window.height - 6 }, 'upright'),
          ...templateBand(content, map, details, place.band),
        ],
      };
    }),
  );
}

interface PlaceOnPaper {
  readonly frame: Rect;
  readonly window: Rect;
  readonly band: Rect;
}

function placeOn(paper: Paper): PlaceOnPaper {
  const { widthMm, heightMm } = PAPERS[paper];
  const frame: Rect = {
    x: MARGIN_MM,
    y: MARGIN_MM,
    width: widthMm - 2 * MARGIN_MM,
    height: heightMm - 2 * MARGIN_MM,
  };
  const height = frame.height - BAND_MM;
  return {
    frame,
    window: { x: frame.x + STRIP_MM, y: frame.y, width: frame.width - STRIP_MM, height },
    band: { ...frame, y: frame.y + height, height: BAND_MM },
  };
}

function drawnTemplate(
  { core }: CorePlan,
  identity: SheetIdentity,
  template: Template,
  tiling: Parameters<typeof drawTemplate>[2],
): TemplateDrawing {
  const { toPanel, chordMm } = core.panel[template.end];
  const chord = [toPanel({ x: 0, y: 0 }), toPanel({ x: 1, y: 0 })] as const;
  const end = template.end.toUpperCase();
  const version = `v${identity.versionNumber}`;
  const names = [
    `${end} ${plainText(chordMm)} mm, ${identity.sheetName} ${version}, ${identity.shortCode}`,
    `${end} ${plainText(chordMm)} mm, ${version}, ${identity.shortCode}`,
    `${end} ${version} ${identity.shortCode}`,
  ];
  return drawTemplate(template, chord, tiling, names);
}

function nameOf({ end }: Template): string {
  return end === 'root' ? 'Root' : 'Tip';
}

function bandContent({ plan, core }: CorePlan, identity: SheetIdentity, template: Template) {
  const { end, rampMm } = template;
  const chordMm = core.panel[end].chordMm;
  const { upperMm, lowerMm } = plan.allowances;
  const wire = plan.template ? `, wire ${plainText(plan.template.wireDiameterMm)} mm` : '';
  const washout = plan.panel.washoutDeg;
  return {
    title: identity.sheetName,
    part: `${nameOf(template)} template, chord ${plainText(chordMm)} mm`,
    status: `Version ${identity.versionNumber}, ${statusLine(identity)}`,
    lines: [
      `Section ${sectionLine(identity, end)}`,
      `Kerf ${plainText(plan.kerfMm[end])} mm${wire}, skins ${plainText(upperMm)} and ${plainText(lowerMm)} mm`,
      `${end === 'tip' && washout !== 0 ? `Washout ${plainText(washout)}°, kept by the level line. ` : ''}Ramp ${fixed(rampMm, 1)} mm`,
      'Saw along the middle of the edge. Set the level lines parallel.',
      'Both people call the numbers and pass the same one together.',
    ],
    shortCode: identity.shortCode,
    checksum: identity.checksum,
    address: identity.address,
  };
}

/** The part of the drawing that lies on a tile, moved to its page; texts stand whole or not at all. */
function tileMarks({ outline, lines, texts }: TemplateDrawing, tile: Tile, window: Rect): Mark[] {
  const move = ({ x, y }: Point): Point => ({
    x: x - tile.minX + window.x,
    y: y + tile.maxY + window.y,
  });
  const edge = line(outline, { closed: true, widthMm: WIDTH.edge });
  const moved = [...lines, edge].flatMap((mark): Mark[] => {
    if (mark.kind === 'line') {
      const pieces = clippedLine(mark.points.map(move), mark.closed, window);
      return pieces.map((points) => ({ ...mark, points, closed: false }));
    }
    if (mark.kind !== 'circle') return [];
    const centre = move(mark.centre);
    const { radiusMm: r } = mark;
    const box = { x: centre.x - r, y: centre.y - r, width: 2 * r, height: 2 * r };
    if (isWithin(box, window)) return [{ ...mark, centre }];
    const { widthMm, ink } = mark;
    return clippedLine(ring(centre, r), true, window).map((points) => line(points, { widthMm, ink }));
  });
  const words = texts
    .map((mark) => ({ ...mark, at: move(mark.at) }))
    .filter((mark) => isWithin(textBox(mark), window));
  return [outlined(window, { widthMm: WIDTH.hair, ink: 'graphite' }), ...moved, ...words];
}

const AROUND = 72;

function ring(centre: Point, radius: number): Point[] {
  return Array.from({ length: AROUND }, (_, i) => ({
    x: centre.x + radius * Math.cos((2 * Math.PI * i) / AROUND),
    y: centre.y + radius * Math.sin((2 * Math.PI * i) / AROUND),
  }));
}
