import type { InspectionReport, ReportedSeat } from '#shared/contracts/inspection.ts';
import { planes, readingDirectionsDeg } from '#shared/contracts/inspection.ts';
import { DescriptionList } from '#src/components/description-list.tsx';
import { Figure } from '#src/components/figure.tsx';
import { formatFixed } from '#src/lib/numbers.ts';
import { InPlaceChecksView } from './in-place-checks-view.tsx';
import { outcomeWords, partWords, seatWords, stageWords } from './inspection-words.ts';

/** A report as it was given. */
export function ReportView({ report }: { report: InspectionReport }) {
  return (
    <div className="flex flex-col gap-4">
      <DescriptionList
        items={[
          { label: 'Result', value: outcomeWords[report.outcome] },
          { label: 'Put right', value: report.repaired ? 'Yes' : 'No' },
          { label: 'Found in place', value: report.inPlaceResult },
          ...(report.causeInPlace
            ? [{ label: 'Seats', value: 'Stayed closed: the cause was found in place.' }]
            : []),
          {
            label: 'Work done',
            value: <span className="whitespace-pre-line">{report.workDone}</span>,
          },
        ]}
      />
      <InPlaceChecksView checks={report.inPlaceChecks} />
      {report.seats.map((seat) => (
        <ReportedSeatView key={`${seat.seat} ${seat.stage}`} seat={seat} />
      ))}
    </div>
  );
}

function ReportedSeatView({ seat }: { seat: ReportedSeat }) {
  return (
    <section>
      <h3 className="text-sm font-semibold">
        {seatWords[seat.seat]}, {stageWords[seat.stage].toLowerCase()}: {seat.condition}
      </h3>
      {(['seat', 'ring'] as const).map((part) => {
        const readings = seat.readings.filter((reading) => reading.part === part);
        if (readings.length === 0) return null;
        return (
          <table key={part} className="mt-2 text-sm">
            <caption className="text-left text-ink-soft">{partWords[seat.seat][part]}, mm</caption>
            <thead>
              <tr className="text-xs text-ink-faint">
                <th scope="col" className="pr-4 text-left font-normal">
                  Plane
                </th>
                {readingDirectionsDeg.map((directionDeg) => (
                  <th
                    key={directionDeg}
                    scope="col"
                    className="figures px-3 text-right font-normal"
                  >
                    {directionDeg}°
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {planes.map((plane) => (
                <tr key={plane}>
                  <th scope="row" className="figures text-left font-normal">
                    {plane}
                  </th>
                  {readingDirectionsDeg.map((directionDeg) => {
                    const reading = readings.find(
                      (one) => one.plane === plane && one.directionDeg === directionDeg,
                    );
                    return (
                      <td key={directionDeg} className="px-3 text-right">
                        <Figure value={reading ? formatFixed(reading.diameterMm, 4) : null} />
                      </td>
                    );
                  })}
                </tr>
              ))}
            </tbody>
          </table>
        );
      })}
      {seat.readings.length === 0 && <p className="text-sm text-ink-soft">No readings.</p>}
    </section>
  );
}
