import { FitGaugeDrawing } from './fit-gauge-drawing.tsx';
import {
  gaugeRows,
  isLooserThanDrawn,
  type FitGaugeData,
  type GaugeRow,
} from './fit-gauge-geometry.ts';

/** One seat's fit: the zones against the zero line, what was measured, what running makes of it. */
export function FitGauge({ data, title }: { data: FitGaugeData; title: string }) {
  const rows = gaugeRows(data);
  if (rows.length === 0) {
    return (
      <figure aria-label={title} className="border border-dashed border-rule p-4 text-sm">
        <figcaption className="font-semibold">{title}</figcaption>
        <p className="text-ink-soft">
          No class and no diameter is on record for this seat. A fit record is the first step.
        </p>
      </figure>
    );
  }
  return (
    <figure aria-label={title} className="flex flex-wrap items-start gap-x-6 gap-y-3">
      <figcaption className="sr-only">{title}</figcaption>
      {/* Focusable, so that the sentence behind the drawing is read where the drawing stands. */}
      <div
        role="img"
        tabIndex={0}
        aria-label={`${title}. ${rows.map((row) => `${row.label}: ${row.text}`).join('. ')}.`}
        className="w-full max-w-sm"
      >
        <FitGaugeDrawing data={data} />
      </div>
      <dl className="grid min-w-56 grow gap-y-1 text-sm">
        {rows.map((row) => (
          <div key={row.key} className="border-b border-hairline py-1">
            <dt className="flex items-center gap-2 text-ink-soft">
              <Swatch of={row.key} loose={isLooserThanDrawn(data)} />
              {row.label}
            </dt>
            <dd className="figures pl-7">{row.text}</dd>
          </div>
        ))}
      </dl>
    </figure>
  );
}

/** The key to the drawing, in the same strokes. */
function Swatch({ of, loose }: { of: GaugeRow['key']; loose: boolean }) {
  return (
    <svg aria-hidden="true" width="20" height="12" viewBox="0 0 20 12" className="shrink-0">
      {of === 'seat' && (
        <rect
          x="1"
          y="1"
          width="18"
          height="10"
          fill="var(--tone-fit-wash)"
          stroke="var(--tone-fit)"
        />
      )}
      {of === 'ring' && (
        <>
          <rect x="1" y="1" width="18" height="10" fill="none" stroke="var(--tone-ink-soft)" />
          <path d="M3 11L9 1M9 11L15 1M14 11l5-8" stroke="var(--tone-ink-soft)" strokeWidth="0.8" />
        </>
      )}
      {(of === 'drawn' || of === 'recorded') && (
        <path d="M1 1h18M1 11h18M10 1v10" stroke="var(--tone-fit)" strokeWidth="1.6" />
      )}
      {of === 'measured' && (
        <circle cx="10" cy="6" r="4.5" fill={loose ? 'var(--tone-evidence)' : 'var(--tone-ink)'} />
      )}
      {of === 'measured' && loose && (
        <path d="M3 12L17 0" stroke="var(--tone-evidence)" strokeWidth="1.6" />
      )}
      {of === 'running' && (
        <rect
          x="1"
          y="1"
          width="18"
          height="10"
          fill="none"
          stroke="var(--tone-fit)"
          strokeDasharray="3 2"
        />
      )}
    </svg>
  );
}
