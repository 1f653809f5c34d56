import type { CsvColumn } from '#server/csv/csv-table.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { Screening } from '#server/db/entities/screening.entity.ts';
import { pointLabel } from '#shared/contracts/measuring-point.ts';
import { workOrders } from './finding-columns.ts';

export interface ScreeningRow {
  screening: Screening;
  findingId: number | null;
  /** Of that finding. */
  inspections: readonly Inspection[];
}

const waveformOf = ({ screening }: ScreeningRow) => screening.waveform;
const pointOf = (row: ScreeningRow) => waveformOf(row)?.measuringPoint;
const positionOf = (row: ScreeningRow) => pointOf(row)?.bearingPosition;
const resultOf = ({ screening }: ScreeningRow) => screening.result;

function labelOf(row: ScreeningRow): string | null {
  const [point, position] = [pointOf(row), positionOf(row)];
  const tag = position?.machine?.tag;
  if (point === undefined || position === undefined || tag === undefined) return null;
  return pointLabel(tag, position.code, point.direction);
}

export const screeningColumns: readonly CsvColumn<ScreeningRow>[] = [
  { header: 'screening', value: ({ screening }) => screening.id },
  { header: 'survey date', value: (row) => waveformOf(row)?.survey?.surveyedOn ?? null },
  { header: 'route', value: (row) => waveformOf(row)?.survey?.route?.name ?? null },
  { header: 'point', value: labelOf },
  { header: 'machine tag', value: (row) => positionOf(row)?.machine?.tag ?? null },
  { header: 'machine name', value: (row) => positionOf(row)?.machine?.name ?? null },
  { header: 'position name', value: (row) => positionOf(row)?.name ?? null },
  { header: 'direction', value: (row) => pointOf(row)?.direction ?? null },
  { header: 'file', value: (row) => waveformOf(row)?.fileName ?? null },
  { header: 'taken at (UTC)', value: (row) => waveformOf(row)?.takenAt?.toISOString() ?? null },
  { header: 'run', value: ({ screening }) => screening.run },
  {
    header: 'newest run',
    value: (row) => waveformOf(row)?.screeningRun === row.screening.run,
  },
  { header: 'verdict', value: ({ screening }) => screening.verdict },
  { header: 'score (0 to 1)', value: ({ screening }) => screening.score },
  { header: 'kind', value: (row) => resultOf(row).kind },
  {
    header: 'speed (r/min)',
    value: ({ screening }) => (screening.speedHz === null ? null : screening.speedHz * 60),
  },
  { header: 'speed source', value: (row) => resultOf(row).speed.source },
  {
    header: 'overall velocity (mm/s rms)',
    value: ({ screening }) => screening.overallMmPerSRms,
  },
  {
    header: 'overall velocity from (Hz)',
    value: (row) => resultOf(row).overallVelocity?.fromHz ?? null,
  },
  {
    header: 'overall velocity to (Hz)',
    value: (row) => resultOf(row).overallVelocity?.toHz ?? null,
  },
  { header: 'orders in a row (count)', value: (row) => resultOf(row).harmonicRun.length },
  { header: 'half orders (count)', value: (row) => resultOf(row).harmonicRun.halfOrderCount },
  {
    header: 'slope of the run (dB/order)',
    value: (row) => resultOf(row).harmonicRun.slopeDbPerOrder,
  },
  { header: 'truncated side', value: (row) => resultOf(row).truncation.side },
  { header: 'revolutions (count)', value: (row) => resultOf(row).revolutions },
  {
    header: 'defects of the record',
    value: (row) =>
      resultOf(row)
        .quality.map(({ code }) => code)
        .join('; '),
  },
  { header: 'method version', value: ({ screening }) => screening.methodVersion },
  { header: 'limit suspected (score)', value: (row) => resultOf(row).limits.suspectedScore },
  { header: 'limit likely (score)', value: (row) => resultOf(row).limits.likelyScore },
  { header: 'screened at (UTC)', value: ({ screening }) => screening.screenedAt.toISOString() },
  { header: 'decision', value: ({ screening }) => screening.decision },
  { header: 'decision reason', value: ({ screening }) => screening.decisionReason },
  { header: 'decided by', value: ({ screening }) => screening.decidedBy?.name ?? null },
  {
    header: 'decided at (UTC)',
    value: ({ screening }) => screening.decidedAt?.toISOString() ?? null,
  },
  { header: 'finding', value: ({ findingId }) => findingId },
  { header: 'work orders', value: ({ inspections }) => workOrders(inspections) },
];
