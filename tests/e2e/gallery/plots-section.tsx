import { useState } from 'react';
import { AveragedRevolutionPlot } from '#src/charts/averaged-revolution-plot.tsx';
import type { FrequencyUnit } from '#src/charts/frequency-axis.ts';
import type { AmplitudeScale } from '#src/charts/amplitude-scale.ts';
import { SpectrumPlot } from '#src/charts/spectrum-plot.tsx';
import { WaveformPlot } from '#src/charts/waveform-plot.tsx';
import { Panel } from '#src/components/panel.tsx';
import { RadioGroup } from '#src/components/radio-group.tsx';
import {
  looseMarks,
  sampleRateHz,
  sampleSpectrum,
  sampleTurn,
  sampleWaveform,
  speedHz,
  truncatedRanges,
} from './sample-signals.ts';

const spectrum = sampleSpectrum();
const previous = sampleSpectrum(0.4, 11);
const samples = sampleWaveform();
const long = sampleWaveform(400_000);
const truncation = {
  side: 'upper',
  share: 0.12,
  expectedShare: 0.04,
  instrument: false,
  ranges: truncatedRanges(samples),
} as const;
const run = { from: 1, to: 9, length: 9 };

export function PlotsSection() {
  const [unit, setUnit] = useState<FrequencyUnit>('orders');
  const [scale, setScale] = useState<AmplitudeScale>('linear');
  return (
    <div className="flex flex-col gap-4">
      <Panel title="Spectrum">
        <div className="mb-2 flex flex-wrap gap-8">
          <RadioGroup
            inline
            legend="Frequency"
            name="frequency"
            value={unit}
            onChange={(event) => setUnit(event.target.value as FrequencyUnit)}
            options={[
              { value: 'hz', label: 'Hz' },
              { value: 'cpm', label: '1/min' },
              { value: 'orders', label: 'Orders' },
            ]}
          />
          <RadioGroup
            inline
            legend="Amplitude"
            name="amplitude"
            value={scale}
            onChange={(event) => setScale(event.target.value as AmplitudeScale)}
            options={[
              { value: 'linear', label: 'Linear' },
              { value: 'log', label: 'Logarithmic' },
            ]}
          />
        </div>
        <SpectrumPlot
          spectrum={spectrum}
          previous={previous}
          unit="mm/s"
          speedHz={speedHz}
          orders={looseMarks}
          run={run}
          frequencyUnit={unit}
          amplitudeScale={scale}
        />
      </Panel>
      <Panel title="Time">
        <div className="grid gap-6 xl:grid-cols-[2fr_1fr]">
          <WaveformPlot
            samples={samples}
            sampleRateHz={sampleRateHz}
            unit="mm/s"
            speedHz={speedHz}
            truncation={truncation}
          />
          <AveragedRevolutionPlot turn={sampleTurn} />
        </div>
        <WaveformPlot
          title="Long record"
          samples={long}
          sampleRateHz={sampleRateHz}
          unit="mm/s"
          speedHz={null}
          truncation={null}
        />
      </Panel>
    </div>
  );
}
