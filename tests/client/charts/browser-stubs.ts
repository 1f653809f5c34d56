/**
 * What uPlot, the charts and the primitives ask of a browser and jsdom has not. With a ResizeObserver that reports
 * nothing every plot stays at width 0, so no canvas is ever asked for.
 */
class SilentResizeObserver implements ResizeObserver {
  observe(): void {}
  unobserve(): void {}
  disconnect(): void {}
}

globalThis.ResizeObserver ??= SilentResizeObserver;
window.matchMedia ??= (query: string): MediaQueryList =>
  Object.assign(new EventTarget(), {
    matches: false,
    media: query,
    onchange: null,
    addListener: () => undefined,
    removeListener: () => undefined,
  });

Element.prototype.hasPointerCapture ??= () => false;
