import { describe, expect, it } from 'vitest';
import { analyseWaveform } from '#shared/signal/analyse-waveform.ts';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';
import { colouredNoise, noiseColours } from './test-signals.ts';

const sampleRateHz = 2048;

/** Chances stated for the orders of many noise records, and the runs found. */
function screenNoise(colour: (typeof noiseColours)[number], records: number, told: boolean) {
  let [orders, below5, below1, runs, flagged] = [0, 0, 0, 0, 0];
  for (let seed = 1; seed <= records; seed += 1) {
    const input = {
      samples: colouredNoise(colour, 8192, 7919 * seed + noiseColours.indexOf(colour)),
      sampleRateHz,
      unit: 'mm/s' as const,
      toldSpeedRpm: told ? 1500 : undefined,
    };
    const family = analyseWaveform(input).family;
    for (const line of family?.orders ?? []) {
      // The first order is what the search itself has sought out.
      if (line.order <= 1) continue;
      orders += 1;
      if (line.pNoise < 0.05) below5 += 1;
      if (line.pNoise < 0.01) below1 += 1;
    }
    if ((family?.run.pChance ?? 1) < 1e-3) runs += 1;
    const { verdict } = screenWaveform(input).result;
    if (verdict === 'suspected' || verdict === 'likely') flagged += 1;
  }
  return { share5: below5 / orders, share1: below1 / orders, orders, runs, flagged };
}

describe('noise of any colour', () => {
  for (const colour of noiseColours) {
    it(`has no family of orders where it is ${colour}, and lines no oftener than stated`, () => {
      const found = screenNoise(colour, 50, true);
      const where = JSON.stringify({ colour, ...found });
      expect(found.flagged, where).toBe(0);
      // Of 50 chances of one in a thousand two come true once in a thousand times.
      expect(found.runs, where).toBeLessThanOrEqual(1);
      // Sampling error of some 3,800 orders, neighbours sharing a floor: half a per cent at 5 %.
      expect(found.share5, where).toBeGreaterThan(0.02);
      expect(found.share5, where).toBeLessThan(0.055);
      expect(found.share1, where).toBeLessThan(0.013);
    });

    it(`is not called loose where it is ${colour} and no speed is told`, () => {
      const found = screenNoise(colour, 20, false);
      expect(found.flagged).toBe(0);
      expect(found.runs).toBe(0);
    });
  }
});
