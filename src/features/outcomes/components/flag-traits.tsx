import {
  outcomeTraits,
  type OutcomesResponse,
  type OutcomeTrait,
} from '#shared/contracts/outcomes.ts';

type Trait = OutcomesResponse['traits'][number];

const traitWords: Readonly<Record<OutcomeTrait, string>> = {
  'machine kind': 'Machine kind',
  'speed source': 'Running speed',
  'kind of looseness': 'Kind of looseness',
  direction: 'Direction',
};
const valueWords: Readonly<Record<string, string>> = {
  told: 'as told',
  refined: 'told, then refined',
  estimated: 'estimated from the record',
  none: 'not found',
  seat: 'a seat',
  pedestal: 'pedestal, foot or frame',
  undetermined: 'not told',
};

/** Below this many wrong flags a difference between two rows is as good as chance (by judgement). */
const fewWrong = 10;

/** What the flags that proved wrong had in common, against those that proved right. */
export function FlagTraits({ traits }: { traits: readonly Trait[] }) {
  const ofKind = traits.filter(({ trait }) => trait === 'machine kind');
  const wrong = ofKind.reduce((sum, { notFoundCount }) => sum + notFoundCount, 0);
  const right = ofKind.reduce((sum, { confirmedCount }) => sum + confirmedCount, 0);
  if (wrong === 0) {
    return (
      <p className="text-sm text-ink-soft">
        No flag has proved wrong at an inspection yet, so there is nothing to compare
        {right > 0 && ` (${right} proved right)`}.
      </p>
    );
  }
  return (
    <div className="flex flex-col gap-3">
      <p className="max-w-prose text-sm">
        {wrong} {wrong === 1 ? 'flag' : 'flags'} proved wrong and {right} right. Flags are counted
        here, several of one bearing position among them.
        {wrong < fewWrong &&
          ' That is too few for a pattern: take the counts as a list, not as a cause.'}
      </p>
      <div className="grid gap-x-8 gap-y-4 lg:grid-cols-2">
        {outcomeTraits.map((trait) => (
          <TraitTable
            key={trait}
            trait={trait}
            rows={traits.filter((one) => one.trait === trait)}
          />
        ))}
      </div>
    </div>
  );
}

function TraitTable({ trait, rows }: { trait: OutcomeTrait; rows: readonly Trait[] }) {
  return (
    <table className="w-full self-start text-sm">
      <caption className="pb-1 text-left font-medium">{traitWords[trait]}</caption>
      <thead>
        <tr className="border-b border-ink text-left text-xs text-ink-soft">
          <th scope="col" className="py-1 pr-4 font-normal">
            Flags
          </th>
          <th scope="col" className="w-24 py-1 pr-4 text-right font-normal">
            Wrong
          </th>
          <th scope="col" className="w-24 py-1 text-right font-normal">
            Right
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ value, confirmedCount, notFoundCount }) => (
          <tr key={value} className="border-b border-hairline">
            <th scope="row" className="py-1 pr-4 text-left font-normal">
              {valueWords[value] ?? value}
            </th>
            <td className="figures py-1 pr-4 text-right">{notFoundCount}</td>
            <td className="figures py-1 text-right">{confirmedCount}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
