import {
  PDFArray,
  PDFDict,
  PDFDocument,
  PDFHexString,
  PDFName,
  PDFNumber,
  PDFRawStream,
  decodePDFRawStream,
  type PDFPage,
} from 'pdf-lib';

/** A PDF page as it comes out of the printer: mm from the upper left corner, y down. */
export interface ReadPage {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly paths: readonly ReadPath[];
  readonly texts: readonly ReadText[];
}

export interface ReadPath {
  /** Corners of each part; curves are given by their ends. */
  readonly parts: readonly (readonly { x: number; y: number }[])[];
  readonly painted: 'stroke' | 'fill';
  readonly widthMm: number;
}

export interface ReadText {
  readonly text: string;
  readonly at: { readonly x: number; readonly y: number };
  /** By the widths that the font has in the file. */
  readonly widthMm: number;
  /** Height of the capitals by the font's own measure. */
  readonly heightMm: number;
  readonly turned: boolean;
}

type Matrix = readonly [number, number, number, number, number, number];
type Operand = number | string | Operand[];

const MM_PER_POINT = 25.4 / 72;

/** Reads what is drawn on each page by carrying out the content stream (ISO 32000-1, clause 8 and 9). */
export async function readPdf(bytes: Uint8Array): Promise<{ document: PDFDocument; pages: ReadPage[] }> {
  const document = await PDFDocument.load(bytes, { updateMetadata: false });
  return { document, pages: document.getPages().map(readPage) };
}

function streamText(stream: unknown): string {
  if (!(stream instanceof PDFRawStream)) throw new Error('Not a stream.');
  return Buffer.from(decodePDFRawStream(stream).decode()).toString('latin1');
}

function times([a, b, c, d, e, f]: Matrix, [g, h, i, j, k, l]: Matrix): Matrix {
  return [a * g + b * i, a * h + b * j, c * g + d * i, c * h + d * j, e * g + f * i + k, e * h + f * j + l];
}

/** Numbers, names with their slash, hexadecimal strings with their bracket, arrays, and operators as text. */
function tokensOf(text: string): Operand[] {
  const stack: Operand[][] = [[]];
  for (const [token] of text.matchAll(/<[0-9a-fA-F\s]*>|[[\]]|[^\s[\]<>]+/g)) {
    if (token === '[') stack.push([]);
    else if (token === ']') {
      const array = stack.pop()!;
      stack.at(-1)!.push(array);
    } else stack.at(-1)!.push(/^[-+.\d]/.test(token) ? Number(token) : token);
  }
  return stack[0]!;
}

