import type {
  VerificationReadingResponse,
  VerificationResponse,
} from '#shared/contracts/verification.ts';
import type { VerificationReading } from '#shared/verification/verification-reading.ts';
import type { FindingVerification } from './finding-verification.ts';

const presentReading = (reading: VerificationReading): VerificationReadingResponse => ({
  surveyedOn: reading.surveyedOn,
  verdict: reading.verdict,
  score: reading.score,
  runLength: reading.runLength,
  runMmPerSRms: reading.runMmPerSRms,
  overallMmPerSRms: reading.overallMmPerSRms,
  speedRpm: reading.speedRpm,
});

export function presentVerification(verification: FindingVerification): VerificationResponse {
  const { repairedOn, surveyCount, comparison } = verification;
  return {
    repairedOn,
    surveyCount,
    comparison: comparison && {
      surveyedOn: comparison.surveyedOn,
      proposal: comparison.proposal,
      sentence: comparison.sentence,
      points: comparison.points.map(({ pointLabel, outcome, sentence, before, after }) => ({
        pointLabel,
        outcome,
        sentence,
        before: before && presentReading(before),
        after: after && presentReading(after),
      })),
      conditions: comparison.conditions,
    },
  };
}
