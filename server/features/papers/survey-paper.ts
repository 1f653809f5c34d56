import type { SurveyResponse } from '#shared/contracts/survey.ts';
import type { WaveformListItem } from '#shared/contracts/waveform.ts';
import { formatFixed } from '#shared/quantities/format-number.ts';
import { standingOrdersText } from './order-cells-view.ts';
import { scoreText, verdictWords } from './paper-words.ts';
import { titleBlock } from './sheet-blocks.ts';
import { ink, type Sheet } from './sheet.ts';
import { drawTable, type TableColumn } from './table-block.ts';

export interface SurveyPaper {
  survey: SurveyResponse;
  methodVersions: readonly string[];
}

const flagRank = { likely: 0, suspected: 1 } as const;

/** Points measured, missing and to be taken again, the flags worst first, and the whole table. */
export function drawSurvey(sheet: Sheet, { survey, methodVersions }: SurveyPaper): void {
  const { counts, waveforms } = survey;
  titleBlock(sheet, survey.routeName, `Survey of ${survey.surveyedOn}`, [
    { label: 'Points measured', value: `${counts.measuredPointCount} of ${counts.pointCount}` },
    { label: 'Points missing', value: String(survey.missingPoints.length) },
    { label: 'To be taken again', value: String(counts.retakeCount) },
    { label: 'Waveforms', value: String(counts.waveformCount) },
    { label: verdictWords.likely, value: String(counts.likelyCount) },
    { label: verdictWords.suspected, value: String(counts.suspectedCount) },
    { label: verdictWords.none, value: String(counts.noneCount) },
    { label: 'Flags not decided', value: String(counts.undecidedFlagCount) },
    { label: 'Made by', value: survey.createdByName },
    { label: 'Method version', value: methodVersions.join(', ') || 'nothing screened' },
    { label: 'Waiting for screening', value: String(counts.queuedCount + counts.runningCount) },
    { label: 'Screening failed', value: String(counts.failedCount) },
  ]);
  sheet.heading('Flags, worst first');
  const flags = waveforms
    .filter((one) => one.verdict === 'likely' || one.verdict === 'suspected')
    .sort((a, b) => rankOf(a) - rankOf(b) || (b.score ?? 0) - (a.score ?? 0));
  if (flags.length === 0) sheet.paragraph('No looseness signs were flagged in this survey.');
  else drawTable(sheet, flagColumns(survey), flags);
  listBlock(
    sheet,
    'To be taken again',
    waveforms.filter(({ verdict }) => verdict === 'retake').map(({ pointLabel }) => pointLabel),
  );
  listBlock(
    sheet,
    'Points without a waveform',
    survey.missingPoints.map(({ label }) => label),
  );
  listBlock(
    sheet,
    'Files that could not be read',
    survey.rejectedFiles.map(
      ({ fileName, errorLine, errorMessage }) =>
        `${fileName}${errorLine === null ? '' : `, line ${errorLine}`}: ${errorMessage}`,
    ),
    '\n',
  );
  sheet.heading('All waveforms');
  if (waveforms.length === 0) sheet.paragraph('No waveform has been uploaded.');
  else drawTable(sheet, allColumns, [...waveforms].sort(byPoint));
}

const rankOf = ({ verdict }: WaveformListItem) =>
  verdict === 'likely' || verdict === 'suspected' ? flagRank[verdict] : 2;
const byPoint = (a: WaveformListItem, b: WaveformListItem) =>
  a.pointLabel.localeCompare(b.pointLabel, 'en', { numeric: true });

function listBlock(sheet: Sheet, title: string, items: readonly string[], between = ', '): void {
  if (items.length === 0) return;
  sheet.heading(`${title} (${items.length})`);
  sheet.paragraph(items.join(between), { size: 8 });
}

const decisionWords: Readonly<Record<string, string>> = {
  accepted: 'Accepted',
  rejected: 'Rejected',
  retake: 'Retake asked',
};
const decisionText = ({ decision }: WaveformListItem) =>
  decision === null ? 'not decided' : (decisionWords[decision] ?? decision);

function verdictText({ verdict, screeningState, score }: WaveformListItem): string {
  if (verdict !== null) {
    return score === null ? verdictWords[verdict] : `${verdictWords[verdict]}, ${scoreText(score)}`;
  }
  return screeningState === 'failed' ? 'Screening failed' : 'Waiting for screening';
}

const speed: TableColumn<WaveformListItem> = {
  header: 'Speed, r/min',
  share: 8,
  align: 'right',
  value: ({ speedRpm }) => formatFixed(speedRpm, 0),
  style: () => ({ face: 'figures' }),
};

const flagColumns = ({ points }: SurveyResponse): readonly TableColumn<WaveformListItem>[] => {
  const machineOf = new Map(points.map((point) => [point.id, point]));
  return [
    {
      header: 'Point',
      share: 18,
      value: ({ pointLabel }) => pointLabel,
      style: () => ({ face: 'strong' }),
    },
    {
      header: 'Machine and bearing position',
      share: 30,
      value: ({ measuringPointId }) => {
        const point = machineOf.get(measuringPointId);
        return point === undefined
          ? 'not on the route'
          : `${point.machineName}, ${point.positionName}`;
      },
    },
    {
      header: 'Verdict',
      share: 16,
      value: ({ verdict }) => (verdict === null ? '' : verdictWords[verdict]),
      style: () => ({ color: ink.evidence }),
    },
    {
      header: 'Score, 0 to 1',
      share: 7,
      align: 'right',
      value: ({ score }) => formatFixed(score, 2),
      style: () => ({ face: 'figures' }),
    },
    speed,
    {
      header: 'Orders that stand out',
      share: 20,
      value: ({ orders }) => standingOrdersText(orders),
    },
    { header: 'Decision', share: 12, value: decisionText },
  ];
};

const allColumns: readonly TableColumn<WaveformListItem>[] = [
  { header: 'Point', share: 18, value: ({ pointLabel }) => pointLabel },
  {
    header: 'File',
    share: 26,
    value: ({ fileName }) => fileName,
    style: () => ({ color: ink.soft }),
  },
  { header: 'Verdict', share: 30, value: verdictText },
  speed,
  {
    header: 'Length, s',
    share: 7,
    align: 'right',
    value: ({ durationS }) => formatFixed(durationS, 1),
    style: () => ({ face: 'figures' }),
  },
  {
    header: 'Sampling rate, Hz',
    share: 10,
    align: 'right',
    value: ({ sampleRateHz }) => formatFixed(sampleRateHz, 0),
    style: () => ({ face: 'figures' }),
  },
  {
    header: 'Decision',
    share: 12,
    value: (one) => (one.verdict === null || one.verdict === 'none' ? '' : decisionText(one)),
  },
];
