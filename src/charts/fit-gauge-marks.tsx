import { formatSigned } from '#src/lib/numbers.ts';
import type { RangeUm } from './fit-gauge-geometry.ts';

/** Place of a value on the drawing. */
export type Place = (valueUm: number) => number;

function shortUm(valueUm: number): string {
  return formatSigned(valueUm, Number.isInteger(valueUm) ? 0 : 1);
}

const textHeight = 11;

/** Baseline of a text above an edge, lifted over the zero line where that would strike it through. */
function above(edgeY: number, zeroY: number): number {
  const baseline = edgeY - 4;
  return zeroY < baseline + 2 && zeroY > baseline - textHeight ? zeroY - 4 : baseline;
}

/** Baseline of a text beneath an edge, likewise kept clear of the zero line. */
function below(edgeY: number, zeroY: number): number {
  const baseline = edgeY + textHeight + 1;
  return zeroY < baseline + 2 && zeroY > baseline - textHeight ? zeroY + textHeight + 1 : baseline;
}

export const zoneWidth = 52;

export function Zone({
  x,
  limits: [lower, upper],
  y,
  fill,
  stroke,
  name,
}: {
  x: number;
  limits: RangeUm;
  y: Place;
  fill: string;
  stroke: string;
  name: string;
}) {
  const centre = x + zoneWidth / 2;
  const zoneHeight = Math.max(1.5, y(lower) - y(upper));
  return (
    <g>
      <rect x={x} y={y(upper)} width={zoneWidth} height={zoneHeight} fill="var(--tone-sheet)" />
      <rect
        x={x}
        y={y(upper)}
        width={zoneWidth}
        height={zoneHeight}
        fill={fill}
        stroke={stroke}
        strokeWidth="1.2"
      />
      <Label x={centre} y={above(y(upper), y(0))} text={shortUm(upper)} />
      <Label x={centre} y={below(y(upper) + zoneHeight, y(0))} text={shortUm(lower)} />
      {zoneHeight > 17 && <Label x={centre} y={y(upper) + zoneHeight / 2 + 4} text={name} strong />}
    </g>
  );
}

/** Written on a patch of paper, so that a line behind it does not strike it through. */
function Label({
  x,
  y,
  text,
  strong = false,
}: {
  x: number;
  y: number;
  text: string;
  strong?: boolean;
}) {
  return (
    <text
      x={x}
      y={y}
      textAnchor="middle"
      fill="var(--tone-ink)"
      stroke="var(--tone-sheet)"
      strokeWidth="3.5"
      paintOrder="stroke"
      fontWeight={strong ? 650 : undefined}
    >
      {text}
    </text>
  );
}

/** The allowed fit as a dimension line with its mean. */
export function Dimension({
  x,
  min,
  mean,
  max,
  y,
}: {
  x: number;
  min: number;
  mean: number;
  max: number;
  y: Place;
}) {
  return (
    <g stroke="var(--tone-fit)" strokeWidth="1.6" fill="none">
      <path d={`M${x - 12} ${y(max)}h24M${x - 12} ${y(min)}h24M${x} ${y(max)}V${y(min)}`} />
      <path d={`M${x - 6} ${y(mean)}h12`} strokeWidth="3" />
      <g stroke="none">
        <Label x={x} y={above(y(max), y(0))} text={shortUm(max)} />
        <Label x={x} y={below(y(min), y(0))} text={shortUm(min)} />
      </g>
    </g>
  );
}

export function Measured({
  x,
  value,
  uncertainty,
  loose,
  y,
}: {
  x: number;
  value: number;
  uncertainty: number | null;
  loose: boolean;
  y: Place;
}) {
  const colour = loose ? 'var(--tone-evidence)' : 'var(--tone-ink)';
  const doubt = uncertainty === null ? 0 : 2 * uncertainty;
  return (
    <g stroke={colour} strokeWidth="1.4">
      {doubt > 0 && (
        <path
          d={`M${x} ${y(value + doubt)}V${y(value - doubt)}M${x - 5} ${y(value + doubt)}h10M${x - 5} ${y(value - doubt)}h10`}
        />
      )}
      <circle cx={x} cy={y(value)} r="5.5" fill={colour} />
      {loose && <path d={`M${x - 9} ${y(value) + 9}L${x + 9} ${y(value) - 9}`} strokeWidth="2" />}
      <g stroke="none">
        <Label x={x} y={y(value + doubt) - (doubt > 0 ? 6 : 11)} text={shortUm(value)} strong />
      </g>
    </g>
  );
}

export function Running({
  x,
  range: [min, max],
  mean,
  from,
  fromX,
  y,
}: {
  x: number;
  range: RangeUm;
  mean: number;
  from: number | null;
  fromX: number;
  y: Place;
}) {
  return (
    <g stroke="var(--tone-fit)" fill="none">
      <rect
        x={x - 9}
        y={y(max)}
        width={18}
        height={Math.max(2, y(min) - y(max))}
        strokeDasharray="4 2.5"
        strokeWidth="1.3"
      />
      <path d={`M${x - 9} ${y(mean)}h18`} strokeWidth="2.4" />
      {from !== null && (
        <path
          d={`M${fromX + 9} ${y(from)}L${x - 12} ${y(mean)}`}
          strokeWidth="1"
          strokeDasharray="1.5 2"
        />
      )}
      <g stroke="none" className="font-sans">
        <Label x={x + 2} y={y(min) + 13} text="warm" />
      </g>
    </g>
  );
}
