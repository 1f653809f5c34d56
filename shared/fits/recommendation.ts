import type { BearingType, LoadLevel, RingLoad } from './fit-types.ts';

/** A proposed tolerance class with its reason in a sentence or two. */
export interface Recommendation {
  toleranceClass: string;
  reason: string;
  /** What must go with it, e.g. a greater internal clearance. */
  cautions: readonly string[];
}

/** What decides the shaft class. */
export interface ShaftDemand {
  d: number;
  type: BearingType;
  load: RingLoad;
  /** Absent counts as normal, and the reason says so. */
  level?: LoadLevel;
  mustSlide: boolean;
  /** Bore of a hollow shaft, mm. */
  shaftBoreMm?: number;
  /** True where the clearance group is known to be above CN. */
  clearanceAboveNormal: boolean;
}

/** What decides the housing class. */
export interface HousingDemand {
  D: number;
  type: BearingType;
  load: RingLoad;
  level?: LoadLevel;
  mustSlide: boolean;
  split: boolean;
  heatThroughShaft: boolean;
  thinHousing: boolean;
  lightAlloy: boolean;
  highAccuracy: boolean;
  quietElectricMachine: boolean;
}

/** From loose to tight, for "a tighter class" of hollow shafts and thin or light-alloy housings. */
const shaftOrder = ['f', 'g', 'h', 'j', 'k', 'm', 'n', 'p', 'r', 's'];
const housingOrder = ['F', 'G', 'H', 'J', 'K', 'M', 'N', 'P', 'R'];

/**
 * The next tighter class of the same grade; of H8 the next is H7 (common practice, no source).
 *
 * @example
 * oneTighter('k5') // => 'm5'
 */
export function oneTighter(toleranceClass: string): string {
  if (toleranceClass === 'H8') return 'H7';
  const letter = toleranceClass.replace(/\d+$/, '').replace(/^js$/, 'j').replace(/^JS$/, 'J');
  const grade = toleranceClass.slice(toleranceClass.search(/\d/));
  const order = shaftOrder.includes(letter) ? shaftOrder : housingOrder;
  return (order[order.indexOf(letter) + 1] ?? letter) + grade;
}

/** "ball bearing" and the like, for the reasons. */
export function typeName(type: BearingType): string {
  return type === 'roller' ? 'roller bearing' : `${type} bearing`;
}
