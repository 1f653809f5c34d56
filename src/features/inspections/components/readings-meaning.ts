import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import { measuredDeviationUm } from '#shared/fits/measured-diameter.ts';
import { formatFixed } from '#src/lib/numbers.ts';
import type { PlacedReading } from './report-draft.ts';

/** What is wrong with one reading, or null; the server asks the same question. */
export function readingQuestion(diameterMm: number, nominalMm: number | null): string | null {
  if (Number.isNaN(diameterMm)) return 'This is no number.';
  if (nominalMm === null) return null;
  try {
    measuredDeviationUm(diameterMm, nominalMm, 'diameterMm');
    return null;
  } catch (error) {
    if (error instanceof FitInputError) return error.message;
    throw error;
  }
}

const um = (value: number) => `${formatFixed(Math.abs(value), 1)} µm`;
const fitText = (value: number) => `${um(value)} of ${value >= 0 ? 'interference' : 'clearance'}`;

interface Spread {
  mean: number;
  min: number;
  max: number;
}

function spreadOf(readings: readonly PlacedReading[]): Spread | null {
  if (readings.length === 0) return null;
  const values = readings.map(({ diameterMm }) => diameterMm);
  return {
    mean: values.reduce((sum, value) => sum + value, 0) / values.length,
    min: Math.min(...values),
    max: Math.max(...values),
  };
}

function limitsSentence(seat: SeatAssessment, mean: number): string {
  if (seat.seatLimitsMm === null) return 'No class is on record to compare it with.';
  const [least, most] = seat.seatLimitsMm;
  const range = `${seat.toleranceClass ?? 'The limits'} (${formatFixed(least, 3)} to ${formatFixed(most, 3)} mm)`;
  if (mean < least) return `It lies ${um((least - mean) * 1000)} below ${range}.`;
  if (mean > most) return `It lies ${um((mean - most) * 1000)} above ${range}.`;
  return `It lies within ${range}.`;
}

/** The fit with the ring: as measured, or over the ring's tolerance where it was not. */
function fitSentence(seat: SeatAssessment, seatMm: number, ring: Spread | null): string | null {
  if (seat.nominalMm === null) return null;
  const sign = seat.seat === 'shaft' ? 1 : -1;
  if (ring !== null) {
    return `Measured fit: ${fitText(sign * (seatMm - ring.mean) * 1000)}.`;
  }
  if (seat.ringLimitsUm === null) return null;
  const deviationUm = (seatMm - seat.nominalMm) * 1000;
  const ends = seat.ringLimitsUm.map((limit) => sign * (deviationUm - limit));
  const [low, high] = [Math.min(...ends), Math.max(...ends)];
  return `With a ring inside its tolerance that is ${fitText(low)} to ${fitText(high)}.`;
}

/**
 * What the readings typed so far say of a seat, at 20 °C; null while there is none of the seat
 * itself or one of them can't be right.
 */
export function readingsMeaning(
  seat: SeatAssessment,
  readings: readonly PlacedReading[],
): string | null {
  const doubtful = readings.some(
    ({ diameterMm }) => readingQuestion(diameterMm, seat.nominalMm) !== null,
  );
  if (doubtful) return null;
  const own = spreadOf(readings.filter(({ part }) => part === 'seat'));
  if (own === null) return null;
  const ring = spreadOf(readings.filter(({ part }) => part === 'ring'));
  const count = readings.filter(({ part }) => part === 'seat').length;
  const spread = count > 1 ? `, readings ${um((own.max - own.min) * 1000)} apart` : '';
  return [
    `Mean ${formatFixed(own.mean, 4)} mm of ${count}${spread}.`,
    limitsSentence(seat, own.mean),
    fitSentence(seat, own.mean, ring),
  ]
    .filter((sentence) => sentence !== null)
    .join(' ');
}
