import { describe, expect, it } from 'vitest';
import { meanDiameterMm, reportFaults } from '#server/features/inspections/report-checks.ts';
import type { InspectionReport, ReportedSeat, SeatReading } from '#shared/contracts/inspection.ts';

const nominal = { shaft: 60, housing: 130 };
const at = (diameterMm: number, place: Partial<SeatReading> = {}): SeatReading => ({
  part: 'seat',
  plane: 1,
  directionDeg: 0,
  diameterMm,
  ...place,
});
const shaftSeat = (...readings: SeatReading[]): ReportedSeat => ({
  seat: 'shaft',
  stage: 'as found',
  condition: 'creep marks',
  readings,
});
const reportOf = (...seats: ReportedSeat[]): InspectionReport => ({
  cautionsRead: true,
  outcome: 'loose',
  seats,
  inPlaceResult: null,
  inPlaceChecks: [],
  causeInPlace: false,
  workDone: 'Measured.',
  repaired: false,
});

describe('readings of an inspection', () => {
  it('are taken where the seat is worn by two tenths of a millimetre', () => {
    expect(reportFaults(reportOf(shaftSeat(at(59.8))), nominal)).toEqual([]);
  });

  it.each([
    ['in inches', 2.3622, /inches/],
    ['a factor 1000 too large', 2800, /factor of 1000|off/],
    ['a factor 10 too small', 6.0005, /off/],
    ['of the other seat', 130.01, /off/],
  ])('are refused at their field when they are %s', (_what, diameterMm, message) => {
    const faults = reportFaults(
      reportOf(shaftSeat(at(60.005), at(diameterMm, { plane: 2 }))),
      nominal,
    );
    expect(faults).toEqual([
      {
        path: 'report.seats.0.readings.1.diameterMm',
        message: expect.stringMatching(message) as string,
      },
    ]);
  });

  it('are refused when one place is given twice', () => {
    const [fault] = reportFaults(reportOf(shaftSeat(at(60.001), at(60.002))), nominal);
    expect(fault?.message).toBe('Plane 1, 0° is given twice.');
  });

  it('of the same place on seat and ring are two readings', () => {
    expect(
      reportFaults(reportOf(shaftSeat(at(60.001), at(59.995, { part: 'ring' }))), nominal),
    ).toEqual([]);
  });

  it('are taken as they are where the nominal size is not on record', () => {
    expect(reportFaults(reportOf(shaftSeat(at(2.36))), { shaft: null, housing: null })).toEqual([]);
  });

  it('name a seat that is reported twice at the same stage', () => {
    const faults = reportFaults(reportOf(shaftSeat(), shaftSeat()), nominal);
    expect(faults).toEqual([
      { path: 'report.seats.1', message: 'The shaft seat is reported twice as found.' },
    ]);
  });

  it('are averaged for seat and ring on their own', () => {
    const seat = shaftSeat(
      at(60.002),
      at(60.006, { directionDeg: 90 }),
      at(59.99, { part: 'ring' }),
    );
    expect(meanDiameterMm(seat, 'seat')).toBe(60.004);
    expect(meanDiameterMm(seat, 'ring')).toBe(59.99);
    expect(meanDiameterMm(shaftSeat(), 'seat')).toBeNull();
  });
});
