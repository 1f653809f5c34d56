import { oneTighter, type HousingDemand, type Recommendation } from './recommendation.ts';

/** "Very large" where heat comes through the shaft: F7 above this (project's choice, no source). */
const veryLargeMm = 400;

/** Classes tighter than K7, which a split housing must not have. */
const tooTightForSplit = ['M7', 'N7', 'P7', 'R7', 'M6', 'N6', 'P6'];

function rotating(demand: HousingDemand): [string, string] {
  const level = demand.level ?? 'normal';
  if (level === 'heavy' || demand.thinHousing) {
    return [
      'P7',
      `The load rotates relative to the outer ring and ${level === 'heavy' ? 'is heavy' : 'the housing is thin-walled'}: P7.`,
    ];
  }
  if (level === 'normal')
    return ['N7', 'The load rotates relative to the outer ring, normal load: N7.'];
  return ['M7', 'The load rotates relative to the outer ring, light or variable load: M7.'];
}

function indeterminate(demand: HousingDemand): [string, string] {
  const level = demand.level ?? 'normal';
  if (demand.mustSlide)
    return ['J7', 'The load on the outer ring is indeterminate and the ring must move: J7.'];
  if (level === 'heavy')
    return ['M7', 'The load on the outer ring is indeterminate and heavy: M7.'];
  if (level === 'normal')
    return ['K7', 'The load on the outer ring is indeterminate, normal load: K7.'];
  return ['J7', 'The load on the outer ring is indeterminate, light load: J7.'];
}

function stationary(demand: HousingDemand): [string, string] {
  const still = 'The load stands still on the outer ring';
  if (demand.heatThroughShaft) {
    return demand.D > veryLargeMm
      ? ['F7', `${still}, heat comes through the shaft and the bearing is very large: F7.`]
      : ['G7', `${still} and heat comes through the shaft: G7.`];
  }
  if (demand.highAccuracy) {
    return demand.type === 'ball'
      ? ['JS6', `${still}; high running accuracy with a ball bearing: JS6.`]
      : ['K6', `${still}; high running accuracy with a roller bearing: K6.`];
  }
  if (demand.quietElectricMachine) return ['H6', `${still} in a small quiet electric machine: H6.`];
  if (demand.split) return ['H8', `${still} in a split housing: H8.`];
  if (demand.level === 'light') return ['H8', `${still}, light load: H8.`];
  return ['H7', `${still}: H7.`];
}

/**
 * Housing class the load asks for: the decision table of common practice for iron or steel housings,
 * with the adjustments for thin or light-alloy and for split housings. A proposal: the machine
 * maker's drawing wins.
 *
 * @returns class, reason and cautions
 *
 * @example
 * // stationary outer ring, normal load, one-piece iron housing → H7
 */
export function recommendHousingClass(demand: HousingDemand): Recommendation {
  const table = { rotating, indeterminate, stationary };
  let [toleranceClass, reason] = table[demand.load](demand);
  const cautions: string[] = [];
  if (demand.level === undefined && demand.load !== 'stationary') {
    reason += ' The load level is not recorded, normal assumed.';
  }
  // A thin wall already chose P7; a ring that must move is not given a tighter bore.
  const thin = demand.thinHousing && toleranceClass !== 'P7';
  if ((thin || demand.lightAlloy) && !demand.mustSlide) {
    toleranceClass = oneTighter(toleranceClass);
    reason += ` A ${demand.lightAlloy ? 'light-alloy' : 'thin-walled'} housing asks for a tighter class: ${toleranceClass}.`;
  }
  if (demand.split && tooTightForSplit.includes(toleranceClass)) {
    cautions.push(
      `A split housing takes nothing tighter than K7, but the load asks for ${toleranceClass}: a one-piece housing suits this load better.`,
    );
    toleranceClass = 'K7';
    reason += ' A split housing takes nothing tighter than K7.';
  }
  return { toleranceClass, reason, cautions };
}
