import jsQR from 'jsqr';
import { PDFName, PDFRawStream } from 'pdf-lib';
import { describe, expect, test } from 'vitest';
import { cutSheetPages } from '#geometry/pages/cut-sheet/cut-sheet-pages.ts';
import { textBox } from '#geometry/pages/lettering.ts';
import { overlaps } from '#geometry/pages/occupied.ts';
import { PAPERS, type Paper, templatePages } from '#geometry/pages/templates/template-pages.ts';
import { pagesToPdf } from '#server/cut-sheets/files/pdf.ts';
import { qrModules } from '#server/cut-sheets/files/qr.ts';
import { textsOf } from '#tests/geometry/pages/checking.ts';
import { HOSTILE_NAMES, PLANS, SHEET, namedSheet, planned } from '#tests/geometry/pages/samples.ts';
import { type ReadPage, type ReadText, fontDictionaries, readPdf } from './pdf-reading.ts';

const DETAILS = { qr: qrModules(SHEET.address), owner: 'Fen Works' };
const { plan, findings } = planned(PLANS['tapered and swept']);
const templates = (paper: Paper) => templatePages(plan, SHEET, paper, DETAILS);
const sheets = cutSheetPages(plan, findings, SHEET, DETAILS);
const pdf = (pages = templates('A4')) => pagesToPdf(pages, 'Reed wing v3, templates', SHEET);

/** Lengths of straight strokes near a "100 mm", along it. */
function scaleBars({ paths, texts }: ReadPage): { level: number; upright: number } {
  const measure = (turned: boolean) => {
    const words = texts.find((of) => of.text === '100 mm' && of.turned === turned)!;
    const middle = {
      x: words.at.x + (turned ? 0 : words.widthMm / 2),
      y: words.at.y - (turned ? words.widthMm / 2 : 0),
    };
    const lengths = paths.flatMap(({ parts, painted }) => {
      const [a, b] = parts[0] ?? [];
      if (painted !== 'stroke' || parts.length !== 1 || parts[0]!.length !== 2 || !a || !b) return [];
      const [dx, dy] = [Math.abs(b.x - a.x), Math.abs(b.y - a.y)];
      const off = Math.hypot((a.x + b.x) / 2 - middle.x, (a.y + b.y) / 2 - middle.y);
      const along = turned ? dx < 1e-6 : dy < 1e-6;
      return along && off < 5 && dx + dy > 50 ? [dx + dy] : [];
    });
    expect(lengths).toHaveLength(1);
    return lengths[0]!;
  };
  return { level: measure(false), upright: measure(true) };
}

describe('true size', () => {
  test.each(['A4', 'A3', 'Letter'] as const)(
    '%s: page and both scale bars measure what they say',
    async (paper) => {
      const { pages } = await readPdf(await pdf(templates(paper)));
      expect(pages.length).toBeGreaterThan(1);
      for (const page of pages) {
        expect(page.widthMm).toBeCloseTo(PAPERS[paper].widthMm, 3);
        expect(page.heightMm).toBeCloseTo(PAPERS[paper].heightMm, 3);
        const { level, upright } = scaleBars(page);
        expect(Math.abs(level - 100)).toBeLessThan(0.05);
        expect(Math.abs(upright - 100)).toBeLessThan(0.05);
      }
    },
  );

  test('the edge of each template lies in the file as in the plan, within 0.01 mm', async () => {
    const { pages } = await readPdf(await pdf());
    plan.templates.forEach(({ outline, pins }, i) => {
      const { paths } = pages[i]!;
      const edge = paths.find(
        ({ parts }) => parts.length === 1 && parts[0]!.length === outline.x.length + 1,
      )!;
      const circles = paths.filter(({ parts }) => parts.length === 1 && parts[0]!.length === 6);
      const centres = circles.map(({ parts }) => ({
        x: (parts[0]![0]!.x + parts[0]![2]!.x) / 2,
        y: (parts[0]![0]!.y + parts[0]![2]!.y) / 2,
      }));
      const [pin, drawn] = [pins[0]!, centres.sort((a, b) => a.x - b.x)[0]!];
      const off = edge.parts[0]!.slice(0, -1).map(({ x, y }, k) =>
        Math.hypot(x - drawn.x + pin.x - outline.x[k]!, pin.y - (y - drawn.y) - outline.y[k]!),
      );
      expect(off).toHaveLength(outline.x.length);
      expect(Math.max(...off)).toBeLessThan(0.01);
    });
  });
});

