import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import PDFDocument from 'pdfkit';
import { type SheetIdentity } from '#geometry/cutting/files/identity.ts';
import { textWidth, TYPEFACE } from '#geometry/pages/lettering.ts';
import { DASHES } from '#geometry/pages/marks.ts';
import { type Ink, type Mark, type Page, type TextMark, type Weight } from '#geometry/pages/page.ts';
import { singleLine } from '#geometry/formats/text.ts';

type Document = InstanceType<typeof PDFDocument>;

/** PDF measures in points of 1/72 inch (ISO 32000-1, 8.3.2.3). */
const POINTS_PER_MM = 72 / 25.4;

/** The sheet's colours by day, as on the screen. */
const COLOURS: Readonly<Record<Ink, string>> = {
  ink: '#1D2329',
  graphite: '#5B646D',
  hair: '#D5CFC2',
  foam: '#DCEBEE',
  wire: '#C2410C',
  paper: '#FFFFFF',
};

const FONTS: Readonly<Record<Weight, string>> = {
  400: '400Regular/JetBrainsMono_400Regular.ttf',
  600: '600SemiBold/JetBrainsMono_600SemiBold.ttf',
  800: '800ExtraBold/JetBrainsMono_800ExtraBold.ttf',
};

/** No contextual ligatures: they crash the subsetting of this font. The types know only lists of features to switch on. */
const UNLINKED = { calt: false } as unknown as PDFKit.Mixins.OpenTypeFeatures[];

/** A document that can say which characters its present font has. */
interface FontOfDocument {
  readonly _font: { readonly font: { hasGlyphForCodePoint(code: number): boolean } };
}

let fontFiles: Readonly<Record<Weight, Buffer>> | null = null;

function fonts(): Readonly<Record<Weight, Buffer>> {
  const { resolve } = createRequire(import.meta.url);
  const read = (weight: Weight) =>
    readFileSync(resolve(`@expo-google-fonts/jetbrains-mono/${FONTS[weight]}`));
  fontFiles ??= { 400: read(400), 600: read(600), 800: read(800) };
  return fontFiles;
}

/**
 * Writes pages as a PDF file of vectors alone, 1 mm of a page being exactly 1 mm of the file's, with the letters used embedded. Its dates are those of
 * the version, so the same pages give the same bytes.
 * @param title of the document, for instance "Reed wing v3, templates"
 */
export function pagesToPdf(
  pages: readonly Page[],
  title: string,
  identity: Pick<SheetIdentity, 'author' | 'createdAt'>,
): Promise<Buffer> {
  const created = new Date(identity.createdAt);
  const document = new PDFDocument({
    autoFirstPage: false,
    lang: 'en',
    displayTitle: true,
    info: {
      Title: singleLine(title),
      Author: singleLine(identity.author),
      Creator: 'Ribwright',
      Producer: 'Ribwright',
      CreationDate: created,
      ModDate: created,
    },
  });
  const chunks: Buffer[] = [];
  const done = new Promise<Buffer>((resolve, reject) => {
    document.on('data', (chunk) => chunks.push(chunk));
    document.on('end', () => resolve(Buffer.concat(chunks)));
    document.on('error', reject);
  });
  for (const [weight, file] of Object.entries(fonts())) document.registerFont(weight, file);
  for (const page of pages) writePage(document, page);
  document.end();
  return done;
}

function writePage(document: Document, { widthMm, heightMm, marks }: Page): void {
  document.addPage({ size: [widthMm * POINTS_PER_MM, heightMm * POINTS_PER_MM], margin: 0 });
  document.scale(POINTS_PER_MM, POINTS_PER_MM).lineJoin('round');
  for (const mark of marks) writeMark(document, mark);
}

function writeMark(document: Document, mark: Mark): void {
  if (mark.kind === 'text') {
    writeText(document, mark);
  } else if (mark.kind === 'area') {
    for (const ring of mark.rings) writePath(document, ring, true);
    document.fillColor(COLOURS[mark.ink]).fill('even-odd');
  } else if (mark.kind === 'circle') {
    document.circle(mark.centre.x, mark.centre.y, mark.radiusMm);
    document.lineWidth(mark.widthMm).strokeColor(COLOURS[mark.ink]).stroke();
  } else {
    const dashes = DASHES[mark.type].map((multiple) => multiple * mark.widthMm);
    // The types know only one length.
    if (dashes.length > 0) document.dash(dashes as unknown as number, {});
    writePath(document, mark.points, mark.closed);
    document.lineWidth(mark.widthMm).strokeColor(COLOURS[mark.ink]).stroke();
    if (dashes.length > 0) document.undash();
  }
}

function writePath(
  document: Document,
  points: readonly { readonly x: number; readonly y: number }[],
  closed: boolean,
): void {
  points.forEach(({ x, y }, i) => (i === 0 ? document.moveTo(x, y) : document.lineTo(x, y)));
  if (closed) document.closePath();
}

function writeText(document: Document, mark: TextMark): void {
  const { at, heightMm, weight, anchor, turned, ink } = mark;
  document.font(String(weight)).fontSize(heightMm / TYPEFACE.capital);
  const words = drawable(document, mark.text);
  if (words === '') return;
  const width = textWidth(mark.text, heightMm);
  const x = at.x - (anchor === 'start' ? 0 : anchor === 'middle' ? width / 2 : width);
  if (turned) document.save().rotate(-90, { origin: [at.x, at.y] });
  const options = { lineBreak: false, baseline: 'alphabetic', features: UNLINKED } as const;
  document.fillColor(COLOURS[ink]).text(words, x, at.y, options);
  if (turned) document.restore();
}

/** Characters that the font does not have become question marks, one for one, so the text keeps its width. */
function drawable(document: Document, text: string): string {
  const { font } = (document as unknown as FontOfDocument)._font;
  return [...text].map((of) => (font.hasGlyphForCodePoint(of.codePointAt(0) ?? 0) ? of : '?')).join('');
}
