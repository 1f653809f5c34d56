import { open } from 'node:fs/promises';

const chunkSamples = 128 * 1024;

/**
 * A file of 64-bit samples as little-endian 32-bit floats, piece by piece: the longest record takes
 * no more memory than one piece, and other requests get their turn between two.
 */
export async function* float32Samples(path: string): AsyncGenerator<Buffer> {
  for await (const samples of float64Chunks(path)) yield asBuffer(new Float32Array(samples));
}

/**
 * The same drawn together for a plot: of every `samplesPerPair` samples the lowest and the highest.
 * Gaps are passed over; a pair of gaps alone is NaN, NaN.
 */
export async function* minMaxPairs(path: string, samplesPerPair: number): AsyncGenerator<Buffer> {
  let low = Infinity;
  let high = -Infinity;
  let taken = 0;
  const pair = () => (low > high ? [Number.NaN, Number.NaN] : [low, high]);
  for await (const samples of float64Chunks(path)) {
    const pairs: number[] = [];
    for (const value of samples) {
      if (value < low) low = value;
      if (value > high) high = value;
      taken += 1;
      if (taken < samplesPerPair) continue;
      pairs.push(...pair());
      low = Infinity;
      high = -Infinity;
      taken = 0;
    }
    if (pairs.length > 0) yield asBuffer(Float32Array.from(pairs));
  }
  if (taken > 0) yield asBuffer(Float32Array.from(pair()));
}

async function* float64Chunks(path: string): AsyncGenerator<Float64Array> {
  const file = await open(path, 'r');
  try {
    for (;;) {
      const samples = new Float64Array(chunkSamples);
      const { bytesRead } = await file.read(new Uint8Array(samples.buffer));
      if (bytesRead === 0) return;
      if (bytesRead % 8 !== 0) throw new Error(`A file of samples ends within a sample: ${path}`);
      yield samples.subarray(0, bytesRead / 8);
    }
  } finally {
    await file.close();
  }
}

const asBuffer = (values: Float32Array) =>
  Buffer.from(values.buffer, values.byteOffset, values.byteLength);
