import type { StateChangeResponse } from '#shared/contracts/finding.ts';
import { Timeline } from '#src/components/timeline.tsx';
import { formatInstant } from '#src/lib/dates.ts';

/** Who moved the finding and its inspections, when and why; newest first. */
export function FindingHistory({ history }: { history: readonly StateChangeResponse[] }) {
  return (
    <Timeline
      label="History of the finding"
      entries={[...history].reverse().map((change) => ({
        id: change.id,
        at: { iso: change.changedAt, text: formatInstant(change.changedAt) },
        title: titleOf(change),
        children: (
          <>
            <p>{change.changedByName}</p>
            {change.reason !== null && <p className="whitespace-pre-line">{change.reason}</p>}
          </>
        ),
      }))}
    />
  );
}

function titleOf({ subject, fromState, toState }: StateChangeResponse): string {
  const what = subject === 'finding' ? 'Finding' : 'Inspection';
  return fromState === null ? `${what} ${toState}` : `${what}: ${fromState} → ${toState}`;
}
