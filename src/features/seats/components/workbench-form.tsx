import { Checkbox } from '#src/components/checkbox.tsx';
import { Field } from '#src/components/field.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Select } from '#src/components/select.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import { unitParameter, workbenchGroups, type WorkbenchField } from '../workbench-trial.ts';

interface WorkbenchFormProps {
  parameters: URLSearchParams;
  faults: Readonly<Record<string, string>>;
  onChange: (name: string, value: string) => void;
}

/** Everything that can be tried; what is typed stands in the address at once. */
export function WorkbenchForm({ parameters, faults, onChange }: WorkbenchFormProps) {
  const unit = parameters.get(unitParameter) === 'in' ? 'in' : 'mm';
  return (
    <form
      aria-label="What is tried"
      className="flex flex-col gap-4"
      onSubmit={(event) => event.preventDefault()}
    >
      {workbenchGroups.map((group) => (
        <fieldset key={group.title} className="border border-hairline bg-sheet px-4 pt-2 pb-4">
          <legend className="px-1 font-semibold">{group.title}</legend>
          <div className="grid items-start gap-x-4 gap-y-3 phone:grid-cols-2">
            {group.title === 'Seats' && (
              <Field label="Measured in" className="phone:col-span-2">
                <Select
                  value={unit}
                  options={[
                    { value: 'mm', label: 'Millimetres' },
                    { value: 'in', label: 'Inches' },
                  ]}
                  onChange={(event) => onChange(unitParameter, event.target.value)}
                />
              </Field>
            )}
            {group.fields.map((field) => (
              <WorkbenchInput
                key={field.name}
                field={field}
                typed={parameters.get(field.name) ?? ''}
                fault={faults[field.name]}
                diameterUnit={unit}
                onChange={(value) => onChange(field.name, value)}
              />
            ))}
          </div>
        </fieldset>
      ))}
    </form>
  );
}

function WorkbenchInput({
  field,
  typed,
  fault,
  diameterUnit,
  onChange,
}: {
  field: WorkbenchField;
  typed: string;
  fault: string | undefined;
  diameterUnit: string;
  onChange: (value: string) => void;
}) {
  const { kind } = field;
  if (kind === 'flag') {
    return (
      <Checkbox
        className="self-end phone:col-span-2"
        label={field.label}
        checked={typed === '1'}
        onChange={(event) => onChange(event.target.checked ? '1' : '')}
      />
    );
  }
  return (
    <Field optional label={field.label} hint={field.hint} error={fault}>
      {typeof kind === 'object' ? (
        <Select
          placeholder="not said"
          value={kind.choices.includes(typed) ? typed : ''}
          options={kind.choices.map((value) => ({ value, label: value }))}
          onChange={(event) => onChange(event.target.value)}
        />
      ) : kind === 'text' ? (
        <TextInput
          value={typed}
          autoComplete="off"
          spellCheck={false}
          onChange={(event) => onChange(event.target.value)}
        />
      ) : (
        <NumberInput
          value={typed}
          unit={kind === 'diameter' ? diameterUnit : (field.unit ?? '')}
          onChange={(event) => onChange(event.target.value)}
        />
      )}
    </Field>
  );
}
