import { useSuspenseQuery } from '@tanstack/react-query';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Panel } from '#src/components/panel.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { formatInstant } from '#src/lib/dates.ts';
import { calendarFeedQuery, useMakeCalendar, useRevokeCalendar } from '../api/calendar.ts';

/** The secret address at which a calendar program finds the inspections due. */
export function CalendarPanel({ siteId, whose }: { siteId: number; whose: string }) {
  const { data: feed } = useSuspenseQuery(calendarFeedQuery(siteId));
  const make = useMakeCalendar(siteId);
  const revoke = useRevokeCalendar(siteId);
  const notify = useToast();
  const onError = (error: Error) => notify({ text: toApiError(error).message, failed: true });
  const hasFeed = feed.createdAt !== null;
  return (
    <Panel title="Calendar">
      <p className="mb-3 max-w-prose text-sm text-ink-soft">
        Your calendar program can subscribe to {whose}. Whoever has the address can read them: keep
        it to yourself, and make it anew if it got about.
      </p>
      {feed.createdAt !== null && (
        <p className="mb-3 text-sm">
          Address made {formatInstant(feed.createdAt)},{' '}
          {feed.lastReadAt === null
            ? 'not read yet.'
            : `last read ${formatInstant(feed.lastReadAt)}.`}
        </p>
      )}
      {hasFeed && make.data !== undefined && (
        <Field
          className="mb-3"
          label="Calendar address"
          hint="Shown this once. Copy it into your calendar program as a subscription."
        >
          <TextInput
            readOnly
            className="figures"
            value={make.data.address}
            onFocus={({ target }) => target.select()}
          />
        </Field>
      )}
      <div className="flex flex-wrap gap-2">
        <Button busy={make.isPending} onClick={() => make.mutate(undefined, { onError })}>
          {hasFeed ? 'Make the address anew' : 'Make a calendar address'}
        </Button>
        {hasFeed && (
          <Button
            busy={revoke.isPending}
            onClick={() =>
              revoke.mutate(undefined, {
                onError,
                onSuccess: () => notify({ text: 'The address leads nowhere any more.' }),
              })
            }
          >
            Revoke it
          </Button>
        )}
      </div>
    </Panel>
  );
}
