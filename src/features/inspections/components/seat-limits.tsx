import type { InspectionResponse } from '#shared/contracts/inspection.ts';
import { Figure } from '#src/components/figure.tsx';
import { formatFixed } from '#src/lib/numbers.ts';
import { partWords, seatWords } from './inspection-words.ts';

/** What the micrometer should read on the seats that are to be checked. */
export function SeatLimits({ inspection }: { inspection: InspectionResponse }) {
  const seats = inspection.seats.seats.filter(({ seat }) =>
    seat === 'shaft' ? inspection.checkShaftSeat : inspection.checkHousingSeat,
  );
  return (
    <ul className="flex flex-col gap-3">
      {inspection.checkInPlace && (
        <li>
          <p className="font-semibold">In place, before anything is opened</p>
          <p className="text-sm text-ink-soft">
            Bolt torque, movement across the joint, soft foot, shims, grout, cracks. What is found
            here can spare the opening.
          </p>
        </li>
      )}
      {seats.map((seat) => (
        <li key={seat.seat}>
          <p className="font-semibold">{seatWords[seat.seat]}</p>
          <p className="text-sm">
            {partWords[seat.seat].seat}{' '}
            {seat.seatLimitsMm === null ? (
              <span className="text-ink-soft">
                has no limits on record: measure it, that is the first step.
              </span>
            ) : (
              <>
                <Figure
                  className="font-semibold"
                  value={`${formatFixed(seat.seatLimitsMm[0], 3)} to ${formatFixed(seat.seatLimitsMm[1], 3)}`}
                  unit="mm"
                />{' '}
                at 20 °C, class <Figure value={seat.toleranceClass} />
              </>
            )}
          </p>
          {seat.recommendedClass !== null && seat.recommendedClass !== seat.toleranceClass && (
            <p className="text-sm text-ink-soft">
              Common practice for this load asks for <Figure value={seat.recommendedClass} />; the
              machine maker’s drawing wins.
            </p>
          )}
          <p className="text-sm text-ink-soft">{seat.sentence}</p>
        </li>
      ))}
      {seats.length > 0 && (
        <li className="text-sm text-ink-soft">
          Measure in two planes, a quarter of the width from either end, in four directions each,
          45° apart, with part and micrometer at the same temperature.
        </li>
      )}
    </ul>
  );
}
