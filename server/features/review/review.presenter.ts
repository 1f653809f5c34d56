import type { Screening } from '#server/db/entities/screening.entity.ts';
import { pointLabel } from '#shared/contracts/measuring-point.ts';
import { orderCellsOf } from '#shared/contracts/order-cells.ts';
import type { ReviewQueueItem } from '#shared/contracts/review.ts';

/** A row of the queue; empty where the joins it needs were not loaded. */
export function presentQueueItem(screening: Screening): ReviewQueueItem[] {
  const { waveform } = screening;
  const point = waveform?.measuringPoint;
  const position = point?.bearingPosition;
  const machine = position?.machine;
  if (!waveform?.survey || !point || !position || !machine) return [];
  return [
    {
      screeningId: screening.id,
      waveformId: waveform.id,
      surveyId: waveform.surveyId,
      surveyedOn: waveform.survey.surveyedOn,
      pointLabel: pointLabel(machine.tag, position.code, point.direction),
      machineId: machine.id,
      machineTag: machine.tag,
      machineName: machine.name,
      positionName: position.name,
      direction: point.direction,
      verdict: screening.verdict,
      score: screening.score,
      kind: screening.result.kind,
      speedRpm: screening.speedHz === null ? null : screening.speedHz * 60,
      orders: orderCellsOf(screening.result.orders),
      decision: screening.decision,
      decidedByName: screening.decidedBy?.name ?? null,
    },
  ];
}
