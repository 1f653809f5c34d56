/**
 * Weights of the logistic score. Set by hand from the physics and the open recordings' known
 * false-alarm behaviour (a run alone is worth little; fractions, strong high orders and a family that
 * rules the spectrum are worth much), not fitted.
 */
export const scoreConstants = {
  base: -6.2,
  perOpenOrder: 0.12,
  openOrdersMax: 9,
  perStrongHighOrder: 0.75,
  strongHighOrdersMax: 6,
  perRunOverFirst: 1.1,
  runOverFirstMax: 2.5,
  perFraction: 0.55,
  fractionsMax: 4,
  truncated: 0.6,
  /** A family that rules the spectrum; below the middle it counts against. */
  synchronous: 5,
  synchronousMiddle: 0.55,
  /** A stranger stronger than this against the family's top speaks against. */
  perStrangerDb: 0.09,
  strangerFreeDb: -14,
  /** Little vibration is little evidence, per factor of e below the level. */
  perWeak: 1.2,
  weakBelowMmPerS: 0.6,
} as const;
export type ScoreConstants = { readonly [Key in keyof typeof scoreConstants]: number };
