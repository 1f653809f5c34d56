import type { Quantity } from '../quantities/quantity.ts';
import type { ScreeningResult, Verdict } from '../signal/screening-types.ts';

/** The highest order counted into the run's level, as the change since earlier surveys counts it. */
const runTo = 10;

/** What a verification takes from one screening of one measuring point. */
export interface VerificationReading {
  pointLabel: string;
  /** YYYY-MM-DD */
  surveyedOn: string;
  verdict: Verdict;
  /** 0–1; null where the record could not be judged. */
  score: number | null;
  /** Consecutive orders that stand out. */
  runLength: number;
  /** Velocity of orders 2–10 together, mm/s rms. */
  runMmPerSRms: number;
  overallMmPerSRms: number | null;
  /** Band of the overall velocity, Hz. */
  overallBandHz: readonly [number, number] | null;
  /** Of the position's shaft, r/min. */
  speedRpm: number | null;
  quantity: Quantity;
  methodVersion: string;
  /** Score from which looseness was suspected when the screening was made, 0–1. */
  suspectedScore: number;
}

/**
 * Takes what a verification compares out of a screening's result.
 *
 * @returns the run's level is the root of the summed squares of orders 2–10, mm/s rms; 0 where none
 *   was measured
 */
export function verificationReading(
  result: ScreeningResult,
  at: { pointLabel: string; surveyedOn: string },
): VerificationReading {
  const power = result.orders
    .filter(({ order }) => Number.isInteger(order) && order >= 2 && order <= runTo)
    .reduce((sum, line) => sum + line.velocityMmPerSRms ** 2, 0);
  const { overallVelocity, speed } = result;
  return {
    ...at,
    verdict: result.verdict,
    score: result.score,
    runLength: result.harmonicRun.length,
    runMmPerSRms: Math.sqrt(power),
    overallMmPerSRms: overallVelocity?.mmPerSRms ?? null,
    overallBandHz: overallVelocity === null ? null : [overallVelocity.fromHz, overallVelocity.toHz],
    speedRpm: speed.speedHz === null ? null : speed.speedHz * 60,
    quantity: result.quantity,
    methodVersion: result.methodVersion,
    suspectedScore: result.limits.suspectedScore,
  };
}
