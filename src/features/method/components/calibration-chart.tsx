import type { MethodFigures } from '#shared/signal/method-figures.ts';

const size = 240;
const edge = 34;
const place = (share: number) => edge + share * (size - 2 * edge);

/** Score against the share that was loose: on the diagonal a score means what it says. */
export function CalibrationChart({ bins }: { bins: MethodFigures['calibration'] }) {
  const filled = bins.filter(({ cases }) => cases > 0);
  const most = Math.max(1, ...filled.map(({ cases }) => cases));
  return (
    <figure className="m-0">
      <svg
        viewBox={`0 0 ${size} ${size}`}
        role="img"
        aria-labelledby="calibration-title"
        className="w-full max-w-sm"
      >
        <title id="calibration-title">
          Share of loose machines by score; the numbers stand in the table beside it.
        </title>
        <rect
          x={edge}
          y={edge}
          width={size - 2 * edge}
          height={size - 2 * edge}
          className="fill-sheet stroke-rule"
        />
        <line
          x1={place(0)}
          y1={size - place(0)}
          x2={place(1)}
          y2={size - place(1)}
          className="stroke-hairline"
        />
        {filled.map((bin) => (
          <circle
            key={bin.from}
            cx={place(bin.meanScore)}
            cy={size - place(bin.looseShare)}
            r={2.5 + 3 * Math.sqrt(bin.cases / most)}
            className="fill-ink"
          />
        ))}
        {[0, 0.5, 1].map((tick) => (
          <g key={tick} className="fill-ink-soft text-2xs">
            <text x={place(tick)} y={size - edge + 14} textAnchor="middle">
              {tick}
            </text>
            <text x={edge - 6} y={size - place(tick) + 4} textAnchor="end">
              {tick}
            </text>
          </g>
        ))}
        <text x={size / 2} y={size - 4} textAnchor="middle" className="fill-ink-soft text-2xs">
          score
        </text>
        <text
          x={10}
          y={size / 2}
          textAnchor="middle"
          transform={`rotate(-90 10 ${size / 2})`}
          className="fill-ink-soft text-2xs"
        >
          share that is loose
        </text>
      </svg>
      <figcaption className="max-w-prose text-xs text-ink-soft">
        A dot on the line: of the records scored so, that share came from loose machines. Larger
        dots stand for more records.
      </figcaption>
    </figure>
  );
}
