import type { Screening } from '#server/db/entities/screening.entity.ts';

const verdictWords = {
  none: 'no looseness signs',
  suspected: 'looseness suspected',
  likely: 'looseness likely',
  retake: 'a record that could not be judged',
} as const;

const kindWords = {
  seat: 'The signs point to a bearing ring that is loose on its shaft or in its housing.',
  pedestal: 'The signs point to a pedestal, foot or frame that lifts.',
  undetermined: 'The signs do not tell which joint is loose.',
} as const;

/** From how many multiples in a row the sentence speaks of a run. */
const runFrom = 3;

function seenSentence(positionName: string, { speedHz, result, waveform }: Screening): string {
  const on = waveform?.survey ? `On ${waveform.survey.surveyedOn} the` : 'The';
  const direction = waveform?.measuringPoint?.direction;
  const what = `${on} vibration of ${positionName}${direction ? ` (${direction})` : ''}`;
  const { length } = result.harmonicRun;
  if (length < runFrom) return `${what} was screened.`;
  const speed = speedHz === null ? '' : ` (${Math.round(speedHz * 60)} r/min)`;
  return `${what} showed ${length} multiples of the running speed${speed} in a row: a part with play knocks in every turn of the shaft.`;
}

/** What was seen, for somebody who reads no spectra. */
export function inspectionSummary(
  positionName: string,
  clearest: Screening | null,
  screeningCount: number,
): string {
  if (clearest === null) return `The fit of ${positionName} is to be checked.`;
  const { kind } = clearest.result;
  return [
    seenSentence(positionName, clearest),
    `Verdict of the screening: ${verdictWords[clearest.verdict]}.`,
    ...(kind === null ? [] : [kindWords[kind]]),
    ...(screeningCount > 1 ? [`Signs were seen in ${screeningCount} measurements.`] : []),
  ].join(' ');
}
