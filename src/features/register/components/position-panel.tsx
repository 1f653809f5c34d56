import { useState, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { BearingPositionResponse } from '#shared/contracts/bearing-position.ts';
import { seatNames } from '#shared/contracts/fit-record.ts';
import { directions, type Direction } from '#shared/contracts/measuring-point.ts';
import { Badge } from '#src/components/badge.tsx';
import { Button } from '#src/components/button.tsx';
import { DescriptionList } from '#src/components/description-list.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Figure } from '#src/components/figure.tsx';
import { Menu } from '#src/components/menu.tsx';
import { Panel } from '#src/components/panel.tsx';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { formatEntered } from '#src/lib/numbers.ts';
import { useAddFitRecord, useAddPoint, useUpdatePosition } from '../api/machines.ts';
import type { PreparedFitRecord } from './copy-fit-dialog.tsx';
import { FitRecordForm } from './fit-record-form.tsx';
import { FitRecordTable } from './fit-record-table.tsx';
import { capital } from './machine-words.ts';
import { type Shaft } from './machine-shafts.ts';
import { PositionForm } from './position-form.tsx';

const sizeOf = (position: BearingPositionResponse): string | null =>
  position.boreMm === null || position.outsideMm === null
    ? null
    : [position.boreMm, position.outsideMm, position.widthMm]
        .filter((value) => value !== null)
        .join(' × ');

const figure = (value: number | null, unit: string) => (
  <Figure value={value === null ? null : formatEntered(value)} unit={unit} />
);

function loadsInWords(position: BearingPositionResponse): string | null {
  const parts = [
    position.innerLoad && `inner ring ${position.innerLoad}`,
    position.outerLoad && `outer ring ${position.outerLoad}`,
    position.loadLevel && `${position.loadLevel} load`,
  ].filter(Boolean);
  return parts.length === 0 ? null : capital(parts.join(', '));
}

/** What the rings sit on and in. */
function partsInWords(position: BearingPositionResponse): string | null {
  const bore = position.shaftBoreMm === null ? '' : ` with a ${position.shaftBoreMm} mm bore`;
  const wall = position.housingWallMm === null ? '' : `, ${position.housingWallMm} mm wall`;
  const shaft =
    position.shaftMaterial === null && bore === ''
      ? null
      : `${position.shaftMaterial ?? ''} shaft${bore}`;
  const housing =
    position.housingMaterial === null && wall === '' && !position.splitHousing
      ? null
      : `${position.splitHousing ? 'split ' : ''}${position.housingMaterial ?? ''} housing${wall}`;
  const seat =
    position.shaftSeatForm === 'cylindrical'
      ? null
      : `ring on ${position.shaftSeatForm === 'adapter sleeve' ? 'an' : 'a'} ${position.shaftSeatForm} ${position.seatTaper ?? ''}`;
  const parts = [shaft, seat, housing].filter((part) => part !== null).map((part) => part.trim());
  return parts.length === 0 ? null : capital(parts.join(', '));
}

function ShaftSpeed({ ratio, shafts }: { ratio: number; shafts: readonly Shaft[] }) {
  const speedRpm = shafts.find((shaft) => shaft.ratio === ratio)?.speedRpm ?? null;
  if (ratio === 1) return figure(speedRpm, 'r/min');
  return (
    <>
      {figure(speedRpm === null ? null : Math.round(speedRpm * 10) / 10, 'r/min')}, ratio{' '}
      <Figure value={formatEntered(ratio)} />
    </>
  );
}

/** One bearing position: its bearing, points and fit records; `seats` shows what the records mean. */
export function PositionPanel({
  siteId,
  position,
  shafts,
  mayEdit,
  prepared,
  seats,
}: {
  siteId: number;
  position: BearingPositionResponse;
  /** Of the whole machine. */
  shafts: readonly Shaft[];
  mayEdit: boolean;
  /** Opens the fit record form at once, with these values. */
  prepared?: PreparedFitRecord['values'] | undefined;
  seats: ReactNode;
}) {
  const [open, setOpen] = useState<'position' | 'fit-record' | null>(
    prepared !== undefined && mayEdit ? 'fit-record' : null,
  );
  const notify = useToast();
  const update = useUpdatePosition(siteId, position.id);
  const addPoint = useAddPoint(siteId, position.id);
  const addRecord = useAddFitRecord(siteId, position.id);
  const close = () => setOpen(null);
  const missing = directions.filter(
    (direction) => !position.points.some((point) => point.direction === direction),
  );
  const add = (direction: Direction) =>
    addPoint.mutate(
      { direction },
      {
        onSuccess: () => notify({ text: `The ${direction} point is on record.` }),
        onError: (error) => notify({ text: toApiError(error).message, failed: true }),
      },
    );
  const {
    points: _points,
    fitRecords: _records,
    id: _id,
    machineId: _machine,
    ...editable
  } = position;
  return (
    <Panel
      title={
        <>
          <span className="figures">{position.code}</span> {position.name}
        </>
      }
      aside={
        mayEdit && (
          <div className="flex flex-wrap gap-2">
            <Button size="small" onClick={() => setOpen('position')}>
              Edit
            </Button>
            {missing.length > 0 && (
              <Menu
                align="end"
                trigger={
                  <Button size="small" icon="plus">
                    Measuring point
                  </Button>
                }
                items={missing.map((direction) => ({
                  label: capital(direction),
                  onSelect: () => add(direction),
                }))}
              />
            )}
            {position.kind === 'rolling' && (
              <Button size="small" icon="plus" onClick={() => setOpen('fit-record')}>
                Fit record
              </Button>
            )}
          </div>
        )
      }
    >
      <div className="flex flex-col gap-5">
        <DescriptionList
          columns={2}
          items={[
            {
              label: 'Bearing',
              value: (
                <span className="figures">
                  {[position.designation, position.clearanceGroup].filter(Boolean).join(' ') ||
                    (position.kind === 'plain' ? 'plain bearing, no seats' : null)}
                </span>
              ),
            },
            { label: 'd × D × B', value: <Figure value={sizeOf(position)} unit="mm" /> },
            { label: 'Load', value: loadsInWords(position) },
            {
              label: 'Shaft speed',
              value: <ShaftSpeed ratio={position.shaftRatio} shafts={shafts} />,
            },
            { label: 'Shaft and housing', value: partsInWords(position) },
            {
              label: 'Running temperatures',
              value: (
                <span>
                  shaft {figure(position.shaftC, '°C')}, inner ring{' '}
                  {figure(position.innerRingC, '°C')}, outer ring{' '}
                  {figure(position.outerRingC, '°C')}, housing {figure(position.housingC, '°C')}
                </span>
              ),
            },
            {
              label: 'Measuring points',
              value:
                position.points.length === 0 ? (
                  'none yet'
                ) : (
                  <span className="flex flex-wrap gap-1">
                    {position.points.map((point) => (
                      <Badge key={point.id}>{point.direction}</Badge>
                    ))}
                  </span>
                ),
            },
            { label: 'Floating bearing', value: position.mustSlide ? 'Yes' : 'No' },
          ]}
        />
        {seats}
        {position.kind === 'rolling' && (
          <>
            <FitRecordTable positionCode={position.code} records={position.fitRecords} />
            <p className="flex flex-wrap gap-x-6 text-sm">
              {seatNames.map((seat) => (
                <Link
                  key={seat}
                  className="ink-link"
                  to={`positions/${position.id}/seats/${seat}`}
                  aria-label={`History of the ${seat} seat of ${position.code}`}
                >
                  History of the {seat} seat
                </Link>
              ))}
            </p>
          </>
        )}
      </div>
      <Dialog
        wide
        title={`Edit ${position.code}`}
        open={open === 'position'}
        onOpenChange={(isOpen) => !isOpen && close()}
      >
        <PositionForm
          position={editable}
          shafts={shafts}
          saving={update.isPending}
          failure={update.isError ? toApiError(update.error) : null}
          onSave={(body) => update.mutate(body, { onSuccess: close })}
        />
      </Dialog>
      <Dialog
        wide
        title={`New fit record, ${position.code}`}
        description="Records are added and never overwritten: a wrong one is put right by a newer one."
        open={open === 'fit-record'}
        onOpenChange={(isOpen) => !isOpen && close()}
      >
        <FitRecordForm
          position={position}
          initial={prepared}
          saving={addRecord.isPending}
          failure={addRecord.isError ? toApiError(addRecord.error) : null}
          onSave={(body) => addRecord.mutate(body, { onSuccess: close })}
        />
      </Dialog>
    </Panel>
  );
}
