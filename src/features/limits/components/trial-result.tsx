import { Link } from 'react-router-dom';
import { shownMax, type ChangedFlag, type LimitsTrialResponse } from '#shared/contracts/limits.ts';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatFixed } from '#src/lib/numbers.ts';

const outcomeWords = {
  loose: 'Loose',
  'not loose': 'Not loose',
  'not clear': 'Not clear',
} as const;
const decisionWords = { accepted: 'Accepted', rejected: 'Rejected', retake: 'Retake' } as const;

/** The desk shows flags; what was none is found in its survey. */
const addressOf = (
  siteId: number,
  { decision, verdictGiven, surveyId, screeningId }: ChangedFlag,
) =>
  verdictGiven === 'none' && decision === null
    ? `/sites/${siteId}/surveys/${surveyId}`
    : `/sites/${siteId}/review?show=${decision === null ? 'open' : 'decided'}&screening=${screeningId}`;

const columns = (siteId: number): DataTableColumn<ChangedFlag>[] => [
  {
    id: 'point',
    header: 'Point',
    rowHeader: true,
    cell: (row) => (
      <Link className="ink-link" to={addressOf(siteId, row)}>
        <span className="figures">{row.pointLabel}</span> {row.positionName}
      </Link>
    ),
  },
  { id: 'day', header: 'Survey', cell: (row) => <Figure value={formatDay(row.surveyedOn)} /> },
  {
    id: 'score',
    header: 'Score',
    align: 'end',
    cell: (row) => <Figure value={formatFixed(row.score, 3)} />,
  },
  {
    id: 'now',
    header: 'By the present limits',
    cell: (row) => <VerdictMark verdict={row.verdictNow} />,
  },
  {
    id: 'then',
    header: 'By those tried',
    cell: (row) => <VerdictMark verdict={row.verdictThen} />,
  },
  {
    id: 'decision',
    header: 'Decision',
    cell: (row) => (row.decision === null ? <Figure value={null} /> : decisionWords[row.decision]),
  },
  {
    id: 'inspection',
    header: 'Next inspection there',
    cell: (row) =>
      row.inspection === null ? (
        <span className="text-ink-soft">none yet</span>
      ) : (
        <>
          {outcomeWords[row.inspection.outcome]}{' '}
          <span className="text-ink-soft">{formatDay(row.inspection.reportedOn)}</span>
        </>
      ),
  },
];

type Count = LimitsTrialResponse['coming'];

const flags = (count: number) => `${count} ${count === 1 ? 'flag' : 'flags'}`;

function inspected({ flagCount, looseCount, notLooseCount }: Count): string {
  if (flagCount === 0) return '';
  const rest = flagCount - looseCount - notLooseCount;
  return ` (inspected since: ${looseCount} loose, ${notLooseCount} not loose; ${rest} without an answer)`;
}

/** Which flags of the past surveys would come and go with the limits tried. */
export function TrialResult({ siteId, trial }: { siteId: number; trial: LimitsTrialResponse }) {
  const { now, tried, coming, going, changes } = trial;
  const listed = coming.flagCount + going.flagCount + trial.changingCount;
  const pair = (limits: typeof now) =>
    `${formatFixed(limits.suspectedScore, 2)} and ${formatFixed(limits.likelyScore, 2)}`;
  return (
    <div className="flex flex-col gap-3">
      <div className="max-w-prose text-sm">
        <p>
          Of {trial.screeningCount} judged screenings, {flags(trial.flagsNowCount)} by the limits in
          force ({pair(now)}) would be {trial.flagsThenCount} by those tried ({pair(tried)}).
        </p>
        <ul className="mt-1 list-disc pl-5">
          <li>
            {flags(going.flagCount)} would go{inspected(going)}.
          </li>
          <li>
            {flags(coming.flagCount)} would come{inspected(coming)}.
          </li>
          <li>{flags(trial.changingCount)} would change between suspected and likely.</li>
        </ul>
        {going.looseCount > 0 && (
          <p className="mt-1 font-medium">
            The limits tried would have missed {going.looseCount} that an inspection found loose.
          </p>
        )}
        {trial.otherMethodCount > 0 && (
          <p className="mt-1 text-ink-soft">
            {trial.otherMethodCount} of the screenings were made with another version of the method
            than the present one; their scores are not quite on the scale of the new ones.
          </p>
        )}
      </div>
      <DataTable
        label="Screenings whose verdict would change"
        columns={columns(siteId)}
        rows={changes}
        rowId={(row) => row.screeningId}
        empty={
          <p className="text-sm text-ink-soft">No verdict of the past surveys would change.</p>
        }
      />
      {listed > changes.length && (
        <p className="text-sm text-ink-soft">
          The {shownMax} with the highest scores of {listed} are listed.
        </p>
      )}
    </div>
  );
}
