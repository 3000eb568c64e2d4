import { type CstShape } from '#geometry/shapes/cst.ts';
import { type Naca4Shape } from '#geometry/shapes/naca4.ts';

/** A 4-digit shape from its values in % of chord. */
export function fourDigit(
  camber: number,
  position: number,
  thickness: number,
  trailingEdge: Naca4Shape['trailingEdge'] = 'open',
): Naca4Shape {
  const fraction = (percent: number) => Number((percent / 100).toFixed(6));
  return {
    kind: 'naca4',
    maxCamber: fraction(camber),
    maxCamberPosition: fraction(position),
    maxThickness: fraction(thickness),
    trailingEdge,
  };
}

type Weights = readonly number[];

function freeForm(upper: Weights, lower: Weights, trailingEdgeGap: number): CstShape {
  return { kind: 'cst', upper: [...upper], lower: [...lower], n1: 0.5, n2: 1, trailingEdgeGap };
}

function symmetrical(upper: Weights, trailingEdgeGap: number): CstShape {
  return freeForm(
    upper,
    upper.map((weight) => -weight),
    trailingEdgeGap,
  );
}

/** Free-form shapes of the demo workshop: made up here by editing weights, for one purpose each. */
export const freeForms = {
  /** Underside straight within 0.1 % of chord behind the first fifth, so that the panel lies flat on the bench. */
  flatBottomFirst: freeForm(
    [0.2, 0.19, 0.25, 0.18, 0.21, 0.19, 0.2],
    [-0.164, 0.002, -0.135, 0.034, -0.097, -0.009, -0.043],
    0.004,
  ),
  flatBottom: freeForm(
    [0.215, 0.21, 0.265, 0.19, 0.22, 0.2, 0.21],
    [-0.164, 0.002, -0.135, 0.034, -0.097, -0.009, -0.043],
    0.006,
  ),
  /** Mean line turned up towards the trailing edge, for a wing without a tail. */
  reflexFirst: freeForm([0.17, 0.2, 0.23, 0.14, 0.12], [-0.17, -0.104, -0.1, -0.14, -0.19], 0.003),
  reflex: freeForm([0.17, 0.207, 0.235, 0.13, 0.1], [-0.17, -0.097, -0.095, -0.15, -0.21], 0.003),
  reflexTrial: freeForm([0.17, 0.21, 0.24, 0.12, 0.085], [-0.17, -0.094, -0.09, -0.155, -0.22], 0.003),
  reflexTip: freeForm([0.13, 0.152, 0.172, 0.105, 0.085], [-0.13, -0.084, -0.082, -0.115, -0.155], 0.004),
  reflexTipTrial: freeForm([0.135, 0.15, 0.168, 0.108, 0.09], [-0.135, -0.088, -0.086, -0.114, -0.15], 0.004),
  /** Thin and symmetrical, for tailplanes and fins. */
  thinTailFirst: symmetrical([0.1, 0.09, 0.095, 0.08, 0.075], 0.003),
  thinTail: symmetrical([0.105, 0.098, 0.1, 0.088, 0.085], 0.004),
  fin: symmetrical([0.115, 0.108, 0.112, 0.098, 0.092], 0.004),
  finThicker: symmetrical([0.122, 0.115, 0.118, 0.104, 0.1], 0.005),
  /** Camber far aft, for slow flight with a heavy load. */
  highLiftFirst: freeForm(
    [0.19, 0.22, 0.26, 0.24, 0.27, 0.26],
    [-0.155, -0.095, -0.09, -0.02, 0.06, 0.1],
    0.003,
  ),
  highLift: freeForm(
    [0.195, 0.225, 0.27, 0.255, 0.295, 0.29],
    [-0.155, -0.085, -0.07, 0.005, 0.105, 0.15],
    0.003,
  ),
  /** Deep enough at the spar for a tube of 40 mm. */
  thickRoot: freeForm([0.27, 0.29, 0.31, 0.28, 0.27], [-0.27, -0.21, -0.22, -0.2, -0.17], 0.004),
  thickRootBlunter: freeForm(
    [0.285, 0.295, 0.31, 0.28, 0.275],
    [-0.285, -0.225, -0.23, -0.205, -0.18],
    0.004,
  ),
} as const;
