import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import type { CreateBearingPositionRequest } from '#shared/contracts/bearing-position.ts';
import type { RowFault } from '#shared/contracts/register-import.ts';
import type { CreateFitRecordRequest } from '#shared/contracts/fit-record.ts';
import type { GivenRow } from './given-row.ts';
import type { RegisterLookupRepository } from './register-lookup.repository.ts';

type FieldFault = { path: string; message: string };

/** The checks that the register's forms make of fit data. */
export interface RegisterChecks {
  positionFaults: (position: CreateBearingPositionRequest) => FieldFault[];
  recordFaults: (position: BearingPosition, record: CreateFitRecordRequest) => FieldFault[];
}

/** What a dry run carries from one batch of rows to the next. */
export interface JudgeContext {
  siteId: number;
  lookup: RegisterLookupRepository;
  checks: RegisterChecks;
  people: { id: number; email: string; isOwner: boolean }[];
  /** Today, YYYY-MM-DD. */
  today: string;
  /** Row number by what the row is about. */
  seen: Map<string, number>;
}

/** The fault of a row about something that an earlier row of the file is about already. */
export function alreadyNamed(
  { seen }: JudgeContext,
  row: GivenRow,
  key: string,
  { column, what }: { column: string; what: string },
): RowFault[] {
  const earlier = seen.get(key);
  if (earlier === undefined) {
    seen.set(key, row.rowNumber);
    return [];
  }
  return [
    {
      column,
      reason: `${what} stands in row ${earlier} already.`,
      remedy: 'Leave one of the two rows in the file.',
    },
  ];
}

/** The fault of a row whose machine or bearing position is not in the register. */
export function missingParent(tag: string, code: string | null, machineThere: boolean): RowFault {
  return machineThere
    ? {
        column: 'position code',
        reason: `The machine ${tag} has no bearing position ${code ?? ''}.`,
        remedy: 'Import the bearing positions first, or correct the code.',
      }
    : {
        column: 'machine tag',
        reason: `There is no machine ${tag} at this site.`,
        remedy: 'Import the machines first, or correct the tag.',
      };
}
