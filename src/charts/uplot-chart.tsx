import { useEffect, useLayoutEffect, useRef, type KeyboardEvent } from 'react';
import type uPlot from 'uplot';
import {
  stagePlot,
  type ChartOptions,
  type PlotOverlay,
  type PlotSource,
  type PlotStage,
} from './plot-stage.ts';
import type { Window } from './plot-window.ts';
import type { Store } from './store.ts';
import { useElementWidth } from './use-element-width.ts';

export interface UplotChartProps {
  /** A new object rebuilds the chart: keep it in a memo. */
  options: ChartOptions;
  /** What is drawn; a new object replaces it. Where the ends of x are one, nothing is drawn. */
  source: PlotSource;
  /** What of it is in sight; null for the whole. */
  view: Store<Window | null>;
  /** Kept in a memo as well. */
  overlay?: PlotOverlay;
  heightPx: number;
  /** What is drawn, in words; the figures stand in the table beside the chart. */
  label: string;
  /** Says how the keys work here, e.g. the id of a hint. */
  describedBy?: string;
  /** Keys of this plot's own; true where one was used. */
  onKey?: (event: KeyboardEvent, stage: PlotStage) => boolean;
}

/** The one owner of uPlot instances. */
export function UplotChart(props: UplotChartProps) {
  const { options, source, view, overlay, heightPx, label, describedBy, onKey } = props;
  const [box, widthPx] = useElementWidth<HTMLDivElement>();
  const stage = useRef<PlotStage | null>(null);
  const drawable = widthPx > 0 && heightPx > 0 && source.whole.max > source.whole.min;

  // What the chart is built with; later changes have their own effects.
  const atBuild = useRef({ source, widthPx, heightPx });
  useLayoutEffect(() => {
    atBuild.current = { source, widthPx, heightPx };
  });

  // Before the browser paints, so that a plot is never an empty box first.
  useLayoutEffect(() => {
    const element = box.current;
    if (element === null || !drawable) return;
    const { source: first, ...size } = atBuild.current;
    const built = stagePlot(element, options, size, first, view, overlay ?? null);
    stage.current = built;
    return () => {
      built.destroy();
      stage.current = null;
    };
  }, [options, drawable, box, view, overlay]);

  useEffect(() => {
    stage.current?.show(source);
  }, [source]);

  useEffect(() => {
    stage.current?.resize(widthPx, heightPx);
  }, [widthPx, heightPx]);

  const onKeyDown = (event: KeyboardEvent) => {
    if (stage.current === null || event.ctrlKey || event.metaKey || event.altKey) return;
    if (onKey?.(event, stage.current) || pressKey(event, stage.current)) event.preventDefault();
  };

  return (
    <div
      ref={box}
      role="application"
      aria-roledescription="plot"
      aria-label={label}
      aria-describedby={describedBy}
      tabIndex={0}
      onKeyDown={onKeyDown}
      style={{ height: `${heightPx}px` }}
      className="w-full overflow-hidden"
    />
  );
}

/** The keys of every plot. */
function pressKey(event: KeyboardEvent, stage: PlotStage): boolean {
  const step = event.shiftKey ? 10 : 1;
  const { plot } = stage;
  const left = plot.cursor.left ?? -1;
  const about = left >= 0 ? plot.posToVal(left, 'x') : undefined;
  if (event.key === 'ArrowRight') movePointerLine(plot, step);
  else if (event.key === 'ArrowLeft') movePointerLine(plot, -step);
  else if (event.key === '+' || event.key === '=') stage.zoom(0.5, about);
  else if (event.key === '-') stage.zoom(2, about);
  else if (event.key === '0') stage.reset();
  else if (event.key === 'PageDown') stage.pan(0.5);
  else if (event.key === 'PageUp') stage.pan(-0.5);
  else return false;
  return true;
}

/** The index a cursor goes to, from where it is (or the middle of the view), within the view. */
export function cursorIndex(
  at: number | null | undefined,
  steps: number,
  first: number,
  last: number,
): number {
  const from = at ?? Math.round((first + last) / 2) - steps;
  return Math.min(last, Math.max(first, from + steps));
}

function movePointerLine(plot: uPlot, steps: number): void {
  const xs = plot.data[0];
  const [first, last] = plot.series[0]?.idxs ?? [0, xs.length - 1];
  const x = xs[cursorIndex(plot.cursor.idx, steps, first, last)];
  if (x !== undefined) {
    plot.setCursor({ left: plot.valToPos(x, 'x'), top: plot.over.clientHeight / 2 });
  }
}
