import {
  seatConditions,
  type SeatCondition,
  type SeatStage,
} from '#shared/contracts/fit-record.ts';
import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import { conditionWords } from '#shared/fits/condition-words.ts';
import { Field } from '#src/components/field.tsx';
import { Select } from '#src/components/select.tsx';
import { partWords, seatWords, stageWords } from './inspection-words.ts';
import { readingsMeaning } from './readings-meaning.ts';
import { readingsOf, type LengthUnit, type SeatDraft } from './report-draft.ts';
import { ReadingsGrid } from './readings-grid.tsx';

const conditionOptions = seatConditions.map((condition) => ({
  value: condition,
  label: condition.charAt(0).toUpperCase() + condition.slice(1),
}));

/** One seat at one stage: how it looks, what the micrometer reads, and what that means at once. */
export function SeatReport({
  assessment,
  stage,
  unit,
  told,
  conditionError,
  onTell,
}: {
  assessment: SeatAssessment;
  stage: SeatStage;
  unit: LengthUnit;
  told: SeatDraft;
  conditionError: string | undefined;
  onTell: (told: SeatDraft) => void;
}) {
  const { seat, nominalMm } = assessment;
  const title = `${seatWords[seat]}, ${stageWords[stage].toLowerCase()}`;
  const meaning = readingsMeaning(assessment, readingsOf(told, unit));
  const read = (key: string, typed: string) =>
    onTell({ ...told, readings: { ...told.readings, [key]: typed } });
  const grid = (part: 'seat' | 'ring') => (
    <ReadingsGrid
      seat={seat}
      part={part}
      unit={unit}
      nominalMm={nominalMm}
      readings={told.readings}
      onRead={read}
    />
  );
  return (
    <fieldset className="flex flex-col gap-3 border border-hairline bg-sheet p-3">
      <legend className="px-1 text-base font-semibold">{title}</legend>
      <Field
        id={`condition-${seat}-${stage.replace(' ', '-')}`}
        label="Condition"
        error={conditionError}
        {...(told.condition === '' ? {} : { hint: conditionWords[told.condition].meaning })}
      >
        <Select
          placeholder="Choose what it looks like"
          options={conditionOptions}
          value={told.condition}
          onChange={(event) =>
            onTell({ ...told, condition: event.target.value as SeatCondition | '' })
          }
        />
      </Field>
      {grid('seat')}
      <details>
        <summary className="cursor-pointer text-sm">{partWords[seat].ring} (optional)</summary>
        <div className="mt-2">{grid('ring')}</div>
      </details>
      <output aria-live="polite" className="block text-sm">
        {meaning !== null && <span className="block border-l-4 border-fit pl-2">{meaning}</span>}
      </output>
    </fieldset>
  );
}
