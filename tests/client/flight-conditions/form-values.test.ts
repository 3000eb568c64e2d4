import { describe, expect, it } from 'vitest';
import { readCondition, readForm, textsOf } from '#client/flight-conditions/form-values.ts';
import { fastDash, levelTrainer, slowLoiter } from '#server/contracts/flight-condition-samples.ts';

describe('the texts of a flight condition', () => {
  it.each([
    ['span and speed', levelTrainer],
    ['lift coefficient and altitude', slowLoiter],
    ['area and forced transition', fastDash],
  ])('give the condition with %s back, in mm and in inches', (_what, condition) => {
    expect(readForm(textsOf('One', condition, 'mm'), null, 'mm').value).toEqual({
      name: 'One',
      settings: condition,
    });
    const inches = readForm(textsOf('One', condition, 'inch'), condition, 'inch');
    expect(inches.value?.settings).toEqual(condition);
  });

  it('keep a number exactly that nobody touched, whatever its text was rounded to', () => {
    const condition = { ...levelTrainer, massKg: 4.200_123, rootChordMm: 279.999 };
    const texts = { ...textsOf('One', condition, 'mm'), rootChordMm: '300' };
    expect(readCondition(texts, condition, 'mm').value).toEqual({ ...condition, rootChordMm: 300 });
  });

  it('leave transition free where nothing stands, and everywhere on a smooth surface', () => {
    const texts = { ...textsOf('One', fastDash, 'mm'), tripLower: ' ' };
    expect(readCondition(texts, fastDash, 'mm').value?.surface).toEqual({
      turbulencePercent: 0.2,
      tripUpper: 0.05,
      tripLower: null,
    });
    const smooth = { ...texts, surface: 'smooth' as const };
    expect(readCondition(smooth, fastDash, 'mm').value?.surface.tripUpper).toBeNull();
  });

  it('name what is wrong in words, field by field', () => {
    const texts = {
      ...textsOf('', levelTrainer, 'mm'),
      massKg: '0',
      spanM: 'wide',
      meanChordMm: '5000',
      areaM2: 'not asked for',
      turbulencePercent: '3',
    };
    expect(readForm(texts, levelTrainer, 'mm').errors).toEqual(
      new Map([
        ['spanM', expect.any(String)],
        ['massKg', 'Mass must be between 0.02 and 500 kg.'],
        ['meanChordMm', 'Mean chord must be between 10 and 4000 mm.'],
        ['turbulencePercent', 'Turbulence of the air must be between 0.02 and 2.98 %.'],
        ['name', 'Give it a name.'],
      ]),
    );
  });
});
