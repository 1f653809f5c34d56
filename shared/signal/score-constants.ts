/**
 * Weights of the logistic score, one for each named part of score.ts, written by
 * `npm run evaluate -- --fit --join-real --machines 600 --seed 901 --real FOLDER`: logistic, ridge,
 * no weight against what its part stands for; on simulated machines, loose ones whose looseness
 * reaches the record against sound ones and look-alikes, with real recordings without looseness
 * among the latter. Machines judged are others than those fitted on.
 */
export const scoreConstants = {
  base: -4.6948,
  /** Velocity of all whole orders. */
  perFamilyLevel: 1.6818,
  perProminence: 0.83144,
  perFirstProminence: 0.45612,
  /** A floor raised between the orders: chaotic rattle. */
  perFloor: 0.2034,
  perLowOrders: 0.11939,
  /** A strong line out of step speaks against. */
  perStranger: 0.40563,
  perUneven: 0.45899,
  perHalf: 0.69906,
  /** A long run counts where the shaft rules the spectrum, and where it is strong. */
  perSteadyRun: 0.34012,
  perStrongRun: 0.34172,
  /** A third order, which unbalance and most misalignment lack. */
  perThird: 0.42902,
  /** One order alone above its neighbours, or levels that scatter, speak of a process or a resonance. */
  perAlone: 0.19629,
  perRough: 0.37937,
  /** Reciprocating machines show such families when sound, so theirs say little: by judgement. */
  perNature: 6,
  /** Orders that something known explains. */
  perUnexplained: 0.7213,
} as const;
export type ScoreConstants = { readonly [Key in keyof typeof scoreConstants]: number };
