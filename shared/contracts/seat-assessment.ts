import { z } from 'zod';
import { seatTaper } from './bearing-position.ts';
import { seatBonding, seatCondition, seatName } from './fit-record.ts';

const rangeUm = z.tuple([z.number(), z.number()]);
const spreadUm = z.object({ min: z.number(), mean: z.number(), max: z.number() });

export const seatVerdicts = ['as recommended', 'looser', 'tighter', 'not recorded'] as const;

/**
 * What is known of one seat and what it means; interference positive, clearance negative. A null
 * is something that can't be said from the records at hand.
 */
export const seatAssessment = z.object({
  seat: seatName,
  /** Nominal diameter of the seat: d for the shaft, D for the housing. */
  nominalMm: z.number().nullable(),
  toleranceClass: z.string().nullable(),
  /** Null for a cylindrical seat. A tapered one has drive-up and loss of clearance, no fit. */
  taper: seatTaper.nullable(),
  driveUpMm: z.number().nullable(),
  clearanceReductionUm: z.number().nullable(),
  bonding: seatBonding.nullable(),
  /** Limit deviations of the shaft or housing bore from the nominal size, lower and upper. */
  seatLimitsUm: rangeUm.nullable(),
  /** Limit deviations of the bearing's bore or outside diameter. */
  ringLimitsUm: rangeUm.nullable(),
  /** The same limits as diameters at 20 °C, for the micrometer. */
  seatLimitsMm: rangeUm.nullable(),
  interferenceUm: spreadUm.nullable(),
  probableUm: z.object({ min: z.number(), max: z.number() }).nullable(),
  /** From measured diameters, with the standard uncertainty where it is known. */
  measuredUm: z.object({ value: z.number(), uncertainty: z.number().nullable() }).nullable(),
  runningUm: spreadUm.nullable(),
  /** Interference that the radial load asks for, shaft seat alone. */
  neededUm: z.number().nullable(),
  recommendedClass: z.string().nullable(),
  recommendationReason: z.string().nullable(),
  /** Null where a class is on record and nothing to compare it with. */
  verdict: z.enum(seatVerdicts).nullable(),
  outsideLimitsUm: z.number().nullable(),
  chanceOfClearance: z.number().nullable(),
  lastCondition: seatCondition.nullable(),
  lastRecordedOn: z.string().nullable(),
  /** Place in the order of suspicion for the finding at hand, from 1; null outside a finding. */
  suspicionRank: z.int().nullable(),
  /** Chance that this seat explains the finding, 0–1; null where nothing allows one. */
  suspicion: z.number().nullable(),
  /** One sentence: what the seat's records mean, and for a finding why it is suspected or not. */
  sentence: z.string(),
});
export type SeatAssessment = z.infer<typeof seatAssessment>;

/** A seat of the next bearing positions, as far as it could explain the finding at hand. */
export const neighbourSeat = z.object({
  positionName: z.string(),
  seat: seatName,
  suspicionRank: z.int(),
  suspicion: z.number().nullable(),
  sentence: z.string(),
});

export const seatAssessmentsResponse = z.object({
  /** Empty for a plain bearing, which has no seats. */
  seats: z.array(seatAssessment),
  /** Radial internal clearance of the bearing, as far as it can be said. */
  internalClearanceUm: z
    .object({
      unmounted: spreadUm,
      mounted: spreadUm.nullable(),
      running: spreadUm.nullable(),
    })
    .nullable(),
  /** Heating the inner ring to mount it; null where there is nothing to heat for. */
  mounting: z
    .object({
      heatToC: z.number(),
      limitC: z.number(),
      allowed: z.boolean(),
      advice: z.string(),
    })
    .nullable(),
  /** Empty outside a finding. */
  neighbours: z.array(neighbourSeat),
  /** Which seat fits the evidence, or which record is missing first. */
  conclusion: z.string(),
  cautions: z.array(z.string()),
});
export type SeatAssessmentsResponse = z.infer<typeof seatAssessmentsResponse>;
