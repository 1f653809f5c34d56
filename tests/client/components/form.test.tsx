import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { FormErrorSummary } from '#src/components/form-error-summary.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { RadioGroup } from '#src/components/radio-group.tsx';
import { Select } from '#src/components/select.tsx';

afterEach(cleanup);

function descriptionOf(element: HTMLElement): string {
  const ids = element.getAttribute('aria-describedby')?.split(' ') ?? [];
  return ids.map((id) => document.getElementById(id)?.textContent ?? `missing ${id}`).join(' | ');
}

describe('Field', () => {
  it('names its input and reads out hint, fault and unit with it', () => {
    render(
      <Field label="Shaft, measured" hint="At 20 °C" error="Enter a diameter.">
        <NumberInput unit="mm" />
      </Field>,
    );
    const input = screen.getByRole('textbox', { name: 'Shaft, measured' });
    expect(descriptionOf(input)).toBe('At 20 °C | !Enter a diameter. | mm');
    expect(input.getAttribute('aria-invalid')).toBe('true');
  });

  it('says which input may be left empty', () => {
    render(
      <Field label="Work order" optional>
        <Select options={[]} placeholder="None" />
      </Field>,
    );
    const input = screen.getByRole('combobox', { name: 'Work order (optional)' });
    expect(input.getAttribute('aria-required')).toBeNull();
  });
});

describe('NumberInput', () => {
  it('keeps a decimal comma as it was typed', async () => {
    render(
      <Field label="Bore">
        <NumberInput unit="mm" />
      </Field>,
    );
    const input = screen.getByRole<HTMLInputElement>('textbox', { name: 'Bore' });
    await userEvent.type(input, '59,985');
    expect(input.value).toBe('59,985');
  });
});

describe('RadioGroup', () => {
  it('is one group under its legend and tells the choice', async () => {
    const onChange = vi.fn();
    render(
      <RadioGroup
        legend="Seat"
        name="seat"
        value="shaft"
        onChange={(event) => onChange(event.target.value)}
        options={[
          { value: 'shaft', label: 'Shaft seat' },
          { value: 'housing', label: 'Housing seat' },
        ]}
      />,
    );
    screen.getByRole('group', { name: 'Seat' });
    expect(screen.getByRole<HTMLInputElement>('radio', { name: 'Shaft seat' }).checked).toBe(true);
    await userEvent.click(screen.getByRole('radio', { name: 'Housing seat' }));
    expect(onChange).toHaveBeenCalledWith('housing');
  });
});

describe('FormErrorSummary', () => {
  it('takes the focus when faults appear and leads to the input at fault', async () => {
    const faults = [{ inputId: 'tag', message: 'Tag: enter the machine’s tag.' }];
    const { rerender } = render(
      <>
        <FormErrorSummary faults={[]} />
        <input id="tag" aria-label="Tag" />
      </>,
    );
    expect(screen.queryByRole('alert')).toBeNull();
    rerender(
      <>
        <FormErrorSummary faults={faults} />
        <input id="tag" aria-label="Tag" />
      </>,
    );
    expect(document.activeElement).toBe(screen.getByRole('alert'));
    await userEvent.click(screen.getByRole('link', { name: 'Tag: enter the machine’s tag.' }));
    expect(document.activeElement).toBe(screen.getByRole('textbox', { name: 'Tag' }));
  });
});

describe('Button', () => {
  it('can’t be pressed a second time while its work is under way', async () => {
    const onClick = vi.fn();
    render(
      <form onSubmit={onClick}>
        <Button type="submit" busy busyLabel="Saving…" onClick={onClick}>
          Save
        </Button>
      </form>,
    );
    await userEvent.click(screen.getByRole('button', { name: 'Saving…' }));
    expect(onClick).not.toHaveBeenCalled();
  });
});
