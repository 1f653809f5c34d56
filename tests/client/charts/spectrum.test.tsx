import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it } from 'vitest';
import './browser-stubs.ts';
import { decadeTexts, tickTexts } from '#src/charts/chart-axes.ts';
import { alignedData } from '#src/charts/aligned-data.ts';
import { spectrumInUnit } from '#src/charts/amplitude-unit.ts';
import { noiseFloorLine } from '#src/charts/noise-floor-line.ts';
import { shownSpectrum } from '#src/charts/shown-spectrum.ts';
import { perHz, usableUnit } from '#src/charts/frequency-axis.ts';
import { labelsThatFit } from '#src/charts/label-lane.ts';
import type { OrderMark } from '#src/charts/order-mark.ts';
import { logFloor, peakNear, spectrumMarks, spectrumSeries } from '#src/charts/spectrum-data.ts';
import { SpectrumPlot } from '#src/charts/spectrum-plot.tsx';

afterEach(cleanup);

const speedHz = 25;

/** 400 lines of 0.5 Hz with lines of amplitude 1/order at the first four orders. */
function aSpectrum(scale = 1) {
  const amplitude = new Float32Array(400).fill(0.01);
  for (const order of [1, 2, 3, 4]) amplitude[(order * speedHz) / 0.5] = scale / order;
  return { stepHz: 0.5, amplitude };
}

function mark(order: number, overrides: Partial<OrderMark> = {}): OrderMark {
  return { order, prominenceDb: 20, significant: true, explainedBy: null, ...overrides };
}

const run = { from: 1, to: 3, length: 3 };

describe('the frequency axis', () => {
  it('turns Hz into cycles per minute and orders', () => {
    expect(50 * perHz('cpm', null)).toBe(3000);
    expect(50 * perHz('orders', 25)).toBe(2);
  });

  it('falls back to Hz for orders without a speed', () => {
    expect(usableUnit('orders', null)).toBe('hz');
    expect(usableUnit('orders', 25)).toBe('orders');
  });

  it('writes ticks with the decimals their step needs and a real minus sign', () => {
    expect(tickTexts([-0.5, 0, 0.5], 0.5)).toEqual(['−0.5', '0.0', '0.5']);
    expect(tickTexts([0, 20], 20)).toEqual(['0', '20']);
    expect(tickTexts([0, 2.5, 5], 2.5)).toEqual(['0.0', '2.5', '5.0']);
    expect(tickTexts([0, 0.25, 0.5], 0.25)).toEqual(['0.00', '0.25', '0.50']);
    expect(decadeTexts([0.01, 0.02, 1, 10])).toEqual(['0.01', '', '1', '10']);
  });
});

describe('the marks of a spectrum', () => {
  it('stand on the greatest line near the order, not on the nominal place', () => {
    const spectrum = aSpectrum();
    spectrum.amplitude[101] = 5;
    expect(peakNear(spectrum, 50, 1)).toEqual({ frequencyHz: 50.5, amplitude: 5 });
  });

  it('tell the run from what else stands out and from what is explained', () => {
    const orders = [mark(1), mark(2), mark(3, { explainedBy: 'belt' }), mark(4), mark(0.5)];
    const kinds = spectrumMarks(aSpectrum(), speedHz, orders, run).map((m) => [m.order, m.kind]);
    expect(kinds).toEqual([
      [1, 'run'],
      [2, 'run'],
      [3, 'explained'],
      [4, 'standing'],
      [0.5, 'fraction'],
    ]);
  });

  it('are none without a speed, and none for what is only noise', () => {
    expect(spectrumMarks(aSpectrum(), null, [mark(1)], run)).toEqual([]);
    expect(spectrumMarks(aSpectrum(), speedHz, [mark(1, { significant: false })], run)).toEqual([]);
  });

  it('carry the level of the survey before', () => {
    const [first] = spectrumMarks(aSpectrum(), speedHz, [mark(1)], run, aSpectrum(0.25));
    expect(first?.amplitude).toBe(1);
    expect(first?.previousAmplitude).toBe(0.25);
  });
});

