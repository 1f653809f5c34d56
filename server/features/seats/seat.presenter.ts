import type { SeatAssessment, SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import type { LimitsUm, PositionAssessment, SeatFit, SeatName } from '#shared/fits/fit-types.ts';
import type { SeatRecord } from './seat-record.ts';

/** Standard uncertainty of a diameter taken with a micrometer in the plant; see shared/fits/seat-fit. */
const micrometerUncertaintyUm = 2;

const pair = (limits: LimitsUm | undefined): [number, number] | null =>
  limits === undefined ? null : [limits[0], limits[1]];

const asDiameters = (limits: LimitsUm | undefined, nominalMm: number | null) =>
  limits === undefined || nominalMm === null
    ? null
    : ([nominalMm + limits[0] / 1000, nominalMm + limits[1] / 1000] as [number, number]);

function measured(fit: SeatFit, record: SeatRecord): SeatAssessment['measuredUm'] {
  if (record.seatMeasuredMm === null || fit.interferenceUm === undefined) return null;
  // With one part measured the other adds the spread of its tolerance, which the fit's range shows.
  const uncertainty = Math.hypot(
    micrometerUncertaintyUm,
    record.ringMeasuredMm === null
      ? (fit.interferenceUm.max - fit.interferenceUm.min) / 6
      : micrometerUncertaintyUm,
  );
  return { value: fit.interferenceUm.mean, uncertainty };
}

export interface SeatFacts {
  seat: SeatName;
  nominalMm: number | null;
  record: SeatRecord;
  taper: SeatAssessment['taper'];
  fit: SeatFit | undefined;
  sentence: string;
  suspicionRank: number | null;
  suspicion: number | null;
}

/** One seat's records and what they mean. */
export function presentSeat(facts: SeatFacts): SeatAssessment {
  const { seat, nominalMm, record, fit } = facts;
  return {
    seat,
    nominalMm,
    toleranceClass: record.toleranceClass,
    taper: facts.taper,
    driveUpMm: record.driveUpMm,
    clearanceReductionUm: record.clearanceReductionUm,
    bonding: record.bonding,
    seatLimitsUm: pair(fit?.seatLimitsUm),
    ringLimitsUm: pair(fit?.ringLimitsUm),
    seatLimitsMm: asDiameters(fit?.seatLimitsUm, nominalMm),
    interferenceUm: fit?.interferenceUm ?? null,
    probableUm: fit?.probableUm ?? null,
    measuredUm: fit === undefined ? null : measured(fit, record),
    runningUm: fit?.runningUm ?? null,
    neededUm: fit?.neededUm ?? null,
    recommendedClass: fit?.recommendedClass ?? null,
    recommendationReason: fit?.reason ?? null,
    verdict: fit === undefined ? 'not recorded' : (fit.verdict ?? null),
    outsideLimitsUm: fit?.outsideLimitsUm ?? null,
    chanceOfClearance: fit?.chanceOfClearance ?? null,
    lastCondition: record.condition,
    lastRecordedOn: record.recordedOn,
    suspicionRank: facts.suspicionRank,
    suspicion: facts.suspicion,
    sentence: facts.sentence,
  };
}

/** What the whole bearing has left of its clearance, and how it is mounted. */
export function presentBearing(
  assessment: PositionAssessment,
): Pick<SeatAssessmentsResponse, 'internalClearanceUm' | 'mounting' | 'cautions'> {
  const { internalClearanceUm: clearance, mounting } = assessment;
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
    cautions: [...assessment.cautions],
  };
}
