/**
 * Potential flow of 4-digit sections with closed trailing edge (last coefficient −0.1036), by conformal mapping with 1024 and 4096 points
 * that agree to 1e-6. Lift and moment about the quarter chord at 0, 4, 8°.
 */
export const INVISCID_SECTIONS: Readonly<
  Record<string, { readonly cl: readonly number[]; readonly cm: readonly number[] }>
> = {
  '0009': { cl: [0, 0.471482, 0.940667], cm: [0, -0.003745, -0.007417] },
  '0012': { cl: [0, 0.482632, 0.962913], cm: [0, -0.005437, -0.010769] },
  '0015': { cl: [0, 0.493836, 0.985266], cm: [0, -0.007346, -0.014548] },
  '2412': { cl: [0.259627, 0.741658, 1.220075], cm: [-0.055473, -0.061208, -0.067109] },
  '4412': { cl: [0.518264, 0.999758, 1.476381], cm: [-0.110702, -0.117054, -0.123837] },
  '6412': { cl: [0.774969, 1.255995, 1.730901], cm: [-0.165452, -0.172748, -0.180731] },
};

/** Pressure coefficients by the same mapping: station, 0012 at 4° above and below, 4412 at 4° above and below. */
export const INVISCID_PRESSURES: readonly (readonly [
  x: number,
  u0012: number,
  l0012: number,
  u4412: number,
  l4412: number,
])[] = [
  [0.0125, -1.5367, 0.8224, -1.3503, 0.8195],
  [0.025, -1.44, 0.5726, -1.3735, 0.58],
  [0.05, -1.2443, 0.3109, -1.3491, 0.3702],
  [0.1, -1.0163, 0.0956, -1.308, 0.2466],
  [0.2, -0.7733, -0.0432, -1.2322, 0.2127],
  [0.3, -0.6141, -0.0778, -1.1217, 0.2221],
  [0.5, -0.3825, -0.0627, -0.7714, 0.2076],
  [0.7, -0.2012, -0.0124, -0.4827, 0.2131],
  [0.9, 0.0036, 0.0851, -0.1311, 0.2243],
];

/**
 * Exact thin-airfoil integrals of the 4-digit mean lines (Glauert 1926), m = 6 %: position in tenths, angle of zero lift, moment about the
 * quarter chord.
 */
export const MEAN_LINES: readonly (readonly [tenths: number, zeroLiftDeg: number, cm: number])[] = [
  [2, -5.3963, -0.11088],
  [3, -5.7538, -0.13419],
  [4, -6.2317, -0.15936],
  [5, -6.8755, -0.1885],
  [6, -7.7763, -0.22468],
];

/**
 * Wind-tunnel values of NACA Report 824 (1945), smooth, Re 9e6, as tabulated from its charts in the USAF Stability and Control Datcom,
 * table 4.1.1-B (from memory; chart reading scatters
 * by 0.2°): angle and moment of zero lift, slope per degree, highest lift and the end of the linear part.
 */
export const MEASURED_SECTIONS: readonly {
  readonly digits: string;
  readonly zeroLiftDeg: number;
  readonly cm: number;
  readonly slope: number;
  readonly maxLift: number;
  readonly linearToDeg: number;
}[] = [
  { digits: '0006', zeroLiftDeg: 0, cm: 0, slope: 0.108, maxLift: 0.92, linearToDeg: 9 },
  { digits: '2412', zeroLiftDeg: -2, cm: -0.047, slope: 0.105, maxLift: 1.68, linearToDeg: 9.5 },
  { digits: '4412', zeroLiftDeg: -3.8, cm: -0.093, slope: 0.105, maxLift: 1.67, linearToDeg: 7.5 },
  { digits: '4418', zeroLiftDeg: -3.8, cm: -0.088, slope: 0.105, maxLift: 1.53, linearToDeg: 7.2 },
];

/** Least drag, smooth, Re 6e6, Report 824 charts (from memory, ± 0.0004). */
export const MEASURED_LEAST_DRAG: readonly (readonly [digits: string, cd: number])[] = [
  ['0012', 0.0058],
  ['2412', 0.006],
  ['4412', 0.0061],
  ['4415', 0.0064],
];

/** 0012 tripped near 5 % chord, M 0.15, Re 6e6: Ladson, NASA TM 4074 (1988), 80-grit strips (points from memory): angle, cl, cd. */
export const TRIPPED_0012: readonly (readonly [alphaDeg: number, cl: number, cd: number])[] = [
  [-4.04, -0.4417, 0.00871],
  [-0.05, -0.0126, 0.00809],
  [4.04, 0.4316, 0.00823],
  [8.3, 0.8873, 0.0105],
  [10.12, 1.0707, 0.01201],
  [12.12, 1.2605, 0.01332],
  [15.26, 1.5129, 0.019],
  [17.13, 1.6116, 0.0256],
];

/**
 * 0012 over many tunnels: McCroskey, NASA TM 100019 (1987) (formulas from memory): Re, slope per degree at low speed, tripped drag at zero
 * lift.
 */
export const CORRELATED_0012: readonly (readonly [reynolds: number, slope: number, cd: number])[] = [
  [1e6, 0.1025, 0.010642],
  [2e6, 0.10396, 0.009581],
  [6e6, 0.10627, 0.008228],
];
