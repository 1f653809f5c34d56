import type { ShareRow } from '#shared/signal/method-figures.ts';
import { formatPercent } from './format-figure.ts';

/** Cases by name, how many of them were flagged (found, sent back), and the share. */
export function ShareTable({
  caption,
  hitWord,
  rows,
}: {
  caption: string;
  hitWord: string;
  rows: readonly ShareRow[];
}) {
  return (
    <div className="overflow-x-auto">
      <table className="w-full max-w-2xl border-collapse text-sm">
        <caption className="mb-1 text-left font-semibold">{caption}</caption>
        <thead>
          <tr className="border-b border-ink text-left text-xs text-ink-soft">
            <th scope="col" className="py-1 pr-4 font-normal">
              What
            </th>
            <th scope="col" className="py-1 pr-4 text-right font-normal">
              Records
            </th>
            <th scope="col" className="py-1 pr-4 text-right font-normal">
              {hitWord}
            </th>
            <th scope="col" className="py-1 text-right font-normal">
              Share
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.name} className="border-b border-hairline">
              <th scope="row" className="py-1 pr-4 text-left font-normal">
                {row.name}
              </th>
              <td className="figures py-1 pr-4 text-right">{row.cases}</td>
              <td className="figures py-1 pr-4 text-right">{row.hits}</td>
              <td className="figures py-1 text-right whitespace-nowrap">
                {row.cases === 0 ? '–' : formatPercent((100 * row.hits) / row.cases)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
