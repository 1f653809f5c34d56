import { describe, expect, it } from 'vitest';
import { simulatedFindings } from '#fixtures/fits/simulated-positions.ts';
import { assessSeats } from '#shared/fits/assess-seats.ts';
import type { PositionFit } from '#shared/fits/fit-types.ts';
import { rankSeats, type SuspectSeat } from '#shared/fits/seat-ranking.ts';

const turning: PositionFit = {
  designation: '6312',
  innerLoad: 'rotating',
  outerLoad: 'stationary',
  loadLevel: 'normal',
};

function suspects(name: string, isNeighbour: boolean, input: PositionFit): SuspectSeat[] {
  const { shaftSeat, housingSeat } = assessSeats({ ...turning, ...input });
  return [
    {
      key: `${name}:shaft`,
      positionName: name,
      seat: 'shaft',
      isNeighbour,
      fit: shaftSeat,
      toleranceClass: input.shaftClass,
    },
    {
      key: `${name}:housing`,
      positionName: name,
      seat: 'housing',
      isNeighbour,
      fit: housingSeat,
      toleranceClass: input.housingClass,
    },
  ];
}

const sound = { shaftClass: 'k5', housingClass: 'H7' };
const worn = { ...sound, shaftMeasuredMm: 59.97 };

describe('ranking on simulated findings with a known loose seat', () => {
  // The model of the simulation, and what differs from the ranking's own, stands in the fixture.
  it.each([11, 12, 13])(
    'puts the right seat first in at least 85 of 100 with complete records (seed %d)',
    (seed) => {
      const findings = simulatedFindings(seed, 400, true);
      const right = findings.filter(
        (f) => rankSeats(f.suspects, f.signs).seats[0]?.key === f.looseKey,
      );
      expect(right.length / findings.length).toBeGreaterThanOrEqual(0.85);
    },
  );

  it('is right in at least 93 of 100 of the rankings it is confident of', () => {
    const confident = simulatedFindings(21, 400, true)
      .map((f) => ({ f, ranking: rankSeats(f.suspects, f.signs) }))
      .filter(({ ranking }) => ranking.isConfident);
    const right = confident.filter(({ f, ranking }) => ranking.seats[0]?.key === f.looseKey);
    expect(confident.length).toBeGreaterThan(200);
    expect(right.length / confident.length).toBeGreaterThanOrEqual(0.93);
  });

  it('is never confident and gives no figure where nothing is recorded', () => {
    for (const { suspects: seats, signs } of simulatedFindings(31, 200, false)) {
      const ranking = rankSeats(seats, signs);
      expect(ranking.isConfident).toBe(false);
      expect(ranking.seats.every((s) => s.suspicion === null)).toBe(true);
      expect(ranking.elsewhere).toBeNull();
      expect(ranking.firstGap).toMatch(/^M-DE:/);
      expect(ranking.conclusion).toContain('first step');
    }
  });
});

