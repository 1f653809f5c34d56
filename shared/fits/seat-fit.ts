import { fitAtRest, probableRange } from './fit-at-rest.ts';
import type { LimitsUm, RingLoad, SeatFit, SeatHistory, SeatName, SpreadUm } from './fit-types.ts';
import { looseChance } from './loose-chance.ts';
import type { Recommendation } from './recommendation.ts';
import { runningFit } from './running-fit.ts';
import { seatVerdict } from './seat-verdict.ts';
import { meanWearUm } from './seat-wear.ts';

/** Standard uncertainty of a diameter measured with a micrometer in the plant, µm (assumption). */
const defaultUncertaintyUm = 2;

/** All that is known of one seat, deviations in µm from the common nominal size. */
export interface SeatFacts {
  seat: SeatName;
  /** From the recorded class. */
  seatLimitsUm?: LimitsUm;
  ringLimitsUm?: LimitsUm;
  seatMeasuredUm?: number;
  ringMeasuredUm?: number;
  seatUncertaintyUm?: number;
  ringUncertaintyUm?: number;
  recommendation?: Recommendation;
  recommendedLimitsUm?: LimitsUm;
  load?: RingLoad;
  effects: { smoothingUm: number; expansionUm: number; ringGrowthUm: number };
  history?: SeatHistory;
  bonded: boolean;
}

type Pair = (seatUm: LimitsUm, ringUm: LimitsUm) => readonly [LimitsUm, LimitsUm];

/** The shaft is the inner part of its seat, the ring that of the housing seat. */
const innerFirst: Readonly<Record<SeatName, Pair>> = {
  shaft: (seatUm, ringUm) => [seatUm, ringUm],
  housing: (seatUm, ringUm) => [ringUm, seatUm],
};

/** What a seat contributes to the fit, tighter upwards: a small housing bore is tight. */
function towardsTight(seat: SeatName, limits: LimitsUm | undefined): LimitsUm | undefined {
  return limits && (seat === 'shaft' ? limits : [0 - limits[1], 0 - limits[0]]);
}

/** A measured diameter as limits: a point, or as wide as six of its stated uncertainties. */
function asLimits(
  measured: number | undefined,
  uncertainty: number | undefined,
): LimitsUm | undefined {
  if (measured === undefined) return undefined;
  const half = 3 * (uncertainty ?? 0);
  return [measured - half, measured + half];
}

function deviation(
  limits: LimitsUm,
  measured: number | undefined,
  uncertainty: number | undefined,
): number {
  return measured === undefined
    ? (limits[1] - limits[0]) / 6
    : (uncertainty ?? defaultUncertaintyUm);
}

/**
 * The greatest clearance that is right, as an interference (0 or negative). The class the load asks
 * for decides; under a stationary load a looser class on the drawing is a choice, not a fault.
 */
function rightFromUm(facts: SeatFacts, ring: LimitsUm): number | undefined {
  const least = (limits: LimitsUm | undefined) =>
    limits && Math.min(0, fitAtRest(...innerFirst[facts.seat](limits, ring)).min);
  const recommended = least(facts.recommendedLimitsUm);
  const recorded = least(facts.seatLimitsUm);
  if (recommended === undefined) return recorded;
  return facts.load === 'stationary' ? Math.min(recommended, recorded ?? 0) : recommended;
}

function chance(
  facts: SeatFacts,
  running: SpreadUm,
  seat: LimitsUm,
  ring: LimitsUm,
): number | undefined {
  // The right clearance is counted with the ring's own limits, whether or not it was measured.
  const from = rightFromUm(facts, facts.ringLimitsUm ?? ring);
  if (from === undefined || facts.bonded) return undefined;
  const sigmaUm = Math.hypot(
    deviation(seat, facts.seatMeasuredUm, facts.seatUncertaintyUm),
    deviation(ring, facts.ringMeasuredUm, facts.ringUncertaintyUm),
  );
  const wear = meanWearUm(facts.history, facts.load, facts.seatMeasuredUm !== undefined);
  return looseChance({ meanUm: running.mean, sigmaUm }, wear, from);
}

/**
 * What one seat's facts mean: limits, fit at rest and running, recommendation, verdict and the chance
 * that it runs with more clearance than its class allows. Measured diameters take the place of
 * limits.
 */
export function seatFit(facts: SeatFacts): SeatFit {
  const recorded = towardsTight(facts.seat, facts.seatLimitsUm);
  const measured = facts.seatMeasuredUm;
  const result: SeatFit = {
    seatLimitsUm: facts.seatLimitsUm,
    ringLimitsUm: facts.ringLimitsUm,
    recommendedClass: facts.recommendation?.toleranceClass,
    reason: facts.recommendation?.reason,
    ...seatVerdict({
      recorded,
      recommended: towardsTight(facts.seat, facts.recommendedLimitsUm),
      measuredUm: measured === undefined || facts.seat === 'shaft' ? measured : 0 - measured,
    }),
  };
  const point = (value: number | undefined): LimitsUm | undefined => asLimits(value, undefined);
  const seat = point(measured) ?? facts.seatLimitsUm;
  const ring = point(facts.ringMeasuredUm) ?? facts.ringLimitsUm;
  if (!seat || !ring) return result;
  const atRest = fitAtRest(...innerFirst[facts.seat](seat, ring));
  const running = runningFit(atRest, facts.effects);
  return {
    ...result,
    interferenceUm: atRest,
    probableUm: probableRange(
      ...innerFirst[facts.seat](
        asLimits(measured, facts.seatUncertaintyUm) ?? seat,
        asLimits(facts.ringMeasuredUm, facts.ringUncertaintyUm) ?? ring,
      ),
    ),
    runningUm: running,
    chanceOfClearance: chance(facts, running, seat, ring),
  };
}
