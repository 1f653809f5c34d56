import { describe, expect, it } from 'vitest';
import { addFitRecordRequest, createFitRecordRequest } from '#shared/contracts/fit-record.ts';

const record = { seat: 'shaft', recordedOn: '2026-05-04', source: 'mounting' };
const faultOf = (change: object) => {
  const parsed = addFitRecordRequest.safeParse({ ...record, ...change });
  return parsed.error?.issues.map(({ path }) => path.join('.'));
};

describe('a fit record to add', () => {
  it('is kept in millimetres and corrects nothing where it says no more', () => {
    expect(addFitRecordRequest.parse({ ...record, toleranceClass: 'k5' })).toMatchObject({
      diameterUnit: 'mm',
      driveUpMm: null,
      bonding: null,
      correctsSameDay: false,
    });
  });

  it.each([
    ['a drive-up', { driveUpMm: 0.5 }],
    ['a loss of clearance', { clearanceReductionUm: 45 }],
    ['word of the adhesive', { bonding: 'bonded' }],
  ])('may say nothing but %s', (_what, said) => {
    expect(faultOf(said)).toBeUndefined();
  });

  it.each([
    ['nothing', {}, ['toleranceClass']],
    ['a negative drive-up', { driveUpMm: -0.1 }, ['driveUpMm']],
    ['a negative loss of clearance', { clearanceReductionUm: -1 }, ['clearanceReductionUm']],
    ['a diameter in feet', { seatMeasuredMm: 60, diameterUnit: 'ft' }, ['diameterUnit']],
    ['a day that is none', { toleranceClass: 'k5', recordedOn: '2026-02-30' }, ['recordedOn']],
  ])('is refused with %s, naming the field', (_what, change, fields) => {
    expect(faultOf(change)).toEqual(fields);
  });

  it('cannot be a correction when it is imported', () => {
    const imported = { ...record, toleranceClass: 'k5', correctsSameDay: true };
    expect(createFitRecordRequest.safeParse(imported).success).toBe(false);
  });
});
