import { describe, expect, it } from 'vitest';
import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import {
  readingQuestion,
  readingsMeaning,
} from '#src/features/inspections/components/readings-meaning.ts';
import type { PlacedReading } from '#src/features/inspections/components/report-draft.ts';
import { aSeat } from '#tests/support/client-fixtures.ts';

const reading = (diameterMm: number, overrides: Partial<PlacedReading> = {}): PlacedReading => ({
  key: '',
  part: 'seat',
  plane: 1,
  directionDeg: 0,
  diameterMm,
  ...overrides,
});
// k5 at 60 mm is +2 to +15 µm, the bore of a Normal class bearing −15 to 0 µm: ISO 286-2 and ISO 492, from memory.
const shaft = aSeat({ seat: 'shaft' });
const housing: SeatAssessment = aSeat({
  seat: 'housing',
  nominalMm: 130,
  toleranceClass: 'H7',
  seatLimitsMm: [130, 130.04],
  ringLimitsUm: [-18, 0],
});

describe('readings while they are typed', () => {
  it('say how far below its limits a worn shaft is and what clearance that leaves', () => {
    expect(readingsMeaning(shaft, [reading(59.98), reading(59.984)])).toBe(
      'Mean 59.9820 mm of 2, readings 4.0 µm apart. ' +
        'It lies 20.0 µm below k5 (60.002 to 60.015 mm). ' +
        'With a ring inside its tolerance that is 18.0 µm of clearance to 3.0 µm of clearance.',
    );
  });

  it('give the measured fit where the ring was measured too', () => {
    const meaning = readingsMeaning(shaft, [reading(60.01), reading(59.992, { part: 'ring' })]);
    expect(meaning).toMatch(/It lies within k5.*Measured fit: 18\.0 µm of interference\.$/);
  });

  it('count a large housing bore as clearance', () => {
    const meaning = readingsMeaning(housing, [reading(130.06), reading(129.99, { part: 'ring' })]);
    expect(meaning).toMatch(/20\.0 µm above H7.*Measured fit: 70\.0 µm of clearance\.$/);
  });

  it('say nothing while a reading can’t be right', () => {
    expect(readingsMeaning(shaft, [reading(60.01), reading(2.361)])).toBeNull();
    expect(readingQuestion(2.361, 60)).toMatch(/looks like inches/);
    expect(readingQuestion(Number.NaN, 60)).toBe('This is no number.');
    expect(readingQuestion(59.8, 60)).toBeNull();
  });

  it('say nothing of a seat of which only the ring was measured', () => {
    expect(readingsMeaning(shaft, [reading(59.99, { part: 'ring' })])).toBeNull();
  });
});
