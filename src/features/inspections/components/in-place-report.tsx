import {
  inPlaceCheckNames,
  inPlaceFindings,
  inPlaceReadingUnits,
  type InPlaceCheckName,
} from '#shared/contracts/in-place-check.ts';
import { Checkbox } from '#src/components/checkbox.tsx';
import { Field } from '#src/components/field.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Select } from '#src/components/select.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import { inPlaceMeaning } from './in-place-meaning.ts';
import { inPlaceFindingWords, inPlaceWords } from './inspection-words.ts';
import { emptyCheck, type InPlaceDraft, type ReportDraft } from './report-draft.ts';

/** The checks that cost no dismantling, done before anything is opened. */
export function InPlaceReport({
  draft,
  mayOpen,
  error,
  onChange,
}: {
  draft: ReportDraft;
  /** Whether seats are to be opened as well, unless the cause is found here. */
  mayOpen: boolean;
  error: (inputId: string) => string | undefined;
  onChange: (changes: Partial<ReportDraft>) => void;
}) {
  return (
    <fieldset className="flex flex-col gap-3 border border-hairline bg-sheet p-3">
      <legend className="px-1 text-base font-semibold">In place, before anything is opened</legend>
      <div className="grid gap-3 lg:grid-cols-2">
        {inPlaceCheckNames.map((check) => (
          <Check
            key={check}
            check={check}
            told={draft.inPlace[check] ?? emptyCheck}
            error={error(`in-place-${check.replaceAll(' ', '-')}`)}
            onTell={(told) => onChange({ inPlace: { ...draft.inPlace, [check]: told } })}
          />
        ))}
      </div>
      {mayOpen && (
        <Checkbox
          label="The cause was found here"
          hint="The seats stay closed and are not asked for. Leave it open where the checks lead on to the seats."
          checked={draft.causeInPlace}
          onChange={(event) => onChange({ causeInPlace: event.target.checked })}
        />
      )}
    </fieldset>
  );
}

function Check({
  check,
  told,
  error,
  onTell,
}: {
  check: InPlaceCheckName;
  told: InPlaceDraft;
  error: string | undefined;
  onTell: (told: InPlaceDraft) => void;
}) {
  const unit = inPlaceReadingUnits[check];
  const { name, reading, hint } = inPlaceWords[check];
  const meaning = inPlaceMeaning(check, told);
  const twoSided = check === 'movement across the joint';
  return (
    <section aria-label={name} className="flex flex-col gap-2 border-t border-hairline pt-2">
      <Field
        optional
        id={`in-place-${check.replaceAll(' ', '-')}`}
        label={name}
        hint={hint}
        error={error}
      >
        <Select
          placeholder="not told"
          value={told.finding}
          options={inPlaceFindings.map((value) => ({ value, label: inPlaceFindingWords[value] }))}
          onChange={(event) =>
            onTell({ ...told, finding: event.target.value as InPlaceDraft['finding'] })
          }
        />
      </Field>
      {unit !== null && (
        <div className="grid grid-cols-2 gap-2">
          <Field optional label={reading}>
            <NumberInput
              unit={unit}
              value={told.reading}
              onChange={(event) => onTell({ ...told, reading: event.target.value })}
            />
          </Field>
          {twoSided && (
            <Field optional label="Above the joint">
              <NumberInput
                unit={unit}
                value={told.readingAbove}
                onChange={(event) => onTell({ ...told, readingAbove: event.target.value })}
              />
            </Field>
          )}
        </div>
      )}
      <Field optional label={`What was seen: ${name.toLowerCase()}`}>
        <TextInput
          value={told.note}
          onChange={(event) => onTell({ ...told, note: event.target.value })}
        />
      </Field>
      <output aria-live="polite" className="block text-sm">
        {meaning !== null && <span className="block border-l-4 border-rule pl-2">{meaning}</span>}
      </output>
    </section>
  );
}
