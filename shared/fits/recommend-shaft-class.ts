import type { BearingType, LoadLevel } from './fit-types.ts';
import { oneTighter, typeName, type Recommendation, type ShaftDemand } from './recommendation.ts';

/** Shaft diameters up to and including the limit (mm) take the class. */
type Steps = readonly (readonly [upToMm: number, toleranceClass: string])[];

/** Sizes end at 500 mm, so `above` in the table reads up to 500. */
const end = 500;

/** Inner ring rotating or indeterminate: common practice, makers differ by a step. */
const ballLight: Steps = [
  [18, 'h5'],
  [100, 'j6'],
  [200, 'k6'],
];
const ballNormal: Steps = [
  [18, 'j5'],
  [100, 'k5'],
  [140, 'm5'],
  [200, 'm6'],
  [280, 'n6'],
];
const rollerLight: Steps = [
  [40, 'j6'],
  [140, 'k6'],
  [200, 'm6'],
];
const rollerNormal: Steps = [
  [40, 'k5'],
  [100, 'm5'],
  [140, 'm6'],
  [200, 'n6'],
  [400, 'p6'],
];
const rollerHeavy: Steps = [
  [140, 'n6'],
  [200, 'p6'],
  [end, 'r6'],
];
const sphericalNormal: Steps = [
  [40, 'k5'],
  [65, 'm5'],
  [100, 'm6'],
  [140, 'n6'],
  [280, 'p6'],
  [500, 'r6'],
];
const sphericalHeavy: Steps = [
  [100, 'n6'],
  [140, 'p6'],
  [end, 'r6'],
];
/** Heavy rows begin at this diameter; smaller shafts take the normal row. */
const heavyFromMm = 50;
/** "Large" for a sliding inner ring: f6 instead of g6 above this (project's choice, no source). */
const slidingLargeMm = 250;

/**
 * The row of a bearing type and load level. Where the table has none (balls under heavy load,
 * spherical rollers under light load, heavy load on a small shaft) the type's normal row is taken.
 */
function rowFor(
  type: BearingType,
  level: LoadLevel,
  d: number,
): { steps: Steps; level: LoadLevel } {
  const isHeavy = level === 'heavy' && type !== 'ball' && d >= heavyFromMm;
  if (isHeavy) return { steps: type === 'roller' ? rollerHeavy : sphericalHeavy, level };
  if (level === 'light' && type !== 'spherical roller') {
    return { steps: type === 'ball' ? ballLight : rollerLight, level };
  }
  const normal = { ball: ballNormal, roller: rollerNormal, 'spherical roller': sphericalNormal };
  return { steps: normal[type], level: 'normal' };
}

function stationary(demand: ShaftDemand): Recommendation {
  if (demand.mustSlide) {
    const large = demand.d > slidingLargeMm;
    return {
      toleranceClass: large ? 'f6' : 'g6',
      reason: `The load stands still on the inner ring, which must slide on the shaft${large ? ' and is large' : ''}: a loose class.`,
      cautions: [],
    };
  }
  return {
    toleranceClass: 'h6',
    reason: 'The load stands still on the inner ring, which need not slide: h6.',
    cautions: [],
  };
}

function turning(demand: ShaftDemand): Recommendation | undefined {
  const level = demand.level ?? 'normal';
  const row = rowFor(demand.type, level, demand.d);
  const step = row.steps.find(([upTo]) => demand.d <= upTo);
  if (!step) return undefined;
  const load =
    demand.load === 'rotating'
      ? 'The load rotates relative to the inner ring'
      : 'The load on the inner ring is indeterminate';
  let note = demand.level === undefined ? ' (not recorded, normal assumed)' : '';
  if (row.level !== level) note = ' (the table has no row for it here; the normal row is taken)';
  return {
    toleranceClass: step[1],
    reason: `${load}; ${typeName(demand.type)}, ${level} load${note}, shaft ${demand.d} mm (row up to ${step[0]} mm): ${step[1]}.`,
    cautions:
      row.level === 'heavy' && !demand.clearanceAboveNormal
        ? [`${step[1]} on the shaft asks for an internal clearance above CN.`]
        : [],
  };
}

/**
 * Shaft class the load asks for: the decision table of common practice for a solid steel shaft and
 * bearings of class Normal or 6, and the step for hollow shafts. A proposal: the machine maker's
 * drawing wins.
 *
 * @returns class, reason and cautions; `undefined` where the table ends (e.g. light load above
 *   200 mm)
 *
 * @example
 * // ball, rotating, normal load, 60 mm → k5
 */
export function recommendShaftClass(demand: ShaftDemand): Recommendation | undefined {
  const basic = demand.load === 'stationary' ? stationary(demand) : turning(demand);
  const isHollow = demand.shaftBoreMm !== undefined && demand.shaftBoreMm > demand.d / 2;
  if (!basic || !isHollow || (demand.load === 'stationary' && demand.mustSlide)) return basic;
  const tighter = oneTighter(basic.toleranceClass);
  return {
    ...basic,
    toleranceClass: tighter,
    reason: `${basic.reason} The shaft is hollow (bore above half its diameter), which asks for a tighter class: ${tighter}.`,
  };
}
