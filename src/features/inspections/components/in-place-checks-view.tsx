import { inPlaceReadingUnits, type InPlaceCheck } from '#shared/contracts/in-place-check.ts';
import { Figure } from '#src/components/figure.tsx';
import { formatEntered } from '#src/lib/numbers.ts';
import { inPlaceFindingWords, inPlaceWords } from './inspection-words.ts';

/** The checks in place as they were reported. */
export function InPlaceChecksView({ checks }: { checks: readonly InPlaceCheck[] }) {
  if (checks.length === 0) return null;
  return (
    <table className="w-full max-w-2xl text-sm">
      <caption className="mb-1 text-left font-semibold">Checked in place</caption>
      <thead>
        <tr className="border-b border-ink text-left text-xs text-ink-soft">
          {['Check', 'Finding', 'Reading', 'Seen'].map((words) => (
            <th key={words} scope="col" className="py-1 pr-4 font-normal">
              {words}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {checks.map((told) => (
          <tr key={told.check} className="border-b border-hairline align-top">
            <th scope="row" className="py-1 pr-4 text-left font-normal">
              {inPlaceWords[told.check].name}
            </th>
            <td className="py-1 pr-4">{inPlaceFindingWords[told.finding]}</td>
            <td className="py-1 pr-4">
              <Reading told={told} />
            </td>
            <td className="py-1">{told.note}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Reading({ told }: { told: InPlaceCheck }) {
  const unit = inPlaceReadingUnits[told.check];
  if (told.reading === null || unit === null) return <Figure value={null} />;
  return (
    <>
      <Figure value={formatEntered(told.reading)} unit={unit} />
      {told.readingAbove !== null && (
        <>
          {' below, '}
          <Figure value={formatEntered(told.readingAbove)} unit={unit} /> above
        </>
      )}
    </>
  );
}
