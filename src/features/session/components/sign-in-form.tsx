import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import {
  signInRequest,
  type ProductResponse,
  type SessionResponse,
  type SignInRequest,
} from '#shared/contracts/session.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useSignIn } from '../api/session.ts';

type DemoAccount = ProductResponse['demoAccounts'][number];

/** E-mail and password; in a demo also one button for each demo account. */
export function SignInForm({
  demoAccounts,
  onSignedIn,
}: {
  demoAccounts: readonly DemoAccount[];
  onSignedIn: (session: SessionResponse) => void;
}) {
  const signIn = useSignIn();
  const form = useForm<SignInRequest>({
    resolver: zodResolver(signInRequest),
    defaultValues: { email: '', password: '' },
  });
  const send = form.handleSubmit((values) => signIn.mutate(values, { onSuccess: onSignedIn }));
  const { errors } = form.formState;
  return (
    <div className="flex flex-col gap-6">
      <form noValidate onSubmit={(event) => void send(event)} className="flex flex-col gap-4">
        {signIn.isError && (
          <Notice loud title="Not signed in">
            {toApiError(signIn.error).message}
          </Notice>
        )}
        <Field label="E-mail address" error={errors.email?.message}>
          <TextInput type="email" autoComplete="username" {...form.register('email')} />
        </Field>
        <Field label="Password" error={errors.password?.message}>
          <TextInput
            type="password"
            autoComplete="current-password"
            {...form.register('password')}
          />
        </Field>
        <Button type="submit" variant="primary" busy={signIn.isPending} busyLabel="Signing in…">
          Sign in
        </Button>
      </form>
      {demoAccounts.length > 0 && (
        <section aria-labelledby="demo-accounts">
          <h2 id="demo-accounts" className="lettering mb-2 text-ink-faint">
            Demo accounts
          </h2>
          <ul className="flex flex-col border-t border-hairline">
            {demoAccounts.map((account) => (
              <li
                key={account.email}
                className="flex items-center justify-between gap-3 border-b border-hairline py-1.5"
              >
                <div className="min-w-0 text-sm">
                  <p>
                    {account.role} <span className="text-ink-faint">– {account.name}</span>
                  </p>
                  <p className="figures truncate text-xs text-ink-faint">{account.email}</p>
                </div>
                <Button
                  size="small"
                  aria-label={`Sign in as ${account.name}, ${account.role}`}
                  onClick={() =>
                    signIn.mutate(
                      { email: account.email, password: account.password },
                      { onSuccess: onSignedIn },
                    )
                  }
                >
                  Sign in
                </Button>
              </li>
            ))}
          </ul>
        </section>
      )}
    </div>
  );
}
