import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { windowOf } from '#shared/signal/amplitude-spectrum.ts';
import { realFft } from '#shared/signal/fft.ts';
import { averageSegments, orderSegments } from '#shared/signal/order-spectra.ts';
import { fisherTail, gammaTail, logGamma } from '#shared/signal/tail-chances.ts';

const referenceSchema = z.object({
  transforms: z.array(
    z.object({
      count: z.number(),
      lines: z.array(z.tuple([z.number(), z.number(), z.number()])),
    }),
  ),
  welch: z.object({
    turns: z.number(),
    count: z.number(),
    lines: z.array(z.tuple([z.number(), z.number()])),
  }),
  logGamma: z.array(z.tuple([z.number(), z.number()])),
  gammaTail: z.array(z.tuple([z.number(), z.number(), z.number()])),
  fisherTail: z.array(z.tuple([z.number(), z.number(), z.number(), z.number()])),
  hannNoiseBandwidth: z.number(),
});

const script = new URL('./scipy-reference.py', import.meta.url).pathname;
const reference = referenceSchema.parse(
  JSON.parse(readFileSync(new URL('./scipy-reference.json', import.meta.url), 'utf8')),
);

/** The script's record: a chirp with a slow line. */
const record = (count: number) =>
  Float64Array.from(
    { length: count },
    (_, i) => Math.sin(0.37 * i + 2e-4 * i * i) + 0.5 * Math.cos(0.011 * i) + 0.1,
  );

const relative = (found: number, wanted: number) =>
  Math.abs(found - wanted) / Math.max(Math.abs(wanted), 1e-300);

// SciPy 1.10.1; scipy-reference.py beside this file makes the values.
describe('against SciPy', () => {
  it('transforms to the same lines', () => {
    for (const { count, lines } of reference.transforms) {
      const found = realFft(record(count));
      for (const [k, re, im] of lines) {
        expect(found[2 * k], `${count}: ${k}`).toBeCloseTo(re, 7);
        expect(found[2 * k + 1], `${count}: ${k}`).toBeCloseTo(im, 7);
      }
    }
  });

  it("averages segments as Welch's method does", () => {
    const { turns, count, lines } = reference.welch;
    const { power } = averageSegments(orderSegments(record(count), turns, turns / 2));
    for (const [k, wanted] of lines) expect(relative(power[k] ?? 0, wanted)).toBeLessThan(1e-8);
  });

  it('has the same gamma function and tails of the gamma and F distributions', () => {
    for (const [x, wanted] of reference.logGamma) expect(logGamma(x)).toBeCloseTo(wanted, 9);
    for (const [a, x, wanted] of reference.gammaTail) {
      expect(relative(gammaTail(a, x), wanted), `gamma ${a} ${x}`).toBeLessThan(1e-8);
    }
    for (const [ratio, n, m, wanted] of reference.fisherTail) {
      expect(relative(fisherTail(ratio, n, m), wanted), `F ${ratio} ${n} ${m}`).toBeLessThan(1e-8);
    }
  });

  it('has the same noise bandwidth of the Hann window', () => {
    const window = windowOf('hann', 4096);
    const [sum, squares] = window.reduce(([a, b], w) => [a + w, b + w * w], [0, 0]);
    expect((4096 * squares) / sum ** 2).toBeCloseTo(reference.hannNoiseBandwidth, 12);
  });

  const python = ['/usr/bin/python3', 'python3'].find(
    (name) => spawnSync(name, ['-c', 'import scipy']).status === 0,
  );
  it.skipIf(python === undefined)(
    'has values that the script beside it still makes',
    () => {
      const made = spawnSync(python ?? '', [script], { encoding: 'utf8' });
      expect(made.status, made.stderr).toBe(0);
      const again = referenceSchema.parse(JSON.parse(made.stdout));
      const flat = (values: unknown): number[] =>
        typeof values === 'number'
          ? [values]
          : Object.values(values as Record<string, unknown>).flatMap(flat);
      const [wanted, found] = [flat(reference), flat(again)];
      expect(found).toHaveLength(wanted.length);
      found.forEach((value, i) => expect(value).toBeCloseTo(wanted[i] ?? NaN, 8));
    },
    60_000,
  );
});
