import type { SeatMark } from './condition-words.ts';

/** Basic type of a rolling bearing; `roller` is cylindrical, needle or tapered. */
export const bearingTypes = ['ball', 'roller', 'spherical roller'] as const;
export type BearingType = (typeof bearingTypes)[number];

/** ISO 492 tolerance class. */
export const bearingClasses = ['Normal', '6', '5'] as const;
export type BearingClass = (typeof bearingClasses)[number];

/** ISO 5753-1 group of radial internal clearance. */
export const clearanceGroups = ['C2', 'CN', 'C3', 'C4', 'C5'] as const;
export type ClearanceGroup = (typeof clearanceGroups)[number];

/** How the load moves relative to a ring. */
export const ringLoads = ['rotating', 'stationary', 'indeterminate'] as const;
export type RingLoad = (typeof ringLoads)[number];

export const loadLevels = ['light', 'normal', 'heavy'] as const;
export type LoadLevel = (typeof loadLevels)[number];

export const shaftMaterials = ['steel', 'stainless'] as const;
export type ShaftMaterial = (typeof shaftMaterials)[number];

export const housingMaterials = ['steel', 'cast iron', 'aluminium'] as const;
export type HousingMaterial = (typeof housingMaterials)[number];

export const seatNames = ['shaft', 'housing'] as const;
export type SeatName = (typeof seatNames)[number];

/** Lower and upper limit deviation from the nominal size, µm. */
export type LimitsUm = readonly [lower: number, upper: number];

/** Least, mean and greatest value, µm; of a fit: interference positive, clearance negative. */
export interface SpreadUm {
  min: number;
  mean: number;
  max: number;
}

/** What happened to a seat since it was made or measured; absent means unknown. */
export interface SeatHistory {
  /** Years in service since the seat was made, restored or last measured. */
  yearsInService?: number;
  /** Condition found at the last inspection. */
  condition?: SeatMark;
  /** Earlier findings of looseness at this position that were not repaired since. */
  earlierFindings?: number;
}

/** A tapered seat (adapter or withdrawal sleeve) and what was recorded when it was mounted. */
export interface TaperedSeat {
  /** Diameter over length: 1:12, or 1:30 for the wide series. */
  taper: '1:12' | '1:30';
  driveUpMm?: number;
  clearanceReductionUm?: number;
}

/**
 * What is known of one bearing position. Everything is optional; a size is needed (`designation`, or
 * `d` / `D` for the seats asked for). Millimetres, micrometres, °C, K, N. The keys are those of the
 * command line; the last group is for the register, which knows more.
 */
export interface PositionFit {
  /** Basic designation, e.g. 6312. */
  designation?: string;
  /** Bore, outside diameter and width, mm. */
  d?: number;
  D?: number;
  B?: number;
  bearingClass?: BearingClass;
  bearingType?: BearingType;
  clearanceGroup?: ClearanceGroup;
  /** Sealed, shielded or greased: heated to 80 °C at most. */
  capped?: boolean;
  shaftClass?: string;
  housingClass?: string;
  /** Measured diameters at 20 °C, mm. */
  shaftMeasuredMm?: number;
  boreMeasuredMm?: number;
  outsideMeasuredMm?: number;
  housingMeasuredMm?: number;
  /** Running temperatures; one that is absent counts as 20 °C. */
  temperaturesC?: { shaft?: number; innerRing?: number; outerRing?: number; housing?: number };
  innerWarmerThanOuterK?: number;
  shaftMaterial?: ShaftMaterial;
  /** Bore of a hollow shaft. */
  shaftBoreMm?: number;
  housingMaterial?: HousingMaterial;
  /** Coefficients of expansion, 1/K, instead of the materials' own. */
  alphaPerK?: { shaft?: number; ring?: number; housing?: number };
  innerLoad?: RingLoad;
  outerLoad?: RingLoad;
  loadLevel?: LoadLevel;
  /** Equivalent load over dynamic load rating; used where `loadLevel` is absent. */
  pOverC?: number;
  splitHousing?: boolean;
  heatThroughShaft?: boolean;
  /** The bearing is the floating one: one ring must move along its seat. */
  mustSlide?: boolean;
  radialLoadN?: number;
  staticRatingN?: number;
  /** How much warmer the inner ring is than its surroundings. */
  warmerThanSurroundingsK?: number;
  smoothingUm?: number;
  slideOnClearanceUm?: number;
  handlingMarginK?: number;
  /** Distance from the locating bearing. */
  spanMm?: number;

  /** Plain bearings have no rolling-bearing seats. */
  plain?: boolean;
  shaftTapered?: TaperedSeat;
  speedRpm?: number;
  /** Outside diameter of the housing round the seat; absent counts as very thick. */
  housingOutsideMm?: number;
  thinHousing?: boolean;
  highAccuracy?: boolean;
  /** Small electric machine that must run quietly. */
  quietElectricMachine?: boolean;
  /** The seat is bonded on purpose, as on some small mass-made machines. */
  shaftBonded?: boolean;
  housingBonded?: boolean;
  /** Standard uncertainty of the measured diameters, µm; default 2. */
  uncertaintyUm?: { shaft?: number; bore?: number; outside?: number; housing?: number };
  shaftHistory?: SeatHistory;
  housingHistory?: SeatHistory;
}

export const seatVerdicts = ['as recommended', 'looser', 'tighter', 'not recorded'] as const;
export type SeatVerdict = (typeof seatVerdicts)[number];

/** What is known of one seat and what it means; absent is what can't be said. */
export interface SeatFit {
  /** Limit deviations of shaft or housing bore, from the class. */
  seatLimitsUm?: LimitsUm;
  /** Limit deviations of the bearing's bore or outside diameter. */
  ringLimitsUm?: LimitsUm;
  /** Fit at rest at 20 °C, from the class or, where measured, from the diameters. */
  interferenceUm?: SpreadUm;
  probableUm?: { min: number; max: number };
  /** Fit at running temperature, after smoothing and ring growth. */
  runningUm?: SpreadUm;
  /** Interference asked for by the radial load (shaft seat alone). */
  neededUm?: number;
  recommendedClass?: string;
  reason?: string;
  /** Absent where a class is on record but nothing to compare it with (no load, no diameter). */
  verdict?: SeatVerdict;
  /** By how much the seat lies outside its limits, µm, never negative; the verdict gives the side. */
  outsideLimitsUm?: number;
  /** Chance, 0–1, that the seat runs with more clearance than its class allows. */
  chanceOfClearance?: number;
}

export interface InternalClearance {
  unmounted: SpreadUm;
  mounted?: SpreadUm;
  running?: SpreadUm;
}

export interface Mounting {
  /** Ring temperature at which the greatest interference and the clearance for sliding are reached. */
  neededC: number;
  /** The same with the handling margin: what to heat to. */
  heatToC: number;
  limitC: number;
  allowed: boolean;
  /** Where heating alone passes the limit: shaft temperature that makes up for it. */
  shaftCooledToC?: number;
  advice: string;
}

/** The whole answer for one position; the command line prints it, the server stores it. */
export interface PositionAssessment {
  /** Absent for plain bearings and where no bore is known. */
  shaftSeat?: SeatFit;
  housingSeat?: SeatFit;
  internalClearanceUm?: InternalClearance;
  mounting?: Mounting;
  /** How far the floating ring travels, µm; positive where the shaft grows more. */
  floatingTravelUm?: number;
  cautions: readonly string[];
}
