import { useId, useState } from 'react';
import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import { TextInput } from '#src/components/text-input.tsx';

export const pointListId = 'upload-points';

/** The points that every PointInput of the page offers while one types. */
export function PointOptions({ points }: { points: readonly PointChoice[] }) {
  return (
    <datalist id={pointListId}>
      {points.map((point) => (
        <option key={point.id} value={point.label}>
          {`${point.machineName}, ${point.positionName}`}
        </option>
      ))}
    </datalist>
  );
}

/** Chooses a measuring point by typing part of its name. */
export function PointInput({
  label,
  points,
  pointId,
  onChoose,
}: {
  label: string;
  points: readonly PointChoice[];
  pointId: number | null;
  onChoose: (pointId: number | null) => void;
}) {
  const chosen = points.find(({ id }) => id === pointId)?.label ?? '';
  const [text, setText] = useState(chosen);
  const [shown, setShown] = useState(chosen);
  // Matched anew from outside: what was typed before no longer holds.
  if (chosen !== shown) {
    setShown(chosen);
    if (chosen !== '') setText(chosen);
  }
  const hintId = useId();
  const typed = (value: string) => {
    setText(value);
    const wanted = value.trim().toUpperCase();
    const found = points.find((point) => point.label.toUpperCase() === wanted);
    if ((found?.id ?? null) !== pointId) onChoose(found?.id ?? null);
  };
  const isUnknown = text.trim() !== '' && pointId === null;
  return (
    <span className="block">
      <TextInput
        aria-label={label}
        aria-invalid={isUnknown || undefined}
        aria-describedby={isUnknown ? hintId : undefined}
        list={pointListId}
        placeholder="Tag, position, direction"
        className="figures"
        value={text}
        onChange={(event) => typed(event.target.value)}
      />
      {isUnknown && (
        <span id={hintId} className="text-xs text-ink-soft">
          No measuring point of this name yet: go on typing, or choose from the list.
        </span>
      )}
    </span>
  );
}