describe('ranking', () => {
  const seatSigns = { kind: 'seat', truncationSide: 'none' } as const;

  it('puts a seat measured loose before sound ones, with its reason', () => {
    const ranking = rankSeats(
      [...suspects('M-DE', false, worn), ...suspects('M-NDE', true, sound)],
      seatSigns,
    );
    expect(ranking.seats[0]).toMatchObject({ key: 'M-DE:shaft', rank: 1 });
    expect(ranking.seats[0]?.suspicion).toBeGreaterThan(0.9);
    expect(ranking.seats[0]?.reason).toContain('k5 on record');
    expect(ranking.isConfident).toBe(true);
    expect(ranking.conclusion).toContain('shaft seat of M-DE');
  });

  it('shares the whole chance out between the seats and elsewhere', () => {
    const ranking = rankSeats(
      [...suspects('M-DE', false, worn), ...suspects('M-NDE', true, sound)],
      seatSigns,
    );
    const sum = ranking.seats.reduce(
      (total, s) => total + (s.suspicion ?? 0),
      ranking.elsewhere ?? 0,
    );
    expect(sum).toBeCloseTo(1, 9);
  });

  it('lets the signs decide between two seats the records leave alike', () => {
    const alike: SuspectSeat[] = (['shaft', 'housing'] as const).map((seat) => ({
      key: seat,
      positionName: 'M-DE',
      seat,
      isNeighbour: false,
      fit: { verdict: 'looser', chanceOfClearance: 0.5 },
    }));
    const creeping = rankSeats(alike, { kind: 'seat', creepModulation: true });
    const lifting = rankSeats(alike, {
      kind: 'seat',
      truncationSide: 'upper',
      strongestDirection: 'vertical',
    });
    expect(creeping.seats[0]?.key).toBe('shaft');
    expect(creeping.seats[0]?.reason).toContain('slow creep');
    expect(lifting.seats[0]?.key).toBe('housing');
    expect(lifting.seats[0]?.reason).toContain('one side');
  });

  it('asks for no record of a seat that is recorded without a chance, and gives it no figure', () => {
    const [shaft, housing] = suspects('M-DE', false, { ...sound, shaftBonded: true });
    if (shaft === undefined || housing === undefined) throw new Error('Two seats expected.');
    const asked = rankSeats([shaft, housing], { kind: 'seat' });
    expect(asked.firstGap).toBe('M-DE:shaft');
    const bonded = { ...shaft, recordedAs: 'bonded with adhesive on purpose' };
    const ranking = rankSeats([bonded, housing], { kind: 'seat' });
    const ranked = ranking.seats.find(({ key }) => key === 'M-DE:shaft');
    expect(ranking.firstGap).toBeNull();
    expect(ranked?.suspicion).toBeNull();
    expect(ranked?.reason).toMatch(/bonded with adhesive on purpose, which allows no figure/);
  });

  it('prefers the position of the finding to its neighbour, unless that one is much louder', () => {
    const both = (levelRatio?: number): SuspectSeat[] => [
      {
        key: 'own',
        positionName: 'M-DE',
        seat: 'shaft',
        isNeighbour: false,
        fit: { chanceOfClearance: 0.5 },
      },
      {
        key: 'next',
        positionName: 'M-NDE',
        seat: 'shaft',
        isNeighbour: true,
        fit: { chanceOfClearance: 0.5 },
        levelRatio,
      },
    ];
    expect(rankSeats(both(), seatSigns).seats[0]?.key).toBe('own');
    expect(rankSeats(both(10), seatSigns).seats[1]?.key).toBe('next');
    expect(rankSeats(both(10), seatSigns).seats[1]?.suspicion).toBeGreaterThan(
      rankSeats(both(), seatSigns).seats[1]?.suspicion ?? 1,
    );
  });

  it('names the missing record of a half-recorded position first and is not confident', () => {
    const ranking = rankSeats(suspects('M-DE', false, { shaftClass: 'k5' }), seatSigns);
    expect(ranking.firstGap).toBe('M-DE:housing');
    expect(ranking.isConfident).toBe(false);
    expect(ranking.conclusion).toContain('record of the housing seat of M-DE is missing');
    expect(ranking.seats.find((s) => s.key === 'M-DE:housing')?.suspicion).toBeNull();
  });

  it('points to pedestal and feet where the records are sound and the signs say so', () => {
    const ranking = rankSeats(suspects('M-DE', false, sound), {
      kind: 'pedestal',
      strongestDirection: 'vertical',
    });
    expect(ranking.elsewhere).toBeGreaterThan(0.5);
    expect(ranking.isConfident).toBe(false);
    expect(ranking.conclusion).toContain('pedestal, feet and frame');
  });

  it('has nothing to say of a position without seats', () => {
    expect(rankSeats([], seatSigns)).toMatchObject({
      seats: [],
      firstGap: null,
      isConfident: false,
    });
  });
});
