import type { DiameterUnit } from '#shared/contracts/fit-record.ts';

/** A diameter in the unit in which it was read: micrometres of a millimetre, tens of microinches. */
export function diameterText(valueMm: number, unit: DiameterUnit): string {
  if (unit === 'mm') return valueMm.toFixed(3);
  const [whole = '0', decimals = ''] = String(Number((valueMm / 25.4).toFixed(6))).split('.');
  return `${whole}.${decimals.padEnd(4, '0')}`;
}
