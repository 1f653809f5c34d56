import type { QueryClient } from '@tanstack/react-query';
import { useSuspenseQuery } from '@tanstack/react-query';
import {
  Link,
  redirect,
  useNavigate,
  useSearchParams,
  type LoaderFunctionArgs,
} from 'react-router-dom';
import { SignInForm } from '#src/features/session/components/sign-in-form.tsx';
import { WhatItDoes } from '#src/features/session/components/what-it-does.tsx';
import { productQuery, sessionQuery } from '#src/features/session/api/session.ts';
import { homeOf } from '../home.ts';
import { Shell } from '../shell.tsx';

/** Only addresses of this product: `//elsewhere` or a full URL would lead out of it. */
const safeNext = (next: string | null): string | null =>
  next !== null && /^\/(?![/\\])/.test(next) ? next : null;

export const signInLoader =
  (queryClient: QueryClient) =>
  async ({ request }: LoaderFunctionArgs): Promise<Response | null> => {
    const [session] = await Promise.all([
      queryClient.fetchQuery(sessionQuery()),
      queryClient.ensureQueryData(productQuery()),
    ]);
    if (session === null) return null;
    const next = safeNext(new URL(request.url).searchParams.get('next'));
    return redirect(next ?? homeOf(session));
  };

export function SignInPage() {
  const { data: product } = useSuspenseQuery(productQuery());
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const next = safeNext(search.get('next'));
  return (
    <Shell homeTo="/">
      <div className="mx-auto mt-6 grid max-w-5xl gap-x-12 gap-y-8 lg:grid-cols-[1fr_22rem]">
        <div className="flex flex-col gap-4">
          <h1 className="text-2xl">Looseness, traced to its fit</h1>
          <p className="max-w-prose text-ink-soft">
            Fretline screens the waveforms of a vibration route for mechanical looseness, asks which
            recorded bearing fit can explain it, gets the seat inspected, and checks at the next
            survey that it is gone.
          </p>
          <WhatItDoes />
          <p className="max-w-prose border-l border-rule pl-3 text-sm text-ink-soft">
            A screening is a hint for a qualified analyst. It is not a diagnosis and not a release
            to run.
          </p>
          {product.demo && (
            <p className="text-sm">
              <Link to="/demo/mailbox" className="ink-link">
                Demo mailbox
              </Link>
              : the e-mails this demo has sent.
            </p>
          )}
        </div>
        <SignInForm
          demoAccounts={product.demoAccounts}
          onSignedIn={(session) => void navigate(next ?? homeOf(session), { replace: true })}
        />
      </div>
    </Shell>
  );
}
