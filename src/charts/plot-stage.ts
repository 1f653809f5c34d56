import uPlot from 'uplot';
import { figuresFont, textFont } from './chart-palette.ts';
import { orWhole, pannedWindow, windowWithin, zoomedWindow, type Window } from './plot-window.ts';
import type { Store } from './store.ts';

/** Everything but the size, which the page decides. */
export type ChartOptions = Omit<uPlot.Options, 'width' | 'height'>;

/** The plotting area in CSS pixels, and its x scale. */
export interface PlotArea {
  widthPx: number;
  heightPx: number;
  toPx: (x: number) => number;
  toX: (px: number) => number;
}

/** What is drawn over a plot and changes with every move of the pointer: the plot stays as it is. */
export interface PlotOverlay {
  draw: (context: CanvasRenderingContext2D, area: PlotArea) => void;
  /** Calls back whenever there is something else to draw. */
  subscribe: (listener: () => void) => () => void;
  /** Takes hold of something at `x`; what is returned gets each further place, else the plot zooms. */
  grip: (x: number, reach: number) => ((x: number) => void) | null;
  /** A click that took hold of nothing. */
  pick: (x: number) => void;
}

export interface PlotSource {
  whole: Window;
  /** The data to draw in a window, thinned to what can be seen of it. */
  dataFor: (view: Window) => uPlot.AlignedData;
  /** Drawn beneath the lines, and over them. */
  drawUnder?: (plot: uPlot) => void;
  drawOver?: (plot: uPlot) => void;
}

export interface PlotStage {
  plot: uPlot;
  view: () => Window;
  zoom: (factor: number, about?: number) => boolean;
  pan: (share: number) => void;
  reset: () => void;
  resize: (widthPx: number, heightPx: number) => void;
  show: (source: PlotSource) => void;
  destroy: () => void;
}

const gripReachPx = 5;
const clickReachPx = 4;
const wheelZoomPerPx = 0.0015;

/** One uPlot with its zoom in a store, its overlay and what a pointer does to it. */
export function stagePlot(
  element: HTMLElement,
  options: ChartOptions,
  size: { widthPx: number; heightPx: number },
  first: PlotSource,
  windowStore: Store<Window | null>,
  overlay: PlotOverlay | null,
): PlotStage {
  let source = first;
  let isAlive = true;
  const view = () => windowWithin(windowStore.get(), source.whole);
  const show = (next: Window) => windowStore.set(orWhole(next, source.whole));

  const plot = new uPlot(
    {
      ...options,
      // Told at once: set afterwards, the y scale has been ranged over nothing.
      scales: { ...options.scales, x: { ...options.scales?.['x'], ...view() } },
      width: size.widthPx,
      height: size.heightPx,
      cursor: {
        ...options.cursor,
        drag: { ...options.cursor?.drag, setScale: false, dist: clickReachPx },
        bind: {
          dblclick: () => () => {
            windowStore.set(null);
            return null;
          },
        },
      },
      hooks: {
        ...options.hooks,
        setSelect: [onSelect],
        // Of another record other things are drawn, and the chart need not be built anew for it.
        drawAxes: [(drawn) => source.drawUnder?.(drawn)],
        draw: [(drawn) => source.drawOver?.(drawn)],
      },
    },
    source.dataFor(view()),
    element,
  );

  function onSelect({ select }: uPlot) {
    if (select.width <= 0) return;
    const min = plot.posToVal(select.left, 'x');
    const max = plot.posToVal(select.left + select.width, 'x');
    plot.setSelect({ left: 0, top: 0, width: 0, height: 0 }, false);
    show(windowWithin({ min, max }, source.whole));
  }

  // One frame draws whatever has changed since the last one.
  let frame = 0;
  let isStale = false;
  const request = () => {
    frame ||= requestAnimationFrame(paint);
  };
  const refresh = () => {
    isStale = true;
    request();
  };
  const canvas = overlay === null ? null : addCanvas(plot.over);
  function paint() {
    frame = 0;
    if (!isAlive) return;
    if (isStale) {
      isStale = false;
      const next = view();
      plot.batch(() => {
        plot.setData(source.dataFor(next), false);
        plot.setScale('x', next);
      });
    }
    if (canvas !== null) drawOverlay(canvas, plot, overlay);
  }
  request();

  const unsubscribe = [windowStore.subscribe(refresh), overlay?.subscribe(request)];
  const stage: PlotStage = {
    plot,
    view,
    zoom: (factor, about) => {
      const now = view();
      const next = zoomedWindow(now, source.whole, about ?? (now.min + now.max) / 2, factor);
      if (next !== null) show(next);
      return next !== null;
    },
    pan: (share) => {
      const next = pannedWindow(view(), source.whole, share);
      if (next !== null) show(next);
    },
    reset: () => windowStore.set(null),
    resize: (widthPx, heightPx) => {
      if (plot.width === widthPx && plot.height === heightPx) return;
      plot.setSize({ width: widthPx, height: heightPx });
      request();
    },
    show: (next) => {
      if (next === source) return;
      source = next;
      refresh();
    },
    destroy: () => {
      isAlive = false;
      cancelAnimationFrame(frame);
      for (const stop of unsubscribe) stop?.();
      stopPointer();
      plot.destroy();
    },
  };
  const stopPointer = listenToPointer(element, stage, overlay);
  redrawWithFonts(plot, () => isAlive);
  return stage;
}

