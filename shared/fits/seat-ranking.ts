import type { SeatFit, SeatName } from './fit-types.ts';
import { signLikelihoods, tellingSigns, type FindingSigns } from './seat-signs.ts';

/** One seat that could explain a finding. */
export interface SuspectSeat {
  /** The caller's own id of the seat. */
  key: string;
  /** Name of the bearing position, as shown. */
  positionName: string;
  seat: SeatName;
  /** False for the position of the finding, true for a neighbouring one. */
  isNeighbour: boolean;
  /** From `assessSeats`; absent where the position could not be assessed. */
  fit?: SeatFit;
  /** Recorded class, for the reason. */
  toleranceClass?: string;
  /** What is on record where no chance can be said of it, e.g. "bonded on purpose". */
  recordedAs?: string;
  /** Level of the harmonic run at the neighbour over that at the finding, where both were measured. */
  levelRatio?: number;
}

export interface RankedSeat {
  key: string;
  positionName: string;
  seat: SeatName;
  /** 1 is the first to look at. */
  rank: number;
  /** Chance that this seat explains the finding, 0–1; null where nothing of it is on record. */
  suspicion: number | null;
  /** One sentence: why it stands where it stands. */
  reason: string;
}

export interface SeatRanking {
  seats: readonly RankedSeat[];
  /** Chance that none of the seats explains it: pedestal, foot, frame or another fault. */
  elsewhere: number | null;
  /** Key of the seat whose record is missing and should be got first; null where all is recorded. */
  firstGap: string | null;
  /** True only where the first seat is likely and both seats of the position are on record. */
  isConfident: boolean;
  /** One or two sentences: which seat, or which record is missing first. */
  conclusion: string;
}

/** Chance of running loose of a seat of which nothing is known. Assumption, no source. */
const unknownChance = 0.15;
/** Weight (odds) of joints other than the seats. Assumption, no source. */
const elsewhereOdds = 0.15;
/** How much less a neighbour's seat explains what was measured here. Assumption, no source. */
const neighbourFactor = 0.2;
/** No record makes a seat surely sound or surely loose. */
const chanceBounds = { least: 0.005, most: 0.98 } as const;
/** From here the first seat counts as likely. */
const confidentFrom = 0.6;

function odds(chance: number): number {
  const p = Math.min(chanceBounds.most, Math.max(chanceBounds.least, chance));
  return p / (1 - p);
}

function isRecorded(seat: SuspectSeat): boolean {
  return seat.fit?.chanceOfClearance !== undefined || seat.recordedAs !== undefined;
}

function placeFactor(seat: SuspectSeat): number {
  if (!seat.isNeighbour) return 1;
  return neighbourFactor * Math.min(5, Math.max(0.2, seat.levelRatio ?? 1));
}

function seatName(seat: { seat: SeatName; positionName: string }): string {
  return `${seat.seat} seat of ${seat.positionName}`;
}

function percent(chance: number): string {
  const value = Math.round(chance * 100);
  if (value < 1) return 'under 1 %';
  return value > 99 ? 'over 99 %' : `${value} %`;
}

function joined(parts: readonly string[]): string {
  return parts.length < 2
    ? parts.join('')
    : `${parts.slice(0, -1).join(', ')} and ${parts.at(-1) ?? ''}`;
}

function recordClause(seat: SuspectSeat): string {
  const chance = seat.fit?.chanceOfClearance;
  if (chance === undefined && seat.recordedAs !== undefined) {
    return `${seat.recordedAs}, which allows no figure for its chance of running loose`;
  }
  if (chance === undefined) return 'nothing that tells its fit is on record';
  const named = seat.toleranceClass ? `${seat.toleranceClass} on record, ` : '';
  return `${named}${percent(chance)} chance that it runs with more clearance than it should`;
}

