import { z } from 'zod';
import { bearingPositionResponse } from './bearing-position.ts';
import { id, isoDate, line, numberBetween, paragraph } from './fields.ts';
import { listQuery, listResponse } from './list.ts';

export const machineKinds = [
  'pump',
  'fan',
  'motor',
  'compressor',
  'blower',
  'gearbox',
  'conveyor',
  'mixer',
  'generator',
  'turbine',
  'mill',
  'other',
] as const;
export const machineKind = z.enum(machineKinds);
export type MachineKind = z.infer<typeof machineKind>;

export const mountings = ['rigid', 'flexible'] as const;
export const mounting = z.enum(mountings);
export type Mounting = z.infer<typeof mounting>;

export const criticalities = ['low', 'medium', 'high'] as const;
export const criticality = z.enum(criticalities);
export type Criticality = z.infer<typeof criticality>;

const speedRpm = numberBetween(1, 200_000, 'r/min');

const machineFields = {
  tag: line(40, 'the tag'),
  name: line(120, 'a name'),
  kind: machineKind,
  drive: line(120, 'the drive').nullable(),
  powerKw: numberBetween(0.01, 500_000, 'kW').nullable(),
  nominalSpeedRpm: speedRpm.nullable(),
  speedMinRpm: speedRpm.nullable(),
  speedMaxRpm: speedRpm.nullable(),
  lineFrequencyHz: numberBetween(10, 500, 'Hz').nullable(),
  mounting: mounting.nullable(),
  bladeCount: z.int().min(1).max(500).nullable(),
  gearTeethCount: z.int().min(1).max(2000).nullable(),
  beltFrequencyHz: numberBetween(0.01, 1000, 'Hz').nullable(),
  criticality,
  nextPlannedStopOn: isoDate.nullable(),
  notes: paragraph(4000).nullable(),
  ownerUserId: id.nullable(),
};

const speedRangeRight = (m: { speedMinRpm?: number | null; speedMaxRpm?: number | null }) =>
  m.speedMinRpm == null || m.speedMaxRpm == null || m.speedMinRpm <= m.speedMaxRpm;
const speedRangeFault = {
  path: ['speedMaxRpm'],
  message: 'The highest speed is below the lowest.',
};

export const createMachineRequest = z
  .strictObject({
    tag: machineFields.tag,
    name: machineFields.name,
    kind: machineFields.kind,
    drive: machineFields.drive.default(null),
    powerKw: machineFields.powerKw.default(null),
    nominalSpeedRpm: machineFields.nominalSpeedRpm.default(null),
    speedMinRpm: machineFields.speedMinRpm.default(null),
    speedMaxRpm: machineFields.speedMaxRpm.default(null),
    lineFrequencyHz: machineFields.lineFrequencyHz.default(null),
    mounting: machineFields.mounting.default(null),
    bladeCount: machineFields.bladeCount.default(null),
    gearTeethCount: machineFields.gearTeethCount.default(null),
    beltFrequencyHz: machineFields.beltFrequencyHz.default(null),
    criticality: machineFields.criticality.default('medium'),
    nextPlannedStopOn: machineFields.nextPlannedStopOn.default(null),
    notes: machineFields.notes.default(null),
    ownerUserId: machineFields.ownerUserId.default(null),
  })
  .refine(speedRangeRight, speedRangeFault);
export type CreateMachineRequest = z.infer<typeof createMachineRequest>;

/** An absent field is left as it is, null clears it; `version` is the one the form was opened with. */
export const updateMachineRequest = z
  .strictObject({ ...machineFields })
  .partial()
  .extend({ version: z.int().min(1) })
  .refine(speedRangeRight, speedRangeFault);
export type UpdateMachineRequest = z.infer<typeof updateMachineRequest>;

export const machineListQuery = listQuery([
  'tag',
  'name',
  'kind',
  'criticality',
  'nextPlannedStopOn',
]).extend({
  kind: machineKind.optional(),
  criticality: criticality.optional(),
});
export type MachineListQuery = z.infer<typeof machineListQuery>;

export const machineListItem = z.object({
  id: z.int(),
  tag: z.string(),
  name: z.string(),
  kind: machineKind,
  nominalSpeedRpm: z.number().nullable(),
  powerKw: z.number().nullable(),
  criticality,
  nextPlannedStopOn: z.string().nullable(),
  ownerName: z.string().nullable(),
  positionCount: z.int(),
  pointCount: z.int(),
  openFindingCount: z.int(),
});
export const machineListResponse = listResponse(machineListItem);
export type MachineListResponse = z.infer<typeof machineListResponse>;

export const machineResponse = z.object({
  id: z.int(),
  ...machineFields,
  ownerName: z.string().nullable(),
  version: z.int(),
  positions: z.array(bearingPositionResponse),
  findings: z.array(z.object({ id: z.int(), state: z.string(), positionCode: z.string() })),
  /** What the person asking may do. */
  can: z.object({ edit: z.boolean() }),
});
export type MachineResponse = z.infer<typeof machineResponse>;
