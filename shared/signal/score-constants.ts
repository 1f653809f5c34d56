/**
 * Weights of the logistic score, one for each named part of score.ts, written by
 * `npm run evaluate -- --fit --join-real --machines 600 --seed 901 --real FOLDER`: logistic, ridge,
 * no weight against what its part stands for; on simulated machines, loose ones whose looseness
 * reaches the record against sound ones and look-alikes, with real recordings without looseness
 * among the latter. Machines judged are others than those fitted on.
 */
export const scoreConstants = {
  base: -6.04,
  /** Velocity of all whole orders. */
  perFamilyLevel: 1.5819,
  perProminence: 0.79358,
  perFirstProminence: 0.69897,
  /** A floor raised between the orders: chaotic rattle. */
  perFloor: 0.084573,
  perLowOrders: 0.28191,
  /** A strong line out of step speaks against. */
  perStranger: 0.21363,
  perUneven: 0.37682,
  perHalf: 0.71267,
  /** A long run counts where the shaft rules the spectrum, and where it is strong. */
  perSteadyRun: 0.50005,
  perStrongRun: 0.10595,
  /** A third order, which unbalance and most misalignment lack. */
  perThird: 0.61357,
  /** One order alone above its neighbours, or levels that scatter, speak of a process or a resonance. */
  perAlone: 0.14147,
  perRough: 0.32217,
  /** Reciprocating machines show such families when sound. */
  perNature: 1.953,
  /** Orders that something known explains. */
  perUnexplained: 0.36053,
} as const;
export type ScoreConstants = { readonly [Key in keyof typeof scoreConstants]: number };
