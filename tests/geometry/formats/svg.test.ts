// @vitest-environment jsdom
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { writeSvg } from '#geometry/formats/svg.ts';
import { SMALL_DRAWING } from './drawing-example.ts';
import { NASTY_NAMES } from './identity-example.ts';

function parse(text: string): Document {
  return new DOMParser().parseFromString(text, 'image/svg+xml');
}

describe('writeSvg', () => {
  const text = writeSvg(SMALL_DRAWING);
  const svg = parse(text).documentElement;

  test('is the same to the byte each time', async () => {
    expect(writeSvg(SMALL_DRAWING)).toBe(text);
    await expect(text).toMatchFileSnapshot('./snapshots/small.svg');
  });

  test('has its true size: one unit is one millimetre', () => {
    const [x, y, width, height] = (svg.getAttribute('viewBox') ?? '').split(' ').map(Number);
    expect(svg.getAttribute('width')).toBe(`${width?.toFixed(4)}mm`);
    expect(svg.getAttribute('height')).toBe(`${height?.toFixed(4)}mm`);
    expect(x).toBeLessThanOrEqual(0);
    expect(x! + width!).toBeGreaterThanOrEqual(100);
    expect(y).toBeLessThanOrEqual(-9.5);
    expect(y! + height!).toBeGreaterThanOrEqual(10);
  });

  test('draws the layers with y upwards, the outline closed', () => {
    expect([...svg.querySelectorAll('g')].map(({ id }) => id)).toEqual([
      'OUTLINE',
      'CHORD',
      'CAMBER',
      'TEXT',
    ]);
    expect(svg.querySelector('#OUTLINE path')?.getAttribute('d')).toBe(
      'M100.0000 -0.2500A243.7839 243.7839 0 0 0 40.0000 -9.5000L0.0000 0.0000L40.0000 4.0000L100.0000 0.2500Z',
    );
    expect(svg.querySelector('#CHORD line')?.getAttribute('x2')).toBe('100.0000');
    expect(svg.querySelector('#CAMBER')?.getAttribute('stroke-dasharray')).toBe('6 0.75 0.125 0.75');
    expect(svg.querySelector('#TEXT text')?.textContent).toBe('Marsh 2412 v3, released');
    expect(svg.querySelector('title')?.textContent).toBe('Marsh 2412 v3');
    expect(svg.querySelector('desc')?.textContent).toBe(SMALL_DRAWING.header.join('; '));
  });

  test('bends arcs to the side that their bulge says', () => {
    const outline = { x: [1, -1], y: [0, 0], bulge: [1, -0.5] };
    const path = parse(writeSvg({ ...SMALL_DRAWING, outline }))
      .querySelector('#OUTLINE path')
      ?.getAttribute('d');
    expect(path).toBe('M1.0000 0.0000A1.0000 1.0000 0 0 0 -1.0000 0.0000A1.2500 1.2500 0 0 1 1.0000 0.0000Z');
  });

  test('leaves out layers that are not asked for', () => {
    const only = parse(writeSvg({ ...SMALL_DRAWING, layers: ['CAMBER'] })).documentElement;
    expect([...only.querySelectorAll('g')].map(({ id }) => id)).toEqual(['CAMBER']);
  });

  test('stays the same document whatever its text says', () => {
    const names = fc.oneof(fc.constantFrom(...NASTY_NAMES), fc.string({ unit: 'binary', maxLength: 300 }));
    const elements = [...svg.querySelectorAll('*')].map(({ tagName }) => tagName);
    fc.assert(
      fc.property(names, (name) => {
        const written = writeSvg({
          ...SMALL_DRAWING,
          title: name,
          header: [name],
          texts: [{ ...SMALL_DRAWING.texts[0]!, text: name }],
        });
        const read = parse(written).documentElement;
        expect([...read.querySelectorAll('*')].map(({ tagName }) => tagName)).toEqual(elements);
        expect(written.split('\n')).toHaveLength(text.split('\n').length);
      }),
      { numRuns: 60 },
    );
  });

  test('refuses coordinates that are no numbers', () => {
    expect(() => writeSvg({ ...SMALL_DRAWING, outline: { x: [0, NaN], y: [0, 1] } })).toThrow(RangeError);
  });
});
