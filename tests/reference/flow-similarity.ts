/**
 * Falkner–Skan flows, scaled with η = y √((m+1) ue/(2 ν x)): f''' + f f'' + β (1 − f'²) = 0, β = 2m/(m+1), integrated to 1e-8 (Hartree
 * 1937;
 * lower branch Stewartson 1954). `r` products are with Rθ.
 */
export interface SimilarFlow {
  readonly beta: number;
  readonly displacement: number;
  readonly momentum: number;
  readonly shapeFactor: number;
  readonly energyFactor: number;
  readonly rFriction: number;
  readonly rDissipation: number;
}

const flow = (row: readonly [number, number, number, number, number, number, number]): SimilarFlow => {
  const [beta, displacement, momentum, shapeFactor, energyFactor, rFriction, rDissipation] = row;
  return { beta, displacement, momentum, shapeFactor, energyFactor, rFriction, rDissipation };
};

export const SIMILAR_FLOWS: readonly SimilarFlow[] = [
  flow([1, 0.6479, 0.29234, 2.21623, 1.62575, 0.36034, 0.20842]),
  flow([0.5, 0.80455, 0.35027, 2.29694, 1.61173, 0.32494, 0.19774]),
  flow([0.2, 0.98416, 0.40823, 2.41079, 1.59457, 0.28034, 0.18602]),
  flow([0.1, 1.08032, 0.43546, 2.48089, 1.58533, 0.25563, 0.18037]),
  flow([0, 1.21678, 0.4696, 2.5911, 1.57258, 0.22052, 0.1734]),
  flow([-0.05, 1.31236, 0.49046, 2.67576, 1.56408, 0.19634, 0.16931]),
  flow([-0.1, 1.4427, 0.51504, 2.80111, 1.55328, 0.16444, 0.16482]),
  flow([-0.14, 1.5959, 0.53856, 2.96327, 1.54201, 0.12911, 0.16101]),
  flow([-0.18, 1.87158, 0.56771, 3.29673, 1.5263, 0.07303, 0.15741]),
];

/**
 * Values of the published laminar fits at the shape factors of the flows above and of reversed profiles: tells a misprint from a property
 * of the fits.
 */
export const LAMINAR_FITS: readonly (readonly [
  h: number,
  hs: number,
  rFriction: number,
  rDissipation: number,
])[] = [
  [2.21623, 1.62411, 0.3698, 0.20825],
  [2.5911, 1.57322, 0.22034, 0.17345],
  [2.96327, 1.54257, 0.13122, 0.16158],
  [4.02923, 1.51501, 0.00715, 0.1568],
  [4.5752, 1.51789, -0.02287, 0.15635],
  [6.4102, 1.55125, -0.06342, 0.14844],
  [8.5006, 1.61031, -0.06274, 0.13185],
];

/** Turbulent closure in equilibrium, from the published relations: H, Rθ, H*, cf, Us, CTeq, CD. */
export const TURBULENT_FITS: readonly (readonly number[])[] = [
  [1.4, 1000, 1.75672, 0.004276, 0.54375, 0.001347, 0.001777],
  [1.4, 10000, 1.74026, 0.002287, 0.53865, 0.00132, 0.001225],
  [1.6, 1000, 1.69213, 0.00306, 0.42303, 0.00232, 0.001986],
  [2, 1000, 1.607, 0.001563, 0.26783, 0.004115, 0.003222],
  [2.5, 3000, 1.53249, 0.00045, 0.15325, 0.005864, 0.005],
  [3, 1000, 1.5178, 0.000242, 0.08432, 0.007367, 0.006756],
  [3, 500, 1.5348, 0.000339, 0.08527, 0.007457, 0.006836],
];

/** Envelope method: H, dn/dRθ, Rθ₀, l, m from the published relations. */
export const GROWTH_FITS: readonly (readonly [
  h: number,
  perR: number,
  critical: number,
  l: number,
  m: number,
])[] = [
  [2.3, 0.005655, 3679.6, 0.18374, 0.33165],
  [2.5, 0.007137, 663.9, 0.3648, 0.05208],
  [2.591, 0.010388, 242, 0.42828, 0.01021],
  [2.8, 0.020279, 97.6, 0.54107, -0.03992],
  [3.5, 0.060633, 48, 0.72, -0.08639],
  [6, 0.132086, 20.2, 0.69917, -0.03089],
];
