import uPlot from 'uplot';

/** Runs a drawing clipped to nothing but with the canvas given back as it was found. */
export function drawOverlay(
  plot: uPlot,
  draw: (context: CanvasRenderingContext2D, pxRatio: number) => void,
): void {
  const { ctx } = plot;
  ctx.save();
  try {
    draw(ctx, uPlot.pxRatio);
  } finally {
    ctx.restore();
  }
}

/** Canvas font for a text of so many CSS pixels. */
export function canvasFont(sizePx: number, pxRatio: number, family: 'figures' | 'text'): string {
  const name = family === 'figures' ? 'Sometype Mono Variable' : 'Archivo Variable';
  return `500 ${sizePx * pxRatio}px "${name}", "Fretline Signs", sans-serif`;
}
