import { frequencyUnits, type FrequencyUnit } from '#src/charts/frequency-axis.ts';
import type { AmplitudeScale } from '#src/charts/spectrum-options.ts';
import { Select } from '#src/components/select.tsx';

export interface PlotSettingsValue {
  frequencyUnit: FrequencyUnit;
  amplitudeScale: AmplitudeScale;
}

const unitLabels: Readonly<Record<FrequencyUnit, string>> = {
  hz: 'Hz',
  cpm: '1/min',
  orders: 'Orders',
};

/** The plots' settings as the address keeps them; what it doesn't know is the default. */
export const readPlotSettings = (search: URLSearchParams): PlotSettingsValue => ({
  frequencyUnit: frequencyUnits.find((unit) => unit === search.get('axis')) ?? 'orders',
  amplitudeScale: search.get('scale') === 'log' ? 'log' : 'linear',
});

export function PlotSettings({
  value,
  onChange,
}: {
  value: PlotSettingsValue;
  onChange: (changes: { axis?: string; scale?: string }) => void;
}) {
  return (
    <div className="flex flex-wrap gap-2">
      <Select
        aria-label="Frequency axis"
        className="w-28"
        value={value.frequencyUnit}
        options={frequencyUnits.map((unit) => ({ value: unit, label: unitLabels[unit] }))}
        onChange={({ target }) => onChange({ axis: target.value })}
      />
      <Select
        aria-label="Amplitude axis"
        className="w-32"
        value={value.amplitudeScale}
        options={[
          { value: 'linear', label: 'Linear' },
          { value: 'log', label: 'Logarithmic' },
        ]}
        onChange={({ target }) => onChange({ scale: target.value })}
      />
    </div>
  );
}
