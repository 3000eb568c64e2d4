import { render } from '@testing-library/react';
import { expect, it } from 'vitest';
import { drawSection } from '#client/drawing/section-drawing.ts';
import { MeasuredValues } from '#client/sections/editor/measured-values.tsx';
import { type CstShape, withNoseRadius } from '#geometry/shapes/cst.ts';

const freeForm: CstShape = {
  kind: 'cst',
  upper: [0.2, 0.22, 0.2],
  lower: [-0.15, -0.1, -0.08],
  n1: 0.5,
  n2: 1,
  trailingEdgeGap: 0.002,
};

function noseRadiusOf(shape: CstShape): string | undefined {
  const { getByText, unmount } = render(
    <MeasuredValues drawing={drawSection(shape)} chordMm={200} units="mm" station={0.3} />,
  );
  const said = getByText('Nose radius').nextElementSibling?.textContent;
  unmount();
  return said;
}

it('says both nose radii where the surfaces differ', () => {
  const differing = withNoseRadius(withNoseRadius(freeForm, 'upper', 0.02), 'lower', 0.01);
  expect(noseRadiusOf(differing)).toBe('4.00 above, 2.00 mm below');
});

it('says one nose radius where they agree', () => {
  expect(noseRadiusOf(withNoseRadius(freeForm, 'both', 0.015))).toBe('3.00 mm');
});
