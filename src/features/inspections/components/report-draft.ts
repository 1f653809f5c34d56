import {
  seatStages,
  type SeatCondition,
  type SeatName,
  type SeatStage,
} from '#shared/contracts/fit-record.ts';
import {
  inPlaceCheckNames,
  type InPlaceCheck,
  type InPlaceCheckName,
} from '#shared/contracts/in-place-check.ts';
import {
  planes,
  readingDirectionsDeg,
  type InspectionOutcome,
  type SeatReading,
} from '#shared/contracts/inspection.ts';
import { parseDecimal } from '#src/lib/numbers.ts';

export const lengthUnits = ['mm', 'in'] as const;
export type LengthUnit = (typeof lengthUnits)[number];
const mmPerUnit: Readonly<Record<LengthUnit, number>> = { mm: 1, in: 25.4 };

/** Where a reading is taken, as a key: part, plane, direction. */
export const placeKey = (part: SeatReading['part'], plane: number, directionDeg: number) =>
  `${part}/${plane}/${directionDeg}`;

export interface SeatDraft {
  condition: SeatCondition | '';
  /** What was typed, by place. */
  readings: Readonly<Record<string, string>>;
}

/** One check as it has been told so far. */
export interface InPlaceDraft {
  finding: InPlaceCheck['finding'] | '';
  reading: string;
  readingAbove: string;
  note: string;
}

export const emptyCheck: InPlaceDraft = { finding: '', reading: '', readingAbove: '', note: '' };

/** A report as far as it has been typed. Kept on the device, so that a dead battery loses nothing. */
export interface ReportDraft {
  cautionsRead: boolean;
  unit: LengthUnit;
  outcome: InspectionOutcome | '';
  seats: Readonly<Record<string, SeatDraft>>;
  inPlaceResult: string;
  /** By name of the check. */
  inPlace: Readonly<Partial<Record<InPlaceCheckName, InPlaceDraft>>>;
  causeInPlace: boolean;
  workDone: string;
  repaired: boolean;
}

export const seatKey = (seat: SeatName, stage: SeatStage) => `${seat}/${stage}`;
export const emptySeat: SeatDraft = { condition: '', readings: {} };

export const emptyDraft: ReportDraft = {
  cautionsRead: false,
  unit: 'mm',
  outcome: '',
  seats: {},
  inPlaceResult: '',
  inPlace: {},
  causeInPlace: false,
  workDone: '',
  repaired: false,
};

/** Millimetres of what was typed; undefined where nothing was, NaN where it is no number. */
export function readingMm(typed: string | undefined, unit: LengthUnit): number | undefined {
  const value = parseDecimal(typed ?? '');
  // To a tenth of a micrometre, the finest that a plant's micrometer shows.
  return value === undefined ? undefined : Math.round(value * mmPerUnit[unit] * 1e4) / 1e4;
}

export interface PlacedReading extends SeatReading {
  key: string;
}

/** The readings of one seat that were typed, in the order of the form. */
export function readingsOf(seat: SeatDraft, unit: LengthUnit): PlacedReading[] {
  return (['seat', 'ring'] as const).flatMap((part) =>
    planes.flatMap((plane) =>
      readingDirectionsDeg.flatMap((directionDeg) => {
        const key = placeKey(part, plane, directionDeg);
        const diameterMm = readingMm(seat.readings[key], unit);
        return diameterMm === undefined ? [] : [{ key, part, plane, directionDeg, diameterMm }];
      }),
    ),
  );
}

/** The stages a report tells of: as found, and as left where the fit was put right. */
export const stagesOf = (draft: ReportDraft): readonly SeatStage[] =>
  draft.repaired ? seatStages : ['as found'];

/** Whether anything was said of the seat. */
const isTouched = (seat: SeatDraft) =>
  seat.condition !== '' || Object.values(seat.readings).some((typed) => typed.trim() !== '');

const isUntouchedCheck = (told: InPlaceDraft) =>
  Object.values(told).every((typed: string) => typed.trim() === '');

/**
 * The draft as a report to send; faults are left in it for the contract to name. A seat as left
 * of which nothing was said is left out, a seat as found is always asked for.
 */
export function reportOf(draft: ReportDraft, seats: readonly SeatName[]) {
  return {
    cautionsRead: draft.cautionsRead,
    outcome: draft.outcome,
    seats: (draft.causeInPlace ? [] : seats).flatMap((seat) =>
      stagesOf(draft).flatMap((stage) => {
        const told = draft.seats[seatKey(seat, stage)] ?? emptySeat;
        if (stage === 'as left' && !isTouched(told)) return [];
        const readings = readingsOf(told, draft.unit).map(
          ({ part, plane, directionDeg, diameterMm }) => ({
            part,
            plane,
            directionDeg,
            diameterMm,
          }),
        );
        return [{ seat, stage, condition: told.condition, readings }];
      }),
    ),
    inPlaceResult: draft.inPlaceResult.trim() === '' ? null : draft.inPlaceResult,
    inPlaceChecks: inPlaceCheckNames.flatMap((check) => {
      const told = draft.inPlace[check];
      if (told === undefined || isUntouchedCheck(told)) return [];
      return [
        {
          check,
          finding: told.finding,
          reading: parseDecimal(told.reading) ?? null,
          readingAbove: parseDecimal(told.readingAbove) ?? null,
          note: told.note.trim() === '' ? null : told.note,
        },
      ];
    }),
    causeInPlace: draft.causeInPlace,
    workDone: draft.workDone,
    repaired: draft.repaired,
  };
}
