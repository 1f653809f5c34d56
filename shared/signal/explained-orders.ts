import type { MachineFacts } from './screening-types.ts';

/** What else can put a line at a frequency, besides a loose joint. */
export interface Explanation {
  frequencyHz: number;
  words: string;
}

/**
 * Orders of a rolling bearing's defect families from its geometry: kinematics of rolling without
 * slip (ISO 13373-3, Annex; worked examples in any handbook).
 *
 * @returns orders of shaft speed: outer race, inner race, rolling element, cage
 */
export function bearingDefectOrders(bearing: NonNullable<MachineFacts['bearing']>) {
  const share =
    (bearing.ballDiameterMm / bearing.pitchDiameterMm) *
    Math.cos((bearing.contactAngleDeg * Math.PI) / 180);
  return {
    outerRace: (bearing.ballCount / 2) * (1 - share),
    innerRace: (bearing.ballCount / 2) * (1 + share),
    rollingElement: (bearing.pitchDiameterMm / (2 * bearing.ballDiameterMm)) * (1 - share ** 2),
    cage: (1 - share) / 2,
  };
}

/**
 * Frequencies at which a line has another reason, from what is known of the machine.
 *
 * @param speedHz - of the position's shaft
 * @param toHz - highest frequency of interest
 */
export function explanations(
  speedHz: number,
  machine: MachineFacts | undefined,
  toHz: number,
): Explanation[] {
  if (machine === undefined) return [];
  const found: Explanation[] = [];
  const series = (baseHz: number, words: (k: number) => string, most: number) => {
    for (let k = 1; k <= most && k * baseHz <= toHz; k += 1) {
      found.push({ frequencyHz: k * baseHz, words: words(k) });
    }
  };
  const times = (k: number) => (k === 1 ? '' : `${k} × `);
  if (machine.lineFrequencyHz !== undefined) {
    found.push({ frequencyHz: 2 * machine.lineFrequencyHz, words: 'twice the line frequency' });
  }
  if (machine.bladeCount !== undefined && machine.bladeCount > 1) {
    series(machine.bladeCount * speedHz, (k) => `${times(k)}blade pass`, 4);
  }
  if (machine.gearTeethCount !== undefined) {
    const meshHz = machine.gearTeethCount * speedHz;
    for (const side of [-2, -1, 0, 1, 2]) {
      found.push({
        frequencyHz: meshHz + side * speedHz,
        words: side === 0 ? 'gear mesh' : 'a sideband of the gear mesh',
      });
    }
  }
  if (machine.beltFrequencyHz !== undefined) {
    series(machine.beltFrequencyHz, (k) => `${times(k)}belt frequency`, 6);
  }
  for (const ratio of machine.otherShaftRatios ?? []) {
    const own = machine.shaftRatio ?? 1;
    series((speedHz / own) * ratio, (k) => `${times(k)}the speed of another shaft`, 3);
  }
  for (const neighbourHz of machine.neighbourSpeedsHz ?? []) {
    series(neighbourHz, (k) => `${times(k)}the speed of a neighbour machine`, 3);
  }
  if (machine.bearing !== undefined) {
    const orders = bearingDefectOrders(machine.bearing);
    series(orders.outerRace * speedHz, (k) => `${times(k)}outer race defect`, 4);
    series(orders.innerRace * speedHz, (k) => `${times(k)}inner race defect`, 4);
    series(orders.rollingElement * speedHz, (k) => `${times(k)}rolling element defect`, 4);
  }
  return found;
}
