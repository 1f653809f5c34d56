import { describe, expect, it } from 'vitest';
import { runTask } from '#server/screening/screening-worker.ts';
import type { ScreenAnswer } from '#server/screening/worker-tasks.ts';
import { defaultLimits } from '#shared/signal/screen-waveform.ts';

const screen = async (limits: object) =>
  (await runTask({
    task: 'screen',
    limits,
    input: {
      samples: Float64Array.from({ length: 8192 }, (_, i) =>
        Math.sin((2 * Math.PI * 25 * i) / 2048),
      ),
      sampleRateHz: 2048,
      unit: 'm/s²',
      toldSpeedRpm: 1500,
    },
  })) as ScreenAnswer;

describe('screening in a worker', () => {
  it('judges by the limits in force and keeps them with the result', async () => {
    const lenient = await screen({ suspectedScore: 0.999, likelyScore: 1 });
    expect(lenient.result.limits).toEqual({
      ...defaultLimits,
      suspectedScore: 0.999,
      likelyScore: 1,
    });
    expect(lenient.result.verdict).toBe('none');
    const strict = await screen({ suspectedScore: 0, likelyScore: 1 });
    expect(strict.result.verdict).toBe('suspected');
    expect(strict.result.score).toBe(lenient.result.score);
  });

  it('judges by the method’s own limits where none are set', async () => {
    expect((await screen({})).result.limits).toEqual(defaultLimits);
  });
});