describe('the code', () => {
  const DOTS_PER_MM = 12;

  /** Paints the modules as a printer would. */
  function photographed({ paths }: ReadPage): { data: Uint8ClampedArray; width: number; height: number } {
    const code = paths.filter(({ painted, parts }) => painted === 'fill' && parts.length > 100);
    expect(code).toHaveLength(1);
    const corners = code[0]!.parts.flat();
    const [left, top] = [
      Math.min(...corners.map(({ x }) => x)) - 3,
      Math.min(...corners.map(({ y }) => y)) - 3,
    ];
    const size = Math.ceil((Math.max(...corners.map(({ x }) => x)) + 3 - left) * DOTS_PER_MM);
    const data = new Uint8ClampedArray(4 * size * size).fill(255);
    for (const part of code[0]!.parts) {
      const dots = (of: number, from: number) => Math.round((of - from) * DOTS_PER_MM);
      const [xs, ys] = [part.map(({ x }) => dots(x, left)), part.map(({ y }) => dots(y, top))];
      for (let y = Math.min(...ys); y < Math.max(...ys); y += 1)
        for (let x = Math.min(...xs); x < Math.max(...xs); x += 1)
          data.fill(0, 4 * (y * size + x), 4 * (y * size + x) + 3);
    }
    return { data, width: size, height: size };
  }

  test('is read as the exact address of the version, on templates and on the sheet', async () => {
    for (const pages of [templates('A4'), sheets]) {
      const read = await readPdf(await pdf(pages));
      const { data, width, height } = photographed(read.pages[0]!);
      expect(jsQR(data, width, height)?.data).toBe(SHEET.address);
    }
  });

  test('has modules that a home printer can print', async () => {
    const { pages } = await readPdf(await pdf());
    const code = pages[0]!.paths.find(({ painted, parts }) => painted === 'fill' && parts.length > 100)!;
    const heights = code.parts.map((part) => Math.abs(part[2]!.y - part[0]!.y));
    expect(Math.min(...heights)).toBeGreaterThan(0.5);
  });
});

describe('the file', () => {
  test('the same pages give the same bytes', async () => {
    expect(await pdf()).toEqual(await pdf());
    const other = await pagesToPdf(templates('A4'), 'Reed wing v3, templates', {
      ...SHEET,
      author: 'C. Tanner',
    });
    expect(other.equals(await pdf())).toBe(false);
  });

  test('says what it is and when the version was made', async () => {
    const { document } = await readPdf(await pdf());
    expect(document.getTitle()).toBe('Reed wing v3, templates');
    expect(document.getAuthor()).toBe('A. Weaver');
    expect(document.getCreationDate()?.toISOString()).toBe(SHEET.createdAt);
    expect(document.getModificationDate()?.toISOString()).toBe(SHEET.createdAt);
  });

  test('holds vectors alone, and its fonts in subsets', async () => {
    const bytes = await pdf();
    const { document } = await readPdf(bytes);
    for (const page of document.getPages()) {
      expect(page.node.Resources()!.has(PDFName.of('XObject'))).toBe(false);
      const fonts = fontDictionaries(page);
      expect(fonts).toHaveLength(3);
      for (const { font, descriptor } of fonts) {
        expect(font.get(PDFName.of('BaseFont'))?.toString()).toMatch(/^\/[A-Z]{6}\+JetBrainsMono/);
        expect(descriptor.lookup(PDFName.of('FontFile2'))).toBeInstanceOf(PDFRawStream);
      }
    }
    // The three whole fonts are 345 kB.
    expect(bytes.length).toBeLessThan(120_000);
  });
});

describe('texts', () => {
  /** The box of a text by the measures of the font in the file. */
  function boxOf({ at, widthMm, heightMm, turned }: ReadText) {
    return turned
      ? { x: at.x - heightMm, y: at.y - widthMm, width: heightMm, height: widthMm }
      : { x: at.x, y: at.y - heightMm, width: widthMm, height: heightMm };
  }

  async function faults(pages: Parameters<typeof pdf>[0]): Promise<string[]> {
    const read = await readPdf(await pdf(pages));
    return read.pages.flatMap(({ widthMm, heightMm, texts }, i) => {
      const boxes = texts.map(boxOf);
      const planned_ = textsOf(pages![i]!.marks).filter(({ text }) => text !== '');
      expect(texts).toHaveLength(planned_.length);
      return boxes.flatMap((box, k) => {
        const { text } = texts[k]!;
        const wanted = textBox(planned_[k]!);
        // No wider than planned, and where it was planned.
        const found = box.x + box.width <= wanted.x + wanted.width + 0.02 && box.y + box.height <= wanted.y + wanted.height + 0.02; // prettier-ignore
        const placed = found && box.x >= wanted.x - 0.02 && box.y >= wanted.y - 0.02;
        const inside = box.x > 0 && box.y > 0 && box.x + box.width < widthMm && box.y + box.height < heightMm;
        const over = boxes.slice(0, k).some((of) => overlaps(of, box, -0.02));
        return placed && inside && !over ? [] : [text];
      });
    });
  }

  test('stand where the pages have them, none over another, by the measures of the font in the file', async () => {
    expect(await faults(templates('A4'))).toEqual([]);
    expect(await faults(sheets)).toEqual([]);
  });

  test('can be read out of the file again', async () => {
    const { pages } = await readPdf(await pdf(sheets));
    const planned_ = sheets.map(({ marks }) => textsOf(marks).map(({ text }) => text));
    pages.forEach(({ texts }, i) => {
      expect(texts.map(({ text }) => text)).toEqual(planned_[i]!.filter((of) => of !== ''));
    });
  });

  test.each(HOSTILE_NAMES)('stay in their place whatever the names are: %s', async (name) => {
    const sheet = namedSheet(name);
    const pages = [
      ...templatePages(plan, sheet, 'A4', { ...DETAILS, owner: name }),
      ...cutSheetPages(plan, findings, sheet, { ...DETAILS, owner: name }),
    ];
    expect(await faults(pages)).toEqual([]);
    await expect(pagesToPdf(pages, name, sheet)).resolves.toBeInstanceOf(Buffer);
  });
});
