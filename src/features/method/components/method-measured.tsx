import type { MethodFigures } from '#shared/signal/method-figures.ts';
import { Panel } from '#src/components/panel.tsx';
import { CalibrationChart } from './calibration-chart.tsx';
import { PrevalenceTable } from './prevalence-table.tsx';
import { ScoreTable } from './score-table.tsx';
import { ShareTable } from './share-table.tsx';
import { TargetTable } from './target-table.tsx';

/** The last evaluation, as `npm run evaluate` wrote it down. */
export function MethodMeasured({ figures }: { figures: MethodFigures }) {
  const real = figures.realRecordings.map(({ source, loose, flagged }) => ({
    ...flagged,
    name: `${loose ? 'loose' : 'not loose'}: ${source}`,
  }));
  return (
    <>
      <Panel title="Measured, beside what is wanted">
        <p className="mb-3 max-w-prose text-sm text-ink-soft">
          {figures.waveforms} records of {figures.machines} simulated machines that the fit of the
          score has not seen. Half of the machines are buried in noise and other machines’ lines on
          purpose; a sign counts as left where the looseness doubled two orders or one fraction,
          however small beside everything else.
        </p>
        <TargetTable figures={figures.figures} />
      </Panel>
      <Panel title="One point in a hundred">
        <p className="mb-3 max-w-prose text-sm text-ink-soft">
          On a route perhaps one point in a hundred is loose. A false alarm rate of 1 % then makes
          half of all flags wrong, whatever is found: limits may be raised where a false alarm is
          dear.
        </p>
        <PrevalenceTable {...figures} />
      </Panel>
      <Panel title="Does the score mean what it says?">
        <div className="grid gap-6 lg:grid-cols-[20rem_1fr]">
          <CalibrationChart bins={figures.calibration} />
          <ScoreTable {...figures} />
        </div>
      </Panel>
      <Panel title="What was found, and what was not">
        <div className="grid gap-6 xl:grid-cols-2">
          <ShareTable
            caption="By how many orders the looseness raised"
            hitWord="Found"
            rows={figures.recallBySigns}
          />
          <ShareTable
            caption="By kind and severity"
            hitWord="Found"
            rows={[...figures.recallByKind, figures.withoutSign]}
          />
          <ShareTable
            caption="False alarms, by what looks alike"
            hitWord="Flagged"
            rows={figures.falseAlarms}
          />
          <ShareTable
            caption="Retakes, by fault of the record"
            hitWord="Sent back"
            rows={figures.retakesByFault}
          />
          {real.length > 0 && (
            <ShareTable caption="Public recordings, by source" hitWord="Flagged" rows={real} />
          )}
        </div>
      </Panel>
    </>
  );
}
