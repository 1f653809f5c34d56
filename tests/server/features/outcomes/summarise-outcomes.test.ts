import { describe, expect, it } from 'vitest';
import type { OutcomeCase, OutcomeFlag } from '#server/features/outcomes/outcome-case.ts';
import { summariseOutcomes } from '#server/features/outcomes/summarise-outcomes.ts';

const aFlag = (overrides: Partial<OutcomeFlag> = {}): OutcomeFlag => ({
  verdict: 'likely',
  score: 0.9,
  kind: 'seat',
  speedSource: 'refined',
  direction: 'vertical',
  surveyedOn: '2026-09-01',
  decidedAt: new Date('2026-09-02T08:00:00Z'),
  ...overrides,
});
let lastId = 0;
const aCase = (overrides: Partial<OutcomeCase> = {}): OutcomeCase => ({
  findingId: (lastId += 1),
  state: 'open',
  machineKind: 'pump',
  flags: [aFlag()],
  reports: [],
  closedAt: null,
  ...overrides,
});
const reported = (outcome: 'loose' | 'not loose' | 'not clear', at = '2026-09-11T10:00:00Z') => ({
  outcome,
  reportedAt: new Date(at),
});

describe('what became of the flags', () => {
  it('counts findings by what their inspections said', () => {
    const { site } = summariseOutcomes([
      ...Array.from({ length: 3 }, () => aCase({ reports: [reported('loose')] })),
      ...Array.from({ length: 7 }, () => aCase({ reports: [reported('not loose')] })),
      aCase({ reports: [reported('not clear')] }),
      aCase({ state: 'dismissed' }),
      aCase(),
    ]);
    expect(site).toMatchObject({
      confirmedCount: 3,
      notFoundCount: 7,
      unsettledCount: 1,
      dismissedCount: 1,
      waitingCount: 1,
    });
    // R 3.6.2, prop.test(3, 10, correct = FALSE), see the tests of wilsonInterval.
    expect(site.predictiveValue?.share).toBe(0.3);
    expect(site.predictiveValue?.low).toBeCloseTo(0.1077913, 6);
    expect(site.predictiveValue?.high).toBeCloseTo(0.6032219, 6);
  });

  it('gives no predictive value where nothing is settled', () => {
    expect(summariseOutcomes([aCase()]).site.predictiveValue).toBeNull();
    expect(summariseOutcomes([]).byMachineKind).toEqual([]);
  });

  it('counts a finding once, under the verdict of its highest score', () => {
    const { byVerdict } = summariseOutcomes([
      aCase({
        flags: [aFlag({ verdict: 'suspected', score: 0.6 }), aFlag({ score: 0.9 })],
        reports: [reported('loose')],
      }),
      aCase({ flags: [aFlag({ verdict: 'suspected', score: 0.6 })] }),
    ]);
    expect(byVerdict).toMatchObject([
      { verdict: 'likely', confirmedCount: 1, waitingCount: 0 },
      { verdict: 'suspected', confirmedCount: 0, waitingCount: 1 },
    ]);
  });

  it('leaves out what was accepted after the inspection had reported', () => {
    const later = aFlag({ direction: 'axial', decidedAt: new Date('2026-10-01T00:00:00Z') });
    const { traits } = summariseOutcomes([
      aCase({ flags: [aFlag(), later], reports: [reported('loose')] }),
    ]);
    expect(traits.filter(({ trait }) => trait === 'direction')).toEqual([
      { trait: 'direction', value: 'vertical', confirmedCount: 1, notFoundCount: 0 },
    ]);
  });

  it('takes a finding for confirmed that one of two inspections found loose', () => {
    const { site } = summariseOutcomes([
      aCase({ reports: [reported('not loose'), reported('loose', '2026-10-11T10:00:00Z')] }),
    ]);
    expect(site).toMatchObject({ confirmedCount: 1, notFoundCount: 0 });
  });

  it('measures the days from survey to inspection to closing, as medians with their counts', () => {
    const { times } = summariseOutcomes([
      aCase({ reports: [reported('loose')], closedAt: new Date('2026-09-21T09:00:00Z') }),
      aCase({ reports: [reported('loose', '2026-09-21T23:00:00Z')] }),
      aCase(),
    ]);
    expect(times).toEqual([
      { step: 'survey to inspection', medianDays: 15, findingCount: 2 },
      { step: 'inspection to closing', medianDays: 10, findingCount: 1 },
      { step: 'survey to closing', medianDays: 20, findingCount: 1 },
    ]);
  });

  it('sets the traits of wrong flags against those of right ones', () => {
    const { traits } = summariseOutcomes([
      aCase({ machineKind: 'fan', reports: [reported('not loose')] }),
      aCase({
        machineKind: 'fan',
        flags: [aFlag({ speedSource: 'estimated' }), aFlag({ direction: 'axial' })],
        reports: [reported('not loose')],
      }),
      aCase({ reports: [reported('loose')] }),
      aCase(),
    ]);
    expect(traits.filter(({ trait }) => trait === 'machine kind')).toEqual([
      { trait: 'machine kind', value: 'fan', confirmedCount: 0, notFoundCount: 3 },
      { trait: 'machine kind', value: 'pump', confirmedCount: 1, notFoundCount: 0 },
    ]);
    expect(traits).toContainEqual({
      trait: 'speed source',
      value: 'estimated',
      confirmedCount: 0,
      notFoundCount: 1,
    });
  });

  it('leaves findings out of the method’s account that it had not flagged', () => {
    const { site } = summariseOutcomes([
      aCase({ flags: [aFlag({ verdict: 'none', score: 0.2 })], reports: [reported('loose')] }),
    ]);
    expect(site.confirmedCount).toBe(0);
  });
});
