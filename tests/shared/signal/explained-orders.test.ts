import { describe, expect, it } from 'vitest';
import { bearingDefectOrders, explanations } from '#shared/signal/explained-orders.ts';

describe('bearingDefectOrders', () => {
  // Case Western Reserve University Bearing Data Center, drive end 6205-2RS: inside the published
  // table of defect frequencies, multiples of running speed: inner ring 5.4152, outer ring 3.5848,
  // cage train 0.39828, rolling element 4.7135 (both races struck: twice the spin). Geometry there:
  // nine balls, ball 0.3126 in, pitch 1.537 in.
  it('has the published multiples of a 6205', () => {
    const found = bearingDefectOrders({
      ballCount: 9,
      ballDiameterMm: 0.3126 * 25.4,
      pitchDiameterMm: 1.537 * 25.4,
      contactAngleDeg: 0,
    });
    expect(found.innerRace).toBeCloseTo(5.4152, 3);
    expect(found.outerRace).toBeCloseTo(3.5848, 3);
    expect(found.cage).toBeCloseTo(0.39828, 3);
    expect(2 * found.rollingElement).toBeCloseTo(4.7135, 2);
  });

  // Same source, fan end 6203-2RS: inner ring 4.9469, outer ring 3.0530, cage 0.3817, element 3.9874.
  it('has the published multiples of a 6203', () => {
    const found = bearingDefectOrders({
      ballCount: 8,
      ballDiameterMm: 0.2656 * 25.4,
      pitchDiameterMm: 1.122 * 25.4,
      contactAngleDeg: 0,
    });
    expect(found.innerRace).toBeCloseTo(4.9469, 2);
    expect(found.outerRace).toBeCloseTo(3.053, 2);
    expect(found.cage).toBeCloseTo(0.3817, 3);
    expect(2 * found.rollingElement).toBeCloseTo(3.9874, 2);
  });

  it('passes every ball over one race or the other: both orders add up to the ball count', () => {
    const found = bearingDefectOrders({
      ballCount: 13,
      ballDiameterMm: 19,
      pitchDiameterMm: 95,
      contactAngleDeg: 25,
    });
    expect(found.innerRace + found.outerRace).toBeCloseTo(13, 12);
  });
});

describe('explanations', () => {
  const at = (list: ReturnType<typeof explanations>, frequencyHz: number) =>
    list.filter((one) => Math.abs(one.frequencyHz - frequencyHz) < 1e-9).map((one) => one.words);

  it('names what is known to put a line there', () => {
    const list = explanations(
      25,
      { lineFrequencyHz: 50, bladeCount: 5, gearTeethCount: 17, beltFrequencyHz: 8 },
      1000,
    );
    expect(at(list, 100)).toContain('twice the line frequency');
    expect(at(list, 125)).toContain('blade pass');
    expect(at(list, 425)).toContain('gear mesh');
    expect(at(list, 450)).toContain('a sideband of the gear mesh');
    expect(at(list, 16)).toContain('2 × belt frequency');
  });

  it('explains nothing of a machine of which nothing is known', () => {
    expect(explanations(25, undefined, 1000)).toEqual([]);
    expect(explanations(25, {}, 1000)).toEqual([]);
  });
});
