import { useEffect, useLayoutEffect, useRef, type KeyboardEvent } from 'react';
import uPlot from 'uplot';
import { figuresFont, textFont } from './chart-palette.ts';
import { useElementWidth } from './use-element-width.ts';
import { moveCursor, resetZoom, zoomAboutCursor, type Window } from './plot-keys.ts';

/** Everything but the size, which the page decides. */
export type ChartOptions = Omit<uPlot.Options, 'width' | 'height'>;

export interface UplotChartProps {
  /** A new object rebuilds the chart: keep it in a memo. */
  options: ChartOptions;
  /** A new reference replaces the data; it is never compared deeply. */
  data: uPlot.AlignedData;
  heightPx: number;
  /** What is drawn, in words; the figures stand in the table beside the chart. */
  label: string;
  /** The ends of x, where the data may be a part of the record only. */
  wholeX?: Window;
  /** Says how the keys work here, e.g. the id of a hint. */
  describedBy?: string;
}

/** The one owner of uPlot instances. */
export function UplotChart({
  options,
  data,
  heightPx,
  label,
  wholeX,
  describedBy,
}: UplotChartProps) {
  const [box, widthPx] = useElementWidth<HTMLDivElement>();
  const chart = useRef<uPlot | null>(null);
  const drawnData = useRef(data);
  const drawable = widthPx > 0 && heightPx > 0 && (data[0]?.length ?? 0) > 0;

  // Size and data at the moment of building; later changes have their own effects.
  const atBuild = useRef({ data, widthPx, heightPx });
  useLayoutEffect(() => {
    atBuild.current = { data, widthPx, heightPx };
  });

  useEffect(() => {
    const element = box.current;
    if (element === null || !drawable) return;
    const { data: first, widthPx: width, heightPx: height } = atBuild.current;
    const built = new uPlot({ ...options, width, height }, first, element);
    chart.current = built;
    drawnData.current = first;
    redrawWithFonts(built, () => chart.current === built);
    return () => {
      built.destroy();
      chart.current = null;
    };
  }, [options, drawable, box]);

  useEffect(() => {
    if (chart.current === null || drawnData.current === data) return;
    drawnData.current = data;
    // Zoomed in, new data is the same record in finer steps: the view must stay.
    chart.current.setData(data, false);
    chart.current.redraw();
  }, [data]);

  useEffect(() => {
    chart.current?.setSize({ width: widthPx, height: heightPx });
  }, [widthPx, heightPx]);

  const onKeyDown = (event: KeyboardEvent) => {
    const plot = chart.current;
    if (plot === null || event.ctrlKey || event.metaKey || event.altKey) return;
    const step = event.shiftKey ? 10 : 1;
    if (event.key === 'ArrowRight') moveCursor(plot, step);
    else if (event.key === 'ArrowLeft') moveCursor(plot, -step);
    else if (event.key === '+' || event.key === '=') zoomAboutCursor(plot, 0.5, wholeX);
    else if (event.key === '-') zoomAboutCursor(plot, 2, wholeX);
    else if (event.key === '0') resetZoom(plot, wholeX);
    else return;
    event.preventDefault();
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
      // After uPlot's own answer to it, which knows only the data at hand.
      onDoubleClick={() => chart.current && resetZoom(chart.current, wholeX)}
      style={{ height: `${heightPx}px` }}
      className="w-full overflow-hidden"
    />
  );
}

/** A canvas draws with whatever font is there: draw once more when the shipped ones have come. */
function redrawWithFonts(chart: uPlot, alive: () => boolean): void {
  void Promise.all([document.fonts.load(figuresFont), document.fonts.load(textFont)]).then(() => {
    if (alive()) chart.redraw(false, true);
  });
}