describe('the series of a spectrum', () => {
  it('is lifted to a floor five decades down on a logarithmic axis', () => {
    const amplitude = Float32Array.from([0, 1, 0]);
    const floor = logFloor(amplitude);
    expect(floor).toBeCloseTo(1e-5, 12);
    const { heightOf } = shownSpectrum({ stepHz: 1, amplitude }, null, null, {
      recordedUnit: 'g',
      shownUnit: 'g',
      detector: 'peak',
      scale: 'log',
    });
    const { y } = spectrumSeries({ stepHz: 1, amplitude }, 1, { min: 0, max: 2 }, heightOf);
    expect([...y]).toEqual([floor, 1, floor]);
  });

  it('holds every line of a window, whatever has to be thinned of the whole', () => {
    const amplitude = new Float32Array(65_536);
    amplitude[40_001] = 7;
    const spectrum = { stepHz: 0.5, amplitude };
    const same = (value: number) => value;
    const whole = spectrumSeries(spectrum, 1, { min: 0, max: 32_768 }, same);
    expect(whole.y.length).toBeLessThanOrEqual(4000);
    expect(Math.max(...whole.y)).toBe(7);
    const part = spectrumSeries(spectrum, 1, { min: 20_000, max: 20_001 }, same);
    expect([...part.x]).toEqual([19_999.5, 20_000, 20_000.5, 20_001, 20_001.5]);
    expect([...part.y]).toEqual([0, 0, 7, 0, 0]);
  });

  it('begins where integration has hidden nothing', () => {
    const shown = spectrumInUnit(aSpectrum(), 'm/s²', 'mm/s', 'peak');
    const { x } = spectrumSeries(shown, 1, { min: 0, max: 10 }, (value) => value);
    expect(x[0]).toBe(1.5);
    expect(peakNear(shown, 1, 1)?.frequencyHz).toBe(1.5);
  });

  it('reads another survey off at its own lines', () => {
    const front = { x: Float64Array.from([0, 1, 2]), y: Float64Array.from([1, 1, 1]) };
    const behind = { x: Float64Array.from([0, 2]), y: Float64Array.from([0, 10]) };
    expect([...(alignedData(front, [behind])[1] ?? [])]).toEqual([0, 5, 10]);
    expect([...(alignedData(front, [null])[1] ?? [])]).toEqual([null, null, null]);
  });
});

describe('the noise floor', () => {
  it('lies at the noise and not at the lines', () => {
    const { amplitude } = noiseFloorLine(aSpectrum(), speedHz);
    // A constant is its own median; the mean of noise of that median is 1/√ln 2 as high.
    expect(amplitude[50]).toBeCloseTo(0.01 / Math.sqrt(Math.LN2), 4);
  });
});

describe('what is said of a spectrum in another unit', () => {
  const shownIn = (shownUnit: 'mm/s' | 'g' | 'µm', scale: 'linear' | 'db') =>
    shownSpectrum(aSpectrum(), null, speedHz, {
      recordedUnit: 'mm/s',
      shownUnit,
      detector: 'rms',
      scale,
    });

  it('is that it was integrated, from where on, or differentiated', () => {
    expect(shownIn('µm', 'linear').remark).toBe(
      'Integrated from mm/s; nothing is shown below 1.5 Hz.',
    );
    expect(shownIn('g', 'linear').remark).toBe('Differentiated from mm/s.');
    expect(shownIn('mm/s', 'linear').remark).toBe('');
  });

  it('is the reference of a level', () => {
    const { label, remark, heightOf } = shownIn('mm/s', 'db');
    expect(label).toBe('dB re 1 nm/s, rms');
    expect(remark).toBe('0 dB is 1 nm/s (ISO 1683).');
    expect(heightOf(1)).toBeCloseTo(120, 9);
  });
});

describe('labels on one line', () => {
  it('leave out those that would touch an earlier one', () => {
    const labels = [10, 14, 40].map((x) => ({ x, width: 8 }));
    expect(labelsThatFit(labels, 2).map((label) => label.x)).toEqual([10, 40]);
  });
});

describe('SpectrumPlot', () => {
  it('has the marked orders as a table', async () => {
    render(
      <SpectrumPlot
        spectrum={aSpectrum()}
        unit="mm/s"
        speedHz={speedHz}
        orders={[mark(1), mark(2), mark(3, { explainedBy: 'vane pass' })]}
        run={run}
        frequencyUnit="orders"
        amplitudeScale="linear"
      />,
    );
    screen.getByRole('application', { name: /Spectrum, mm\/s peak\. 2 lines of a run/u });
    await userEvent.click(screen.getByText('Orders as a table'));
    const rows = screen.getAllByRole('row', { hidden: true }).map((row) => row.textContent);
    expect(rows).toContain('125.001.0020run of harmonics');
    expect(rows).toContain('375.000.33320vane pass');
  });

  it('shows its highest lines, and how many of how many, where no order is marked', () => {
    render(
      <SpectrumPlot
        spectrum={aSpectrum()}
        unit="g"
        speedHz={null}
        orders={[]}
        run={null}
        frequencyUnit="orders"
        amplitudeScale="log"
      />,
    );
    screen.getByText('The 4 highest of 400 lines.');
    expect(screen.queryByText('Orders as a table')).toBeNull();
  });
});
