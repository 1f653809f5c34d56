import type { OutcomesResponse, OutcomeStep } from '#shared/contracts/outcomes.ts';
import { Figure } from '#src/components/figure.tsx';
import { formatFixed } from '#src/lib/numbers.ts';

const stepWords: Readonly<Record<OutcomeStep, string>> = {
  'survey to inspection': 'From the survey to the report of the inspection',
  'inspection to closing': 'From the report to the closing of the finding',
  'survey to closing': 'From the survey to the closing of the finding',
};

/** How long findings took, as medians with the findings they stand on. */
export function OutcomeTimes({ times }: { times: OutcomesResponse['times'] }) {
  return (
    <table className="w-full text-sm" aria-label="Time taken">
      <thead>
        <tr className="border-b border-ink text-left text-xs text-ink-soft">
          <th scope="col" className="py-1 pr-4 font-normal">
            Time
          </th>
          <th scope="col" className="py-1 pr-4 text-right font-normal">
            Median
          </th>
          <th scope="col" className="py-1 text-right font-normal">
            Findings
          </th>
        </tr>
      </thead>
      <tbody>
        {times.map(({ step, medianDays, findingCount }) => (
          <tr key={step} className="border-b border-hairline">
            <th scope="row" className="py-1 pr-4 text-left font-normal">
              {stepWords[step]}
            </th>
            <td className="py-1 pr-4 text-right">
              <Figure
                value={
                  medianDays === null
                    ? null
                    : formatFixed(medianDays, Number.isInteger(medianDays) ? 0 : 1)
                }
                unit="days"
              />
            </td>
            <td className="figures py-1 text-right">{findingCount}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
