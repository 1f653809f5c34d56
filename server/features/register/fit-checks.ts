import { bearingByDesignation } from '#shared/fits/bearing-designation.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import { measuredDeviationUm } from '#shared/fits/measured-diameter.ts';
import { nominalSeatMm } from '#shared/fits/nominal-seat.ts';
import { resolvePosition } from '#shared/fits/resolve-position.ts';
import { seatClassLimitsUm } from '#shared/fits/seat-class-limits.ts';
import { shaftTaperOf } from '#shared/fits/tapered-position.ts';
import type { FitChecks } from './position.service.ts';

type Fault = { path: string; message: string };

/** Fields of the register by the name the fit functions give them. */
const fieldOf: Readonly<Record<string, string>> = {
  d: 'boreMm',
  D: 'outsideMm',
  B: 'widthMm',
  shaftClass: 'toleranceClass',
  housingClass: 'toleranceClass',
};

/** Runs a check and turns what it throws into a fault of the form; other errors pass on. */
function faultOf(check: () => unknown): Fault[] {
  try {
    check();
    return [];
  } catch (error) {
    if (!(error instanceof FitInputError)) throw error;
    return [{ path: fieldOf[error.field] ?? error.field, message: error.message }];
  }
}

type Sizes = Parameters<FitChecks['recordFaults']>[0];
type NewRecord = Parameters<FitChecks['recordFaults']>[1];

/** The designation's own sizes where the tables know it; a maker's own designation tells nothing. */
function knownDesignation(designation: string | null) {
  if (designation === null) return undefined;
  try {
    return bearingByDesignation(designation);
  } catch (error) {
    if (error instanceof FitInputError) return undefined;
    throw error;
  }
}

const unless = (value: unknown, path: string, message: string): Fault[] =>
  value === null ? [] : [{ path, message }];

/** A tapered seat is judged by its drive-up, a cylindrical one by diameters: never by the other's. */
function formFaults(position: Sizes, record: NewRecord): Fault[] {
  if (record.seat === 'shaft' && shaftTaperOf(position) !== null) {
    const message =
      'The shaft seat is tapered: record the drive-up or the loss of internal clearance instead of diameters.';
    return [
      ...unless(record.seatMeasuredMm, 'seatMeasuredMm', message),
      ...unless(record.ringMeasuredMm, 'ringMeasuredMm', message),
    ];
  }
  const message = `The ${record.seat} seat is cylindrical: drive-up and loss of clearance belong to a tapered shaft seat.`;
  return [
    ...unless(record.driveUpMm, 'driveUpMm', message),
    ...unless(record.clearanceReductionUm, 'clearanceReductionUm', message),
  ];
}

/** Checks of fit data that the register makes before anything is written. */
export const fitChecks: FitChecks = {
  positionFaults: (position) => {
    const sized = position.boreMm !== null && position.outsideMm !== null;
    const known = knownDesignation(position.designation) !== undefined;
    // A designation outside the tables is as good as none, if the sizes are given by hand.
    if (position.designation !== null && !known && !sized) {
      return faultOf(() => bearingByDesignation(position.designation ?? ''));
    }
    if (!known && position.boreMm === null && position.outsideMm === null) return [];
    return faultOf(() =>
      resolvePosition({
        ...(known && position.designation !== null ? { designation: position.designation } : {}),
        ...(position.boreMm === null ? {} : { d: position.boreMm }),
        ...(position.outsideMm === null ? {} : { D: position.outsideMm }),
        ...(position.shaftBoreMm == null ? {} : { shaftBoreMm: position.shaftBoreMm }),
      }),
    );
  },
  recordFaults: (position, record) => {
    const nominalMm = nominalSeatMm(position, record.seat);
    const { toleranceClass } = record;
    const misplaced = formFaults(position, record);
    if (misplaced.length > 0) return misplaced;
    if (nominalMm === null) {
      if (toleranceClass === null && record.seatMeasuredMm === null) return [];
      return [
        {
          path: 'seat',
          message: `The size of the ${record.seat} seat is not known: enter the bearing's designation or its ${record.seat === 'shaft' ? 'bore d' : 'outside diameter D'} first.`,
        },
      ];
    }
    return [
      ...(toleranceClass === null
        ? []
        : faultOf(() => seatClassLimitsUm(record.seat, nominalMm, toleranceClass))),
      ...(['seatMeasuredMm', 'ringMeasuredMm'] as const).flatMap((path) => {
        const measured = record[path];
        return measured === null
          ? []
          : faultOf(() => measuredDeviationUm(measured, nominalMm, path));
      }),
    ];
  },
};
