import { useId, useLayoutEffect, useMemo, useState, type KeyboardEvent } from 'react';
import type { Detector } from '#shared/quantities/detector.ts';
import type { Unit } from '#shared/quantities/quantity.ts';
import { alignedData } from './aligned-data.ts';
import type { AmplitudeScale } from './amplitude-scale.ts';
import { useChartPalette } from './chart-palette.ts';
import { perHz, usableUnit, type FrequencyUnit } from './frequency-axis.ts';
import type { OrderMark } from './order-mark.ts';
import { PlotFrame } from './plot-frame.tsx';
import { PlotReading } from './plot-reading.tsx';
import type { PlotSource, PlotStage } from './plot-stage.ts';
import { windowShowing, windowWithin, orWhole, type Window } from './plot-window.ts';
import { shownSpectrum } from './shown-spectrum.ts';
import { cursorOfKind, placeOf, steppedCursor } from './spectrum-cursor.ts';
import { cursorKindOfKey, SpectrumCursorChoice } from './spectrum-cursor-choice.tsx';
import { spectrumCursorOverlay } from './spectrum-cursor-overlay.ts';
import { linesIn, plotMaxPoints, spectrumMarks, spectrumSeries } from './spectrum-data.ts';
import type { Spectrum, SpectrumMark } from './spectrum-data.ts';
import { drawSpectrumMarks } from './spectrum-overlay.ts';
import { spectrumOptions, type PlotPlace } from './spectrum-options.ts';
import { amplitudeTextOf, cursorReading, readingAt } from './spectrum-reading.ts';
import { SpectrumStrip } from './spectrum-strip.tsx';
import { SpectrumTable } from './spectrum-table.tsx';
import { createSpectrumView, type SpectrumView } from './spectrum-view.ts';
import { createStore, useStore, type Store } from './store.ts';
import { UplotChart } from './uplot-chart.tsx';

export interface SpectrumPlotProps {
  /** As recorded, peak. */
  spectrum: Spectrum;
  /** Unit of what was recorded. */
  unit: Unit;
  /** Unit it is shown in, integrated where that needs it; without one as recorded. */
  shownUnit?: Unit;
  detector?: Detector;
  /** Speed of the position's shaft; without one there are no orders. */
  speedHz: number | null;
  orders: readonly OrderMark[];
  run: { from: number; to: number; length: number } | null;
  frequencyUnit: FrequencyUnit;
  amplitudeScale: AmplitudeScale;
  /** The same point at the survey before, in the same unit, drawn behind. */
  previous?: Spectrum | null;
  /** Zoom and cursor, where the page keeps them. */
  view?: SpectrumView;
  heightPx?: number;
  title?: string;
  /** Under another spectrum that has the tools and says what is drawn. */
  isCompanion?: boolean;
}

const keysHint =
  'f, h and s choose a free, a harmonic or a sideband cursor. Left and right arrow move it, with Shift faster; up and down arrow change the spacing of sidebands. Plus and minus zoom, Page Up and Page Down move along, 0 shows the whole, Escape takes the cursor away.';

