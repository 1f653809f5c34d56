/**
 * Weights of the logistic score, one for each named part of score.ts. Fitted (logistic, ridge, no
 * weight against what its part stands for) on simulated machines, loose ones whose looseness reaches
 * the record against sound ones and look-alikes, with real recordings without looseness among the
 * latter; machines judged are others than those fitted on.
 */
export const scoreConstants = {
  base: -7.272,
  /** Velocity of all whole orders. */
  perFamilyLevel: 1.536,
  perProminence: 0.905,
  perFirstProminence: 0.939,
  /** A floor raised between the orders: chaotic rattle. */
  perFloor: 1.308,
  perLowOrders: 0.463,
  /** A strong line out of step speaks against. */
  perStranger: 0.266,
  perUneven: 0.355,
  perHalf: 0.088,
  /** A long run counts where the shaft rules the spectrum, and where it is strong. */
  perSteadyRun: 0.433,
  perStrongRun: 0.251,
  /** Reciprocating machines show such families when sound: by hand, the set holds too few. */
  perNature: 3,
  /** Orders that something known explains. */
  perUnexplained: 0.385,
} as const;
export type ScoreConstants = { readonly [Key in keyof typeof scoreConstants]: number };
