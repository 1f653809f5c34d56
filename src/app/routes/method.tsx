import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { redirect, type LoaderFunctionArgs } from 'react-router-dom';
import figures from '#shared/signal/method-figures.json';
import type { MethodFigures } from '#shared/signal/method-figures.ts';
import { PageHeader } from '#src/components/page-header.tsx';
import { MethodLimits } from '#src/features/method/components/method-limits.tsx';
import { MethodMeasured } from '#src/features/method/components/method-measured.tsx';
import { MethodSteps } from '#src/features/method/components/method-steps.tsx';
import { Panel } from '#src/components/panel.tsx';
import { sessionQuery } from '#src/features/session/api/session.ts';
import { formatDay } from '#src/lib/dates.ts';
import { AccountMenu } from '../account-menu.tsx';
import { Shell } from '../shell.tsx';
import { signInAddress } from '../site-layout.tsx';

const measured = figures as MethodFigures;

export const methodLoader =
  (queryClient: QueryClient) =>
  async ({ request }: LoaderFunctionArgs): Promise<Response | null> => {
    const session = await queryClient.ensureQueryData(sessionQuery());
    return session === null ? redirect(signInAddress(request)) : null;
  };

/** What the screening does, how well it did where the truth was known, and where it fails. */
export function MethodPage() {
  const { data: session } = useSuspenseQuery(sessionQuery());
  return (
    <Shell homeTo="/" account={session && <AccountMenu session={session} />}>
      <PageHeader
        title="The screening method"
        facts={[
          { label: 'Version', value: measured.methodVersion },
          { label: 'Last measured', value: formatDay(measured.evaluatedOn) },
        ]}
      />
      <div className="grid gap-5">
        <p className="max-w-prose">
          A waveform goes in; a verdict with its evidence comes out: no looseness signs, looseness
          suspected, looseness likely, or retake the measurement. It is a hint for a qualified
          analyst, not a diagnosis, and never a release to run.
        </p>
        <Panel title="What is done, step by step">
          <MethodSteps />
        </Panel>
        <Panel title="What it can’t tell">
          <MethodLimits />
        </Panel>
        <MethodMeasured figures={measured} />
      </div>
    </Shell>
  );
}
