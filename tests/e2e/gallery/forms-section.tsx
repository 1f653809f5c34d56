import { useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Checkbox } from '#src/components/checkbox.tsx';
import { DateInput } from '#src/components/date-input.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field } from '#src/components/field.tsx';
import { FileDrop } from '#src/components/file-drop.tsx';
import { FormErrorSummary } from '#src/components/form-error-summary.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Panel } from '#src/components/panel.tsx';
import { RadioGroup } from '#src/components/radio-group.tsx';
import { Select } from '#src/components/select.tsx';
import { Tabs } from '#src/components/tabs.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import { Textarea } from '#src/components/textarea.tsx';

export function FormsSection() {
  const [open, setOpen] = useState(false);
  const [files, setFiles] = useState<string[]>([]);
  return (
    <div className="flex flex-col gap-4">
      <Panel title="Fit record">
        <form className="grid max-w-3xl gap-4 phone:grid-cols-2">
          <div className="phone:col-span-2">
            <FormErrorSummary
              faults={[
                {
                  inputId: 'shaft-measured',
                  message: 'Shaft: enter a diameter between 1 and 3000 mm.',
                },
              ]}
            />
          </div>
          <Field label="Machine tag" hint="As on the nameplate of the base">
            <TextInput defaultValue="P-2104" />
          </Field>
          <Field label="Mounting">
            <Select placeholder="Choose" options={[{ value: 'rigid', label: 'Rigid' }]} />
          </Field>
          <Field
            label="Shaft, measured"
            id="shaft-measured"
            hint="At 20 °C, mean of the readings"
            error="Enter a diameter between 1 and 3000 mm."
          >
            <NumberInput unit="mm" defaultValue="6000" />
          </Field>
          <Field label="Nominal speed" optional>
            <NumberInput unit="r/min" whole defaultValue="1486" />
          </Field>
          <Field label="Measured on">
            <DateInput defaultValue="2026-03-04" />
          </Field>
          <Field label="Remarks" optional>
            <Textarea placeholder="What was found" />
          </Field>
          <RadioGroup
            legend="Seat"
            name="seat"
            defaultValue="shaft"
            inline
            options={[
              { value: 'shaft', label: 'Shaft seat' },
              { value: 'housing', label: 'Housing seat' },
            ]}
          />
          <Checkbox label="Opened and measured" hint="Leave off where it was only looked at." />
          <div className="flex flex-wrap gap-2 phone:col-span-2">
            <Button variant="primary">Save the record</Button>
            <Button busy busyLabel="Saving…">
              Save
            </Button>
            <Button variant="quiet" onClick={() => setOpen(true)}>
              Reject with a reason
            </Button>
            <Button disabled>Not yet</Button>
            <Button size="large" icon="upload">
              Photograph
            </Button>
            <Button size="small">Small</Button>
          </div>
        </form>
      </Panel>
      <Tabs
        label="Views"
        items={[
          { value: 'a', label: 'Positions', content: 'Three bearing positions.' },
          { value: 'b', label: 'Points', content: 'Nine measuring points.' },
        ]}
      />
      <FileDrop
        label="Waveform files"
        hint="CSV files up to 256 MB each, 5000 in one survey."
        endings={['.csv']}
        onFiles={(taken) => setFiles(taken.map((file) => file.name))}
      />
      <p>{files.join(', ')}</p>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title="Reject this flag"
        description="The reason is kept with the screening."
        actions={
          <>
            <Button variant="primary">Reject</Button>
            <Button variant="quiet" onClick={() => setOpen(false)}>
              Cancel
            </Button>
          </>
        }
      >
        <Field label="Reason">
          <Textarea />
        </Field>
      </Dialog>
    </div>
  );
}
