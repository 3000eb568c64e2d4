import { textBox } from '#geometry/pages/lettering.ts';
import { isWithin, overlaps } from '#geometry/pages/occupied.ts';
import { type Mark, type Page, type Rect, type TextMark } from '#geometry/pages/page.ts';

export function textsOf(marks: readonly Mark[]): TextMark[] {
  return marks.filter((of) => of.kind === 'text');
}

export function wordsOf(marks: readonly Mark[]): string[] {
  return textsOf(marks).map(({ text }) => text);
}

/** The box around a mark, its line width left out. */
export function boxOfMark(mark: Mark): Rect {
  if (mark.kind === 'text') return textBox(mark);
  if (mark.kind === 'circle') {
    const { centre, radiusMm: r } = mark;
    return { x: centre.x - r, y: centre.y - r, width: 2 * r, height: 2 * r };
  }
  const points = mark.kind === 'area' ? mark.rings.flat() : mark.points;
  const [x, y] = [Math.min(...points.map((p) => p.x)), Math.min(...points.map((p) => p.y))];
  return {
    x,
    y,
    width: Math.max(...points.map((p) => p.x)) - x,
    height: Math.max(...points.map((p) => p.y)) - y,
  };
}

/** Names of the fields of a drawing's frame stand outside of it; nothing else does. */
function isField({ text }: TextMark): boolean {
  return /^(?:[A-H]|\d)$/.test(text);
}

/** What is wrong with a page, in words: texts that leave the frame, overlap, or hold what is no single line; marks off the paper; numbers that are none. */
export function faultsOf({ widthMm, heightMm, frame, marks }: Page): string[] {
  const texts = textsOf(marks);
  const boxes = texts.map(textBox);
  const paper = { x: 0, y: 0, width: widthMm, height: heightMm };
  const faults: string[] = [];
  marks.forEach((mark) => {
    const box = boxOfMark(mark);
    if (!Object.values(box).every(Number.isFinite)) faults.push(`not finite: ${JSON.stringify(mark)}`);
    const field = mark.kind === 'text' ? isField(mark) : mark.kind === 'line' && mark.points.length === 2;
    if (!isWithin(box, frame) && !(field && isWithin(box, paper)))
      faults.push(`outside the frame: ${mark.kind === 'text' ? mark.text : JSON.stringify(mark)}`);
  });
  texts.forEach((mark, i) => {
    const box = boxes[i]!;
    if (/[\p{Cc}\u2028\u2029]/u.test(mark.text)) faults.push(`not one line: ${mark.text}`);
    texts.slice(0, i).forEach((other, k) => {
      if (overlaps(box, boxes[k]!, -0.02)) faults.push(`overlap: ${other.text} and ${mark.text}`);
    });
  });
  return faults;
}
