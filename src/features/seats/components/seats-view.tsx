import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { Notice } from '#src/components/notice.tsx';
import { BearingFacts } from './bearing-facts.tsx';
import { SeatCard } from './seat-card.tsx';
import { percentText, seatWords } from './seat-words.ts';

/** The seats of a bearing position, the likeliest suspect first, and what they say together. */
export function SeatsView({ assessment }: { assessment: SeatAssessmentsResponse }) {
  const seats = [...assessment.seats].sort(
    (a, b) => (a.suspicionRank ?? Infinity) - (b.suspicionRank ?? Infinity),
  );
  return (
    <div className="flex flex-col gap-4">
      <p className="max-w-prose border-l-4 border-fit pl-3 text-lg">{assessment.conclusion}</p>
      <div className="grid items-start gap-4 xl:grid-cols-2">
        {seats.map((seat) => (
          <SeatCard key={seat.seat} seat={seat} />
        ))}
      </div>
      <BearingFacts assessment={assessment} />
      {assessment.neighbours.length > 0 && (
        <details>
          <summary className="cursor-pointer text-sm">
            Seats of the neighbouring positions ({assessment.neighbours.length})
          </summary>
          <ul className="mt-2 flex flex-col gap-1 text-sm">
            {assessment.neighbours.map((seat) => (
              <li
                key={`${seat.positionName} ${seat.seat}`}
                className="border-b border-hairline py-1"
              >
                <span className="font-medium">
                  {seatWords[seat.seat]}, {seat.positionName}
                </span>{' '}
                <span className="figures text-ink-soft">
                  suspect {seat.suspicionRank}
                  {seat.suspicion !== null && `, ${percentText(seat.suspicion)}`}
                </span>
                <p className="text-ink-soft">{seat.sentence}</p>
              </li>
            ))}
          </ul>
        </details>
      )}
      {assessment.cautions.length > 0 && (
        <Notice title="Before acting on these figures">
          <ul className="list-disc pl-5">
            {assessment.cautions.map((caution) => (
              <li key={caution}>{caution}</li>
            ))}
          </ul>
        </Notice>
      )}
    </div>
  );
}
