import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database } from '#server/db/database.ts';
import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import type { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { Screening } from '#server/db/entities/screening.entity.ts';
import { notFound } from '#server/http/app-error.ts';
import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { assessSeats } from '#shared/fits/assess-seats.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import type { PositionAssessment, SeatFit, SeatName } from '#shared/fits/fit-types.ts';
import { rankSeats, type RankedSeat, type SuspectSeat } from '#shared/fits/seat-ranking.ts';
import { findingSignsOf } from './finding-signs.ts';
import { bearingSizeOf, positionFitOf } from './position-fit.ts';
import { seatRecordOf, type SeatRecord } from './seat-record.ts';
import { seatSentence } from './seat-sentence.ts';
import { presentSeat } from './seat.presenter.ts';
import { SeatRepository } from './seat.repository.ts';

const seats = ['shaft', 'housing'] as const satisfies readonly SeatName[];

interface Assessed {
  position: BearingPosition;
  records: Record<SeatName, SeatRecord>;
  fits: Record<SeatName, SeatFit | undefined>;
  cautions: string[];
  /** What in the register contradicts itself, in words; null where nothing does. */
  fault: string | null;
}

/** What the records of a position's seats mean, and which of them explains a finding. */
export class SeatService {
  private readonly database: Database;
  private readonly now: () => Date;

  constructor(database: Database, now: () => Date = () => new Date()) {
    this.database = database;
    this.now = now;
  }

  /** The seats of a position on its own, for whoever may see its machine. */
  async ofPosition(principal: SitePrincipal, positionId: number): Promise<SeatAssessmentsResponse> {
    const position = await new SeatRepository(this.database.db).find(positionId);
    const machine = position?.machine;
    const isSeen =
      machine?.siteId === principal.siteId &&
      (principal.role !== 'owner' || machine.ownerUserId === principal.userId);
    if (!isSeen) throw notFound('bearing position');
    return this.assess(positionId, []);
  }

  /** The seats of a position; with the screenings of a finding also ranked by suspicion. */
  async assess(
    positionId: number,
    screenings: readonly Screening[],
  ): Promise<SeatAssessmentsResponse> {
    const repository = new SeatRepository(this.database.db);
    const position = await repository.find(positionId);
    if (position === null) throw notFound('bearing position');
    const train = await repository.ofMachine(position.machineId);
    const place = train.findIndex(({ id }) => id === positionId);
    const nearby = [train[place - 1], train[place + 1]].filter((next) => next !== undefined);
    const records = await repository.recordsOf([positionId, ...nearby.map(({ id }) => id)]);
    const own = this.assessOne(position, records);
    if (position.kind === 'plain') {
      return {
        seats: [],
        neighbours: [],
        conclusion:
          'A plain bearing has no seats of its own: check clearance, liner and pedestal instead.',
        cautions: own.cautions,
      };
    }
    if (screenings.length === 0) return presentAlone(own);
    const neighbours = nearby
      .filter(({ kind }) => kind === 'rolling')
      .map((next) => this.assessOne(next, records));
    return presentRanked(own, neighbours, screenings);
  }

  private assessOne(position: BearingPosition, allRecords: readonly FitRecord[]): Assessed {
    const ownRecords = allRecords.filter((record) => record.bearingPositionId === position.id);
    const records = {
      shaft: seatRecordOf(ownRecords, 'shaft'),
      housing: seatRecordOf(ownRecords, 'housing'),
    };
    const { assessment, fault } = tryAssess(position, records, this.now());
    return {
      position,
      records,
      fits: { shaft: assessment.shaftSeat, housing: assessment.housingSeat },
      cautions: [...assessment.cautions],
      fault,
    };
  }
}

/** A record that contradicts the bearing is told, not thrown: the finding must still open. */
function tryAssess(
  position: BearingPosition,
  records: Record<SeatName, SeatRecord>,
  now: Date,
): { assessment: PositionAssessment; fault: string | null } {
  try {
    const fit = positionFitOf(position, records.shaft, records.housing, now);
    return { assessment: assessSeats(fit), fault: null };
  } catch (error) {
    if (!(error instanceof FitInputError)) throw error;
    return { assessment: { cautions: [] }, fault: error.message };
  }
}

const keyOf = (assessed: Assessed, seat: SeatName) => `${assessed.position.id}-${seat}`;
const nominalOf = (assessed: Assessed, seat: SeatName) => {
  const size = bearingSizeOf(assessed.position);
  return seat === 'shaft' ? size.boreMm : size.outsideMm;
};

function presentSeats(own: Assessed, ranked: readonly RankedSeat[]) {
  return seats.map((seat) => {
    const rank = ranked.find(({ key }) => key === keyOf(own, seat));
    return presentSeat({
      seat,
      nominalMm: nominalOf(own, seat),
      record: own.records[seat],
      fit: own.fits[seat],
      sentence: rank?.reason ?? seatSentence(seat, own.fits[seat], own.records[seat]),
      suspicionRank: rank?.rank ?? null,
      suspicion: rank?.suspicion ?? null,
    });
  });
}

const faultSentence = (fault: string) =>
  `The register contradicts itself, so no fit can be worked out: ${fault} Putting the record right is the first step.`;

function presentAlone(own: Assessed): SeatAssessmentsResponse {
  const missing = seats.filter(
    (seat) => own.fits[seat] === undefined || own.fits[seat].verdict === 'not recorded',
  );
  const conclusion =
    own.fault !== null
      ? faultSentence(own.fault)
      : missing.length === 0
        ? 'Both seats are on record.'
        : `The record of the ${missing.join(' and the ')} seat is missing: get the drawing, or measure at the next opening.`;
  return { seats: presentSeats(own, []), neighbours: [], conclusion, cautions: own.cautions };
}

function presentRanked(
  own: Assessed,
  neighbours: readonly Assessed[],
  screenings: readonly Screening[],
): SeatAssessmentsResponse {
  const suspects = [own, ...neighbours].flatMap((assessed) =>
    seats.map((seat): SuspectSeat => {
      const fit = assessed.fits[seat];
      const { toleranceClass } = assessed.records[seat];
      return {
        key: keyOf(assessed, seat),
        positionName: assessed.position.name,
        seat,
        isNeighbour: assessed !== own,
        ...(fit === undefined ? {} : { fit }),
        ...(toleranceClass === null ? {} : { toleranceClass }),
      };
    }),
  );
  const ranking = rankSeats(suspects, findingSignsOf(screenings));
  const ownKeys = new Set(seats.map((seat) => keyOf(own, seat)));
  return {
    seats: presentSeats(own, ranking.seats),
    neighbours: ranking.seats
      .filter(({ key }) => !ownKeys.has(key))
      .map((seat) => ({
        positionName: seat.positionName,
        seat: seat.seat,
        suspicionRank: seat.rank,
        suspicion: seat.suspicion,
        sentence: seat.reason,
      })),
    conclusion: own.fault === null ? ranking.conclusion : faultSentence(own.fault),
    cautions: own.cautions,
  };
}
