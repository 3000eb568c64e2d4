import { expect, it } from 'vitest';
import { shapeSentence } from '#client/app/shape-words.ts';

it('says the fields of a shape in the words of the trade', () => {
  expect(shapeSentence('maxThickness must be between 1 % and 40 % of chord')).toBe(
    'Thickness must be between 1 % and 40 % of chord.',
  );
  expect(
    shapeSentence(
      'the outline crosses itself: take less maxThickness or maxCamber, or a maxCamberPosition nearer',
    ),
  ).toBe('The outline crosses itself: take less thickness or camber, or a camber position nearer.');
});
