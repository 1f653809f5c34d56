import type { MachineResponse } from '#shared/contracts/machine.ts';
import { DescriptionList } from '#src/components/description-list.tsx';
import { Figure } from '#src/components/figure.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatEntered } from '#src/lib/numbers.ts';
import { capital } from './machine-words.ts';

const figure = (value: number | null, unit?: string) => (
  <Figure
    value={value === null ? null : formatEntered(value)}
    {...(unit === undefined ? {} : { unit })}
  />
);

/** What the register knows of a machine, without its bearings. */
export function MachineFacts({ machine }: { machine: MachineResponse }) {
  const range =
    machine.speedMinRpm === null && machine.speedMaxRpm === null ? null : (
      <span>
        {figure(machine.speedMinRpm)} to {figure(machine.speedMaxRpm, 'r/min')}
      </span>
    );
  return (
    <div className="flex flex-col gap-4">
      <DescriptionList
        columns={2}
        items={[
          { label: 'Kind', value: capital(machine.kind) },
          { label: 'Drive', value: machine.drive },
          { label: 'Power', value: figure(machine.powerKw, 'kW') },
          { label: 'Nominal speed', value: figure(machine.nominalSpeedRpm, 'r/min') },
          { label: 'Speed range', value: range },
          { label: 'Line frequency', value: figure(machine.lineFrequencyHz, 'Hz') },
          { label: 'Mounting', value: machine.mounting && capital(machine.mounting) },
          { label: 'Blades or vanes', value: figure(machine.bladeCount) },
          { label: 'Gear teeth', value: figure(machine.gearTeethCount) },
          { label: 'Belt frequency', value: figure(machine.beltFrequencyHz, 'Hz') },
          {
            label: 'Next planned stop',
            value: machine.nextPlannedStopOn && formatDay(machine.nextPlannedStopOn),
          },
          { label: 'Asset owner', value: machine.ownerName },
        ]}
      />
      {machine.notes && <p className="max-w-prose text-sm whitespace-pre-line">{machine.notes}</p>}
    </div>
  );
}
