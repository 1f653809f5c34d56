import { FitGauge } from '#src/charts/fit-gauge.tsx';
import { OrderStrip } from '#src/charts/order-strip.tsx';
import { Badge } from '#src/components/badge.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Button } from '#src/components/button.tsx';
import { Panel } from '#src/components/panel.tsx';
import { Term } from '#src/components/term.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { FindingStateMark, InspectionStateMark } from '#src/components/work-state-mark.tsx';
import { findingStates } from '#shared/contracts/finding.ts';
import { inspectionStates } from '#shared/contracts/inspection.ts';
import { verdicts } from '#shared/signal/screening-types.ts';
import { healthyMarks, looseMarks } from './sample-signals.ts';

export function MarksSection() {
  return (
    <div className="flex flex-col gap-4">
      <PageHeader
        title="Finding 41: P-2104 drive end"
        crumbs={[
          { label: 'Findings', to: '/findings' },
          { label: 'P-2104 Cooling-water pump', to: '/machines/4' },
          { label: 'Finding 41' },
        ]}
        state={<FindingStateMark state="inspecting" />}
        facts={[
          { label: 'Opened', value: '4 Mar 2026' },
          { label: 'Owner', value: 'Tomas Lind' },
          { label: 'Score', value: <span className="figures">0.86</span> },
        ]}
        actions={<Button variant="primary">Assign inspection</Button>}
      />
      <Panel title="States">
        <div className="flex flex-wrap gap-x-6 gap-y-2">
          {verdicts.map((verdict) => (
            <VerdictMark key={verdict} verdict={verdict} />
          ))}
        </div>
        <div className="mt-3 flex flex-wrap gap-x-6 gap-y-2">
          {findingStates.map((state) => (
            <FindingStateMark key={state} state={state} />
          ))}
        </div>
        <div className="mt-3 flex flex-wrap gap-x-6 gap-y-2">
          {inspectionStates.map((state) => (
            <InspectionStateMark key={state} state={state} />
          ))}
          <Badge>horizontal</Badge>
          <Term definition="A multiple of the shaft’s speed of rotation." source="ISO 13373-2">
            order
          </Term>
          <span>≤ ≥ → √ ⌀ Ω Δ π µm ± ° × ²</span>
        </div>
      </Panel>
      <Panel title="Order strip">
        <div className="flex flex-col gap-3">
          <OrderStrip marks={looseMarks} />
          <OrderStrip marks={healthyMarks} />
          <OrderStrip marks={[]} />
          <OrderStrip marks={looseMarks} size="large" />
          <OrderStrip marks={healthyMarks} size="large" />
        </div>
      </Panel>
      <Panel title="Shaft seat, worn">
        <FitGauge
          title="Shaft seat, drive end"
          data={{
            seat: 'shaft',
            seatLimitsUm: [2, 15],
            ringLimitsUm: [-15, 0],
            seatClass: 'k5',
            measuredUm: { value: -14, uncertainty: 2 },
            runningUm: { min: -26, mean: -22, max: -18 },
          }}
        />
      </Panel>
      <Panel title="Housing seat by the drawing">
        <FitGauge
          title="Housing seat, drive end"
          data={{
            seat: 'housing',
            seatLimitsUm: [0, 40],
            ringLimitsUm: [-18, 0],
            seatClass: 'H7',
            measuredUm: { value: -22.5, uncertainty: null },
            runningUm: { min: -49, mean: -20, max: 9 },
          }}
        />
      </Panel>
      <Panel title="Seat without records">
        <FitGauge
          title="Shaft seat, free end"
          data={{ seat: 'shaft', seatLimitsUm: null, ringLimitsUm: null }}
        />
      </Panel>
    </div>
  );
}
