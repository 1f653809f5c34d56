import { CautionPanel } from '#src/components/caution-panel.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Panel } from '#src/components/panel.tsx';
import { trialBearing, trialSeat } from '../workbench-seat.ts';
import type { Trial } from '../workbench-trial.ts';
import { BearingFacts } from './bearing-facts.tsx';
import { SeatCard } from './seat-card.tsx';

/** What the trial comes to, worked out while one types. */
export function WorkbenchResults({
  trial,
  parameters,
}: {
  trial: Trial;
  parameters: URLSearchParams;
}) {
  const { assessment, nominalMm, faults, isEmpty } = trial;
  const has = (name: string) => (parameters.get(name) ?? '').trim() !== '';
  if (isEmpty) {
    return (
      <EmptyState title="Nothing is tried yet">
        Type a bearing’s designation, such as 6312, and the class of a seat. Nothing here is kept:
        the address holds all that is typed, and can be sent to a colleague.
      </EmptyState>
    );
  }
  if (assessment === null) {
    return (
      <Notice title="This can’t be worked out yet">
        {Object.values(faults)[0] ?? 'A size is missing.'}
      </Notice>
    );
  }
  const seat = (name: 'shaft' | 'housing', measured: readonly string[], classField: string) => {
    const fit = name === 'shaft' ? assessment.shaftSeat : assessment.housingSeat;
    if (fit === undefined) return null;
    return (
      <SeatCard
        tried
        seat={trialSeat(name, fit, {
          toleranceClass: parameters.get(classField)?.trim() || null,
          nominalMm: nominalMm[name],
          partsMeasured: measured.filter(has).length,
        })}
      />
    );
  };
  const bearing = trialBearing(assessment);
  return (
    <div className="flex flex-col gap-4">
      {seat('shaft', ['shaftMeasuredMm', 'boreMeasuredMm'], 'shaftClass')}
      {seat('housing', ['housingMeasuredMm', 'outsideMeasuredMm'], 'housingClass')}
      {(bearing.internalClearanceUm !== null || bearing.mounting !== null) && (
        <Panel title="The bearing">
          <BearingFacts assessment={bearing} />
        </Panel>
      )}
      <CautionPanel title="Before a fit is chosen or made" cautions={assessment.cautions} />
    </div>
  );
}
