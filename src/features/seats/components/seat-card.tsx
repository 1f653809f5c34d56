import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import { FitGauge } from '#src/charts/fit-gauge.tsx';
import { DescriptionList, type Description } from '#src/components/description-list.tsx';
import { Figure } from '#src/components/figure.tsx';
import { Term } from '#src/components/term.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatEntered, formatFixed } from '#src/lib/numbers.ts';
import { limitsMmText, percentText, seatPartsWords, seatWords, verdictText } from './seat-words.ts';

/** One seat: its gauge, what its records mean, and its place among the suspects. */
export function SeatCard({
  seat,
  tried = false,
}: {
  seat: SeatAssessment;
  /** Tried at the workbench: there is no record behind it. */
  tried?: boolean;
}) {
  const title = seatWords[seat.seat];
  return (
    <article aria-label={title} className="border border-hairline bg-sheet">
      <header className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-hairline px-4 py-2">
        <h3 className="text-base">
          {title}
          <span className="ml-2 text-sm font-normal text-ink-soft">
            {seatPartsWords[seat.seat]}
          </span>
        </h3>
        {seat.suspicionRank !== null && <Suspicion seat={seat} />}
      </header>
      <div className="flex flex-col gap-3 p-4">
        <p className="max-w-prose">{seat.sentence}</p>
        {seat.taper === null && (
          <FitGauge
            title={`${title}: fit`}
            data={{
              seat: seat.seat,
              seatLimitsUm: seat.seatLimitsUm,
              ringLimitsUm: seat.ringLimitsUm,
              seatClass: seat.toleranceClass,
              interferenceUm: seat.interferenceUm,
              measuredUm: seat.measuredUm,
              runningUm: seat.runningUm,
            }}
          />
        )}
        <DescriptionList
          columns={2}
          items={[...factsOf(seat), ...(tried ? [] : recordFacts(seat))]}
        />
        {seat.recommendationReason !== null && seat.recommendationReason !== seat.sentence && (
          <p className="max-w-prose text-sm text-ink-soft">{seat.recommendationReason}</p>
        )}
      </div>
    </article>
  );
}

function Suspicion({ seat }: { seat: SeatAssessment }) {
  return (
    <p className="text-sm">
      Suspect <span className="figures font-semibold">{seat.suspicionRank}</span>
      {seat.suspicion !== null && (
        <>
          {', '}
          <span className="figures">{percentText(seat.suspicion)}</span> that it explains the
          finding
        </>
      )}
    </p>
  );
}

const entered = (value: number | null, unit: string) => (
  <Figure value={value === null ? null : formatEntered(value)} unit={unit} />
);

/** What a cylindrical seat is judged by. */
const classFacts = (seat: SeatAssessment): Description[] => [
  { label: 'Class', value: <Figure value={seat.toleranceClass} /> },
  { label: 'Limits at 20 °C', value: <Figure value={limitsMmText(seat)} unit="mm" /> },
  { label: 'Class the load asks for', value: <Figure value={seat.recommendedClass} /> },
  ...(seat.neededUm === null
    ? []
    : [
        {
          label: 'Interference the load needs',
          value: <Figure value={formatFixed(seat.neededUm, 1)} unit="µm" />,
        },
      ]),
];

/** What a tapered seat is judged by instead. */
const taperFacts = (seat: SeatAssessment): Description[] => [
  { label: 'Taper of the bore', value: <Figure value={seat.taper} /> },
  { label: 'Driven up', value: entered(seat.driveUpMm, 'mm') },
  { label: 'Loss of internal clearance', value: entered(seat.clearanceReductionUm, 'µm') },
];

function factsOf(seat: SeatAssessment): Description[] {
  return [
    { label: 'Nominal size', value: entered(seat.nominalMm, 'mm') },
    ...(seat.taper === null ? classFacts(seat) : taperFacts(seat)),
    ...(seat.bonding === null
      ? []
      : [{ label: 'Adhesive', value: seat.bonding === 'bonded' ? 'Bonded on purpose' : 'None' }]),
    { label: 'Judged', value: verdictText(seat) },
    {
      label: (
        <Term definition="The chance that the seat runs with more clearance than its class allows, from limits or measured diameters, temperatures, time in service and the condition found. A clearance that is designed does not count.">
          Chance of clearance
        </Term>
      ),
      value: (
        <Figure
          value={seat.chanceOfClearance === null ? null : percentText(seat.chanceOfClearance)}
        />
      ),
    },
  ];
}

const recordFacts = (seat: SeatAssessment): Description[] => [
  { label: 'Condition last seen', value: seat.lastCondition },
  {
    label: 'Last recorded',
    value: seat.lastRecordedOn === null ? null : formatDay(seat.lastRecordedOn),
  },
];
