import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';
import { peakNear, type Spectrum } from './spectrum-data.ts';
import type { SpectrumCursor } from './spectrum-cursor.ts';

/** What is needed to say what stands at a place. */
export interface ReadableSpectrum {
  spectrum: Spectrum;
  speedHz: number | null;
  unitsPerHz: number;
  /** An amplitude with its unit, as the plot's scale states it. */
  amplitudeText: (amplitude: number) => string;
}

/** Lines of a family whose amplitudes are read out. */
const linesRead = 5;

/** Frequency, order and amplitude of the line at a place of the x axis. */
export function readingAt(readable: ReadableSpectrum, x: number): string {
  const { spectrum, speedHz, unitsPerHz } = readable;
  const { stepHz, amplitude } = spectrum;
  const nearest = Math.round(x / unitsPerHz / stepHz);
  const line = Math.min(amplitude.length - 1, Math.max(0, nearest));
  return [
    frequencyText(line * stepHz, speedHz),
    amplitudeWords(readable, amplitude[line] ?? Number.NaN),
  ].join('  ');
}

/** What the cursor that was set says; empty where none is. */
export function cursorReading(readable: ReadableSpectrum, cursor: SpectrumCursor): string {
  const { speedHz, unitsPerHz } = readable;
  if (cursor.kind === 'free') return cursor.at === null ? '' : readingAt(readable, cursor.at);
  if (cursor.kind === 'harmonics') {
    const ofHz = cursor.of / unitsPerHz;
    const read = Array.from({ length: linesRead }, (_, index) => {
      const text = nearText(readable, (index + 1) * ofHz);
      return text === null ? [] : [`${index + 1}: ${text}`];
    });
    return `Harmonics of ${frequencyText(ofHz, speedHz)}  ${read.flat().join('  ')}`;
  }
  const aboutHz = cursor.about / unitsPerHz;
  const spacingHz = cursor.spacing / unitsPerHz;
  const read = [-1, 0, 1].flatMap((side) => {
    const text = nearText(readable, aboutHz + side * spacingHz);
    return text === null ? [] : [`${['−1', '0', '+1'][side + 1] ?? ''}: ${text}`];
  });
  return `Sidebands about ${frequencyText(aboutHz, speedHz)}, ${frequencyText(spacingHz, speedHz)} apart  ${read.join('  ')}`;
}

function frequencyText(frequencyHz: number, speedHz: number | null): string {
  const parts = [
    `${formatFixed(frequencyHz, 2)} Hz`,
    `${formatFixed(frequencyHz * 60, 0)} 1/min`,
    ...(speedHz === null ? [] : [`${formatFixed(frequencyHz / speedHz, 2)}×`]),
  ];
  return parts.join('  ');
}

/** The greatest line near a place: a family seldom falls on lines. */
function nearText(readable: ReadableSpectrum, frequencyHz: number): string | null {
  const { spectrum, amplitudeText } = readable;
  const peak = peakNear(spectrum, frequencyHz, 1.5 * spectrum.stepHz);
  return peak && amplitudeText(peak.amplitude);
}

function amplitudeWords({ amplitudeText }: ReadableSpectrum, amplitude: number): string {
  return Number.isNaN(amplitude) ? 'below the high-pass' : amplitudeText(amplitude);
}

/** "3.2 mm/s peak", "130.1 dB re 1 nm/s, peak". */
export function amplitudeTextOf(
  label: string,
  levelOf: ((amplitude: number) => number) | null,
): (amplitude: number) => string {
  return (amplitude) => {
    if (levelOf === null) return `${formatSignificant(amplitude)} ${label}`;
    return amplitude > 0 ? `${formatFixed(levelOf(amplitude), 1)} ${label}` : `no level, ${label}`;
  };
}
