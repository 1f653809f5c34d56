import { zodResolver } from '@hookform/resolvers/zod';
import type { Resolver } from 'react-hook-form';
import type { z } from 'zod';
import type { BearingPositionResponse } from '#shared/contracts/bearing-position.ts';
import {
  addFitRecordRequest,
  type AddFitRecordRequest,
  type DiameterUnit,
} from '#shared/contracts/fit-record.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import { measuredDeviationUm } from '#shared/fits/measured-diameter.ts';
import { nominalSeatMm } from '#shared/fits/nominal-seat.ts';
import { shaftTaperOf } from '#shared/fits/tapered-position.ts';

const mmPerUnit: Readonly<Record<DiameterUnit, number>> = { mm: 1, in: 25.4 };
const diameters = ['seatMeasuredMm', 'ringMeasuredMm'] as const;

/** As the form holds it: what the contract can fill in may be missing. */
type Draft = z.input<typeof addFitRecordRequest>;
export type RecordedPosition = Pick<
  BearingPositionResponse,
  'designation' | 'boreMm' | 'outsideMm' | 'shaftSeatForm' | 'seatTaper' | 'fitRecords'
>;

/** Whether the seat of a record is judged by drive-up instead of diameters. */
export const isTaperedSeat = (position: RecordedPosition, seat: Draft['seat']): boolean =>
  seat === 'shaft' && shaftTaperOf(position) !== null;

/** Millimetres of a diameter typed in the record's unit; text that is no number stays text. */
function inMm<Value>(typed: Value, unit: DiameterUnit): Value | number {
  // To a nanometre: finer than any micrometer, and the inches come back as they were typed.
  return typeof typed === 'number' ? Math.round(typed * mmPerUnit[unit] * 1e6) / 1e6 : typed;
}

/** The record as it is sent: millimetres, and nothing of a field that the seat's form hides. */
function recordOf(draft: Draft, position: RecordedPosition): Draft {
  const { diameterUnit: unit = 'mm' } = draft;
  return isTaperedSeat(position, draft.seat)
    ? { ...draft, seatMeasuredMm: null, ringMeasuredMm: null, diameterUnit: 'mm' }
    : {
        ...draft,
        seatMeasuredMm: inMm(draft.seatMeasuredMm, unit),
        ringMeasuredMm: inMm(draft.ringMeasuredMm, unit),
        driveUpMm: null,
        clearanceReductionUm: null,
      };
}

/** Checks a record as the server will, so that a slip of unit is questioned at its field. */
export function fitRecordResolver(
  position: RecordedPosition,
): Resolver<Draft, unknown, AddFitRecordRequest> {
  const schema = addFitRecordRequest.superRefine((record, context) => {
    const nominalMm = nominalSeatMm(position, record.seat);
    for (const field of diameters) {
      const measured = record[field];
      if (measured === null || nominalMm === null) continue;
      try {
        measuredDeviationUm(measured, nominalMm, field);
      } catch (error) {
        if (!(error instanceof FitInputError)) throw error;
        context.addIssue({ code: 'custom', path: [field], message: error.message });
      }
    }
  });
  const resolve = zodResolver(schema);
  return (draft, context, options) => resolve(recordOf(draft, position), context, options);
}
