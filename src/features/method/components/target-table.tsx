import { meetsTarget, type Figure } from '#shared/signal/method-figures.ts';
import { formatFigure } from './format-figure.ts';

/** What was measured beside what is wanted; a figure that falls short says so in a word. */
export function TargetTable({ figures }: { figures: readonly Figure[] }) {
  return (
    <div className="overflow-x-auto">
      <table className="w-full border-collapse text-sm">
        <caption className="sr-only">Measured figures beside their targets</caption>
        <thead>
          <tr className="border-b border-ink text-left text-xs text-ink-soft">
            <th scope="col" className="py-1 pr-4 font-normal">
              Figure
            </th>
            <th scope="col" className="py-1 pr-4 text-right font-normal">
              Cases
            </th>
            <th scope="col" className="py-1 pr-4 text-right font-normal">
              Measured
            </th>
            <th scope="col" className="py-1 pr-4 text-right font-normal">
              Wanted
            </th>
            <th scope="col" className="py-1 font-normal">
              Standing
            </th>
          </tr>
        </thead>
        <tbody>
          {figures.map((figure) => (
            <tr key={figure.id} className="border-b border-hairline">
              <th scope="row" className="py-1 pr-4 text-left font-normal">
                {figure.name}
              </th>
              <td className="figures py-1 pr-4 text-right">{figure.cases}</td>
              <td className="figures py-1 pr-4 text-right whitespace-nowrap">
                {formatFigure(figure, figure.value)}
              </td>
              <td className="figures py-1 pr-4 text-right whitespace-nowrap text-ink-soft">
                {figure.target === null
                  ? '–'
                  : `${figure.target.bound} ${figure.target.value}${figure.unit === '%' ? ' %' : ''}`}
              </td>
              <td className="py-1 whitespace-nowrap">
                <Standing figure={figure} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Standing({ figure }: { figure: Figure }) {
  const met = meetsTarget(figure);
  if (met === null) return <span className="text-ink-faint">no target</span>;
  return met ? <span>met</span> : <strong className="font-semibold">falls short</strong>;
}
