import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import { units, type Unit } from '#shared/quantities/quantity.ts';
import { Checkbox } from '#src/components/checkbox.tsx';
import { Select } from '#src/components/select.tsx';
import type { MatchedBy } from '../match-point.ts';
import type { EntryChannel } from '../upload-entry.ts';
import { PointInput } from './point-input.tsx';
import { SketchView } from './sketch-view.tsx';
import type { Sketch } from '../sketch.ts';

const unitOptions = units.map((unit) => ({ value: unit, label: unit }));

const matchWords: Readonly<Record<MatchedBy, string>> = {
  comment: 'by its comment lines',
  column: 'by the column’s name',
  'file name': 'by the file name',
  hand: 'by hand',
};

/** One channel of a file: its outline, the point it belongs to, and its unit where the file is silent. */
export function EntryChannelRow({
  channel,
  fileName,
  sketch,
  points,
  isOnRoute,
  onlyChannel,
  locked,
  onChange,
}: {
  channel: EntryChannel;
  fileName: string;
  sketch: Sketch | undefined;
  points: readonly PointChoice[];
  isOnRoute: (pointId: number) => boolean;
  onlyChannel: boolean;
  /** Under way or done: what was sent is shown and can't be changed. */
  locked: boolean;
  onChange: (changes: Partial<EntryChannel>) => void;
}) {
  const what = onlyChannel ? fileName : `${fileName}, ${channel.name}`;
  const point = points.find(({ id }) => id === channel.pointId);
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
      {!onlyChannel && (
        <div className="w-40">
          <Checkbox
            label={channel.name}
            checked={channel.taken}
            disabled={locked}
            onChange={(event) => onChange({ taken: event.target.checked })}
          />
        </div>
      )}
      {sketch && <SketchView sketch={sketch} />}
      {channel.taken &&
        (locked ? (
          <span className="figures text-sm">{point?.label}</span>
        ) : (
          <>
            <div className="w-64">
              <PointInput
                label={`Measuring point of ${what}`}
                points={points}
                pointId={channel.pointId}
                onChoose={(pointId) =>
                  onChange({ pointId, matchedBy: pointId === null ? null : 'hand' })
                }
              />
            </div>
            {channel.unitInFile === null && (
              <Select
                aria-label={`Unit of ${what}`}
                className="w-32"
                placeholder="Unit"
                options={unitOptions}
                value={channel.unit ?? ''}
                onChange={(event) =>
                  onChange({
                    unit: event.target.value === '' ? null : (event.target.value as Unit),
                  })
                }
              />
            )}
          </>
        ))}
      {channel.taken && point && (
        <span className="text-xs text-ink-soft">
          {point.machineName}, {point.positionName}
          {channel.matchedBy && `; matched ${matchWords[channel.matchedBy]}`}
          {!isOnRoute(point.id) && '; not a point of this route'}
        </span>
      )}
    </div>
  );
}
