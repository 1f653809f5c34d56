import { detectors, type Detector } from '#shared/quantities/detector.ts';
import { units, type Unit } from '#shared/quantities/quantity.ts';
import { frequencyUnits, type FrequencyUnit } from '#src/charts/frequency-axis.ts';
import { amplitudeScales, type AmplitudeScale } from '#src/charts/amplitude-scale.ts';
import { Select } from '#src/components/select.tsx';
import { settingText, type PlotSettingsValue } from './plot-settings-value.ts';

const frequencyLabels: Readonly<Record<FrequencyUnit, string>> = {
  hz: 'Hz',
  cpm: '1/min',
  orders: 'Orders',
};

const scaleLabels: Readonly<Record<AmplitudeScale, string>> = {
  linear: 'Linear',
  log: 'Logarithmic',
  db: 'dB',
};

const detectorLabels: Readonly<Record<Detector, string>> = {
  rms: 'rms',
  peak: 'Peak',
  'peak-to-peak': 'Peak-to-peak',
};

/** In what the spectra are shown; chosen once, it holds for every flag. */
export function PlotSettings({
  value,
  recordedUnit,
  onChange,
}: {
  value: PlotSettingsValue;
  recordedUnit: Unit;
  onChange: (changes: Partial<PlotSettingsValue>) => void;
}) {
  return (
    <div className="flex flex-wrap gap-2">
      <Select
        aria-label="Unit"
        className="w-40"
        value={settingText(value.shownUnit)}
        options={[
          { value: settingText(null), label: `As recorded (${recordedUnit})` },
          ...units.map((unit) => ({ value: unit, label: unit })),
        ]}
        onChange={({ target }) =>
          onChange({ shownUnit: units.find((unit) => unit === target.value) ?? null })
        }
      />
      <Select
        aria-label="Size stated as"
        className="w-32"
        value={value.detector}
        options={detectors.map((detector) => ({
          value: detector,
          label: detectorLabels[detector],
        }))}
        onChange={({ target }) => onChange({ detector: target.value as Detector })}
      />
      <Select
        aria-label="Amplitude axis"
        className="w-32"
        value={value.amplitudeScale}
        options={amplitudeScales.map((scale) => ({ value: scale, label: scaleLabels[scale] }))}
        onChange={({ target }) => onChange({ amplitudeScale: target.value as AmplitudeScale })}
      />
      <Select
        aria-label="Frequency axis"
        className="w-24"
        value={value.frequencyUnit}
        options={frequencyUnits.map((unit) => ({ value: unit, label: frequencyLabels[unit] }))}
        onChange={({ target }) => onChange({ frequencyUnit: target.value as FrequencyUnit })}
      />
    </div>
  );
}