/** A spectrum with its run of harmonics marked, its cursors and the order strip beneath it. */
export function SpectrumPlot(props: SpectrumPlotProps) {
  const { spectrum, unit, speedHz, orders, run, frequencyUnit, amplitudeScale } = props;
  const { shownUnit = unit, detector = 'peak', previous = null } = props;
  const { heightPx = 300, title = 'Spectrum', isCompanion = false } = props;
  const palette = useChartPalette();
  const keysHintId = useId();
  const [hover] = useState(() => createStore<number | null>(null));
  const [ownView] = useState(createSpectrumView);
  const [place, setPlace] = useState<PlotPlace | null>(null);
  const xUnit = usableUnit(frequencyUnit, speedHz);
  // What was set in orders means nothing on an axis in Hz.
  const view = xUnit === frequencyUnit && props.view ? props.view : ownView;
  const unitsPerHz = perHz(xUnit, speedHz);
  const lineStep = spectrum.stepHz * unitsPerHz;
  const lineCount = spectrum.amplitude.length;
  const whole = useMemo<Window>(
    () => ({ min: 0, max: Math.max(0, lineCount - 1) * lineStep }),
    [lineCount, lineStep],
  );

  const shown = useMemo(
    () =>
      shownSpectrum(spectrum, previous, speedHz, {
        recordedUnit: unit,
        shownUnit,
        detector,
        scale: amplitudeScale,
      }),
    [spectrum, previous, speedHz, unit, shownUnit, detector, amplitudeScale],
  );
  const marks = useMemo(
    () => spectrumMarks(shown.front, speedHz, orders, run, shown.previous),
    [shown, speedHz, orders, run],
  );
  const source = useMemo<PlotSource>(
    () => ({
      whole,
      dataFor: (stretch) => {
        const seriesOf = (one: Spectrum) =>
          spectrumSeries(one, unitsPerHz, stretch, shown.heightOf);
        const behind = shown.previous && seriesOf(shown.previous);
        return alignedData(seriesOf(shown.front), [behind], [seriesOf(shown.noise)]);
      },
      drawOver: (plot) =>
        drawSpectrumMarks(plot, marks, { unitsPerHz, heightOf: shown.heightOf }, palette),
    }),
    [whole, shown, unitsPerHz, marks, palette],
  );
  const options = useMemo(
    () =>
      spectrumOptions({
        palette,
        frequencyUnit: xUnit,
        amplitudeScale,
        amplitudeLabel: shown.label,
        onCursor: hover.set,
        onPlace: (next) => setPlace((old) => (samePlace(old, next) ? old : next)),
      }),
    [palette, xUnit, amplitudeScale, shown.label, hover],
  );
  // Of its own, so that the next flag's lines don't build the chart anew.
  const [lineSteps] = useState(() => createStore(lineStep));
  useLayoutEffect(() => lineSteps.set(lineStep), [lineSteps, lineStep]);
  const overlay = useMemo(
    () => spectrumCursorOverlay(view.cursor, lineSteps.get, palette),
    [view, lineSteps, palette],
  );
  const readable = useMemo(
    () => ({
      spectrum: shown.front,
      speedHz,
      unitsPerHz,
      amplitudeText: amplitudeTextOf(shown.label, shown.levelOf),
    }),
    [shown, speedHz, unitsPerHz],
  );
  const turn = speedHz === null ? null : speedHz * unitsPerHz;

  const onKey = (event: KeyboardEvent, stage: PlotStage): boolean => {
    const { cursor } = view;
    const kind = cursorKindOfKey(event.key);
    if (kind !== null) cursor.set(cursorOfKind(kind, cursor.get(), turn, stage.view()));
    else if (event.key === 'Escape' && placeOf(cursor.get()) !== null) {
      cursor.set({ kind: 'free', at: null });
    } else if (event.key === '+' || event.key === '=' || event.key === '-') {
      stage.zoom(event.key === '-' ? 2 : 0.5, placeOf(cursor.get()) ?? undefined);
    } else {
      const key = cursorKeyOf(event);
      if (key === null || (key.spacing !== 0 && cursor.get().kind !== 'sidebands')) return false;
      cursor.set(steppedCursor(cursor.get(), key, lineStep, stage.view(), whole));
      const at = placeOf(cursor.get());
      if (at !== null) view.window.set(orWhole(windowShowing(stage.view(), whole, at), whole));
    }
    return true;
  };

  return (
    <PlotFrame
      title={title}
      keysHintId={keysHintId}
      keysHint={keysHint}
      reading={
        <PlotReading
          hover={hover}
          cursor={view.cursor}
          readHover={(x) => readingAt(readable, x)}
          readCursor={(cursor) => cursorReading(readable, cursor)}
        />
      }
      tools={
        !isCompanion && (
          <SpectrumCursorChoice
            cursor={view.cursor}
            turn={turn}
            view={() => windowWithin(view.window.get(), whole)}
          />
        )
      }
      caption={
        !isCompanion && (
          <>
            Grey line: noise floor.{' '}
            {previous !== null && 'Broken line and cross bars: the survey before. '}
            {shown.remark}{' '}
            <ThinningRemark
              spectrum={shown.front}
              unitsPerHz={unitsPerHz}
              whole={whole}
              window={view.window}
            />
          </>
        )
      }
      table={
        <SpectrumTable
          spectrum={shown.front}
          marks={marks}
          orders={orders}
          speedHz={speedHz}
          amplitudeLabel={shown.label}
          levelOf={shown.levelOf}
        />
      }
    >
      <UplotChart
        options={options}
        source={source}
        view={view.window}
        overlay={overlay}
        onKey={onKey}
        heightPx={heightPx}
        label={`${title}, ${shown.label}. ${marksText(marks)}`}
        describedBy={keysHintId}
      />
      {place !== null && turn !== null && orders.length > 0 && (
        <SpectrumStrip
          place={place}
          orders={orders}
          run={run}
          turn={turn}
          whole={whole}
          window={view.window}
        />
      )}
    </PlotFrame>
  );
}

function cursorKeyOf({ key, shiftKey }: KeyboardEvent) {
  const along = key === 'ArrowRight' ? 1 : key === 'ArrowLeft' ? -1 : 0;
  const spacing = key === 'ArrowUp' ? 1 : key === 'ArrowDown' ? -1 : 0;
  return along === 0 && spacing === 0 ? null : { along, spacing, isFast: shiftKey };
}

function samePlace(a: PlotPlace | null, b: PlotPlace): boolean {
  return a !== null && a.leftPx === b.leftPx && a.widthPx === b.widthPx;
}

function ThinningRemark({
  spectrum,
  unitsPerHz,
  whole,
  window,
}: {
  spectrum: Spectrum;
  unitsPerHz: number;
  whole: Window;
  window: Store<Window | null>;
}) {
  const { first, end } = linesIn(spectrum, unitsPerHz, windowWithin(useStore(window), whole));
  const count = end - first;
  if (count <= plotMaxPoints) return null;
  return `${count} lines in sight; of those too close to tell apart the least and the greatest are drawn, so no peak is lost.`;
}

function marksText(marks: readonly SpectrumMark[]): string {
  const run = marks.filter((mark) => mark.kind === 'run').length;
  return run === 0 ? 'No run of harmonics is marked.' : `${run} lines of a run are marked.`;
}
