import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { bearingByDesignation } from '#shared/fits/bearing-designation.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import type { PositionFit, SeatHistory, SeatName } from '#shared/fits/fit-types.ts';
import { shaftTaperOf } from '#shared/fits/tapered-position.ts';
import type { SeatRecord } from './seat-record.ts';

const msPerYear = 365.25 * 24 * 3600 * 1000;

/** Leaves out what the register doesn't know: the fit functions tell absent from stated. */
function known<T extends object>(values: { [Key in keyof T]: T[Key] | null | undefined }) {
  return Object.fromEntries(
    Object.entries(values).filter(([, value]) => value !== null && value !== undefined),
  ) as Partial<T>;
}

/** What the register and the findings tell of a position besides its own row. */
export interface PositionPast {
  records: Readonly<Record<SeatName, SeatRecord>>;
  /** When each finding of looseness was opened that nobody has repaired or dismissed. */
  unrepairedFindingsAt: readonly Date[];
  now: Date;
}

/** A finding counts for a seat until its wear stands in a newer measurement. */
function earlierFindings(record: SeatRecord, openedAt: readonly Date[]): number {
  const measuredMs = record.measuredOn === null ? -Infinity : Date.parse(record.measuredOn);
  return openedAt.filter((opened) => opened.getTime() > measuredMs).length;
}

function historyOf(
  seat: SeatName,
  { records, unrepairedFindingsAt, now }: PositionPast,
): SeatHistory {
  const record = records[seat];
  const sinceMs = record.inServiceSince === null ? null : Date.parse(record.inServiceSince);
  return known<SeatHistory>({
    yearsInService: sinceMs === null ? null : Math.max(0, (now.getTime() - sinceMs) / msPerYear),
    condition: record.condition,
    earlierFindings: earlierFindings(record, unrepairedFindingsAt) || null,
  });
}

/** Drive-up and loss of clearance where the ring sits on a taper; null on a cylindrical seat. */
function taperedSeatOf(position: BearingPosition, shaft: SeatRecord): PositionFit['shaftTapered'] {
  const taper = shaftTaperOf(position);
  if (taper === null) return undefined;
  return {
    taper,
    ...known<{ driveUpMm: number; clearanceReductionUm: number }>({
      driveUpMm: shaft.driveUpMm,
      clearanceReductionUm: shaft.clearanceReductionUm,
    }),
  };
}

/** The bearing's d, D and B as recorded, else as its designation gives them; null where neither does. */
export function bearingSizeOf(
  position: Pick<BearingPosition, 'designation' | 'boreMm' | 'outsideMm' | 'widthMm'>,
) {
  const table = tableSizeOf(position.designation);
  return {
    boreMm: position.boreMm ?? table?.d ?? null,
    outsideMm: position.outsideMm ?? table?.D ?? null,
    widthMm: position.widthMm ?? table?.B ?? null,
    /** Whether the designation is one that the tables hold. */
    designationKnown: table !== null,
  };
}

const housingOutsideMm = (boreMm: number | null, wallMm: number | null) =>
  boreMm === null || wallMm === null ? null : boreMm + 2 * wallMm;

function tableSizeOf(designation: string | null) {
  if (designation === null) return null;
  try {
    return bearingByDesignation(designation);
  } catch (error) {
    if (error instanceof FitInputError) return null;
    throw error;
  }
}

/** A bearing position and its records as the fit functions take them. */
export function positionFitOf(position: BearingPosition, past: PositionPast): PositionFit {
  if (position.kind === 'plain') return { plain: true };
  const { shaft, housing } = past.records;
  const size = bearingSizeOf(position);
  const speedRpm = position.machine?.nominalSpeedRpm ?? null;
  const temperaturesC = known<NonNullable<PositionFit['temperaturesC']>>({
    shaft: position.shaftC,
    innerRing: position.innerRingC,
    outerRing: position.outerRingC,
    housing: position.housingC,
  });
  return {
    ...known<PositionFit>({
      // A designation that the tables lack is no fault where the sizes are on record.
      designation: size.designationKnown ? position.designation : null,
      d: size.boreMm,
      D: size.outsideMm,
      B: size.widthMm,
      bearingClass: position.bearingClass,
      bearingType: position.bearingType,
      clearanceGroup: position.clearanceGroup,
      shaftClass: shaft.toleranceClass,
      housingClass: housing.toleranceClass,
      shaftMeasuredMm: shaft.seatMeasuredMm,
      boreMeasuredMm: shaft.ringMeasuredMm,
      outsideMeasuredMm: housing.ringMeasuredMm,
      housingMeasuredMm: housing.seatMeasuredMm,
      shaftMaterial: position.shaftMaterial,
      housingMaterial: position.housingMaterial,
      innerLoad: position.innerLoad,
      outerLoad: position.outerLoad,
      loadLevel: position.loadLevel,
      shaftBoreMm: position.shaftBoreMm,
      housingOutsideMm: housingOutsideMm(size.outsideMm, position.housingWallMm),
      radialLoadN: position.radialLoadN,
      shaftTapered: taperedSeatOf(position, shaft),
      speedRpm: speedRpm === null ? null : speedRpm * position.shaftRatio,
    }),
    ...(Object.keys(temperaturesC).length > 0 ? { temperaturesC } : {}),
    splitHousing: position.splitHousing,
    mustSlide: position.mustSlide,
    heatThroughShaft: position.heatThroughShaft,
    shaftBonded: shaft.bonding === 'bonded',
    housingBonded: housing.bonding === 'bonded',
    shaftHistory: historyOf('shaft', past),
    housingHistory: historyOf('housing', past),
  };
}
