import type { MachineResponse } from '#shared/contracts/machine.ts';
import { formatEntered } from '#src/lib/numbers.ts';

/** One shaft of a machine, told from the others by its speed. */
export interface Shaft {
  /** Speed over the machine's told speed. */
  ratio: number;
  speedRpm: number | null;
  positionCodes: string[];
}

/** Speed of a position's shaft; null where the machine's own is not known. */
export const shaftSpeedRpm = (
  { nominalSpeedRpm }: Pick<MachineResponse, 'nominalSpeedRpm'>,
  ratio: number,
): number | null => (nominalSpeedRpm === null ? null : nominalSpeedRpm * ratio);

/** The shafts of a machine, the told one first, then by speed. */
export function shaftsOf(
  machine: Pick<MachineResponse, 'nominalSpeedRpm'> & {
    positions: readonly Pick<MachineResponse['positions'][number], 'shaftRatio' | 'code'>[];
  },
): Shaft[] {
  const shafts = new Map<number, Shaft>();
  for (const { shaftRatio: ratio, code } of machine.positions) {
    const known = shafts.get(ratio) ?? {
      ratio,
      speedRpm: shaftSpeedRpm(machine, ratio),
      positionCodes: [],
    };
    known.positionCodes.push(code);
    shafts.set(ratio, known);
  }
  const rank = ({ ratio }: Shaft) => (ratio === 1 ? Infinity : ratio);
  return [...shafts.values()].sort((a, b) => rank(b) - rank(a));
}

const speedText = (speedRpm: number | null) =>
  speedRpm === null ? '' : ` (${formatEntered(Math.round(speedRpm * 10) / 10)} r/min)`;

/** "So far: 1 (1480 r/min), 0.3125 (462.5 r/min)." */
export function shaftsInWords(shafts: readonly Shaft[]): string {
  if (shafts.length === 0) return 'The told shaft has 1.';
  const each = shafts.map(({ ratio, speedRpm }) => `${formatEntered(ratio)}${speedText(speedRpm)}`);
  return `So far: ${each.join(', ')}.`;
}
