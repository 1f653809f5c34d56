import { Link } from 'react-router-dom';
import type { InspectionListItem } from '#shared/contracts/inspection.ts';
import { InspectionStateMark } from '#src/components/work-state-mark.tsx';
import { formatDay } from '#src/lib/dates.ts';

/** The inspections of a finding, newest first. */
export function FindingInspections({
  siteId,
  inspections,
}: {
  siteId: number;
  inspections: readonly InspectionListItem[];
}) {
  if (inspections.length === 0) {
    return <p className="text-sm text-ink-soft">None has been assigned.</p>;
  }
  return (
    <ul className="flex flex-col">
      {inspections.map((inspection) => (
        <li
          key={inspection.id}
          className="flex flex-col gap-0.5 border-b border-hairline py-2 text-sm first:pt-0 last:border-b-0"
        >
          <div className="flex flex-wrap items-center justify-between gap-x-3">
            <Link className="ink-link" to={`/sites/${siteId}/inspections/${inspection.id}`}>
              Inspection <span className="figures">{inspection.id}</span>
            </Link>
            <InspectionStateMark state={inspection.state} />
          </div>
          <p className="text-ink-soft">
            {inspection.assigneeName}, due {formatDay(inspection.dueOn)}
            {inspection.overdue && <strong className="text-ink"> – overdue</strong>}
            {inspection.workOrderReference !== null && (
              <>
                , work order <span className="figures">{inspection.workOrderReference}</span>
              </>
            )}
          </p>
        </li>
      ))}
    </ul>
  );
}
