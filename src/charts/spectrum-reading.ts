import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';
import { peakNear, type Spectrum } from './spectrum-data.ts';
import type { SpectrumCursor } from './spectrum-cursor.ts';

/** What is needed to say what stands at a place. */
export interface ReadableSpectrum {
  spectrum: Spectrum;
  speedHz: number | null;
  unitsPerHz: number;
  amplitudeText: AmplitudeText;
}

/** Lines of a family whose amplitudes are read out. */
const linesRead = 5;

/** Frequency, order and amplitude of the line at a place of the x axis. */
export function readingAt(readable: ReadableSpectrum, x: number): string {
  const { spectrum, speedHz, unitsPerHz } = readable;
  const { stepHz, amplitude } = spectrum;
  const { figure, unit } = readable.amplitudeText;
  const nearest = Math.round(x / unitsPerHz / stepHz);
  const line = Math.min(amplitude.length - 1, Math.max(0, nearest));
  const value = amplitude[line] ?? Number.NaN;
  const height = Number.isNaN(value) ? 'below the high-pass' : `${figure(value)} ${unit}`;
  return `${frequencyText(line * stepHz, speedHz)}  ${height}`;
}

/** What the cursor that was set says; empty where none is. */
export function cursorReading(readable: ReadableSpectrum, cursor: SpectrumCursor): string {
  const { unitsPerHz } = readable;
  if (cursor.kind === 'free') return cursor.at === null ? '' : readingAt(readable, cursor.at);
  if (cursor.kind === 'harmonics') {
    const ofHz = cursor.of / unitsPerHz;
    const first = Array.from({ length: linesRead }, (_, index) => index + 1);
    const lines = first.map((order) => ({ name: `${order}×`, atHz: order * ofHz }));
    return `Harmonics of ${placeText(readable, ofHz)}  ${linesText(readable, lines)}`;
  }
  const aboutHz = cursor.about / unitsPerHz;
  const spacingHz = cursor.spacing / unitsPerHz;
  const lines = [
    { name: '−1', atHz: aboutHz - spacingHz },
    { name: '0', atHz: aboutHz },
    { name: '+1', atHz: aboutHz + spacingHz },
  ];
  return `Sidebands of ${placeText(readable, aboutHz)} at ${placeText(readable, spacingHz)}  ${linesText(readable, lines)}`;
}

function frequencyText(frequencyHz: number, speedHz: number | null): string {
  const parts = [
    `${formatFixed(frequencyHz, 2)} Hz`,
    `${formatFixed(frequencyHz * 60, 0)} 1/min`,
    ...(speedHz === null ? [] : [`${formatFixed(frequencyHz / speedHz, 2)}×`]),
  ];
  return parts.join('  ');
}

/** Shorter: what is read at a family has to stand beside it. */
function placeText({ speedHz }: ReadableSpectrum, frequencyHz: number): string {
  const order = speedHz === null ? '' : ` (${formatFixed(frequencyHz / speedHz, 3)}×)`;
  return `${formatFixed(frequencyHz, 2)} Hz${order}`;
}

/** The greatest line near each place (a family seldom falls on lines), the unit once behind them. */
function linesText(
  readable: ReadableSpectrum,
  places: readonly { name: string; atHz: number }[],
): string {
  const { spectrum, amplitudeText } = readable;
  const read = places.flatMap(({ name, atHz }) => {
    const peak = peakNear(spectrum, atHz, 1.5 * spectrum.stepHz);
    return peak === null ? [] : [`${name} ${amplitudeText.figure(peak.amplitude)}`];
  });
  return `${read.join('  ')} ${amplitudeText.unit}`;
}

/** How a plot's scale states amplitudes. */
export interface AmplitudeText {
  figure: (amplitude: number) => string;
  unit: string;
}

/** "3.2" and "mm/s peak", or "130.1" and "dB": its reference stands at the axis. */
export function amplitudeTextOf(
  label: string,
  levelOf: ((amplitude: number) => number) | null,
): AmplitudeText {
  if (levelOf === null) return { figure: formatSignificant, unit: label };
  return {
    figure: (amplitude) => (amplitude > 0 ? formatFixed(levelOf(amplitude), 1) : 'no level'),
    unit: 'dB',
  };
}
