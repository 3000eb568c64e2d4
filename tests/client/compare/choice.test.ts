import { describe, expect, test } from 'vitest';
import { type Choice, choiceOf, comparePath, searchOf, withReference } from '#client/compare/choice.ts';
import { idOf } from '#tests/client/support/samples.ts';

const ref = (section: number, number: number) => ({ sectionId: idOf(section), number });
const read = (search: string) => choiceOf(new URLSearchParams(search));

describe('the choice in the address', () => {
  test('is the same after writing and reading', () => {
    const choice: Choice = {
      versions: [ref(1, 3), ref(2, 1), ref(1, 12)],
      alignment: 'quarter-chord',
      chordMm: 182.5,
      magnification: 0.5,
    };
    expect(read(searchOf(choice))).toEqual({ choice, dropped: [] });
  });

  test('is empty, as usual, and not worth a word without a query', () => {
    const usual = { versions: [], alignment: 'chord', chordMm: 220, magnification: null };
    expect(read('')).toEqual({ choice: usual, dropped: [] });
    expect(searchOf(read('').choice)).toBe('');
  });

  test('keeps what can be read and says what cannot', () => {
    const { choice, dropped } = read(
      `v=${idOf(1)}.2,foo,${idOf(2)}.0,${idOf(2)}.1&align=sheet&chord=&scale=3`,
    );
    expect(choice).toEqual({
      versions: [ref(1, 2), ref(2, 1)],
      alignment: 'chord',
      chordMm: 220,
      magnification: null,
    });
    expect(dropped).toEqual([
      '“sheet” is no value for align: left out.',
      '“” is no value for chord: left out.',
      '“3” is no value for scale: left out.',
      '“foo” names no version: left out.',
      `“${idOf(2).slice(0, 23)}…” names no version: left out.`,
    ]);
  });

  test('takes six versions and each of them once', () => {
    const six = [1, 2, 3, 4, 5, 6].map((number) => `${idOf(1)}.${number}`);
    const { choice, dropped } = read(`v=${[...six, six[0], `${idOf(2)}.1`].join()}`);
    expect(choice.versions.map(({ number }) => number)).toEqual([1, 2, 3, 4, 5, 6]);
    expect(dropped).toHaveLength(2);
    expect(dropped[0]).toBe('Version 1 was named twice: shown once.');
    expect(dropped[1]).toMatch(/^More than 6 versions/);
  });

  test('of a link leads to the versions in their order, at the chord', () => {
    expect(comparePath([ref(1, 2), ref(1, 3)], 180)).toBe(`/compare?v=${idOf(1)}.2,${idOf(1)}.3&chord=180`);
  });

  test('a new reference changes places with the old one', () => {
    expect(withReference([ref(1, 1), ref(1, 2), ref(1, 3)], ref(1, 3))).toEqual([
      ref(1, 3),
      ref(1, 2),
      ref(1, 1),
    ]);
  });
});
