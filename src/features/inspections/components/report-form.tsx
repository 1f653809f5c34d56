import { useState } from 'react';
import {
  inspectionOutcomes,
  inspectionReport,
  type InspectionOutcome,
  type InspectionReport,
  type InspectionResponse,
} from '#shared/contracts/inspection.ts';
import { Button } from '#src/components/button.tsx';
import { Checkbox } from '#src/components/checkbox.tsx';
import { Field } from '#src/components/field.tsx';
import { FormErrorSummary, type FormFault } from '#src/components/form-error-summary.tsx';
import { RadioGroup } from '#src/components/radio-group.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import type { ApiError } from '#src/lib/api-error.ts';
import { InPlaceReport } from './in-place-report.tsx';
import { outcomeWords } from './inspection-words.ts';
import {
  emptySeat,
  lengthUnits,
  reportOf,
  seatKey,
  stagesOf,
  type LengthUnit,
  type ReportDraft,
} from './report-draft.ts';
import { reportFaults } from './report-faults.ts';
import { SeatReport } from './seat-report.tsx';

const outcomeHints: Readonly<Record<InspectionOutcome, string>> = {
  loose: 'The fit, foot or pedestal has more play than it may have.',
  'not loose': 'Everything that was checked sits as it should.',
  'not clear': 'It could not be settled; say below what is missing.',
};

/** What the owner reports. Nothing typed is lost: the draft stays on the device until it is sent. */
export function ReportForm({
  inspection,
  draft,
  saving,
  failure,
  onChange,
  onReport,
}: {
  inspection: InspectionResponse;
  draft: ReportDraft;
  saving: boolean;
  failure: ApiError | null;
  onChange: (changes: Partial<ReportDraft>) => void;
  onReport: (report: InspectionReport) => void;
}) {
  const [isTried, setTried] = useState(false);
  const seats = inspection.seats.seats.filter(({ seat }) =>
    seat === 'shaft' ? inspection.checkShaftSeat : inspection.checkHousingSeat,
  );
  const report = reportOf(
    draft,
    seats.map(({ seat }) => seat),
  );
  const own = isTried ? reportFaults(report) : [];
  const error = (inputId: string) => own.find((fault) => fault.inputId === inputId)?.message;
  const faults: readonly FormFault[] = own.length > 0 ? own : serverFaults(failure);
  const send = () => {
    setTried(true);
    const parsed = inspectionReport.safeParse(report);
    if (parsed.success) onReport(parsed.data);
  };
  return (
    <form
      noValidate
      aria-label="Inspection report"
      onSubmit={(event) => {
        event.preventDefault();
        send();
      }}
      className="flex flex-col gap-5"
    >
      <FormErrorSummary faults={faults} title="Please mend this and report again." />
      {inspection.checkInPlace && (
        <InPlaceReport draft={draft} mayOpen={seats.length > 0} error={error} onChange={onChange} />
      )}
      {inspection.checkInPlace && (
        <Field
          id="inPlaceResult"
          label="What the checks in place come to"
          optional
          error={error('inPlaceResult')}
        >
          <Textarea
            value={draft.inPlaceResult}
            onChange={(event) => onChange({ inPlaceResult: event.target.value })}
          />
        </Field>
      )}
      <Checkbox
        label="The fit was put right"
        hint="The next survey will show whether it holds. Readings as left can then be entered too."
        checked={draft.repaired}
        onChange={(event) => onChange({ repaired: event.target.checked })}
      />
      {seats.length > 0 && !draft.causeInPlace && (
        <>
          <RadioGroup
            inline
            name="unit"
            legend="Readings are in"
            value={draft.unit}
            options={lengthUnits.map((unit) => ({
              value: unit,
              label: unit === 'mm' ? 'millimetres' : 'inches',
            }))}
            onChange={(event) => onChange({ unit: event.target.value as LengthUnit })}
          />
          {seats.map((assessment) =>
            stagesOf(draft).map((stage) => {
              const key = seatKey(assessment.seat, stage);
              return (
                <SeatReport
                  key={key}
                  assessment={assessment}
                  stage={stage}
                  unit={draft.unit}
                  told={draft.seats[key] ?? emptySeat}
                  conditionError={error(`condition-${assessment.seat}-${stage.replace(' ', '-')}`)}
                  onTell={(told) => onChange({ seats: { ...draft.seats, [key]: told } })}
                />
              );
            }),
          )}
        </>
      )}
      <Field
        id="workDone"
        label="Work done"
        hint="What was done and which parts were used, or that nothing was done"
        error={error('workDone')}
      >
        <Textarea
          rows={4}
          value={draft.workDone}
          onChange={(event) => onChange({ workDone: event.target.value })}
        />
      </Field>
      {/* The error summary leads here. */}
      <div id="outcome" tabIndex={-1}>
        <RadioGroup
          name="outcome"
          legend="Result"
          value={draft.outcome}
          error={error('outcome')}
          options={inspectionOutcomes.map((outcome) => ({
            value: outcome,
            label: outcomeWords[outcome],
            hint: outcomeHints[outcome],
          }))}
          onChange={(event) => onChange({ outcome: event.target.value as InspectionOutcome })}
        />
      </div>
      <div className="flex flex-col gap-2">
        <Button type="submit" variant="primary" size="large" busy={saving} busyLabel="Reporting…">
          Report
        </Button>
        <p className="text-xs text-ink-faint">
          What you type stays on this device until it has been reported.
        </p>
      </div>
    </form>
  );
}

function serverFaults(failure: ApiError | null): FormFault[] {
  if (failure === null) return [];
  if (failure.fields.length === 0) return [{ message: failure.message }];
  return failure.fields.map(({ message }) => ({ message }));
}
