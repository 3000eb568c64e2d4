/**
 * The quantities that close the two-equation boundary-layer method, with their slopes against the shape factor H (ending in H), against the
 * Reynolds number of the momentum thickness Rθ (in R) and, for the dissipation, against c = √CT (in C).
 * Incompressible: the kinematic shape factor equals H.
 */
export interface Closure {
  /** H*, energy thickness over momentum thickness. */
  readonly hs: number;
  readonly hsH: number;
  readonly hsR: number;
  /** cf/2, skin friction. */
  readonly cf: number;
  readonly cfH: number;
  readonly cfR: number;
  /** 2 CD/H*, dissipation. */
  readonly di: number;
  readonly diH: number;
  readonly diR: number;
  readonly diC: number;
}
