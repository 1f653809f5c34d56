import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { createPersonRequest, type CreatePersonRequest } from '#shared/contracts/administration.ts';
import { Button } from '#src/components/button.tsx';
import { Checkbox } from '#src/components/checkbox.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import type { ApiError } from '#src/lib/api-error.ts';

/** A new account; roles at sites are given afterwards. */
export function PersonForm({
  saving,
  failure,
  onSave,
}: {
  saving: boolean;
  failure: ApiError | null;
  onSave: (person: CreatePersonRequest) => void;
}) {
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(createPersonRequest),
    defaultValues: { name: '', email: '', password: '', isAdministrator: false },
  });
  const { errors } = formState;
  const send = handleSubmit(onSave);
  return (
    <form noValidate onSubmit={(event) => void send(event)} className="flex flex-col gap-4">
      {failure && <Notice loud title={failure.message} />}
      <Field label="Name" error={errors.name?.message}>
        <TextInput autoComplete="off" {...register('name')} />
      </Field>
      <Field label="E-mail address" error={errors.email?.message}>
        <TextInput type="email" autoComplete="off" {...register('email')} />
      </Field>
      <Field
        label="First password"
        hint="At least 12 characters; tell it to the person yourself"
        error={errors.password?.message}
      >
        <TextInput type="password" autoComplete="new-password" {...register('password')} />
      </Field>
      <Checkbox
        label="Administrator"
        hint="Keeps sites, people and roles. Sees nothing of a site without a role there."
        {...register('isAdministrator')}
      />
      <div>
        <Button type="submit" variant="primary" busy={saving} busyLabel="Saving…">
          Add person
        </Button>
      </div>
    </form>
  );
}
