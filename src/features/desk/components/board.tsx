import { Link } from 'react-router-dom';
import type { DeskColumn, DeskItem } from '#shared/contracts/desk.ts';
import { Button } from '#src/components/button.tsx';
import { Figure } from '#src/components/figure.tsx';
import { Menu } from '#src/components/menu.tsx';
import { inspectionStateWords, InspectionStateMark } from '#src/components/work-state-mark.tsx';
import { formatDay } from '#src/lib/dates.ts';

export type DeskAction = 'reassign' | 'due-date' | 'remind';

/** The inspections of the site, one column for each state. */
export function Board({
  siteId,
  columns,
  onAct,
}: {
  siteId: number;
  columns: readonly DeskColumn[];
  onAct: (action: DeskAction, item: DeskItem) => void;
}) {
  return (
    <div className="grid items-start gap-3 phone:grid-cols-2 lg:grid-cols-3 xl:grid-cols-5">
      {columns.map(({ state, total, items }) => (
        <section
          key={state}
          aria-label={`${inspectionStateWords[state]}, ${total}`}
          className="min-w-0 border border-hairline bg-sheet"
        >
          <header className="flex items-center justify-between border-b border-ink px-3 py-1.5 text-sm">
            <h2 className="text-sm">
              <InspectionStateMark state={state} />
            </h2>
            <span className="figures">{total}</span>
          </header>
          <ul>
            {items.map((item) => (
              <li key={item.id} className="border-b border-hairline px-3 py-2 last:border-b-0">
                <Card siteId={siteId} item={item} onAct={onAct} />
              </li>
            ))}
          </ul>
          {items.length === 0 && <p className="px-3 py-2 text-sm text-ink-faint">None</p>}
          {total > items.length && (
            <p className="border-t border-hairline px-3 py-2 text-sm">
              <Link
                className="ink-link"
                to={`/sites/${siteId}/inspections?state=${state}`}
              >{`All ${total}`}</Link>
            </p>
          )}
        </section>
      ))}
    </div>
  );
}

function Card({
  siteId,
  item,
  onAct,
}: {
  siteId: number;
  item: DeskItem;
  onAct: (action: DeskAction, item: DeskItem) => void;
}) {
  const isInWork = item.state === 'assigned' || item.state === 'accepted';
  return (
    <div className="flex flex-col gap-0.5 text-sm">
      <Link className="ink-link" to={`/sites/${siteId}/inspections/${item.id}`}>
        <span className="figures">{item.machineTag}</span> {item.positionName}
      </Link>
      <span className="text-ink-soft">{item.assigneeName}</span>
      <span>
        Due <Figure value={formatDay(item.dueOn)} />
        {item.overdue && <strong> overdue</strong>}
      </span>
      {item.workOrderReference !== null && (
        <span className="text-xs text-ink-faint">
          Work order <span className="figures">{item.workOrderReference}</span>
        </span>
      )}
      {isInWork && (
        <div className="mt-1">
          <Menu
            trigger={
              <Button
                size="small"
                icon="chevron-down"
                aria-label={`Change the inspection of ${item.machineTag} ${item.positionName}`}
              >
                Change
              </Button>
            }
            items={[
              { label: 'Remind now', onSelect: () => onAct('remind', item) },
              { label: 'Move the due date', onSelect: () => onAct('due-date', item) },
              { label: 'Hand to somebody else', onSelect: () => onAct('reassign', item) },
            ]}
          />
        </div>
      )}
    </div>
  );
}
