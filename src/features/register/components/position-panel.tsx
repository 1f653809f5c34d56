import { useState, type ReactNode } from 'react';
import type { BearingPositionResponse } from '#shared/contracts/bearing-position.ts';
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
import { FitRecordForm } from './fit-record-form.tsx';
import { FitRecordTable } from './fit-record-table.tsx';
import { capital } from './machine-words.ts';
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

/** One bearing position: its bearing, points and fit records; `seats` shows what the records mean. */
export function PositionPanel({
  siteId,
  position,
  mayEdit,
  seats,
}: {
  siteId: number;
  position: BearingPositionResponse;
  mayEdit: boolean;
  seats: ReactNode;
}) {
  const [open, setOpen] = useState<'position' | 'fit-record' | null>(null);
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
              label: 'Shaft speed ratio',
              value: <Figure value={formatEntered(position.shaftRatio)} />,
            },
            {
              label: 'Materials',
              value:
                [
                  position.shaftMaterial && `${position.shaftMaterial} shaft`,
                  position.housingMaterial &&
                    `${position.splitHousing ? 'split ' : ''}${position.housingMaterial} housing`,
                ]
                  .filter(Boolean)
                  .join(', ') || null,
            },
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
          <FitRecordTable positionCode={position.code} records={position.fitRecords} />
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
          saving={addRecord.isPending}
          failure={addRecord.isError ? toApiError(addRecord.error) : null}
          onSave={(body) => addRecord.mutate(body, { onSuccess: close })}
        />
      </Dialog>
    </Panel>
  );
}
