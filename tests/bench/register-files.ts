/** A register of any size as import files; the same for the same number of machines. */
export interface RegisterFiles {
  machines: string;
  positions: string;
  fitRecords: string;
  points: string;
}

const kinds = ['pump', 'fan', 'motor', 'compressor', 'conveyor'];
const criticalities = ['low', 'medium', 'high'];
const services = ['Cooling water', 'Condensate', 'Exhaust', 'Feed', 'Slurry', 'Instrument air'];
/** Designation with its bore and outside diameter, ISO 15 dimension series 02 and 03. */
const bearings = [
  { designation: '6208', d: 40, D: 80 },
  { designation: '6312', d: 60, D: 130 },
  { designation: '22216', d: 80, D: 140 },
] as const;

const of = <T>(list: readonly T[], index: number): T => {
  const found = list[index % list.length];
  if (found === undefined) throw new Error('The list is empty.');
  return found;
};
const csv = (header: string, rows: string[]) => `${header}\r\n${rows.join('\r\n')}\r\n`;

/**
 * Two bearing positions a machine, two seats a position with one fit record each, three measuring
 * points a position.
 */
export function registerFiles(machineCount: number): RegisterFiles {
  const machines: string[] = [];
  const positions: string[] = [];
  const fitRecords: string[] = [];
  const points: string[] = [];
  for (let i = 0; i < machineCount; i += 1) {
    const tag = `P-${String(i).padStart(5, '0')}`;
    const year = 2027 + (i % 3);
    machines.push(
      `${tag},${of(services, i)} unit ${i},${of(kinds, i)},${7.5 + (i % 40)},1480,rigid,${of(criticalities, i)},${year}-06-15`,
    );
    for (const [index, code] of ['DE', 'NDE'].entries()) {
      const { designation, d, D } = of(bearings, i + index);
      positions.push(`${tag},${code},${code} bearing,${designation},rotating,stationary,${index}`);
      const shaftMm = (d + 0.002 * (i % 7)).toFixed(3);
      const housingMm = (D + 0.003 * (i % 11)).toFixed(3);
      fitRecords.push(`${tag},${code},shaft,2025-04-01,mounting,k5,${shaftMm},sound`);
      fitRecords.push(`${tag},${code},housing,2025-04-01,mounting,H7,${housingMm},sound`);
      for (const direction of ['horizontal', 'vertical', 'axial']) {
        points.push(`${tag},${code},${direction}`);
      }
    }
  }
  return {
    machines: csv(
      'tag,name,kind,power [kW],nominal speed [r/min],mounting,criticality,next planned stop',
      machines,
    ),
    positions: csv(
      'machine tag,position code,name,designation,inner ring load,outer ring load,sequence',
      positions,
    ),
    fitRecords: csv(
      'machine tag,position code,seat,recorded on,source,tolerance class,seat diameter [mm],condition',
      fitRecords,
    ),
    points: csv('machine tag,position code,direction', points),
  };
}
