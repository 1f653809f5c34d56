import type { FitRecordResponse } from '#shared/contracts/fit-record.ts';
import type { PartFigures, SeatHistoryEntry } from '#shared/contracts/seat-history.ts';
import { conditionWords } from '#shared/fits/condition-words.ts';
import { Figure } from '#src/components/figure.tsx';
import { diameterText } from '#src/lib/diameters.ts';
import { formatEntered, formatFixed, formatSigned } from '#src/lib/numbers.ts';
import { partWords } from './seat-words.ts';

/** What one record says of the seat, and the readings behind it. */
export function SeatRecordFacts({
  entry: { record, figures },
}: {
  entry: Extract<SeatHistoryEntry, { kind: 'record' }>;
}) {
  return (
    <div className="flex flex-col gap-1">
      <RecordedFigures record={record} />
      {record.condition !== null && <Condition condition={record.condition} />}
      {figures.map((part) => (
        <Readings key={part.part} seat={record.seat} figures={part} />
      ))}
      {record.note !== null && <p className="whitespace-pre-line">{record.note}</p>}
      <p className="text-ink-faint">Recorded by {record.recordedByName}</p>
    </div>
  );
}

function RecordedFigures({ record }: { record: FitRecordResponse }) {
  const words = partWords[record.seat];
  const diameter = (valueMm: number) => (
    <>
      <Figure value={diameterText(valueMm, record.diameterUnit)} unit={record.diameterUnit} />
      {record.diameterUnit === 'in' && (
        <>
          {' ('}
          <Figure value={diameterText(valueMm, 'mm')} unit="mm" />)
        </>
      )}
    </>
  );
  const facts = [
    record.toleranceClass !== null && {
      label: 'Class',
      value: <Figure value={record.toleranceClass} />,
    },
    record.seatMeasuredMm !== null && {
      label: words.seat,
      value: diameter(record.seatMeasuredMm),
    },
    record.ringMeasuredMm !== null && {
      label: words.ring,
      value: diameter(record.ringMeasuredMm),
    },
    record.driveUpMm !== null && {
      label: 'Driven up',
      value: <Figure value={formatEntered(record.driveUpMm)} unit="mm" />,
    },
    record.clearanceReductionUm !== null && {
      label: 'Internal clearance lost',
      value: <Figure value={formatEntered(record.clearanceReductionUm)} unit="µm" />,
    },
    record.bonding !== null && {
      label: 'Adhesive',
      value: record.bonding === 'bonded' ? 'bonded on purpose' : 'none',
    },
  ].filter((fact) => fact !== false);
  if (facts.length === 0) return null;
  return (
    <ul className="flex flex-wrap gap-x-6">
      {facts.map(({ label, value }) => (
        <li key={label}>
          {label} <span className="text-ink">{value}</span>
        </li>
      ))}
    </ul>
  );
}

function Condition({ condition }: { condition: NonNullable<FitRecordResponse['condition']> }) {
  const { clause, meaning } = conditionWords[condition];
  return (
    <p>
      <span className="font-medium text-ink">
        {condition.charAt(0).toUpperCase() + condition.slice(1)}
      </span>
      {clause !== null && ` (ISO 15243, ${clause})`}: {meaning}
    </p>
  );
}

const um = (value: number | null) => (
  <Figure value={value === null ? null : formatFixed(value, 1)} unit="µm" />
);

/** Mean and out-of-roundness of each plane, the taper between them, and how sure the mean is. */
function Readings({ seat, figures }: { seat: FitRecordResponse['seat']; figures: PartFigures }) {
  const caption = `${partWords[seat][figures.part]}, by plane`;
  return (
    <div className="overflow-x-auto">
      <table aria-label={caption} className="mt-1 w-fit">
        <thead>
          <tr className="text-xs text-ink-faint">
            <th scope="col" className="pr-6 text-left font-normal">
              {caption}
            </th>
            <th scope="col" className="pr-6 text-right font-normal">
              Mean
            </th>
            <th scope="col" className="pr-6 text-right font-normal">
              Out of round
            </th>
            <th scope="col" className="text-right font-normal">
              Readings
            </th>
          </tr>
        </thead>
        <tbody>
          {figures.planes.map((plane) => (
            <tr key={plane.plane} className="border-t border-hairline">
              <th scope="row" className="pr-6 text-left font-normal">
                Plane <span className="figures">{plane.plane}</span>
              </th>
              <td className="pr-6 text-right">
                <Figure value={formatFixed(plane.meanMm, 4)} unit="mm" />
              </td>
              <td className="pr-6 text-right">{um(plane.outOfRoundnessUm)}</td>
              <td className="figures text-right">{plane.readingCount}</td>
            </tr>
          ))}
          <tr className="border-t border-hairline">
            <th scope="row" className="pr-6 text-left font-normal">
              Taper, plane <span className="figures">1</span> less{' '}
              <span className="figures">2</span>
            </th>
            <td className="pr-6 text-right">
              <Figure
                value={figures.taperUm === null ? null : formatSigned(figures.taperUm, 1)}
                unit="µm"
              />
            </td>
            <td colSpan={2} className="text-right">
              mean ± {um(figures.expandedUncertaintyUm)}
            </td>
          </tr>
        </tbody>
      </table>
    </div>
  );
}
