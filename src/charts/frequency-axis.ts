export const frequencyUnits = ['hz', 'cpm', 'orders'] as const;
export type FrequencyUnit = (typeof frequencyUnits)[number];

export const frequencyUnitWords: Readonly<Record<FrequencyUnit, { label: string; unit: string }>> =
  {
    hz: { label: 'Frequency', unit: 'Hz' },
    cpm: { label: 'Frequency', unit: '1/min' },
    orders: { label: 'Order of the shaft speed', unit: '×' },
  };

/**
 * How many of `unit` one Hz is.
 *
 * @param speedHz - shaft speed; without one there are no orders, and Hz are used
 */
export function perHz(unit: FrequencyUnit, speedHz: number | null): number {
  if (unit === 'cpm') return 60;
  return unit === 'orders' && hasSpeed(speedHz) ? 1 / speedHz : 1;
}

/** The unit that can be shown: orders need a speed. */
export function usableUnit(unit: FrequencyUnit, speedHz: number | null): FrequencyUnit {
  return unit === 'orders' && !hasSpeed(speedHz) ? 'hz' : unit;
}

function hasSpeed(speedHz: number | null): speedHz is number {
  return speedHz !== null && speedHz > 0 && Number.isFinite(speedHz);
}
