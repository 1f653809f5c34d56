import { useId } from 'react';
import {
  drawnFitUm,
  gaugeScale,
  isLooserThanDrawn,
  yOf,
  type FitGaugeData,
  type GaugeScale,
} from './fit-gauge-geometry.ts';
import { Dimension, Measured, Running, Zone, type Place } from './fit-gauge-marks.tsx';
import { formatSigned } from '#src/lib/numbers.ts';

const width = 352;
const height = 232;
const top = 20;
const plotHeight = 192;
const axisX = 42;
/** Left of this the sizes of the two parts, right of it the fit they make. */
const divideX = 184;
const columns = { seat: 54, ring: 120, drawn: 216, measured: 268, running: 322 };

/** The picture alone; the words that say the same are FitGauge's. */
export function FitGaugeDrawing({ data }: { data: FitGaugeData }) {
  const hatchId = useId();
  const scale = gaugeScale(data);
  const y = (valueUm: number) => top + yOf(valueUm, scale, plotHeight);
  const drawn = drawnFitUm(data) ?? data.interferenceUm ?? null;
  return (
    <svg
      aria-hidden="true"
      viewBox={`0 0 ${width} ${height}`}
      className="figures w-full text-[12px]"
    >
      <defs>
        <pattern
          id={hatchId}
          width="5"
          height="5"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path d="M0 0v5" stroke="var(--tone-ink-soft)" strokeWidth="1.3" />
        </pattern>
      </defs>
      <Axis scale={scale} y={y} />
      {data.seatLimitsUm && (
        <Zone
          x={columns.seat}
          limits={data.seatLimitsUm}
          y={y}
          fill="var(--tone-fit-wash)"
          stroke="var(--tone-fit)"
          name={data.seatClass ?? (data.seat === 'shaft' ? 'shaft' : 'housing')}
        />
      )}
      {data.ringLimitsUm && (
        <Zone
          x={columns.ring}
          limits={data.ringLimitsUm}
          y={y}
          fill={`url(#${hatchId})`}
          stroke="var(--tone-ink-soft)"
          name="ring"
        />
      )}
      {drawn && (
        <Dimension x={columns.drawn} min={drawn.min} mean={drawn.mean} max={drawn.max} y={y} />
      )}
      {data.measuredUm && (
        <Measured
          x={columns.measured}
          value={data.measuredUm.value}
          uncertainty={data.measuredUm.uncertainty}
          loose={isLooserThanDrawn(data)}
          y={y}
        />
      )}
      {data.runningUm && (
        <Running
          x={columns.running}
          range={[data.runningUm.min, data.runningUm.max]}
          mean={data.runningUm.mean}
          from={data.measuredUm?.value ?? drawn?.mean ?? null}
          fromX={data.measuredUm ? columns.measured : columns.drawn}
          y={y}
        />
      )}
    </svg>
  );
}

function Axis({ scale, y }: { scale: GaugeScale; y: Place }) {
  return (
    <>
      {scale.ticksUm.map((tick) => (
        <g key={tick}>
          <path
            d={`M${axisX} ${y(tick)}H${width - 4}`}
            stroke={tick === 0 ? 'var(--tone-ink)' : 'var(--tone-hairline)'}
            strokeWidth={tick === 0 ? 1.6 : 0.8}
          />
          <text x={axisX - 6} y={y(tick) + 3.5} textAnchor="end" fill="var(--tone-ink-faint)">
            {formatSigned(tick, 0)}
          </text>
        </g>
      ))}
      <text x={axisX - 6} y={10} textAnchor="end" fill="var(--tone-ink-faint)">
        µm
      </text>
      <path
        d={`M${divideX} ${top - 14}V${height - 4}`}
        stroke="var(--tone-rule)"
        strokeWidth="0.8"
      />
      <g className="font-sans" fill="var(--tone-ink-soft)">
        <text x={axisX + 4} y={10}>
          against nominal
        </text>
        <text x={divideX + 8} y={10}>
          ↑ interference
        </text>
        <text x={divideX + 8} y={height - 6}>
          ↓ clearance
        </text>
      </g>
    </>
  );
}
