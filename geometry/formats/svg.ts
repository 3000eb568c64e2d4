import { LONG_DASH_DOT_MM, OUTLINE_WIDTH_MM, THIN_WIDTH_MM, type Chain, type Drawing } from './drawing.ts';
import { type Point } from '../point.ts';
import { fixed, xmlText } from './text.ts';

/** Decimals of lengths in mm. */
export const SVG_DECIMALS = 4;
const MARGIN_MM = 5;
/** Width of a letter as a share of its height of a capital; a monospaced face is about 0.82 of it, the rest is reserve. */
const LETTER_WIDTH = 0.9;
/** Font size as a multiple of the height of a capital (common practice for faces without serifs). */
const FONT_SIZE = 1.4;

const mm = (value: number): string => fixed(value, SVG_DECIMALS);

/**
 * An SVG drawing at true size: width and height in mm and a view box of the same numbers, so that one unit is one millimetre.
 * One group for each layer, with the layer's name as its id. The outline is a closed path; lines as ISO 128 draws
 * them. The bytes depend on the drawing alone.
 *
 * @throws RangeError when a coordinate is not finite
 */
export function writeSvg(drawing: Drawing): string {
  const box = boxOf(drawing);
  const size = `width="${mm(box.width)}mm" height="${mm(box.height)}mm"`;
  const viewBox = [box.minX, -box.maxY, box.width, box.height].map(mm).join(' ');
  const lines = [
    '<?xml version="1.0" encoding="UTF-8"?>',
    `<svg xmlns="http://www.w3.org/2000/svg" ${size} viewBox="${viewBox}">`,
    `<title>${xmlText(drawing.title)}</title>`,
    `<desc>${xmlText(drawing.header.join('; '))}</desc>`,
    ...drawing.layers.map((layer) => layerOf(drawing, layer)),
    '</svg>',
  ];
  return `${lines.join('\n')}\n`;
}

function layerOf(drawing: Drawing, layer: Drawing['layers'][number]): string {
  const thin = `fill="none" stroke="#000" stroke-width="${THIN_WIDTH_MM}" stroke-dasharray="${LONG_DASH_DOT_MM.join(' ')}"`;
  const group = (attributes: string, content: string) => `<g id="${layer}" ${attributes}>${content}</g>`;
  switch (layer) {
    case 'OUTLINE':
      return group(
        `fill="none" stroke="#000" stroke-width="${OUTLINE_WIDTH_MM}" stroke-linejoin="round"`,
        `<path d="${pathOf(drawing.outline, true)}"/>`,
      );
    case 'CHORD': {
      const [nose, edge] = drawing.chordLine;
      const ends = `x1="${mm(nose.x)}" y1="${mm(-nose.y)}" x2="${mm(edge.x)}" y2="${mm(-edge.y)}"`;
      return group(thin, `<line ${ends}/>`);
    }
    case 'CAMBER':
      return group(thin, `<path d="${pathOf(drawing.camberLine)}"/>`);
    case 'TEXT':
      return group('fill="#000" font-family="monospace"', drawing.texts.map(textOf).join(''));
  }
}

/** Straight pieces and, where a vertex has a bulge, arcs; the last piece of a closed chain is left to `Z` unless it is an arc. */
function pathOf({ x, y, bulge }: Chain, closed = false): string {
  const at = (i: number) => ({ x: x[i % x.length] ?? NaN, y: -(y[i % x.length] ?? NaN) });
  let path = `M${mm(at(0).x)} ${mm(at(0).y)}`;
  for (let i = 1; i <= x.length; i += 1) {
    const bend = bulge?.[i - 1] ?? 0;
    if (i === x.length && (!closed || bend === 0)) break;
    const end = `${mm(at(i).x)} ${mm(at(i).y)}`;
    path += bend === 0 ? `L${end}` : `A${arcOf(at(i - 1), at(i), bend)} ${end}`;
  }
  return closed ? `${path}Z` : path;
}

/** Radii, rotation and the two flags of an arc command; y points down in SVG, so counter-clockwise is sweep 0. */
function arcOf(a: Point, b: Point, bulge: number): string {
  const radius = mm((Math.hypot(b.x - a.x, b.y - a.y) * (1 + bulge * bulge)) / (4 * Math.abs(bulge)));
  return `${radius} ${radius} 0 ${Math.abs(bulge) > 1 ? 1 : 0} ${bulge > 0 ? 0 : 1}`;
}

function textOf({ text, x, y, height }: Drawing['texts'][number]): string {
  return `<text x="${mm(x)}" y="${mm(-y)}" font-size="${mm(height * FONT_SIZE)}">${xmlText(text)}</text>`;
}

/** The outline, the lines and the text with a margin about them. */
function boxOf({ extents, chordLine, texts, layers }: Drawing) {
  const written = layers.includes('TEXT') ? texts : [];
  const lowest = written.map(({ y, height }) => y - height / 2);
  const right = written.map(({ text, x, height }) => x + text.length * height * LETTER_WIDTH);
  const minX = Math.min(extents.minX, chordLine[0].x) - MARGIN_MM;
  const maxX = Math.max(extents.maxX, chordLine[1].x, ...right) + MARGIN_MM;
  const minY = Math.min(extents.minY, 0, ...lowest) - MARGIN_MM;
  const maxY = Math.max(extents.maxY, 0) + MARGIN_MM;
  return { minX, maxY, width: maxX - minX, height: maxY - minY };
}