function addCanvas(over: HTMLElement): HTMLCanvasElement {
  const canvas = document.createElement('canvas');
  Object.assign(canvas.style, {
    position: 'absolute',
    inset: '0',
    width: '100%',
    height: '100%',
    pointerEvents: 'none',
  });
  over.append(canvas);
  return canvas;
}

function drawOverlay(canvas: HTMLCanvasElement, plot: uPlot, overlay: PlotOverlay | null): void {
  const context = canvas.getContext('2d');
  if (context === null || overlay === null) return;
  const ratio = uPlot.pxRatio;
  const widthPx = plot.bbox.width / ratio;
  const heightPx = plot.bbox.height / ratio;
  const [width, height] = [Math.round(widthPx * ratio), Math.round(heightPx * ratio)];
  // Setting a size clears a canvas, but costs far more than clearing it.
  if (canvas.width !== width || canvas.height !== height) Object.assign(canvas, { width, height });
  else context.clearRect(0, 0, width, height);
  context.save();
  context.scale(ratio, ratio);
  overlay.draw(context, {
    widthPx,
    heightPx,
    toPx: (x) => plot.valToPos(x, 'x'),
    toX: (px) => plot.posToVal(px, 'x'),
  });
  context.restore();
}

/** Wheel, click and dragging of what the overlay lets take hold of. */
function listenToPointer(
  element: HTMLElement,
  { plot, view, zoom }: PlotStage,
  overlay: PlotOverlay | null,
): () => void {
  const { over } = plot;
  const abort = new AbortController();
  const { signal } = abort;
  const xAt = (event: MouseEvent) =>
    plot.posToVal(event.clientX - over.getBoundingClientRect().left, 'x');

  const onWheel = (event: WheelEvent) => {
    // A page under the pointer is scrolled until somebody works in the plot.
    if (!event.ctrlKey && !element.contains(document.activeElement)) return;
    if (zoom(Math.exp(event.deltaY * wheelZoomPerPx), xAt(event))) event.preventDefault();
  };
  const reach = () => {
    const { min, max } = view();
    return ((max - min) / Math.max(1, over.clientWidth)) * gripReachPx;
  };
  const onDown = (event: MouseEvent) => {
    if (event.button !== 0 || overlay === null || !over.contains(event.target as Node)) return;
    const drag = overlay.grip(xAt(event), reach());
    const fromPx = event.clientX;
    const release = new AbortController();
    const releaseSignal = AbortSignal.any([signal, release.signal]);
    if (drag !== null) {
      // Before uPlot sees it: it would draw a stretch to zoom to.
      event.stopPropagation();
      event.preventDefault();
      element.focus();
      const onMove = (move: MouseEvent) => drag(xAt(move));
      window.addEventListener('mousemove', onMove, { signal: releaseSignal });
    }
    const onUp = (up: MouseEvent) => {
      release.abort();
      if (drag === null && Math.abs(up.clientX - fromPx) < clickReachPx) overlay.pick(xAt(up));
    };
    window.addEventListener('mouseup', onUp, { signal: releaseSignal });
  };
  over.addEventListener('wheel', onWheel, { signal, passive: false });
  element.addEventListener('mousedown', onDown, { signal, capture: true });
  return () => abort.abort();
}

/** A canvas draws with whatever font is there: draw once more when the shipped ones have come. */
function redrawWithFonts(chart: uPlot, alive: () => boolean): void {
  if (document.fonts.check(figuresFont) && document.fonts.check(textFont)) return;
  void Promise.all([document.fonts.load(figuresFont), document.fonts.load(textFont)]).then(() => {
    if (alive()) chart.redraw(false, true);
  });
}
