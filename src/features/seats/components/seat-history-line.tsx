import { Link } from 'react-router-dom';
import type { SeatHistoryEntry, SeatHistoryResponse } from '#shared/contracts/seat-history.ts';
import { Timeline } from '#src/components/timeline.tsx';
import { FindingStateMark, InspectionStateMark } from '#src/components/work-state-mark.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { SeatRecordFacts } from './seat-record-facts.tsx';
import { outcomeWords, sourceWords } from './seat-words.ts';

type Entry<Kind extends SeatHistoryEntry['kind']> = Extract<SeatHistoryEntry, { kind: Kind }>;

/** What was recorded of a seat, found at its position and done about it; newest first. */
export function SeatHistoryLine({
  siteId,
  history,
}: {
  siteId: number;
  history: SeatHistoryResponse;
}) {
  return (
    <Timeline
      label={`History of the ${history.seat} seat`}
      entries={history.entries.map((entry) => ({
        id: idOf(entry),
        at: { iso: entry.on, text: formatDay(entry.on) },
        title: <Title siteId={siteId} entry={entry} />,
        children: <Details entry={entry} />,
      }))}
    />
  );
}

function idOf(entry: SeatHistoryEntry): string {
  switch (entry.kind) {
    case 'record':
      return `record ${entry.record.id}`;
    case 'finding':
      return `finding ${entry.findingId}`;
    case 'inspection':
      return `inspection ${entry.inspectionId}`;
  }
}

function Title({ siteId, entry }: { siteId: number; entry: SeatHistoryEntry }) {
  switch (entry.kind) {
    case 'record':
      return <RecordTitle entry={entry} />;
    case 'finding':
      return (
        <span className="flex flex-wrap items-center gap-x-3">
          <Link className="ink-link" to={`/sites/${siteId}/findings/${entry.findingId}`}>
            Finding <span className="figures">{entry.findingId}</span> opened
          </Link>
          <FindingStateMark state={entry.state} />
        </span>
      );
    case 'inspection':
      return (
        <span className="flex flex-wrap items-center gap-x-3">
          <Link className="ink-link" to={`/sites/${siteId}/inspections/${entry.inspectionId}`}>
            Inspection <span className="figures">{entry.inspectionId}</span>{' '}
            {entry.outcome === null ? 'assigned' : 'reported'}
          </Link>
          <InspectionStateMark state={entry.state} />
        </span>
      );
  }
}

function RecordTitle({ entry: { record, corrected } }: { entry: Entry<'record'> }) {
  const words = `${sourceWords[record.source]}${record.stage === null ? '' : `, ${record.stage}`}`;
  return corrected ? (
    <>
      <s>{words}</s> <span className="font-normal">corrected by a later record of that day</span>
    </>
  ) : (
    words
  );
}

function Details({ entry }: { entry: SeatHistoryEntry }) {
  switch (entry.kind) {
    case 'record':
      return <SeatRecordFacts entry={entry} />;
    case 'finding':
      return <p>Looseness was seen in the vibration of this position.</p>;
    case 'inspection':
      return (
        <>
          {!entry.checksThisSeat && <p>This seat was not on the task.</p>}
          {entry.outcome !== null && <p>{outcomeWords[entry.outcome]}</p>}
          {entry.workDone !== null && <p className="whitespace-pre-line">{entry.workDone}</p>}
        </>
      );
  }
}
