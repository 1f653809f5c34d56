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

/** What was seen, for somebody who reads no spectra. */
export function inspectionSummary(
  positionName: string,
  clearest: Screening | null,
  screeningCount: number,
): string {
  if (clearest === null) return `The fit of ${positionName} is to be checked.`;
  const { result, waveform } = clearest;
  const on = waveform?.survey ? ` on ${waveform.survey.surveyedOn}` : '';
  const direction = waveform?.measuringPoint?.direction;
  const where = direction ? `, measured in the ${direction} direction` : '';
  const run = result.harmonicRun.length;
  const speed = clearest.speedHz === null ? '' : ` at ${Math.round(clearest.speedHz * 60)} r/min`;
  const seen =
    run >= 2
      ? `The vibration of ${positionName}${on}${where}, repeats in every turn of the shaft${speed} with knocks: ${run} multiples of the running speed in a row stand out, as when a part with play strikes its neighbour.`
      : `The vibration of ${positionName}${on}${where}, was judged: ${verdictWords[clearest.verdict]}.`;
  const verdict = `Verdict of the screening: ${verdictWords[clearest.verdict]}.`;
  const often = screeningCount > 1 ? ` The same was seen in ${screeningCount} measurements.` : '';
  const kind = result.kind === null ? '' : ` ${kindWords[result.kind]}`;
  return `${seen}${run >= 2 ? ` ${verdict}` : ''}${kind}${often}`;
}
