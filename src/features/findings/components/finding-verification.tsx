import type {
  VerificationReadingResponse,
  VerificationResponse,
} from '#shared/contracts/verification.ts';
import { Figure } from '#src/components/figure.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';

type Comparison = NonNullable<VerificationResponse['comparison']>;

const proposalWords: Readonly<Record<Comparison['proposal'], string>> = {
  verified: 'Proposed: close as verified.',
  reopen: 'Proposed: reopen the finding.',
  'measure again': 'Proposed: measure again before deciding.',
};

/** The survey after the repair against the screenings that raised the finding. */
export function FindingVerification({
  verification,
  decided,
}: {
  verification: VerificationResponse;
  /** The finding is closed: nothing is proposed any more. */
  decided: boolean;
}) {
  const { repairedOn, surveyCount, comparison } = verification;
  if (comparison === null) {
    return (
      <p className="text-sm text-ink-soft">
        The repair was reported on {formatDay(repairedOn)}. No survey has measured this bearing
        position since; the next one is set against the screenings that raised the finding.
      </p>
    );
  }
  return (
    <div className="flex flex-col gap-4">
      <div>
        {!decided && <p className="font-semibold">{proposalWords[comparison.proposal]}</p>}
        <p className="mt-1 max-w-prose text-sm">{comparison.sentence}</p>
        {surveyCount > 1 && (
          <p className="mt-1 text-sm text-ink-soft">
            {surveyCount} surveys have measured the position since the repair of{' '}
            {formatDay(repairedOn)}; this is the first of them that can tell, or else the newest.
          </p>
        )}
      </div>
      <ul className="grid gap-x-8 gap-y-4 xl:grid-cols-2">
        {comparison.points.map((point) => (
          <li key={point.pointLabel}>
            <BeforeAfter {...point} />
          </li>
        ))}
      </ul>
      {comparison.conditions.length > 0 && (
        <div className="text-sm">
          <p className="font-medium">Measured otherwise than before</p>
          <ul className="list-disc pl-5">
            {comparison.conditions.map((text) => (
              <li key={text}>{text}</li>
            ))}
          </ul>
        </div>
      )}
      {!decided && (
        <p className="text-sm text-ink-soft">The reliability lead decides, with a reason.</p>
      )}
    </div>
  );
}

const rows: readonly {
  label: string;
  unit?: string;
  of: (reading: VerificationReadingResponse) => string | null;
}[] = [
  { label: 'Score', of: ({ score }) => (score === null ? null : formatFixed(score, 2)) },
  { label: 'Orders in a row', of: ({ runLength }) => String(runLength) },
  {
    label: 'Orders 2 to 10',
    unit: 'mm/s rms',
    of: ({ runMmPerSRms }) => formatSignificant(runMmPerSRms, 2),
  },
  {
    label: 'Overall velocity',
    unit: 'mm/s rms',
    of: ({ overallMmPerSRms }) =>
      overallMmPerSRms === null ? null : formatSignificant(overallMmPerSRms, 2),
  },
  {
    label: 'Shaft speed',
    unit: 'r/min',
    of: ({ speedRpm }) => (speedRpm === null ? null : formatFixed(speedRpm, 0)),
  },
];

function BeforeAfter({
  pointLabel,
  outcome,
  sentence,
  before,
  after,
}: Comparison['points'][number]) {
  if (before === null || after === null) {
    return (
      <p className="text-sm">
        <span className="figures font-medium">{pointLabel}</span> {sentence}
      </p>
    );
  }
  return (
    <div className="overflow-x-auto">
      <table className="w-full text-sm">
        <caption className="pb-1 text-left">
          <span className="figures font-medium">{pointLabel}</span>{' '}
          <span className="text-ink-soft">{outcome}</span>
        </caption>
        <thead>
          <tr className="border-b border-rule text-left">
            <td />
            <th scope="col" className="py-1 pr-4 font-medium">
              Before, {formatDay(before.surveyedOn)}
            </th>
            <th scope="col" className="py-1 font-medium">
              After, {formatDay(after.surveyedOn)}
            </th>
          </tr>
        </thead>
        <tbody>
          <tr className="border-b border-hairline">
            <th scope="row" className="py-1 pr-4 text-left font-normal text-ink-soft">
              Verdict
            </th>
            <td className="py-1 pr-4">
              <VerdictMark verdict={before.verdict} />
            </td>
            <td className="py-1">
              <VerdictMark verdict={after.verdict} />
            </td>
          </tr>
          {rows.map(({ label, unit, of }) => (
            <tr key={label} className="border-b border-hairline">
              <th scope="row" className="py-1 pr-4 text-left font-normal text-ink-soft">
                {label}
              </th>
              <td className="py-1 pr-4">
                <Figure value={of(before)} unit={unit} />
              </td>
              <td className="py-1">
                <Figure value={of(after)} unit={unit} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
