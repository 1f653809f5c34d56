import { describe, expect, it } from 'vitest';
import type { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import { machineFactsOf } from '#server/screening/machine-facts.ts';

const pointOf = (lineFrequencyHz: number | null) =>
  ({
    direction: 'horizontal',
    bearingPosition: { shaftRatio: 1, machine: { kind: 'motor', lineFrequencyHz } },
  }) as unknown as MeasuringPoint;

describe('what is known of a waveform’s machine', () => {
  it('takes the line frequency of the file where the register says none', () => {
    expect(machineFactsOf(pointOf(null), [], 60).lineFrequencyHz).toBe(60);
    expect(machineFactsOf(pointOf(50), [], 60).lineFrequencyHz).toBe(50);
    expect(machineFactsOf(pointOf(null), [], null)).not.toHaveProperty('lineFrequencyHz');
  });
});
