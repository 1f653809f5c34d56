import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import './browser-stubs.ts';
import { firstOrderSine } from '#src/charts/averaged-revolution.ts';
import { AveragedRevolutionPlot } from '#src/charts/averaged-revolution-plot.tsx';
import {
  pannedWindow,
  windowShowing,
  windowWithin,
  zoomedWindow,
} from '#src/charts/plot-window.ts';
import { cursorIndex } from '#src/charts/uplot-chart.tsx';
import { mergedSpans, revolutionTimes, stretchesOf } from '#src/charts/waveform-geometry.ts';
import { WaveformPlot } from '#src/charts/waveform-plot.tsx';

afterEach(cleanup);

describe('ruling off the turns', () => {
  it('puts a rule at every turn in sight', () => {
    expect(revolutionTimes(0.04, 0.05, 0.2, 0.001)).toEqual([0.08, 0.12, 0.16, 0.2]);
  });

  it('rules every second, fifth or tenth turn where they would touch', () => {
    const step = (minStepS: number) => revolutionTimes(0.04, 0, 20, minStepS)[1];
    expect(step(0.05)).toBeCloseTo(0.08, 9);
    expect(step(0.1)).toBeCloseTo(0.2, 9);
    expect(step(0.5)).toBeCloseTo(0.8, 9);
  });

  it('rules nothing off without a speed or a stretch', () => {
    expect(revolutionTimes(0, 0, 1, 0.1)).toEqual([]);
    expect(revolutionTimes(0.04, 1, 1, 0.1)).toEqual([]);
  });
});

describe('truncated stretches', () => {
  it('are joined where nothing can be seen between them', () => {
    const spans = [
      [10, 12],
      [1, 3],
      [3.5, 5],
    ] as const;
    expect(mergedSpans(spans, 1)).toEqual([
      [1, 5],
      [10, 12],
    ]);
  });
});

describe('a waveform in parts', () => {
  it('gives extremes and rms of each and leaves gaps out', () => {
    const [first, second] = stretchesOf([3, -4, Number.NaN, 5], 2, 2);
    expect(first).toEqual({ fromS: 0, toS: 1, min: -4, max: 3, rms: Math.sqrt(12.5) });
    expect(second).toEqual({ fromS: 1, toS: 2, min: 5, max: 5, rms: 5 });
  });
});

describe('zooming by key', () => {
  const whole = { min: 0, max: 100 };

  it('keeps the place under the cursor and the ends of the record', () => {
    expect(zoomedWindow(whole, whole, 20, 0.5)).toEqual({ min: 10, max: 60 });
    expect(zoomedWindow({ min: 10, max: 60 }, whole, 20, 2)).toEqual({ min: 0, max: 100 });
  });

  it('does nothing at the whole and at the smallest window', () => {
    expect(zoomedWindow(whole, whole, 50, 2)).toBeNull();
    expect(zoomedWindow({ min: 50, max: 50.0001 }, whole, 50, 0.5)).toBeNull();
  });

  it('moves along as far as the record goes', () => {
    expect(pannedWindow({ min: 10, max: 30 }, whole, 0.5)).toEqual({ min: 20, max: 40 });
    expect(pannedWindow({ min: 70, max: 90 }, whole, 1)).toEqual({ min: 80, max: 100 });
    expect(pannedWindow({ min: 0, max: 20 }, whole, -0.5)).toBeNull();
    expect(pannedWindow(whole, whole, 0.5)).toBeNull();
  });

  it('follows a cursor out of sight', () => {
    expect(windowShowing({ min: 10, max: 30 }, whole, 20)).toEqual({ min: 10, max: 30 });
    expect(windowShowing({ min: 10, max: 30 }, whole, 32)).toEqual({ min: 14, max: 34 });
    expect(windowShowing({ min: 10, max: 30 }, whole, 1)).toEqual({ min: 0, max: 20 });
  });

  it('shows the whole of a record in which the window kept from another one does not lie', () => {
    expect(windowWithin({ min: 20, max: 30 }, whole)).toEqual({ min: 20, max: 30 });
    expect(windowWithin({ min: 90, max: 130 }, whole)).toEqual({ min: 90, max: 100 });
    expect(windowWithin({ min: 120, max: 130 }, whole)).toEqual(whole);
  });

  it('moves the cursor within what is in sight, from the middle at first', () => {
    expect(cursorIndex(null, 1, 100, 200)).toBe(150);
    expect(cursorIndex(198, 10, 100, 200)).toBe(200);
  });
});

describe('the sine within an averaged turn', () => {
  it('is found with its amplitude, phase and mean', () => {
    const turn = Float64Array.from({ length: 64 }, (_, i) => {
      const angle = (2 * Math.PI * i) / 64;
      return 0.3 + 2 * Math.sin(angle + 0.7) + 0.8 * Math.sin(3 * angle);
    });
    const sine = firstOrderSine(turn);
    for (const [i, value] of sine.entries()) {
      expect(value).toBeCloseTo(0.3 + 2 * Math.sin((2 * Math.PI * i) / 64 + 0.7), 12);
    }
  });
});

describe('WaveformPlot', () => {
  it('says what is marked, and that thinning loses no peak', () => {
    render(
      <WaveformPlot
        samples={new Float32Array(100_000)}
        sampleRateHz={10_000}
        unit="g"
        speedHz={25}
        truncation={{
          side: 'upper',
          share: 0.1,
          expectedShare: 0.02,
          instrument: false,
          ranges: [[10, 20]],
        }}
      />,
    );
    screen.getByText(/turns of the shaft\. Bars: truncated on the upper side\. 100000 samples; /u);
    screen.getByText('100000 samples in 40 equal parts.');
  });

  it('does not call the instrument’s own limit a truncation of the machine', () => {
    render(
      <WaveformPlot
        samples={new Float32Array(100)}
        sampleRateHz={100}
        unit="g"
        speedHz={null}
        truncation={{ side: 'both', share: 0, expectedShare: 0, instrument: true, ranges: [] }}
      />,
    );
    screen.getByText('Bars: flattened by the instrument on both sides.');
  });

  it('draws nothing of an empty record without breaking', () => {
    render(
      <WaveformPlot
        samples={new Float32Array(0)}
        sampleRateHz={100}
        unit="g"
        speedHz={null}
        truncation={null}
      />,
    );
    screen.getByText('0 samples in 0 equal parts.');
  });
});

describe('AveragedRevolutionPlot', () => {
  it('has a table that says how much of the turn it shows', () => {
    render(<AveragedRevolutionPlot turn={new Float32Array(256)} />);
    screen.getByText('Every 10° of 256 steps.');
  });
});
