import { Link } from 'react-router-dom';
import type { FindingScreeningResponse } from '#shared/contracts/finding.ts';
import { OrderStrip } from '#src/charts/order-strip.tsx';
import { Figure } from '#src/components/figure.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';

/** What was seen over time, newest survey first. */
export function FindingScreenings({
  siteId,
  screenings,
  mayReview,
}: {
  siteId: number;
  screenings: readonly FindingScreeningResponse[];
  mayReview: boolean;
}) {
  const newestFirst = [...screenings].reverse();
  return (
    <ul className="grid gap-x-8 gap-y-5 xl:grid-cols-2">
      {newestFirst.map((screening) => (
        <li key={screening.screeningId} className="flex min-w-0 flex-col gap-1.5">
          <div className="flex flex-wrap items-center gap-x-5 gap-y-1">
            <span className="figures font-medium">{formatDay(screening.surveyedOn)}</span>
            {mayReview ? (
              <Link
                className="ink-link figures"
                to={`/sites/${siteId}/review?show=decided&screening=${screening.screeningId}`}
              >
                {screening.pointLabel}
              </Link>
            ) : (
              <span className="figures">{screening.pointLabel}</span>
            )}
            <VerdictMark verdict={screening.verdict} />
            <span className="text-sm">
              Score{' '}
              <Figure value={screening.score === null ? null : formatFixed(screening.score, 2)} />
            </span>
            <Figure
              value={
                screening.overallMmPerSRms === null
                  ? null
                  : formatSignificant(screening.overallMmPerSRms)
              }
              unit="mm/s rms"
            />
            <Figure
              value={screening.speedRpm === null ? null : formatFixed(screening.speedRpm, 0)}
              unit="r/min"
            />
          </div>
          <OrderStrip size="large" marks={screening.orders} />
          {screening.decidedByName !== null && (
            <p className="text-sm text-ink-soft">
              Accepted by {screening.decidedByName}
              {screening.decisionReason !== null && `: ${screening.decisionReason}`}
            </p>
          )}
          <EvidenceSentences screening={screening} />
        </li>
      ))}
    </ul>
  );
}

function EvidenceSentences({ screening }: { screening: FindingScreeningResponse }) {
  if (screening.evidence.length === 0) return null;
  const sides = [
    { title: 'Speaks for looseness', sentences: screening.evidence.filter((one) => one.for) },
    { title: 'Speaks against it', sentences: screening.evidence.filter((one) => !one.for) },
  ];
  return (
    <details className="text-sm">
      <summary className="cursor-pointer text-ink-soft">
        Evidence ({screening.evidence.length})
      </summary>
      <div className="mt-1 flex flex-col gap-3">
        {sides.map(({ title, sentences }) => (
          <div key={title}>
            <p className="font-medium">{title}</p>
            {sentences.length === 0 ? (
              <p className="text-ink-soft">Nothing.</p>
            ) : (
              <ul className="list-disc pl-5">
                {sentences.map(({ text }) => (
                  <li key={text}>{text}</li>
                ))}
              </ul>
            )}
          </div>
        ))}
      </div>
    </details>
  );
}
