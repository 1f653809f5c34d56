import type { MethodFigures } from '#shared/signal/method-figures.ts';
import { formatPercent } from './format-figure.ts';

const cell = 'figures py-1 pr-4 text-right';

/** Score by score: how many records of loose and of other machines, and the share that is loose. */
export function ScoreTable({ calibration, histogram }: MethodFigures) {
  return (
    <table className="w-full max-w-xl border-collapse text-sm">
      <caption className="mb-1 text-left font-semibold">Scores, and what they meant</caption>
      <thead>
        <tr className="border-b border-ink text-left text-xs text-ink-soft">
          {['Score', 'Loose, with a sign', 'Not loose', 'Mean score', 'Share that is loose'].map(
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
        {histogram.map((bin, index) => {
          const meant = calibration[index];
          return (
            <tr key={bin.from} className="border-b border-hairline">
              <th scope="row" className="figures py-1 pr-4 text-left font-normal">
                {bin.from.toFixed(1)}–{bin.to.toFixed(1)}
              </th>
              <td className={cell}>{bin.loose}</td>
              <td className={cell}>{bin.notLoose}</td>
              <td className={cell}>
                {meant && meant.cases > 0 ? meant.meanScore.toFixed(2) : '–'}
              </td>
              <td className={cell}>
                {meant && meant.cases > 0 ? formatPercent(100 * meant.looseShare) : '–'}
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
