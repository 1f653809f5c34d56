import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Screening } from '#server/db/entities/screening.entity.ts';
import { pointLabel } from '#shared/contracts/measuring-point.ts';
import type { ScreeningResponse } from '#shared/contracts/screening.ts';
import type { WaveformListItem, WaveformResponse } from '#shared/contracts/waveform.ts';
import { orderCellsOf, type OrderCell } from '#shared/contracts/order-cells.ts';
import type { OrderLine } from '#shared/signal/screening-types.ts';
import type { WaveformRow } from './waveform.repository.ts';

/** The point and machine of a row; every query of this feature joins them. */
export function placeOf({ waveform }: WaveformRow) {
  const point = waveform.measuringPoint;
  const position = point?.bearingPosition;
  const machine = position?.machine;
  if (point === undefined || position === undefined || machine === undefined) {
    throw new Error('A waveform was read without its point, position and machine.');
  }
  return { point, position, machine };
}

/** The cells a small strip draws (a third, two thirds and the halves), as finely as it can show them. */
const stripCells = (orders: readonly OrderLine[]): OrderCell[] =>
  orderCellsOf(orders)
    .filter(({ order }) => order < 1 || Math.abs(order * 2 - Math.round(order * 2)) < 1e-3)
    .map((cell) => ({ ...cell, prominenceDb: Math.round(cell.prominenceDb * 10) / 10 }));

export function presentListItem(row: WaveformRow): WaveformListItem {
  const { waveform, screening } = row;
  const { point, position, machine } = placeOf(row);
  return {
    id: waveform.id,
    measuringPointId: waveform.measuringPointId,
    pointLabel: pointLabel(machine.tag, position.code, point.direction),
    fileName: waveform.fileName,
    fileBytes: waveform.fileBytes,
    contentHash: waveform.contentHash,
    channelIndex: waveform.channelIndex,
    quantity: waveform.quantity,
    unit: waveform.unit,
    sampleRateHz: waveform.sampleRateHz,
    sampleCount: waveform.sampleCount,
    gapCount: waveform.gapCount,
    durationS: waveform.sampleCount / waveform.sampleRateHz,
    toldSpeedRpm: waveform.toldSpeedRpm,
    takenAt: waveform.takenAt?.toISOString() ?? null,
    screeningState: waveform.screeningState,
    screeningFailure: waveform.screeningState === 'failed' ? waveform.screeningFailure : null,
    screeningId: screening?.id ?? null,
    verdict: screening?.verdict ?? null,
    score: screening?.score ?? null,
    decision: screening?.decision ?? null,
    speedRpm: screening?.speedHz == null ? null : screening.speedHz * 60,
    orders: screening === null ? [] : stripCells(screening.orders),
  };
}

export function presentWaveform(
  principal: SitePrincipal,
  row: WaveformRow,
  { previous, alongside }: Pick<WaveformResponse, 'previous' | 'alongside'>,
): WaveformResponse {
  const { waveform, screening } = row;
  const { point, position, machine } = placeOf(row);
  const mayWork = principal.role !== 'owner';
  return {
    ...presentListItem(row),
    surveyId: waveform.surveyId,
    surveyedOn: waveform.survey?.surveyedOn ?? '',
    routeName: waveform.survey?.route?.name ?? '',
    machineId: machine.id,
    machineTag: machine.tag,
    machineName: machine.name,
    positionCode: position.code,
    positionName: position.name,
    bearingPositionId: position.id,
    direction: point.direction,
    fullScale: waveform.fullScale,
    previous,
    alongside,
    can: {
      decide: mayWork && screening !== null && screening.decision === null,
      screenAgain:
        mayWork && (waveform.screeningState === 'done' || waveform.screeningState === 'failed'),
    },
  };
}

export const presentScreening = (
  screening: Screening,
  findingId: number | null,
): ScreeningResponse => ({
  id: screening.id,
  waveformId: screening.waveformId,
  run: screening.run,
  result: screening.result,
  screenedAt: screening.screenedAt.toISOString(),
  decision: screening.decision,
  decisionReason: screening.decisionReason,
  decidedByName: screening.decidedBy?.name ?? null,
  decidedAt: screening.decidedAt?.toISOString() ?? null,
  findingId,
});
