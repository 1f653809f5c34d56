import { describe, expect, it } from 'vitest';
import { changeSince } from '#shared/signal/change-since.ts';

const survey = (day: string, runMmPerS: number, score = 0.1) => ({
  takenAtMs: Date.parse(`${day}T08:00:00Z`),
  score,
  firstOrderMmPerS: 1,
  runMmPerS,
  overallMmPerS: 2,
});

describe('what changed since earlier surveys', () => {
  it('says nothing of a point’s first survey, or of traces', () => {
    expect(changeSince({ score: 0.7, runMmPerS: 1.2 })).toEqual([]);
    expect(changeSince({ score: 0.1, runMmPerS: 0.04 }, [survey('2026-10-26', 0.01)])).toEqual([]);
  });

  it('counts a run that grew as evidence, with the day and both levels', () => {
    expect(changeSince({ score: 0.72, runMmPerS: 1.2 }, [survey('2026-10-26', 0.4)])).toEqual([
      {
        for: true,
        text: 'Orders 2 to 10 rose since the survey of 2026-10-26 from 0.40 mm/s rms to 1.2 mm/s rms (score 0.10 then, 0.72 now).',
      },
    ]);
  });

  it('counts a run that fell, or stood there all along, against it', () => {
    const [fell] = changeSince({ score: 0.2, runMmPerS: 0.2 }, [survey('2026-10-26', 1, 0.8)]);
    expect(fell).toMatchObject({ for: false, text: expect.stringMatching(/fell since/u) });
    const [stands] = changeSince({ score: 0.6, runMmPerS: 1 }, [
      survey('2026-09-28', 0.9),
      survey('2026-10-26', 1.1),
    ]);
    expect(stands).toMatchObject({
      for: false,
      text: expect.stringMatching(/as in 2 earlier surveys/u),
    });
  });
});
