import {
  bearingClasses,
  bearingTypes,
  clearanceGroups,
  housingMaterials,
  loadLevels,
  positionKinds,
  ringLoads,
  seatTapers,
  shaftMaterials,
  shaftSeatForms,
  type CreateBearingPositionRequest,
} from '#shared/contracts/bearing-position.ts';
import {
  diameterUnits,
  fitSources,
  seatBondings,
  seatConditions,
  seatNames,
  type CreateFitRecordRequest,
} from '#shared/contracts/fit-record.ts';
import {
  criticalities,
  machineKinds,
  mountings,
  type CreateMachineRequest,
} from '#shared/contracts/machine.ts';
import { directions } from '#shared/contracts/measuring-point.ts';
import type { RegisterKind } from '#shared/contracts/register-import.ts';

/**
 * How a column's cells are written. `part` says what an empty cell means: a `key` finds the row and
 * must be there; `needed` must be there for a new row; a `kept` cell that is empty leaves what is
 * there or takes the form's default; an empty `clearable` cell clears.
 */
export interface ColumnSpec {
  header: string;
  cell: 'text' | 'number' | 'whole number' | 'yes or no' | 'date' | 'word';
  part: 'key' | 'needed' | 'kept' | 'clearable';
  words?: readonly string[];
  unit?: string;
}

export interface Column extends ColumnSpec {
  /** The field's name in the contract. */
  key: string;
}

type Part = ColumnSpec['part'];
const text = (header: string, part: Part = 'clearable'): ColumnSpec => ({
  header,
  cell: 'text',
  part,
});
const date = (header: string, part: Part = 'clearable'): ColumnSpec => ({
  header,
  cell: 'date',
  part,
});
const word = (header: string, words: readonly string[], part: Part = 'clearable'): ColumnSpec => ({
  header,
  cell: 'word',
  part,
  words,
});
const yesOrNo = (header: string): ColumnSpec => ({ header, cell: 'yes or no', part: 'kept' });
const whole = (header: string, part: Part = 'clearable'): ColumnSpec => ({
  header,
  cell: 'whole number',
  part,
});
/** A number with its unit in brackets after the header's name. */
const number = (name: string, unit = '', part: Part = 'clearable'): ColumnSpec => ({
  header: unit === '' ? name : `${name} [${unit}]`,
  cell: 'number',
  part,
  unit,
});

// Keyed by the contracts' fields: a field that gets no column doesn't compile.
type MachineField = Exclude<keyof CreateMachineRequest, 'ownerUserId'> | 'ownerEmail';
const machineColumns: Record<MachineField, ColumnSpec> = {
  tag: text('tag', 'key'),
  name: text('name', 'needed'),
  kind: word('kind', machineKinds, 'needed'),
  drive: text('drive'),
  powerKw: number('power', 'kW'),
  nominalSpeedRpm: number('nominal speed', 'r/min'),
  speedMinRpm: number('lowest speed', 'r/min'),
  speedMaxRpm: number('highest speed', 'r/min'),
  lineFrequencyHz: number('line frequency', 'Hz'),
  mounting: word('mounting', mountings),
  bladeCount: whole('blades'),
  gearTeethCount: whole('gear teeth'),
  beltFrequencyHz: number('belt frequency', 'Hz'),
  criticality: word('criticality', criticalities, 'kept'),
  nextPlannedStopOn: date('next planned stop'),
  notes: text('notes'),
  ownerEmail: text('owner e-mail'),
};

const positionColumns: Record<'machineTag' | keyof CreateBearingPositionRequest, ColumnSpec> = {
  machineTag: text('machine tag', 'key'),
  code: text('position code', 'key'),
  name: text('name', 'needed'),
  kind: word('kind', positionKinds, 'kept'),
  shaftRatio: number('shaft ratio', '', 'kept'),
  designation: text('designation'),
  bearingType: word('bearing type', bearingTypes),
  boreMm: number('bore d', 'mm'),
  outsideMm: number('outside diameter D', 'mm'),
  widthMm: number('width B', 'mm'),
  bearingClass: word('bearing class', bearingClasses),
  clearanceGroup: word('clearance group', clearanceGroups),
  innerLoad: word('inner ring load', ringLoads),
  outerLoad: word('outer ring load', ringLoads),
  loadLevel: word('load level', loadLevels),
  shaftMaterial: word('shaft material', shaftMaterials),
  housingMaterial: word('housing material', housingMaterials),
  shaftSeatForm: word('shaft seat form', shaftSeatForms, 'kept'),
  seatTaper: word('seat taper', seatTapers),
  shaftBoreMm: number('shaft bore', 'mm'),
  housingWallMm: number('housing wall', 'mm'),
  radialLoadN: number('radial load', 'N'),
  heatThroughShaft: yesOrNo('heat through shaft'),
  splitHousing: yesOrNo('split housing'),
  mustSlide: yesOrNo('must slide'),
  shaftC: number('shaft temperature', '°C'),
  innerRingC: number('inner ring temperature', '°C'),
  outerRingC: number('outer ring temperature', '°C'),
  housingC: number('housing temperature', '°C'),
  sequence: whole('sequence', 'kept'),
};

type RecordField = 'machineTag' | 'positionCode' | keyof CreateFitRecordRequest;
const fitRecordColumns: Record<RecordField, ColumnSpec> = {
  machineTag: text('machine tag', 'key'),
  positionCode: text('position code', 'key'),
  seat: word('seat', seatNames, 'key'),
  recordedOn: date('recorded on', 'key'),
  source: word('source', fitSources, 'needed'),
  toleranceClass: text('tolerance class'),
  seatMeasuredMm: number('seat diameter', 'mm'),
  ringMeasuredMm: number('ring diameter', 'mm'),
  // The unit of the micrometer; the file's diameters are in millimetres all the same.
  diameterUnit: word('diameters read in', diameterUnits, 'kept'),
  driveUpMm: number('drive-up', 'mm'),
  clearanceReductionUm: number('clearance reduction', 'µm'),
  bonding: word('bonding', seatBondings),
  condition: word('condition', seatConditions),
  note: text('note'),
};

const pointColumns: Record<'machineTag' | 'positionCode' | 'direction', ColumnSpec> = {
  machineTag: text('machine tag', 'key'),
  positionCode: text('position code', 'key'),
  direction: word('direction', directions, 'key'),
};

const listed = (specs: Record<string, ColumnSpec>): readonly Column[] =>
  Object.entries(specs).map(([key, spec]) => ({ key, ...spec }));

/** The columns of each kind of file, in the order in which they are exported. */
export const columnsOf: Readonly<Record<RegisterKind, readonly Column[]>> = {
  machines: listed(machineColumns),
  positions: listed(positionColumns),
  'fit-records': listed(fitRecordColumns),
  points: listed(pointColumns),
};

export const isNumeric = ({ cell }: Column): boolean =>
  cell === 'number' || cell === 'whole number';

/** What to do about a cell of this column. */
export function remedyOf(column: Column): string {
  switch (column.cell) {
    case 'number':
      return `Write a number${column.unit ? ` in ${column.unit}` : ''}, without the unit.`;
    case 'whole number':
      return 'Write a whole number.';
    case 'yes or no':
      return 'Write yes or no.';
    case 'date':
      return 'Write the date as YYYY-MM-DD.';
    case 'word':
      return `Write one of: ${(column.words ?? []).join(', ')}.`;
    case 'text':
      return `Correct the cell in the column "${column.header}".`;
  }
}