function readPage(page: PDFPage): ReadPage {
  const { width, height } = page.getSize();
  const place = (m: Matrix, x: number, y: number) => ({
    x: (m[0] * x + m[2] * y + m[4]) * MM_PER_POINT,
    y: (height - (m[1] * x + m[3] * y + m[5])) * MM_PER_POINT,
  });
  const fonts = fontsOf(page);
  const paths: ReadPath[] = [];
  const texts: ReadText[] = [];
  let state = { m: [1, 0, 0, 1, 0, 0] as Matrix, width: 1, font: '', size: 0 };
  let textMatrix: Matrix = [1, 0, 0, 1, 0, 0];
  const saved: (typeof state)[] = [];
  let parts: { x: number; y: number }[][] = [];
  let operands: Operand[] = [];
  const paint = (painted: 'stroke' | 'fill') => {
    const scale = Math.hypot(state.m[0], state.m[1]) * MM_PER_POINT;
    paths.push({ parts, painted, widthMm: state.width * scale });
    parts = [];
  };
  for (const token of tokensOf(streamText(page.node.Contents()))) {
    if (typeof token !== 'string' || token.startsWith('/') || token.startsWith('<')) {
      operands.push(token);
      continue;
    }
    const n = operands.filter((of) => typeof of === 'number');
    const [x, y] = [n.at(-2) ?? 0, n.at(-1) ?? 0];
    switch (token) {
      case 'q':
        saved.push(state);
        break;
      case 'Q':
        state = saved.pop() ?? state;
        break;
      case 'cm':
        state = { ...state, m: times(n as unknown as Matrix, state.m) };
        break;
      case 'w':
        state = { ...state, width: y };
        break;
      case 'm':
        parts.push([place(state.m, x, y)]);
        break;
      case 'l':
      case 'c':
        parts.at(-1)!.push(place(state.m, x, y));
        break;
      case 'h':
        parts.at(-1)!.push(parts.at(-1)![0]!);
        break;
      case 'S':
        paint('stroke');
        break;
      case 'f*':
        paint('fill');
        break;
      case 'Tf':
        state = { ...state, font: String(operands[0]), size: y };
        break;
      case 'Tm':
        textMatrix = n as unknown as Matrix;
        break;
      case 'TJ': {
        const font = fonts.get(state.font)!;
        const m = times(textMatrix, state.m);
        const scale = Math.hypot(m[0], m[1]) * MM_PER_POINT * state.size;
        const pieces = operands[0] as Operand[];
        const codes = pieces.flatMap((of) =>
          typeof of === 'string' ? (of.match(/[0-9a-f]{4}/gi) ?? []) : [],
        );
        const kerning = pieces.reduce<number>((sum, of) => sum + (typeof of === 'number' ? of : 0), 0);
        const advance = codes.reduce((sum, code) => sum + font.width(parseInt(code, 16)), 0) - kerning;
        texts.push({
          text: codes.map((code) => font.letters.get(code.toLowerCase()) ?? '').join(''),
          at: place(m, 0, 0),
          widthMm: (advance / 1000) * scale,
          heightMm: (font.capital / 1000) * scale,
          turned: Math.abs(m[1]) > Math.abs(m[0]),
        });
        break;
      }
      default:
        if (!['BT', 'ET', 'J', 'j', 'd', 'scn', 'SCN', 'cs', 'CS', 'gs', 'Tr', 'Tc'].includes(token))
          throw new Error(`Operator ${token} is not known here.`);
    }
    operands = [];
  }
  return { widthMm: width * MM_PER_POINT, heightMm: height * MM_PER_POINT, paths, texts };
}

interface ReadFont {
  width(code: number): number;
  readonly capital: number;
  readonly letters: ReadonlyMap<string, string>;
}

/** The font dictionaries of a page by their resource name, with their descendant and its descriptor. */
export function fontDictionaries(page: PDFPage) {
  const fonts = page.node.Resources()!.lookup(PDFName.of('Font'), PDFDict);
  return fonts.keys().map((key) => {
    const font = fonts.lookup(key, PDFDict);
    const descendant = font.lookup(PDFName.of('DescendantFonts'), PDFArray).lookup(0, PDFDict);
    const descriptor = descendant.lookup(PDFName.of('FontDescriptor'), PDFDict);
    return { name: key.asString(), font, descendant, descriptor };
  });
}

function fontsOf(page: PDFPage): ReadonlyMap<string, ReadFont> {
  return new Map(
    fontDictionaries(page).map(({ name, font, descendant, descriptor }) => {
      const widths = new Map<number, number>();
      const w = descendant.lookup(PDFName.of('W'), PDFArray);
      for (let i = 0; i < w.size(); i += 2) {
        const first = w.lookup(i, PDFNumber).asNumber();
        const run = w.lookup(i + 1, PDFArray);
        for (let k = 0; k < run.size(); k += 1) widths.set(first + k, run.lookup(k, PDFNumber).asNumber());
      }
      const capital = descriptor.lookup(PDFName.of('CapHeight'), PDFNumber).asNumber();
      const letters = lettersOf(streamText(font.lookup(PDFName.of('ToUnicode'))));
      return [name, { width: (code) => widths.get(code) ?? 0, capital, letters }];
    }),
  );
}

/** Characters by code from a ToUnicode map of ranges with lists. */
function lettersOf(map: string): Map<string, string> {
  const letters = new Map<string, string>();
  for (const [, from, list] of map.matchAll(/<([0-9a-f]+)>\s*<[0-9a-f]+>\s*\[([^\]]*)\]/gi)) {
    (list!.match(/<[0-9a-f\s]*>/gi) ?? []).forEach((hex, i) => {
      const code = (parseInt(from!, 16) + i).toString(16).padStart(4, '0');
      const text = PDFHexString.of(hex.slice(1, -1).replaceAll(' ', '')).asBytes();
      letters.set(code, Buffer.from(text).swap16().toString('utf16le'));
    });
  }
  return letters;
}
