import type { MethodFigures } from '#shared/signal/method-figures.ts';
import { formatPercent } from './format-figure.ts';

const looseShare = 0.01;

/** What a flag is worth where one point in a hundred is loose, by the limit of the score. */
export function PrevalenceTable({ operatingPoints }: MethodFigures) {
  return (
    <table className="w-full max-w-xl border-collapse text-sm">
      <caption className="mb-1 text-left font-semibold">
        What a flag is worth where 1 % of the points are loose
      </caption>
      <thead>
        <tr className="border-b border-ink text-left text-xs text-ink-soft">
          {['Flagged from score', 'Looseness found', 'False alarms', 'Flags that are right'].map(
            (words, index) => (
              <th
                key={words}
                scope="col"
                className={`py-1 pr-4 font-normal ${index > 0 ? 'text-right' : ''}`}
              >
                {words}
              </th>
            ),
          )}
        </tr>
      </thead>
      <tbody>
        {operatingPoints.map(({ limit, found, falseAlarms }) => {
          const recall = found.hits / Math.max(1, found.cases);
          const alarms = falseAlarms.hits / Math.max(1, falseAlarms.cases);
          const right = looseShare * recall;
          const flags = right + (1 - looseShare) * alarms;
          return (
            <tr key={limit} className="border-b border-hairline">
              <th scope="row" className="figures py-1 pr-4 text-left font-normal">
                {limit.toFixed(2)}
              </th>
              <td className="figures py-1 pr-4 text-right">{formatPercent(100 * recall)}</td>
              <td className="figures py-1 pr-4 text-right">{formatPercent(100 * alarms)}</td>
              <td className="figures py-1 pr-4 text-right">
                {falseAlarms.hits === 0
                  ? 'too few false ones to say'
                  : formatPercent((100 * right) / flags)}
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
