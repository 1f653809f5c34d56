import type { Screening } from '#server/db/entities/screening.entity.ts';
import type { Finding } from '#server/db/entities/finding.entity.ts';
import type { FindingState } from '#shared/contracts/finding.ts';
import { pointLabel } from '#shared/contracts/measuring-point.ts';
import {
  verificationReading,
  type VerificationReading,
} from '#shared/verification/verification-reading.ts';
import { verifyRepair, type RepairVerification } from '#shared/verification/verify-repair.ts';

/** States in which the comparison has something to say. */
export const verifiedStates: readonly FindingState[] = ['repaired', 'verified'];

export interface FindingVerification {
  repairedOn: string;
  /** Null until a survey after the repair has screenings of the position. */
  comparison: RepairVerification | null;
  /** Surveys after the repair with screenings of the position. */
  surveyCount: number;
}

const dayOf = (moment: Date) => moment.toISOString().slice(0, 10);

/**
 * Whether a screening belongs after the repair. A survey of the very day counts where its record was
 * taken after the report, or, where nothing tells when, was at least uploaded after it.
 */
function isAfter({ waveform }: Screening, repairedAt: Date): boolean {
  const surveyedOn = waveform?.survey?.surveyedOn;
  if (!waveform || surveyedOn === undefined) return false;
  if (surveyedOn !== dayOf(repairedAt)) return surveyedOn > dayOf(repairedAt);
  return (waveform.takenAt ?? waveform.uploadedAt) > repairedAt;
}

/**
 * Sets the surveys after a repair against the screenings that raised the finding: the first survey
 * that can tell has the word; where none can, the newest says why.
 *
 * @param linked - screenings the finding carries, oldest survey first
 * @param later - screenings of the position from the day of the repair on, oldest survey first
 */
export function verifyFinding(
  finding: Finding,
  repairedAt: Date,
  linked: readonly Screening[],
  later: readonly Screening[],
): FindingVerification {
  const position = finding.bearingPosition;
  const reading = (screening: Screening): VerificationReading[] => {
    const { waveform } = screening;
    const direction = waveform?.measuringPoint?.direction;
    if (!position || !waveform?.survey || direction === undefined) return [];
    return [
      verificationReading(screening.result, {
        pointLabel: pointLabel(position.machine?.tag ?? '', position.code, direction),
        surveyedOn: waveform.survey.surveyedOn,
      }),
    ];
  };
  const before = newestOfPoint(
    linked.filter((screening) => !isAfter(screening, repairedAt)).flatMap(reading),
  );
  const surveys = new Map<string, VerificationReading[]>();
  for (const one of later.filter((screening) => isAfter(screening, repairedAt)).flatMap(reading)) {
    surveys.set(one.surveyedOn, [...(surveys.get(one.surveyedOn) ?? []), one]);
  }
  const comparisons =
    before.length === 0
      ? []
      : [...surveys].map(([surveyedOn, readings]) =>
          verifyRepair(before, newestOfPoint(readings), surveyedOn),
        );
  const telling = comparisons.find(({ proposal }) => proposal !== 'measure again');
  return {
    repairedOn: dayOf(repairedAt),
    comparison: telling ?? comparisons.at(-1) ?? null,
    surveyCount: surveys.size,
  };
}

/** One reading a point, the later one where there are several. */
function newestOfPoint(readings: readonly VerificationReading[]): VerificationReading[] {
  return [...new Map(readings.map((one) => [one.pointLabel, one])).values()];
}
