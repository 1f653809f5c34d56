import { useMemo, useState } from 'react';
import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import { Button } from '#src/components/button.tsx';
import { FieldError } from '#src/components/field.tsx';
import { IconButton } from '#src/components/icon-button.tsx';
import { SearchInput } from '#src/components/search-input.tsx';

/** Moves the entry at `index` by `step` places; the ends stay where they are. */
export function moved<T>(list: readonly T[], index: number, step: -1 | 1): T[] {
  const target = index + step;
  const copy = [...list];
  const one = copy[index];
  const other = copy[target];
  if (one === undefined || other === undefined) return copy;
  copy[index] = other;
  copy[target] = one;
  return copy;
}

/** Chooses points from the register and puts them in order, by buttons that a keyboard reaches. */
export function PointPicker({
  id,
  choices,
  chosen,
  error,
  onChange,
}: {
  id: string;
  choices: readonly PointChoice[];
  chosen: readonly number[];
  error: string | undefined;
  onChange: (pointIds: number[]) => void;
}) {
  const [search, setSearch] = useState('');
  const byId = useMemo(() => new Map(choices.map((point) => [point.id, point])), [choices]);
  const taken = new Set(chosen);
  const words = search.toLowerCase();
  const free = choices.filter(
    (point) =>
      !taken.has(point.id) &&
      `${point.label} ${point.machineName} ${point.positionName}`.toLowerCase().includes(words),
  );
  return (
    <div id={id} tabIndex={-1} className="grid gap-6 lg:grid-cols-2">
      <section aria-label="Points on the route">
        {error && <FieldError id={`${id}-error`}>{error}</FieldError>}
        {chosen.length === 0 ? (
          <p className="text-sm text-ink-soft">No point yet: add the points from the register.</p>
        ) : (
          <ol className="max-h-[32rem] overflow-y-auto border-t border-hairline">
            {chosen.map((pointId, index) => {
              const point = byId.get(pointId);
              const label = point?.label ?? `Point ${pointId}`;
              return (
                <li
                  key={pointId}
                  className="flex items-center gap-3 border-b border-hairline py-1 text-sm"
                >
                  <span className="figures w-8 text-right text-ink-faint">{index + 1}</span>
                  <span className="grow">
                    <span className="figures">{label}</span>{' '}
                    <span className="text-ink-soft">{point?.machineName}</span>
                  </span>
                  <IconButton
                    icon="ascending"
                    label={`Move ${label} up`}
                    disabled={index === 0}
                    onClick={() => onChange(moved(chosen, index, -1))}
                  />
                  <IconButton
                    icon="descending"
                    label={`Move ${label} down`}
                    disabled={index === chosen.length - 1}
                    onClick={() => onChange(moved(chosen, index, 1))}
                  />
                  <IconButton
                    icon="close"
                    label={`Take ${label} off the route`}
                    onClick={() => onChange(chosen.filter((one) => one !== pointId))}
                  />
                </li>
              );
            })}
          </ol>
        )}
      </section>
      <section aria-label="Points of the register" className="flex flex-col gap-2">
        <div className="flex gap-2">
          <SearchInput
            label="Search the register’s points"
            placeholder="Tag, name or position"
            className="grow"
            value={search}
            delayMs={0}
            onSearch={setSearch}
          />
          <Button
            disabled={free.length === 0}
            onClick={() => onChange([...chosen, ...free.map((point) => point.id)])}
          >
            Add all shown
          </Button>
        </div>
        <ul className="max-h-[32rem] overflow-y-auto border-t border-hairline">
          {free.map((point) => (
            <li
              key={point.id}
              className="flex items-center gap-3 border-b border-hairline py-1 text-sm"
            >
              <span className="grow">
                <span className="figures">{point.label}</span>{' '}
                <span className="text-ink-soft">
                  {point.machineName}, {point.positionName}
                </span>
              </span>
              <IconButton
                icon="plus"
                label={`Add ${point.label}`}
                onClick={() => onChange([...chosen, point.id])}
              />
            </li>
          ))}
        </ul>
        {free.length === 0 && (
          <p className="text-sm text-ink-soft">
            {choices.length === 0
              ? 'The register has no measuring points yet. Add them to the bearing positions of a machine.'
              : 'Every point that fits is on the route.'}
          </p>
        )}
      </section>
    </div>
  );
}
