import { z } from 'zod';
import { line, numberBetween } from './fields.ts';
import { fitRecordResponse } from './fit-record.ts';
import { measuringPointResponse } from './measuring-point.ts';

export const positionKinds = ['rolling', 'plain'] as const;
export const positionKind = z.enum(positionKinds);
export type PositionKind = z.infer<typeof positionKind>;

export const bearingTypes = ['ball', 'roller', 'spherical roller'] as const;
export const bearingType = z.enum(bearingTypes);
export type BearingType = z.infer<typeof bearingType>;

/** ISO 492 tolerance class. */
export const bearingClasses = ['Normal', '6', '5'] as const;
export const bearingClass = z.enum(bearingClasses);
export type BearingClass = z.infer<typeof bearingClass>;

/** ISO 5753-1 clearance group. */
export const clearanceGroups = ['C2', 'CN', 'C3', 'C4', 'C5'] as const;
export const clearanceGroup = z.enum(clearanceGroups);
export type ClearanceGroup = z.infer<typeof clearanceGroup>;

export const ringLoads = ['rotating', 'stationary', 'indeterminate'] as const;
export const ringLoad = z.enum(ringLoads);
export type RingLoad = z.infer<typeof ringLoad>;

export const loadLevels = ['light', 'normal', 'heavy'] as const;
export const loadLevel = z.enum(loadLevels);
export type LoadLevel = z.infer<typeof loadLevel>;

export const shaftMaterials = ['steel', 'stainless'] as const;
export const shaftMaterial = z.enum(shaftMaterials);
export type ShaftMaterial = z.infer<typeof shaftMaterial>;

export const housingMaterials = ['steel', 'cast iron', 'aluminium'] as const;
export const housingMaterial = z.enum(housingMaterials);
export type HousingMaterial = z.infer<typeof housingMaterial>;

/** How the shaft seat carries the inner ring; the housing seat is always cylindrical. */
export const shaftSeatForms = [
  'cylindrical',
  'adapter sleeve',
  'withdrawal sleeve',
  'tapered shaft',
] as const;
export const shaftSeatForm = z.enum(shaftSeatForms);
export type ShaftSeatForm = z.infer<typeof shaftSeatForm>;

/** Diameter over length of a tapered bore: 1:12, or 1:30 for the wide series. */
export const seatTapers = ['1:12', '1:30'] as const;
export const seatTaper = z.enum(seatTapers);
export type SeatTaper = z.infer<typeof seatTaper>;

const temperatureC = numberBetween(-100, 500, '°C');
const diameterMm = numberBetween(1, 3000, 'mm');

const positionFields = {
  code: line(24, 'a short name such as M-DE'),
  name: line(120, 'a name'),
  kind: positionKind,
  shaftRatio: numberBetween(0.0001, 10_000, ''),
  designation: line(24, 'the designation').nullable(),
  bearingType: bearingType.nullable(),
  boreMm: diameterMm.nullable(),
  outsideMm: diameterMm.nullable(),
  widthMm: diameterMm.nullable(),
  bearingClass: bearingClass.nullable(),
  clearanceGroup: clearanceGroup.nullable(),
  innerLoad: ringLoad.nullable(),
  outerLoad: ringLoad.nullable(),
  loadLevel: loadLevel.nullable(),
  shaftMaterial: shaftMaterial.nullable(),
  housingMaterial: housingMaterial.nullable(),
  shaftSeatForm,
  /** Null on a tapered seat counts as 1:12. */
  seatTaper: seatTaper.nullable(),
  /** Bore of a hollow shaft; null for a solid one. */
  shaftBoreMm: diameterMm.nullable(),
  /** Wall round the bore; null counts as very thick. */
  housingWallMm: numberBetween(1, 1000, 'mm').nullable(),
  radialLoadN: numberBetween(0, 10_000_000, 'N').nullable(),
  heatThroughShaft: z.boolean(),
  splitHousing: z.boolean(),
  mustSlide: z.boolean(),
  shaftC: temperatureC.nullable(),
  innerRingC: temperatureC.nullable(),
  outerRingC: temperatureC.nullable(),
  housingC: temperatureC.nullable(),
  sequence: z.int().min(0).max(1000),
};

const diametersRight = (p: { boreMm?: number | null; outsideMm?: number | null }) =>
  p.boreMm == null || p.outsideMm == null || p.boreMm < p.outsideMm;
const diametersFault = {
  path: ['outsideMm'],
  message: 'The outside diameter D must be greater than the bore d.',
};

export const createBearingPositionRequest = z
  .strictObject({
    code: positionFields.code,
    name: positionFields.name,
    kind: positionFields.kind.default('rolling'),
    shaftRatio: positionFields.shaftRatio.default(1),
    designation: positionFields.designation.default(null),
    bearingType: positionFields.bearingType.default(null),
    boreMm: positionFields.boreMm.default(null),
    outsideMm: positionFields.outsideMm.default(null),
    widthMm: positionFields.widthMm.default(null),
    bearingClass: positionFields.bearingClass.default(null),
    clearanceGroup: positionFields.clearanceGroup.default(null),
    innerLoad: positionFields.innerLoad.default(null),
    outerLoad: positionFields.outerLoad.default(null),
    loadLevel: positionFields.loadLevel.default(null),
    shaftMaterial: positionFields.shaftMaterial.default(null),
    housingMaterial: positionFields.housingMaterial.default(null),
    shaftSeatForm: positionFields.shaftSeatForm.default('cylindrical'),
    seatTaper: positionFields.seatTaper.default(null),
    shaftBoreMm: positionFields.shaftBoreMm.default(null),
    housingWallMm: positionFields.housingWallMm.default(null),
    radialLoadN: positionFields.radialLoadN.default(null),
    heatThroughShaft: positionFields.heatThroughShaft.default(false),
    splitHousing: positionFields.splitHousing.default(false),
    mustSlide: positionFields.mustSlide.default(false),
    shaftC: positionFields.shaftC.default(null),
    innerRingC: positionFields.innerRingC.default(null),
    outerRingC: positionFields.outerRingC.default(null),
    housingC: positionFields.housingC.default(null),
    sequence: positionFields.sequence.default(0),
  })
  .refine(diametersRight, diametersFault);
export type CreateBearingPositionRequest = z.infer<typeof createBearingPositionRequest>;

export const updateBearingPositionRequest = z
  .strictObject(positionFields)
  .partial()
  .refine(diametersRight, diametersFault);
export type UpdateBearingPositionRequest = z.infer<typeof updateBearingPositionRequest>;

export const bearingPositionResponse = z.object({
  id: z.int(),
  machineId: z.int(),
  ...positionFields,
  points: z.array(measuringPointResponse),
  /** Newest first, both seats. */
  fitRecords: z.array(fitRecordResponse),
});
export type BearingPositionResponse = z.infer<typeof bearingPositionResponse>;
