import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { SurveyResponse } from '#shared/contracts/survey.ts';
import type { WaveformListItem } from '#shared/contracts/waveform.ts';
import { OrderStrip } from '#src/charts/order-strip.tsx';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { formatEntered, formatFixed } from '#src/lib/numbers.ts';
import { waveformFileAddress } from '../api/surveys.ts';
import { ScreeningState } from './screening-state.tsx';
import { surveyRows, type SurveyRow } from './survey-rows.ts';

const columns = (siteId: number, surveyId: number): DataTableColumn<SurveyRow>[] => [
  {
    id: 'place',
    header: 'Place',
    align: 'end',
    width: '4rem',
    cell: ({ place }) => <Figure value={place === null ? null : String(place)} />,
  },
  {
    id: 'point',
    header: 'Measuring point',
    rowHeader: true,
    cell: ({ pointLabel, point }) => (
      <>
        <span className="figures">{pointLabel}</span>
        <span className="block text-xs font-normal text-ink-soft">
          {point === null ? 'Not a point of this route' : point.machineName}
        </span>
      </>
    ),
  },
  {
    id: 'verdict',
    header: 'Verdict',
    cell: ({ waveform, pointLabel }) =>
      waveform === null ? (
        <span className="text-sm text-ink-soft">No waveform</span>
      ) : (
        <ScreeningState siteId={siteId} waveform={waveform} pointLabel={pointLabel} />
      ),
  },
  {
    id: 'strip',
    header: 'Orders ⅓ to 20',
    cell: ({ waveform }) =>
      waveform !== null && waveform.screeningId !== null && <OrderStrip marks={waveform.orders} />,
  },
  {
    id: 'score',
    header: 'Score',
    align: 'end',
    cell: ({ waveform }) =>
      waveform && (
        <Figure value={waveform.score === null ? null : formatFixed(waveform.score, 2)} />
      ),
  },
  {
    id: 'speed',
    header: 'Speed',
    align: 'end',
    cell: ({ waveform }) => waveform && <Speed waveform={waveform} />,
  },
  {
    id: 'file',
    header: 'File',
    cell: ({ waveform }) => waveform && <FileCell siteId={siteId} waveform={waveform} />,
  },
  {
    id: 'review',
    header: 'Review',
    cell: ({ waveform, pointLabel }) =>
      waveform !== null &&
      waveform.screeningId !== null &&
      waveform.verdict !== 'none' && (
        <Link
          className="ink-link"
          aria-label={`Review ${pointLabel}`}
          to={reviewAddress(siteId, surveyId, waveform)}
        >
          {waveform.decision === null ? 'Review' : decisionWords[waveform.decision]}
        </Link>
      ),
  },
];

const decisionWords: Readonly<Record<string, string>> = {
  accepted: 'Accepted',
  rejected: 'Rejected',
  retake: 'Retake asked for',
};

function reviewAddress(siteId: number, surveyId: number, waveform: WaveformListItem): string {
  const show = waveform.decision === null ? '' : '&show=decided';
  return `/sites/${siteId}/review?surveyId=${surveyId}${show}&screening=${waveform.screeningId}`;
}

/** The points of the route in walking order, with what was recorded and what it shows. */
export function SurveyTable({ siteId, survey }: { siteId: number; survey: SurveyResponse }) {
  const rows = useMemo(() => surveyRows(survey), [survey]);
  const all = useMemo(() => columns(siteId, survey.id), [siteId, survey.id]);
  return (
    <DataTable
      label="Points and waveforms"
      columns={all}
      rows={rows}
      rowId={(row) => row.key}
      empty={<p className="text-sm text-ink-soft">The route of this survey has no points.</p>}
    />
  );
}

function Speed({ waveform }: { waveform: WaveformListItem }) {
  const { speedRpm, toldSpeedRpm } = waveform;
  if (speedRpm !== null) return <Figure value={formatFixed(speedRpm, 1)} unit="r/min" />;
  return (
    <>
      <Figure value={toldSpeedRpm === null ? null : formatEntered(toldSpeedRpm)} unit="r/min" />
      {toldSpeedRpm !== null && <span className="block text-xs text-ink-faint">as told</span>}
    </>
  );
}

function FileCell({ siteId, waveform }: { siteId: number; waveform: WaveformListItem }) {
  const { fileName, channelIndex, unit, sampleRateHz, durationS, gapCount } = waveform;
  return (
    <>
      <a
        className="ink-link figures text-sm break-all"
        href={waveformFileAddress(siteId, waveform.id)}
        download={fileName}
      >
        {fileName}
      </a>
      <span className="figures block text-xs text-ink-soft">
        {channelIndex > 0 && `channel ${channelIndex + 1}; `}
        {unit}; {formatEntered(sampleRateHz)} Hz; {formatEntered(Number(durationS.toPrecision(3)))}{' '}
        s{gapCount > 0 && `; ${gapCount} ${gapCount === 1 ? 'gap' : 'gaps'}`}
      </span>
    </>
  );
}
