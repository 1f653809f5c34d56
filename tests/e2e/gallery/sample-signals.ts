import type { OrderMark } from '#src/charts/order-mark.ts';

/** A seeded generator: the gallery looks the same every time. */
export function seededNoise(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 1664525 + 1013904223) % 4294967296;
    return state / 4294967296 - 0.5;
  };
}

export const speedHz = 24.72;

export const looseMarks: OrderMark[] = [
  [1 / 3, 4],
  [1 / 2, 14],
  [2 / 3, 3],
  [1, 33],
  [1.5, 13],
  [2, 27],
  [2.5, 9],
  [3, 30],
  [3.5, 8],
  [4, 24],
  [4.5, 4],
  [5, 26],
  [5.5, 3],
  [6, 21],
  [7, 18],
  [8, 15],
  [9, 12],
  [10, 7],
  [11, 5],
  [12, 22],
  [13, 3],
  [14, 4],
  [15, 2],
  [16, 3],
  [17, 1],
  [18, 2],
  [19, 1],
  [20, 2],
].map(([order = 0, prominenceDb = 0]) => ({
  order,
  prominenceDb,
  significant: prominenceDb >= 8,
  explainedBy: order === 12 ? 'vane pass' : order === 4 ? 'line frequency × 2' : null,
}));

export const healthyMarks: OrderMark[] = looseMarks.map((mark) => ({
  ...mark,
  prominenceDb: mark.order === 1 ? 24 : mark.order === 12 ? 19 : mark.prominenceDb * 0.2,
  significant: mark.order === 1 || mark.order === 12,
}));

export function sampleSpectrum(level = 1, seed = 7) {
  const noise = seededNoise(seed);
  const stepHz = 0.15625;
  const amplitude = Float32Array.from({ length: 3200 }, (_, line) => {
    const frequencyHz = line * stepHz;
    let value = 0.02 + 0.015 * Math.abs(noise()) + 0.02 * Math.exp(-frequencyHz / 60);
    for (const { order, prominenceDb } of looseMarks) {
      const away = (frequencyHz - order * speedHz) / stepHz;
      if (Math.abs(away) < 2)
        value += 0.03 * level * 10 ** (prominenceDb / 20) * Math.max(0, 1 - Math.abs(away) / 2);
    }
    return value;
  });
  return { stepHz, amplitude };
}

export const sampleRateHz = 2560;

export function sampleWaveform(count = 16384): Float32Array {
  const noise = seededNoise(3);
  return Float32Array.from({ length: count }, (_, i) => {
    const angle = (2 * Math.PI * speedHz * i) / sampleRateHz;
    const raw =
      2.1 * Math.sin(angle) +
      1.2 * Math.sin(2 * angle + 1) +
      0.8 * Math.sin(3 * angle) +
      0.5 * noise();
    return Math.min(1.9, raw);
  });
}

export function truncatedRanges(samples: Float32Array): [number, number][] {
  const ranges: [number, number][] = [];
  let from = -1;
  samples.forEach((value, i) => {
    if (value >= 1.88 && from < 0) from = i;
    if (value < 1.88 && from >= 0) {
      if (i - from > 4) ranges.push([from, i]);
      from = -1;
    }
  });
  return ranges.slice(0, 400);
}

export const sampleTurn = Float32Array.from({ length: 256 }, (_, i) => {
  const angle = (2 * Math.PI * i) / 256;
  return Math.min(
    1.6,
    2.1 * Math.sin(angle) + 1.1 * Math.sin(2 * angle + 1) + 0.8 * Math.sin(3 * angle),
  );
});
