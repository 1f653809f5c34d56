import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import type { PositionAssessment, SeatFit, SeatName } from '#shared/fits/fit-types.ts';

const pair = (limits: SeatFit['seatLimitsUm']): [number, number] | null =>
  limits === undefined ? null : [limits[0], limits[1]];

/** Standard uncertainty of a micrometer reading, µm: the default of the fit method. */
const readingUncertaintyUm = 2;

/** A tried seat, as the seats of the register are shown. */
export function trialSeat(
  seat: SeatName,
  fit: SeatFit,
  typed: { toleranceClass: string | null; nominalMm: number | null; partsMeasured: number },
): SeatAssessment {
  const { nominalMm } = typed;
  return {
    seat,
    nominalMm,
    toleranceClass: typed.toleranceClass,
    taper: null,
    driveUpMm: null,
    clearanceReductionUm: null,
    bonding: null,
    seatLimitsUm: pair(fit.seatLimitsUm),
    ringLimitsUm: pair(fit.ringLimitsUm),
    seatLimitsMm:
      fit.seatLimitsUm === undefined || nominalMm === null
        ? null
        : [nominalMm + fit.seatLimitsUm[0] / 1000, nominalMm + fit.seatLimitsUm[1] / 1000],
    interferenceUm: fit.interferenceUm ?? null,
    probableUm: fit.probableUm ?? null,
    measuredUm:
      typed.partsMeasured > 0 && fit.interferenceUm
        ? {
            value: fit.interferenceUm.mean,
            // With one part measured the other adds the spread of its tolerance, taken as 6σ.
            uncertainty: Math.hypot(
              readingUncertaintyUm,
              typed.partsMeasured > 1
                ? readingUncertaintyUm
                : (fit.interferenceUm.max - fit.interferenceUm.min) / 6,
            ),
          }
        : null,
    runningUm: fit.runningUm ?? null,
    neededUm: fit.neededUm ?? null,
    recommendedClass: fit.recommendedClass ?? null,
    recommendationReason: null,
    verdict: fit.verdict ?? null,
    outsideLimitsUm: fit.outsideLimitsUm ?? null,
    chanceOfClearance: fit.chanceOfClearance ?? null,
    lastCondition: null,
    lastRecordedOn: null,
    suspicionRank: null,
    suspicion: null,
    sentence: fit.reason ?? 'Say how the load moves to see which class it asks for.',
  };
}

/** Nulls where the assessment says nothing, as the answers of the register have them. */
export function trialBearing({ internalClearanceUm: clearance, mounting }: PositionAssessment) {
  return {
    internalClearanceUm: clearance
      ? {
          unmounted: clearance.unmounted,
          mounted: clearance.mounted ?? null,
          running: clearance.running ?? null,
        }
      : null,
    mounting: mounting
      ? {
          heatToC: mounting.heatToC,
          limitC: mounting.limitC,
          allowed: mounting.allowed,
          advice: mounting.advice,
        }
      : null,
  };
}
