import type { Sketch } from '../sketch.ts';

const widthPx = 132;
const heightPx = 26;

/** The beginning of a waveform, small; a picture beside figures that say the same in words. */
export function SketchView({ sketch }: { sketch: Sketch }) {
  const middle = heightPx / 2;
  const step = widthPx / Math.max(1, sketch.length);
  const path = sketch
    .map(([low, high], index) => {
      if (Number.isNaN(low)) return '';
      const x = ((index + 0.5) * step).toFixed(1);
      // Never thinner than a hairline, so that a quiet stretch is a line and not a gap.
      const top = middle - high * (middle - 1);
      const bottom = Math.max(top + 1, middle - low * (middle - 1));
      return `M${x} ${top.toFixed(1)}V${bottom.toFixed(1)}`;
    })
    .join('');
  return (
    <svg
      aria-hidden="true"
      width={widthPx}
      height={heightPx}
      viewBox={`0 0 ${widthPx} ${heightPx}`}
      className="block text-ink-soft"
    >
      <path d={`M0 ${middle}H${widthPx}`} stroke="var(--tone-hairline)" />
      <path d={path} stroke="currentColor" strokeWidth={Math.max(1, step * 0.7)} />
    </svg>
  );
}
