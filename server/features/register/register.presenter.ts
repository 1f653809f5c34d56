import type { SitePrincipal } from '#server/auth/principal.ts';
import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import type { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { Machine } from '#server/db/entities/machine.entity.ts';
import type { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import type { BearingPositionResponse } from '#shared/contracts/bearing-position.ts';
import type { FitRecordResponse } from '#shared/contracts/fit-record.ts';
import type { MachineResponse } from '#shared/contracts/machine.ts';
import { pointLabel, type MeasuringPointResponse } from '#shared/contracts/measuring-point.ts';
import { mayEditRegister } from './machine.policy.ts';

export const presentPoint = (
  point: MeasuringPoint,
  position: BearingPosition,
  machineTag: string,
): MeasuringPointResponse => ({
  id: point.id,
  bearingPositionId: point.bearingPositionId,
  direction: point.direction,
  label: pointLabel(machineTag, position.code, point.direction),
});

export const presentFitRecord = (record: FitRecord): FitRecordResponse => ({
  id: record.id,
  bearingPositionId: record.bearingPositionId,
  seat: record.seat,
  recordedOn: record.recordedOn,
  source: record.source,
  toleranceClass: record.toleranceClass,
  seatMeasuredMm: record.seatMeasuredMm,
  ringMeasuredMm: record.ringMeasuredMm,
  diameterUnit: record.diameterUnit,
  driveUpMm: record.driveUpMm,
  clearanceReductionUm: record.clearanceReductionUm,
  bonding: record.bonding,
  condition: record.condition,
  stage: record.stage,
  note: record.note,
  inspectionId: record.inspectionId,
  recordedByName: record.recordedBy?.name ?? '',
});

export const presentPosition = (
  position: BearingPosition,
  machineTag: string,
  points: MeasuringPoint[],
  records: FitRecord[],
): BearingPositionResponse => ({
  id: position.id,
  machineId: position.machineId,
  code: position.code,
  name: position.name,
  kind: position.kind,
  shaftRatio: position.shaftRatio,
  designation: position.designation,
  bearingType: position.bearingType,
  boreMm: position.boreMm,
  outsideMm: position.outsideMm,
  widthMm: position.widthMm,
  bearingClass: position.bearingClass,
  clearanceGroup: position.clearanceGroup,
  innerLoad: position.innerLoad,
  outerLoad: position.outerLoad,
  loadLevel: position.loadLevel,
  shaftMaterial: position.shaftMaterial,
  housingMaterial: position.housingMaterial,
  shaftSeatForm: position.shaftSeatForm,
  seatTaper: position.seatTaper,
  shaftBoreMm: position.shaftBoreMm,
  housingWallMm: position.housingWallMm,
  radialLoadN: position.radialLoadN,
  heatThroughShaft: position.heatThroughShaft,
  splitHousing: position.splitHousing,
  mustSlide: position.mustSlide,
  shaftC: position.shaftC,
  innerRingC: position.innerRingC,
  outerRingC: position.outerRingC,
  housingC: position.housingC,
  sequence: position.sequence,
  points: points
    .filter((point) => point.bearingPositionId === position.id)
    .map((point) => presentPoint(point, position, machineTag)),
  fitRecords: records
    .filter((record) => record.bearingPositionId === position.id)
    .map(presentFitRecord),
});

export interface MachineWhole {
  machine: Machine;
  positions: BearingPosition[];
  points: MeasuringPoint[];
  fitRecords: FitRecord[];
  findings: { id: number; state: string; positionCode: string }[];
}

export const presentMachine = (
  principal: SitePrincipal,
  { machine, positions, points, fitRecords, findings }: MachineWhole,
): MachineResponse => ({
  id: machine.id,
  tag: machine.tag,
  name: machine.name,
  kind: machine.kind,
  drive: machine.drive,
  powerKw: machine.powerKw,
  nominalSpeedRpm: machine.nominalSpeedRpm,
  speedMinRpm: machine.speedMinRpm,
  speedMaxRpm: machine.speedMaxRpm,
  lineFrequencyHz: machine.lineFrequencyHz,
  mounting: machine.mounting,
  bladeCount: machine.bladeCount,
  gearTeethCount: machine.gearTeethCount,
  beltFrequencyHz: machine.beltFrequencyHz,
  criticality: machine.criticality,
  nextPlannedStopOn: machine.nextPlannedStopOn,
  notes: machine.notes,
  ownerUserId: machine.ownerUserId,
  ownerName: machine.owner?.name ?? null,
  version: machine.version,
  positions: positions.map((position) =>
    presentPosition(position, machine.tag, points, fitRecords),
  ),
  findings,
  can: { edit: mayEditRegister(principal) },
});
