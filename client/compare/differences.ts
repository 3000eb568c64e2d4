import { type Measures } from '#geometry/contour/measures.ts';
import { type CstShape } from '#geometry/shapes/cst.ts';
import { type Naca4Shape } from '#geometry/shapes/naca4.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import {
  formatAngle,
  formatLength,
  formatNumber,
  formatPercent,
  MM_PER_INCH,
  type Units,
} from '#client/app/units.ts';
import { type Compared } from './comparison.ts';
import { nameOf, signed } from './words.ts';

interface Cell {
  readonly value: string;
  /** From the reference, with its sign; null for the reference and where there is none to state. */
  readonly difference: string | null;
}

export interface Row {
  readonly label: string;
  readonly cells: readonly Cell[];
}

/** A row of numbers: how they are read and written. A reading of null is shown as a dash. */
interface Quantity<Of> {
  readonly label: string;
  readonly of: (item: Of) => number | null;
  readonly text: (value: number) => string;
}

function rowOf<Of>({ label, of, text }: Quantity<Of>, items: readonly Of[]): Row {
  const values = items.map(of);
  const reference = values[0] ?? null;
  const cells = values.map((value, index): Cell => {
    if (value === null) return { value: '–', difference: null };
    const known = index > 0 && reference !== null;
    return { value: text(value), difference: known ? signed(text(value - reference)) : null };
  });
  return { label, cells };
}

/** What is measured on the contours, at a chord. */
export function measureRows(compared: readonly Compared[], chordMm: number, units: Units): Row[] {
  const length = (fraction: number) => formatLength(fraction * chordMm, units);
  const percent = (fraction: number) => formatPercent(fraction);
  const cambered = (m: Measures) => (m.maxCamberPosition === 0 ? null : m.maxCamberPosition);
  const quantities: readonly Quantity<Measures>[] = [
    { label: 'Largest thickness', of: (m) => m.maxThickness, text: length },
    { label: 'Thickness, of chord', of: (m) => m.maxThickness, text: percent },
    { label: 'Thickness, station', of: (m) => m.maxThicknessPosition, text: percent },
    { label: 'Largest camber', of: (m) => m.maxCamber, text: length },
    { label: 'Camber, of chord', of: (m) => m.maxCamber, text: percent },
    { label: 'Camber, station', of: cambered, text: percent },
    { label: 'Nose radius', of: (m) => m.noseRadius, text: length },
    { label: 'Trailing-edge gap', of: (m) => m.trailingEdgeGap, text: length },
    { label: 'Trailing-edge angle', of: (m) => m.trailingEdgeAngleDeg, text: formatAngle },
    { label: 'Area', of: (m) => m.area, text: (area) => areaText(area * chordMm ** 2, units) },
    { label: 'Girth', of: (m) => m.perimeter, text: length },
  ];
  return quantities.map((quantity) =>
    rowOf(
      quantity,
      compared.map(({ drawing }) => drawing.measures),
    ),
  );
}

function areaText(mm2: number, units: Units): string {
  return units === 'mm' ? `${formatNumber(mm2, 1)} mm²` : `${formatNumber(mm2 / MM_PER_INCH ** 2, 4)} in²`;
}

/** The parameters beside each other when all shapes are of one kind; null when they are not. */
export function parameterRows(compared: readonly Compared[]): Row[] | null {
  const shapes = compared.map(({ version }) => version.shape);
  if (shapes.every(isFourDigit)) return fourDigitRows(shapes);
  if (shapes.every(isFreeForm)) return freeFormRows(shapes);
  return null;
}

const isFourDigit = (shape: Shape): shape is Naca4Shape => shape.kind === 'naca4';
const isFreeForm = (shape: Shape): shape is CstShape => shape.kind === 'cst';

function fourDigitRows(shapes: readonly Naca4Shape[]): Row[] {
  const text = (fraction: number) => formatPercent(fraction);
  const position = (shape: Naca4Shape) => (shape.maxCamber === 0 ? null : shape.maxCamberPosition);
  return [
    rowOf({ label: 'Camber', of: (shape) => shape.maxCamber, text }, shapes),
    rowOf({ label: 'Camber position', of: position, text }, shapes),
    rowOf({ label: 'Thickness', of: (shape) => shape.maxThickness, text }, shapes),
    wordRow(
      'Trailing edge',
      shapes.map(({ trailingEdge }) => trailingEdge),
    ),
  ];
}

function wordRow(label: string, words: readonly string[]): Row {
  const cells = words.map((value, index): Cell => {
    return { value, difference: index === 0 ? null : value === words[0] ? 'same' : 'other' };
  });
  return { label, cells };
}

/** Weights of unlike order belong to unlike functions: they stand beside each other without a difference. */
function freeFormRows(shapes: readonly CstShape[]): Row[] {
  const weight = (value: number) => formatNumber(value, 4);
  const weights = (['upper', 'lower'] as const).flatMap((surface) => {
    const most = Math.max(...shapes.map((shape) => shape[surface].length));
    const alike = shapes.every((shape) => shape[surface].length === most);
    return Array.from({ length: most }, (_, index) => {
      const of = (shape: CstShape) => shape[surface][index] ?? null;
      const row = rowOf({ label: `Weight ${index}, ${surface}`, of, text: weight }, shapes);
      return alike ? row : withoutDifferences(row);
    });
  });
  return [
    ...weights,
    rowOf({ label: 'Class exponent, nose', of: ({ n1 }) => n1, text: (n) => formatNumber(n, 2) }, shapes),
    rowOf({ label: 'Class exponent, edge', of: ({ n2 }) => n2, text: (n) => formatNumber(n, 2) }, shapes),
    rowOf({ label: 'Trailing-edge gap', of: (shape) => shape.trailingEdgeGap, text: formatPercent }, shapes),
  ];
}

function withoutDifferences({ label, cells }: Row): Row {
  return { label, cells: cells.map(({ value }) => ({ value, difference: null })) };
}

/** The tables as tab-separated text: for each version its value, and for all but the reference the difference. */
export function tabSeparated(compared: readonly Compared[], rows: readonly Row[]): string {
  const plain = (text: string) => text.replace(/[\t\r\n]+/g, ' ');
  const head = compared.flatMap((one, index) =>
    index === 0 ? [nameOf(one)] : [nameOf(one), `${one.tag}: difference`],
  );
  const lines = rows.map(({ label, cells }) => [
    label,
    ...cells.flatMap(({ value, difference }, index) => (index === 0 ? [value] : [value, difference ?? ''])),
  ]);
  return [['Value', ...head], ...lines].map((line) => line.map(plain).join('\t')).join('\n');
}
