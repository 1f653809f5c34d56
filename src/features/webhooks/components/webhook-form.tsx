import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { setWebhookRequest, webhookSecretMin } from '#shared/contracts/webhook.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useRemoveWebhook, useSetWebhook } from '../api/webhook.ts';

/** An empty field keeps the present secret. */
const typed = setWebhookRequest.extend({
  secret: z.preprocess(
    (value) => (value === '' ? undefined : value),
    setWebhookRequest.shape.secret,
  ),
});

/** Address and secret of the receiver. */
export function WebhookForm({ siteId, url }: { siteId: number; url: string | null }) {
  const set = useSetWebhook(siteId);
  const remove = useRemoveWebhook(siteId);
  const notify = useToast();
  const { register, handleSubmit, formState, reset } = useForm({
    resolver: zodResolver(typed),
    defaultValues: { url: url ?? '', secret: '' },
  });
  const { errors } = formState;
  const failure = set.isError ? toApiError(set.error) : null;
  const faultOf = (path: string) => failure?.fields.find((fault) => fault.path === path)?.message;
  const send = handleSubmit((body) =>
    set.mutate(body, {
      onSuccess: () => {
        reset({ url: body.url, secret: '' });
        notify({ text: 'Changes are told there from now on.' });
      },
    }),
  );
  return (
    <form
      noValidate
      onSubmit={(event) => void send(event)}
      className="flex max-w-xl flex-col gap-4"
    >
      {failure && failure.fields.length === 0 && <Notice loud title={failure.message} />}
      <Field label="Address" error={errors.url?.message ?? faultOf('url')}>
        <TextInput
          type="url"
          placeholder="https://maintenance.example/fretline"
          {...register('url')}
        />
      </Field>
      <Field
        label="Secret"
        optional={url !== null}
        hint={
          url === null
            ? `At least ${webhookSecretMin} characters; the receiver checks the signature with it.`
            : 'Leave it empty to keep the present one; it is never shown.'
        }
        error={errors.secret?.message ?? faultOf('secret')}
      >
        <TextInput type="password" autoComplete="off" {...register('secret')} />
      </Field>
      <div className="flex gap-2">
        <Button type="submit" variant="primary" busy={set.isPending} busyLabel="Saving…">
          Save
        </Button>
        {url !== null && (
          <Button
            busy={remove.isPending}
            onClick={() =>
              remove.mutate(undefined, {
                onSuccess: () => {
                  reset({ url: '', secret: '' });
                  notify({ text: 'Nobody is told any more.' });
                },
                onError: (error) => notify({ text: toApiError(error).message, failed: true }),
              })
            }
          >
            Remove
          </Button>
        )}
      </div>
    </form>
  );
}
