import type { ReactNode } from 'react';
import type { OutcomeGroupResponse } from '#shared/contracts/outcomes.ts';
import { formatFixed } from '#src/lib/numbers.ts';

export interface OutcomeRow extends OutcomeGroupResponse {
  id: string;
  name: ReactNode;
}

const columns: readonly { header: string; of: (row: OutcomeRow) => number }[] = [
  { header: 'Confirmed', of: (row) => row.confirmedCount },
  { header: 'Not found', of: (row) => row.notFoundCount },
  { header: 'Not clear', of: (row) => row.unsettledCount },
  { header: 'Dismissed', of: (row) => row.dismissedCount },
  { header: 'Waiting', of: (row) => row.waitingCount },
];

const percent = (share: number) => formatFixed(100 * share, 0);

/** Findings by what came of them, a row a group, with the share that proved right. */
export function OutcomeTable({ rows }: { rows: readonly OutcomeRow[] }) {
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Findings by outcome">
      <table className="w-full border-collapse text-sm" aria-label="Findings by outcome">
        <thead>
          <tr className="border-b border-ink text-left text-xs text-ink-soft">
            <th scope="col" className="py-1 pr-4 font-normal">
              Findings
            </th>
            {columns.map(({ header }) => (
              <th key={header} scope="col" className="py-1 pr-4 text-right font-normal">
                {header}
              </th>
            ))}
            <th scope="col" className="py-1 pr-4 text-right font-normal">
              Proved right
            </th>
            <th scope="col" className="py-1 text-right font-normal">
              95 % interval
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id} className="border-b border-hairline">
              <th scope="row" className="py-1 pr-4 text-left font-normal">
                {row.name}
              </th>
              {columns.map(({ header, of }) => (
                <td key={header} className="figures py-1 pr-4 text-right">
                  {of(row)}
                </td>
              ))}
              <td className="figures py-1 pr-4 text-right whitespace-nowrap">
                {row.predictiveValue === null ? '–' : `${percent(row.predictiveValue.share)} %`}
              </td>
              <td className="figures py-1 text-right whitespace-nowrap">
                {row.predictiveValue === null
                  ? '–'
                  : `${percent(row.predictiveValue.low)} to ${percent(row.predictiveValue.high)} %`}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
