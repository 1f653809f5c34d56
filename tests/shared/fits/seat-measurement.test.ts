import { describe, expect, it } from 'vitest';
import { conditionWords, seatMarks } from '#shared/fits/condition-words.ts';
import { diameterAt20Mm, inspectionLimits } from '#shared/fits/inspection-limits.ts';
import { measuringPlan } from '#shared/fits/measuring-plan.ts';
import { adviseOnReadings } from '#shared/fits/reading-advice.ts';
import { measureSeat, type DiameterReading } from '#shared/fits/seat-measurement.ts';

const directions = [0, 45, 90, 135] as const;
const readings = (first: readonly number[], second: readonly number[]): DiameterReading[] => [
  ...directions.map((directionDeg, i) => ({
    plane: 1 as const,
    directionDeg,
    diameter: first[i] ?? 0,
  })),
  ...directions.map((directionDeg, i) => ({
    plane: 2 as const,
    directionDeg,
    diameter: second[i] ?? 0,
  })),
];

describe('readings of a seat', () => {
  const set = readings([60.004, 60.006, 60.008, 60.006], [60.0, 60.001, 60.003, 60.0]);

  it('gives mean, taper and out-of-roundness (by hand: 60.0035, 5 µm, 4 µm)', () => {
    const seat = measureSeat(set, 60);
    expect(seat.meanDeviationUm).toBeCloseTo(3.5, 9);
    expect(seat.meanMm).toBeCloseTo(60.0035, 9);
    expect(seat.taperUm).toBeCloseTo(5, 9);
    expect(seat.outOfRoundnessUm).toBeCloseTo(4, 9);
    expect(seat).toMatchObject({ readingCount: 8, complete: true });
  });

  it('tells mean and out-of-roundness of each plane (by hand: 6 and 1 µm; 4 and 3 µm)', () => {
    const [first, second] = measureSeat(set, 60).planes;
    expect(first?.meanMm).toBeCloseTo(60.006, 9);
    expect(first?.outOfRoundnessUm).toBeCloseTo(4, 9);
    expect(second?.meanMm).toBeCloseTo(60.001, 9);
    expect(second?.outOfRoundnessUm).toBeCloseTo(3, 9);
    expect([first?.readingCount, second?.readingCount]).toEqual([4, 4]);
  });

  it('joins the instrument and the scatter in the uncertainty (by hand: √(2² + 9.1429/8))', () => {
    // Deviations 4 6 8 6 0 1 3 0 about 3.5: sum of squares 64, variance 64/7 = 9.1429.
    const seat = measureSeat(set, 60);
    expect(seat.standardUncertaintyUm).toBeCloseTo(Math.sqrt(4 + 64 / 7 / 8), 9);
    expect(seat.expandedUncertaintyUm).toBeCloseTo(2 * Math.sqrt(4 + 64 / 7 / 8), 9);
  });

  it('reads inches and gives the same seat', () => {
    const inches = set.map((r) => ({ ...r, diameter: r.diameter / 25.4 }));
    expect(measureSeat(inches, 60, { unit: 'in' }).meanDeviationUm).toBeCloseTo(3.5, 2);
  });

  it('questions a single reading in the wrong unit and names it', () => {
    const slipped = set.map((r, i) => (i === 2 ? { ...r, diameter: 2.3625 } : r));
    expect(() => measureSeat(slipped, 60)).toThrow(
      expect.objectContaining({ code: 'measured_in_inches', field: 'readings[2]' }),
    );
    expect(() => measureSeat([], 60)).toThrow(expect.objectContaining({ code: 'size_missing' }));
  });

  it('says when planes or directions are missing', () => {
    const one = measureSeat(set.slice(0, 1), 60);
    expect(one).toMatchObject({ complete: false, taperUm: undefined, outOfRoundnessUm: undefined });
  });
});

describe('inspection limits', () => {
  it('are diameters at 20 °C, in millimetres and inches', () => {
    const limits = inspectionLimits(60, [2, 15]);
    expect([limits.lowerMm, limits.upperMm]).toEqual([60.002, 60.015]);
    expect(limits.upperInch).toBeCloseTo(2.362795, 6);
  });

  it('bring a warm reading back to 20 °C (by hand: 60.03/(1 + 11.5e-6·20) = 60.0162)', () => {
    expect(diameterAt20Mm(60.03, { alphaPerK: 11.5e-6, temperatureC: 40 })).toBeCloseTo(60.0162, 4);
  });

  it('leave a reading alone where part and instrument are equally warm and alike', () => {
    const warm = { alphaPerK: 11.5e-6, temperatureC: 35 };
    expect(diameterAt20Mm(60.01, warm, warm)).toBeCloseTo(60.01, 9);
  });
});

describe('measuring plan', () => {
  it('asks for two planes and four directions', () => {
    expect(measuringPlan('shaft', 60, 31)).toMatchObject({
      planesMm: [7.75, 23.25],
      readingCount: 8,
      directionsDeg: [0, 45, 90, 135],
    });
    expect(measuringPlan('housing', 130).steps.join(' ')).toContain('split housing');
  });
});

describe('advice after readings', () => {
  const shaft = {
    seat: 'shaft',
    nominalMm: 60,
    limitsUm: [2, 15],
    expandedUncertaintyUm: 4,
  } as const;

  it.each([
    [{ meanDeviationUm: 8, condition: 'sound' }, 'leave'],
    [{ meanDeviationUm: 8 }, 'leave'],
    [{ meanDeviationUm: 8, condition: 'fretting corrosion' }, 'anti-fretting paste'],
    [{ meanDeviationUm: -20, condition: 'creep marks' }, 'restore the seat'],
    [{ meanDeviationUm: 0 }, 'measure again'],
    [{ meanDeviationUm: 30 }, 'rework to size'],
    [{ meanDeviationUm: 8, taperUm: -14 }, 'restore the seat'],
    [{ meanDeviationUm: 8, condition: 'plastic deformation' }, 'restore the seat'],
    [{ meanDeviationUm: 8, condition: 'cracked' }, 'replace the part'],
    [{ meanDeviationUm: 8, limitsUm: undefined }, 'get the limits'],
  ] as const)('shaft 60 k5, %j: %s', (reading, action) => {
    expect(adviseOnReadings({ ...shaft, ...reading }).action).toBe(action);
  });

  it('turns loose and tight round for a housing', () => {
    const housing = {
      seat: 'housing',
      nominalMm: 130,
      limitsUm: [0, 40],
      expandedUncertaintyUm: 4,
    } as const;
    expect(adviseOnReadings({ ...housing, meanDeviationUm: 70 }).action).toBe('restore the seat');
    expect(adviseOnReadings({ ...housing, meanDeviationUm: -20 }).action).toBe('rework to size');
  });

  it('says that paste is no cure for a seat worn past its limits', () => {
    expect(adviseOnReadings({ ...shaft, meanDeviationUm: -20 }).text).toContain('no cure');
  });
});

describe('condition words', () => {
  it('explain every mark a seat can have', () => {
    for (const mark of seatMarks) expect(conditionWords[mark].meaning.length).toBeGreaterThan(20);
  });
});
