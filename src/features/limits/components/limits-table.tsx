import type { LimitsInForce, LimitsResponse } from '#shared/contracts/limits.ts';
import { formatFixed } from '#src/lib/numbers.ts';

/** What is in force for the site and each kind of machine it has. */
export function LimitsTable({ limits }: { limits: LimitsResponse }) {
  return (
    <table className="w-full text-sm" aria-label="Limits in force">
      <thead>
        <tr className="border-b border-ink text-left text-xs text-ink-soft">
          <th scope="col" className="py-1 pr-4 font-normal">
            For
          </th>
          <th scope="col" className="py-1 pr-4 text-right font-normal">
            Machines
          </th>
          <th scope="col" className="py-1 pr-4 text-right font-normal">
            Suspected from
          </th>
          <th scope="col" className="py-1 pr-4 text-right font-normal">
            Likely from
          </th>
          <th scope="col" className="py-1 font-normal">
            Set by
          </th>
        </tr>
      </thead>
      <tbody>
        {[limits.site, ...limits.kinds].map((one) => (
          <tr key={one.machineKind ?? ''} className="border-b border-hairline">
            <th scope="row" className="py-1 pr-4 text-left font-normal">
              {one.machineKind ?? <strong>The whole site</strong>}
            </th>
            <td className="figures py-1 pr-4 text-right">{one.machineCount}</td>
            <td className="figures py-1 pr-4 text-right">{formatFixed(one.suspectedScore, 2)}</td>
            <td className="figures py-1 pr-4 text-right">{formatFixed(one.likelyScore, 2)}</td>
            <td className="py-1">{sourceOf(one)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function sourceOf({ own, machineKind }: LimitsInForce): string {
  if (own) return machineKind === null ? 'this site' : 'this site, for the kind';
  return machineKind === null ? 'the method' : 'as the site';
}
