import { useId } from 'react';
import { isWholeOrder, orderName, type OrderMark } from './order-mark.ts';
import { useElementWidth } from './use-element-width.ts';
import { alignedStrip, evenStrip, orderStripText, type StripCell } from './order-strip-geometry.ts';

const smallWidth = 172;
const smallHeight = 18;
const largeWidth = 640;
const largeHeight = 34;

/** The small strip of lists, or the large one standing alone with its orders written beneath. */
export function OrderStrip({
  marks,
  size = 'small',
}: {
  marks: readonly OrderMark[];
  size?: 'small' | 'large';
}) {
  if (size === 'large') return <LargeStrip marks={marks} />;
  return (
    <Strip
      cells={evenStrip(marks, smallWidth)}
      label={orderStripText(marks)}
      width={smallWidth}
      height={smallHeight}
      numbered={false}
    />
  );
}

/** As wide as there is room, so that its numbers can be read on a phone too. */
function LargeStrip({ marks }: { marks: readonly OrderMark[] }) {
  const [box, widthPx] = useElementWidth<HTMLDivElement>();
  const width = Math.min(largeWidth, widthPx || largeWidth);
  return (
    <div ref={box}>
      <Strip
        cells={evenStrip(marks, width, width > 480 ? 2 : 1)}
        label={orderStripText(marks)}
        width={width}
        height={largeHeight}
        numbered
      />
    </div>
  );
}

/** The strip beneath a spectrum, its cells under the lines they stand for. */
export function AlignedOrderStrip({
  marks,
  fromOrder,
  toOrder,
  widthPx,
  run,
}: {
  marks: readonly OrderMark[];
  fromOrder: number;
  toOrder: number;
  widthPx: number;
  run: { from: number; to: number; length: number } | null;
}) {
  return (
    <Strip
      cells={alignedStrip(marks, { fromOrder, toOrder, width: widthPx, run })}
      label={orderStripText(marks)}
      width={widthPx}
      height={26}
      numbered
    />
  );
}

interface StripProps {
  cells: readonly StripCell[];
  label: string;
  width: number;
  height: number;
  numbered: boolean;
}

const numbersHeight = 14;

function Strip({ cells, label, width, height, numbered }: StripProps) {
  const hatchId = useId();
  const fullHeight = height + (numbered ? numbersHeight : 0);
  return (
    <svg
      role="img"
      aria-label={label}
      width={width}
      height={fullHeight}
      viewBox={`0 0 ${width} ${fullHeight}`}
      className="block max-w-full"
    >
      <defs>
        <pattern
          id={hatchId}
          width="3.2"
          height="3.2"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path d="M0 0v3.2" stroke="var(--tone-ink-soft)" strokeWidth="1.8" />
        </pattern>
      </defs>
      {/* Broken where nothing is known: an empty strip must not read as a quiet machine. */}
      <path
        d={`M0 ${height - 0.5}H${width}`}
        stroke="var(--tone-rule)"
        strokeDasharray={cells.some((cell) => cell.known) ? undefined : '2 4'}
      />
      {cells.map((cell) => (
        <Cell key={cell.order} cell={cell} height={height} hatchId={hatchId} />
      ))}
      {numbered && <Numbers cells={cells} y={fullHeight - 3} />}
    </svg>
  );
}

function Cell({ cell, height, hatchId }: { cell: StripCell; height: number; hatchId: string }) {
  if (!cell.known) return null;
  const inner = height - 1;
  // Whatever stands out can be seen, however little it does.
  const filled = cell.fill === 'floor' ? cell.share * inner : Math.max(3, cell.share * inner);
  return (
    <g>
      {cell.mark && <title>{cellText(cell.mark)}</title>}
      <rect
        x={cell.x}
        y={0}
        width={cell.width}
        height={inner}
        fill={isWholeOrder(cell.order) ? 'var(--tone-well)' : 'transparent'}
      />
      <rect
        x={cell.x}
        y={inner - filled}
        width={cell.width}
        height={filled}
        fill={fills[cell.fill](hatchId)}
      />
      {cell.fill === 'explained' && (
        <path
          d={`M${cell.x} ${inner - filled + 0.5}h${cell.width}`}
          stroke="var(--tone-ink-soft)"
          strokeWidth="1"
        />
      )}
    </g>
  );
}

const fills = {
  evidence: () => 'var(--tone-evidence)',
  standing: () => 'var(--tone-ink-soft)',
  explained: (hatchId: string) => `url(#${hatchId})`,
  floor: () => 'var(--tone-hairline)',
} as const;

function cellText({ order, prominenceDb, significant, explainedBy }: OrderMark): string {
  const size = `${orderName(order)}×: ${Math.max(0, prominenceDb).toFixed(0)} dB above its floor`;
  if (!significant) return `${size}, not more than noise`;
  return explainedBy === null ? size : `${size}, explained by ${explainedBy}`;
}

function Numbers({ cells, y }: { cells: readonly StripCell[]; y: number }) {
  let lastEnd = -Infinity;
  return (
    <g aria-hidden="true" className="figures fill-ink-faint text-[10.5px]">
      {cells
        .filter((cell) => isWholeOrder(cell.order))
        .map((cell) => {
          const text = orderName(cell.order);
          const centre = cell.x + cell.width / 2;
          const half = text.length * 3.4;
          if (centre - half < lastEnd + 4) return null;
          lastEnd = centre + half;
          return (
            <text key={cell.order} x={centre} y={y} textAnchor="middle">
              {text}
            </text>
          );
        })}
    </g>
  );
}