function reasonFor(seat: SuspectSeat, signs: FindingSigns): string {
  const telling = tellingSigns(seat.seat, signs);
  const clauses = [recordClause(seat)];
  if (telling.for.length > 0) clauses.push(`for it: ${joined(telling.for)}`);
  if (telling.against.length > 0) clauses.push(`against it: ${joined(telling.against)}`);
  if (seat.isNeighbour) clauses.push('a neighbouring position, so less likely');
  const name = seatName(seat);
  return `${name.charAt(0).toUpperCase()}${name.slice(1)}: ${clauses.join('; ')}.`;
}

function conclude(
  ranked: readonly { seat: SuspectSeat; share: number }[],
  gap: SuspectSeat | undefined,
  isConfident: boolean,
  elsewhere: number,
): string {
  const first = ranked[0];
  if (!first) return 'There is no seat to suspect: the position has none on record.';
  const ask = gap
    ? `The record of the ${seatName(gap)} is missing: getting it, from the drawing or by measuring, is the first step.`
    : '';
  if (!ranked.some(({ seat }) => isRecorded(seat)))
    return `Nothing is recorded of any seat. ${ask}`;
  if (isConfident) return `The ${seatName(first.seat)} explains the finding best.`;
  if (gap) return `${ask} Until then the records do not single out a seat.`;
  if (elsewhere > first.share) {
    return 'None of the recorded fits explains the finding well: check pedestal, feet and frame in place first.';
  }
  return `The ${seatName(first.seat)} is the first to check, but the evidence does not single it out.`;
}

/**
 * Which seat explains a finding of looseness.
 *
 * Model: exactly one joint is loose, one of the seats or something elsewhere. Each seat's prior odds
 * are those of its chance of running loose (`chanceOfClearance`; 0.15 where nothing is recorded),
 * times a factor for neighbours; each joint's odds are multiplied by the likelihood of the signs
 * given that joint, the signs taken as independent. Shares of the sum are the suspicions. A seat
 * without a chance keeps its place in the order but gets no figure, and no ranking is confident
 * unless both seats of the position are on record. Checked on simulated positions with known loose
 * seats (`fixtures/fits/simulated-positions.ts`); the figures of this model are assumptions marked
 * beside them.
 *
 * @param suspects - both seats of the position and of its neighbours
 * @param signs - what the screenings of the finding show
 * @returns seats in the order of suspicion with a sentence each, and the conclusion
 */
export function rankSeats(suspects: readonly SuspectSeat[], signs: FindingSigns): SeatRanking {
  const likelihood = signLikelihoods(signs);
  const weighed = suspects.map((seat) => ({
    seat,
    weight:
      odds(seat.fit?.chanceOfClearance ?? unknownChance) *
      placeFactor(seat) *
      likelihood[seat.seat],
  }));
  const elsewhereWeight = elsewhereOdds * likelihood.elsewhere;
  const total = weighed.reduce((sum, { weight }) => sum + weight, elsewhereWeight);
  const ranked = weighed
    .map(({ seat, weight }) => ({ seat, share: weight / total }))
    .sort((a, b) => b.share - a.share);
  const missing = ranked.filter(({ seat }) => !isRecorded(seat));
  // The finding's own position first: a neighbour's gap can wait.
  const gap = (missing.find(({ seat }) => !seat.isNeighbour) ?? missing[0])?.seat;
  const ownRecorded = suspects.every((seat) => seat.isNeighbour || isRecorded(seat));
  const elsewhere = elsewhereWeight / total;
  const first = ranked[0];
  const isConfident =
    first?.seat.fit?.chanceOfClearance !== undefined && ownRecorded && first.share >= confidentFrom;
  return {
    seats: ranked.map(({ seat, share }, index) => ({
      key: seat.key,
      positionName: seat.positionName,
      seat: seat.seat,
      rank: index + 1,
      suspicion: seat.fit?.chanceOfClearance === undefined ? null : share,
      reason: reasonFor(seat, signs),
    })),
    elsewhere: suspects.some(isRecorded) ? elsewhere : null,
    firstGap: gap?.key ?? null,
    isConfident,
    conclusion: conclude(ranked, gap, isConfident, elsewhere),
  };
}
