import type { SeatHistoryResponse } from '#shared/contracts/seat-history.ts';
import { DescriptionList } from '#src/components/description-list.tsx';
import { Figure } from '#src/components/figure.tsx';
import { formatEntered } from '#src/lib/numbers.ts';

/** Where and how to measure a seat. */
export function MeasuringPlanView({ plan }: { plan: NonNullable<SeatHistoryResponse['plan']> }) {
  return (
    <div className="flex flex-col gap-3 text-sm">
      <DescriptionList
        items={[
          {
            label: 'Planes',
            value:
              plan.planesMm === null ? (
                'at a quarter of the width from either end'
              ) : (
                <>
                  <Figure value={plan.planesMm.map(formatEntered).join(' and ')} unit="mm" /> from
                  the open end
                </>
              ),
          },
          {
            label: 'Directions',
            value: <Figure value={plan.directionsDeg.map((degrees) => `${degrees}°`).join(', ')} />,
          },
          { label: 'Instrument', value: plan.instrument },
        ]}
      />
      <ol className="flex list-decimal flex-col gap-1 pl-5">
        {plan.steps.map((step) => (
          <li key={step}>{step}</li>
        ))}
      </ol>
    </div>
  );
}
