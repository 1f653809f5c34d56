import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { DescriptionList, type Description } from '#src/components/description-list.tsx';
import { Figure } from '#src/components/figure.tsx';
import { Term } from '#src/components/term.tsx';
import { formatFixed } from '#src/lib/numbers.ts';

type BearingAssessment = Pick<SeatAssessmentsResponse, 'internalClearanceUm' | 'mounting'>;
type Clearance = NonNullable<SeatAssessmentsResponse['internalClearanceUm']>;

const spread = (range: Clearance['mounted']) => (
  <Figure
    value={range === null ? null : `${formatFixed(range.min, 0)} to ${formatFixed(range.max, 0)}`}
    unit="µm"
  />
);

function factsOf({ internalClearanceUm: clearance, mounting }: BearingAssessment) {
  const facts: Description[] = [];
  if (clearance !== null) {
    facts.push(
      { label: 'Internal clearance, new', value: spread(clearance.unmounted) },
      {
        label: (
          <Term definition="Radial internal clearance that the fits leave: interference widens the inner and narrows the outer ring. Negative means preload.">
            Left when mounted
          </Term>
        ),
        value: spread(clearance.mounted),
      },
      { label: 'Left when running', value: spread(clearance.running) },
    );
  }
  if (mounting !== null) {
    facts.push({
      label: 'Heat to mount',
      value: (
        <>
          <Figure value={formatFixed(mounting.heatToC, 0)} unit="°C" />, at most{' '}
          <Figure value={formatFixed(mounting.limitC, 0)} unit="°C" />
        </>
      ),
    });
  }
  return facts;
}

/** What the fits of both seats leave of the bearing's clearance, and how it is mounted. */
export function BearingFacts({ assessment }: { assessment: BearingAssessment }) {
  const facts = factsOf(assessment);
  if (facts.length === 0) return null;
  return (
    <div className="flex flex-col gap-2">
      <DescriptionList columns={2} items={facts} />
      {assessment.mounting !== null && (
        <p className="max-w-prose text-sm text-ink-soft">{assessment.mounting.advice}</p>
      )}
    </div>
  );
}
