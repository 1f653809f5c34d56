import type { Page } from 'playwright-core';

/** Notes when something was last drawn on each canvas, before the page's own scripts run. */
export const noteDrawing = () => {
  const note = (canvas: HTMLCanvasElement) => {
    canvas.dataset['drawnAt'] = String(performance.now());
  };
  CanvasRenderingContext2D.prototype.stroke = new Proxy(CanvasRenderingContext2D.prototype.stroke, {
    apply: (stroke, context: CanvasRenderingContext2D, path) => {
      note(context.canvas);
      Reflect.apply(stroke, context, path);
    },
  });
};

/**
 * Milliseconds from an act until heading, spectrum and waveform of the flag stand and nothing more
 * is drawn.
 *
 * @param act - a flag to click, or null for the key of the next one
 */
export function timeToPlots(page: Page, act: number | null): Promise<number> {
  return page.evaluate(
    (place) =>
      new Promise<number>((resolve, reject) => {
        const quietMs = 200;
        const items = document.querySelectorAll<HTMLElement>('ol[aria-label="Queue"] button');
        const list = [...items];
        const current = list.findIndex((item) => item.getAttribute('aria-current') === 'true');
        const target = list[place ?? current + 1];
        const wanted = target?.querySelector('.figures')?.textContent;
        if (target === undefined || wanted === undefined) return reject(new Error('No such flag.'));
        const startedAt = performance.now();
        let shownAt = 0;
        const drawnAt = (name: string) => {
          const canvas = document.querySelector<HTMLElement>(
            `[role="application"][aria-label^="${name}"] canvas`,
          );
          return Number(canvas?.dataset['drawnAt'] ?? 0);
        };
        const look = () => {
          const now = performance.now();
          if (now - startedAt > 10_000) return reject(new Error('The plots did not come.'));
          if (shownAt === 0 && document.querySelector('h2')?.textContent === wanted) shownAt = now;
          const [spectrum, waveform] = [drawnAt('Spectrum'), drawnAt('Waveform')];
          const last = Math.max(shownAt, spectrum, waveform);
          const isThere = shownAt > 0 && spectrum > startedAt && waveform > startedAt;
          if (isThere && now - last > quietMs) resolve(last - startedAt);
          else requestAnimationFrame(look);
        };
        if (place === null) window.dispatchEvent(new KeyboardEvent('keydown', { key: 'j' }));
        else target.click();
        requestAnimationFrame(look);
      }),
    act,
  );
}

export interface FrameRates {
  framesPerS: number;
  /** Of a hundred frames the longest but five, ms. */
  slowFrameMs: number;
}

/** Frames a second while the pointer moves, or the wheel turns, over the spectrum in each of them. */
export function frameRates(page: Page, what: 'cursor' | 'zoom'): Promise<FrameRates> {
  return page.evaluate(
    (act) =>
      new Promise<FrameRates>((resolve) => {
        const durationMs = 3000;
        const over = document.querySelector<HTMLElement>(
          '[role="application"][aria-label^="Spectrum"] .u-over',
        );
        const box = over?.getBoundingClientRect();
        if (!over || !box) throw new Error('There is no spectrum.');
        const frames: number[] = [];
        const startedAt = performance.now();
        let before = startedAt;
        const step = (now: number) => {
          if (frames.length > 0 || now > before) frames.push(now - before);
          before = now;
          const turn = frames.length / 60;
          const where = {
            clientX: box.left + box.width * (0.5 + 0.4 * Math.sin(2 * turn)),
            clientY: box.top + box.height / 2,
            bubbles: true,
          };
          if (act === 'cursor') over.dispatchEvent(new MouseEvent('mousemove', where));
          else {
            const deltaY = Math.floor(turn) % 2 === 0 ? -60 : 60;
            const wheel = { ...where, deltaY, ctrlKey: true, cancelable: true };
            over.dispatchEvent(new WheelEvent('wheel', wheel));
          }
          if (now - startedAt < durationMs) requestAnimationFrame(step);
          else {
            const sorted = [...frames].sort((a, b) => a - b);
            const total = frames.reduce((sum, frame) => sum + frame, 0);
            resolve({
              framesPerS: (1000 * frames.length) / total,
              slowFrameMs: sorted[Math.floor(0.95 * sorted.length)] ?? 0,
            });
          }
        };
        requestAnimationFrame(step);
      }),
    what,
  );
}
