/** How the size of a vibration is stated (ISO 2041): a choice of display, never stored. */
export const detectors = ['rms', 'peak', 'peak-to-peak'] as const;
export type Detector = (typeof detectors)[number];

/** Peak of a sine over each way of stating it. */
const peakOver: Readonly<Record<Detector, number>> = {
  rms: Math.SQRT2,
  peak: 1,
  'peak-to-peak': 0.5,
};

/**
 * Restates the size of a sine, such as one line of a spectrum. Of a waveform with more than one
 * line peak and rms don't follow from each other: there it is the "derived" peak that comes out.
 *
 * @param amplitude - size as `from` states it, any unit, >= 0
 * @returns the size as `to` states it, same unit; relative error at most 2^-51
 *
 * @example
 * convertDetector(1, 'peak', 'peak-to-peak') // => 2
 */
export function convertDetector(amplitude: number, from: Detector, to: Detector): number {
  return from === to ? amplitude : (amplitude * peakOver[from]) / peakOver[to];
}
