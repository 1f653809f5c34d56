/**
 * Weights of the logistic score, one for each named part of score.ts. Fitted (logistic, ridge, no
 * weight against what its part stands for) on simulated machines, loose ones whose looseness reaches
 * the record against sound ones and look-alikes, with real recordings without looseness among the
 * latter; machines judged are others than those fitted on.
 */
export const scoreConstants = {
  base: -6.849,
  /** Velocity of all whole orders. */
  perFamilyLevel: 1.653,
  perProminence: 1.203,
  perFirstProminence: 0.878,
  /** A floor raised between the orders: chaotic rattle. */
  perFloor: 1.173,
  perLowOrders: 0.462,
  /** A strong line out of step speaks against. */
  perStranger: 0.443,
  perUneven: 0.59,
  perHalf: 0.081,
  /** A long run counts where the shaft rules the spectrum, and where it is strong. */
  perSteadyRun: 0.228,
  perStrongRun: 0.447,
  /** Little above the third order and no half orders, as misalignment gives it: set by hand. */
  perFewAbove: 0.7,
  /** Reciprocating machines show such families when sound: by hand, the set holds too few. */
  perNature: 3,
  /** Orders that something known explains. */
  perUnexplained: 0.296,
} as const;
export type ScoreConstants = { readonly [Key in keyof typeof scoreConstants]: number };
