import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { changePasswordRequest, type ChangePasswordRequest } from '#shared/contracts/account.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useChangePassword } from '../api/account.ts';

const typed = changePasswordRequest
  .extend({ repeated: z.string() })
  .refine(({ newPassword, repeated }) => newPassword === repeated, {
    path: ['repeated'],
    message: 'This is not the same as the new password.',
  });
const empty = { currentPassword: '', newPassword: '', repeated: '' };

/** A new password of one's own. */
export function PasswordForm({ email, onChanged }: { email: string; onChanged: () => void }) {
  const change = useChangePassword();
  const { register, handleSubmit, formState, setError, reset } = useForm({
    resolver: zodResolver(typed),
    defaultValues: empty,
  });
  const { errors } = formState;
  const send = handleSubmit(({ currentPassword, newPassword }) =>
    change.mutate({ currentPassword, newPassword } satisfies ChangePasswordRequest, {
      onSuccess: () => {
        reset(empty);
        onChanged();
      },
      onError: (error) => {
        for (const { path, message } of toApiError(error).fields) {
          if (path === 'currentPassword' || path === 'newPassword') setError(path, { message });
        }
      },
    }),
  );
  const failure = change.isError ? toApiError(change.error) : null;
  return (
    <form
      noValidate
      onSubmit={(event) => void send(event)}
      className="flex max-w-sm flex-col gap-4"
    >
      {failure && failure.fields.length === 0 && <Notice loud title={failure.message} />}
      {/* Tells a password manager whose password this is. */}
      <input type="hidden" autoComplete="username" value={email} readOnly />
      <Field label="Present password" error={errors.currentPassword?.message}>
        <TextInput
          type="password"
          autoComplete="current-password"
          {...register('currentPassword')}
        />
      </Field>
      <Field label="New password" hint="At least 12 characters" error={errors.newPassword?.message}>
        <TextInput type="password" autoComplete="new-password" {...register('newPassword')} />
      </Field>
      <Field label="New password again" error={errors.repeated?.message}>
        <TextInput type="password" autoComplete="new-password" {...register('repeated')} />
      </Field>
      <div>
        <Button type="submit" variant="primary" busy={change.isPending} busyLabel="Changing…">
          Change password
        </Button>
      </div>
    </form>
  );
}
