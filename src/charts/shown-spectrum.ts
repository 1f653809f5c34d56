import type { Detector } from '#shared/quantities/detector.ts';
import { quantityOfUnit, type Unit } from '#shared/quantities/quantity.ts';
import { highPassHz } from '#shared/signal/velocity-lines.ts';
import { formatFixed } from '#src/lib/numbers.ts';
import { integrates, levelDb, levelReferenceWords, spectrumInUnit } from './amplitude-unit.ts';
import { noiseFloorLine } from './noise-floor-line.ts';
import { logFloor, type Spectrum } from './spectrum-data.ts';
import type { AmplitudeScale } from './amplitude-scale.ts';

export interface AmplitudeSettings {
  /** Unit of what was recorded. */
  recordedUnit: Unit;
  shownUnit: Unit;
  detector: Detector;
  scale: AmplitudeScale;
}

/** A recorded spectrum and its company as the y axis shows them. */
export interface ShownSpectrum {
  front: Spectrum;
  noise: Spectrum;
  previous: Spectrum | null;
  /** Where an amplitude stands on the y axis. */
  heightOf: (amplitude: number) => number;
  levelOf: ((amplitude: number) => number) | null;
  /** Written at the axis, e.g. "mm/s peak", "dB re 1 nm/s, rms". */
  label: string;
  /** What was done to the record to show it so; empty where nothing was. */
  remark: string;
}

/** @param spectrum - as recorded, peak; `previous` the same point before, in the same unit */
export function shownSpectrum(
  spectrum: Spectrum,
  previous: Spectrum | null,
  speedHz: number | null,
  { recordedUnit, shownUnit, detector, scale }: AmplitudeSettings,
): ShownSpectrum {
  const shown = (recorded: Spectrum) => spectrumInUnit(recorded, recordedUnit, shownUnit, detector);
  const front = shown(spectrum);
  const floor = logFloor(front.amplitude);
  const levelOf = (amplitude: number) => levelDb(amplitude, shownUnit);
  const heights: Readonly<Record<AmplitudeScale, (amplitude: number) => number>> = {
    linear: (amplitude) => amplitude,
    log: (amplitude) => Math.max(floor, amplitude),
    db: (amplitude) => levelOf(Math.max(floor, amplitude)),
  };
  const reference = levelReferenceWords[quantityOfUnit[shownUnit]];
  return {
    front,
    noise: shown(noiseFloorLine(spectrum, speedHz)),
    previous: previous && shown(previous),
    heightOf: heights[scale],
    levelOf: scale === 'db' ? levelOf : null,
    label: scale === 'db' ? `dB re ${reference}, ${detector}` : `${shownUnit} ${detector}`,
    remark: [
      integrates(recordedUnit, shownUnit)
        ? `Integrated from ${recordedUnit}; nothing is shown below ${formatFixed(highPassHz, 1)} Hz.`
        : quantityOfUnit[recordedUnit] === quantityOfUnit[shownUnit]
          ? ''
          : `Differentiated from ${recordedUnit}.`,
      scale === 'db' ? `0 dB is ${reference} (ISO 1683).` : '',
    ]
      .filter((sentence) => sentence !== '')
      .join(' '),
  };
}
