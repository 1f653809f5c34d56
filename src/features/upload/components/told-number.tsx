import { useState } from 'react';
import { NumberInput } from '#src/components/number-input.tsx';
import { formatEntered, parseDecimal } from '#src/lib/numbers.ts';

/** A figure the file doesn't say. Text that is no number above zero counts as not said. */
export function ToldNumber({
  label,
  unit,
  value,
  max,
  onChange,
}: {
  label: string;
  unit: string;
  value: number | null;
  max: number;
  onChange: (value: number | null) => void;
}) {
  const [text, setText] = useState(value === null ? '' : formatEntered(value));
  const [given, setGiven] = useState(value);
  // Lent by another file of the same shape.
  if (value !== given) {
    setGiven(value);
    if (value !== null && value !== read(text, max)) setText(formatEntered(value));
  }
  const isWrong = text.trim() !== '' && read(text, max) === null;
  return (
    <label className="flex flex-col gap-0.5 text-sm">
      <span className="text-xs text-ink-soft">{label}</span>
      <NumberInput
        unit={unit}
        className="w-44"
        value={text}
        aria-invalid={isWrong || undefined}
        onChange={(event) => {
          setText(event.target.value);
          const number = read(event.target.value, max);
          setGiven(number);
          onChange(number);
        }}
      />
      {isWrong && <span className="text-xs">A number from 1 to {max.toLocaleString('en')}.</span>}
    </label>
  );
}

function read(text: string, max: number): number | null {
  const number = parseDecimal(text);
  return number !== undefined && number >= 1 && number <= max ? number : null;
}
