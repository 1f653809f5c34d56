import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database } from '#server/db/database.ts';
import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import type { Finding } from '#server/db/entities/finding.entity.ts';
import type { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { Screening } from '#server/db/entities/screening.entity.ts';
import { notFound } from '#server/http/app-error.ts';
import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { assessSeats } from '#shared/fits/assess-seats.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import type { PositionAssessment, SeatFit, SeatName } from '#shared/fits/fit-types.ts';
import { rankSeats, type RankedSeat, type SuspectSeat } from '#shared/fits/seat-ranking.ts';
import { shaftTaperOf } from '#shared/fits/tapered-position.ts';
import { findingSignsOf } from './finding-signs.ts';
import { levelsOf, newestSurveyOf } from './neighbour-levels.ts';
import { bearingSizeOf, positionFitOf, type PositionPast } from './position-fit.ts';
import { seatRecordOf, type SeatRecord } from './seat-record.ts';
import { recordedWithoutChance, seatSentence } from './seat-sentence.ts';
import { presentBearing, presentSeat } from './seat.presenter.ts';
import { SeatRepository } from './seat.repository.ts';

const seats = ['shaft', 'housing'] as const satisfies readonly SeatName[];

interface Assessed {
  position: BearingPosition;
  records: Record<SeatName, SeatRecord>;
  assessment: PositionAssessment;
  fits: Record<SeatName, SeatFit | undefined>;
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
    await this.seenPosition(principal, positionId);
    return this.assess(positionId, []);
  }

  /** The position with its machine; 404 for whoever may not see it. */
  async seenPosition(principal: SitePrincipal, positionId: number): Promise<BearingPosition> {
    const position = await new SeatRepository(this.database.db).find(positionId);
    const machine = position?.machine;
    const isSeen =
      machine?.siteId === principal.siteId &&
      (principal.role !== 'owner' || machine.ownerUserId === principal.userId);
    if (!isSeen || position === null) throw notFound('bearing position');
    return position;
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
    const ids = [positionId, ...nearby.map(({ id }) => id)];
    const records = await repository.recordsOf(ids);
    const findings = await repository.unrepairedFindings(
      ids,
      screenings.map(({ id }) => id),
    );
    const own = this.assessOne(position, records, findings);
    if (position.kind === 'plain') {
      return {
        seats: [],
        neighbours: [],
        conclusion:
          'A plain bearing has no seats of its own: check clearance, liner and pedestal instead.',
        ...presentBearing(own.assessment),
      };
    }
    if (screenings.length === 0) return presentAlone(own);
    const neighbours = nearby
      .filter(({ kind }) => kind === 'rolling')
      .map((next) => this.assessOne(next, records, findings));
    const newest = newestSurveyOf(screenings);
    const levels = levelsOf(await repository.screeningsOf(ids, newest === null ? [] : [newest]));
    return presentRanked(own, neighbours, screenings, levels);
  }

  private assessOne(
    position: BearingPosition,
    allRecords: readonly FitRecord[],
    findings: readonly Pick<Finding, 'bearingPositionId' | 'openedAt'>[],
  ): Assessed {
    const ownRecords = allRecords.filter((record) => record.bearingPositionId === position.id);
    const records = {
      shaft: seatRecordOf(ownRecords, 'shaft'),
      housing: seatRecordOf(ownRecords, 'housing'),
    };
    const { assessment, fault } = tryAssess(position, {
      records,
      unrepairedFindingsAt: findings
        .filter(({ bearingPositionId }) => bearingPositionId === position.id)
        .map(({ openedAt }) => openedAt),
      now: this.now(),
    });
    return {
      position,
      records,
      assessment,
      fits: { shaft: assessment.shaftSeat, housing: assessment.housingSeat },
      fault,
    };
  }
}

/** A record that contradicts the bearing is told, not thrown: the finding must still open. */
function tryAssess(
  position: BearingPosition,
  past: PositionPast,
): { assessment: PositionAssessment; fault: string | null } {
  try {
    return { assessment: assessSeats(positionFitOf(position, past)), fault: null };
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
      taper: seat === 'shaft' ? shaftTaperOf(own.position) : null,
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
  return {
    seats: presentSeats(own, []),
    neighbours: [],
    conclusion,
    ...presentBearing(own.assessment),
  };
}

function presentRanked(
  own: Assessed,
  neighbours: readonly Assessed[],
  screenings: readonly Screening[],
  levels: ReadonlyMap<number, number>,
): SeatAssessmentsResponse {
  const ownLevel = levels.get(own.position.id);
  const suspects = [own, ...neighbours].flatMap((assessed) =>
    seats.map((seat): SuspectSeat => {
      const fit = assessed.fits[seat];
      const { toleranceClass } = assessed.records[seat];
      const recordedAs = recordedWithoutChance(assessed.records[seat]);
      const level = assessed === own ? undefined : levels.get(assessed.position.id);
      return {
        key: keyOf(assessed, seat),
        positionName: assessed.position.name,
        seat,
        isNeighbour: assessed !== own,
        ...(fit === undefined ? {} : { fit }),
        ...(toleranceClass === null ? {} : { toleranceClass }),
        ...(recordedAs === null ? {} : { recordedAs }),
        ...(level === undefined || !ownLevel ? {} : { levelRatio: level / ownLevel }),
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
    ...presentBearing(own.assessment),
  };
}
