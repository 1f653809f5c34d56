import { mailKindWords, type MailChoicesResponse, type MailKind } from '#shared/contracts/mail.ts';
import { Checkbox } from '#src/components/checkbox.tsx';
import { Notice } from '#src/components/notice.tsx';

/** What else tells a person of it, or that nothing does. */
const hints: Readonly<Partial<Record<MailKind, string>>> = {
  'due-soon': 'Three days before the day.',
  overdue: 'When the day has passed, and again each week. Leads get it for what they assigned.',
  weekly:
    'To reliability leads, on Mondays: findings to decide on, overdue inspections, flags waiting.',
};

/** Every kind of mail with its switch; each is saved at once. */
export function MailChoices({
  choices,
  onChoose,
}: {
  choices: MailChoicesResponse['choices'];
  onChoose: (kind: MailKind, wanted: boolean) => void;
}) {
  const isOff = choices.some(({ kind, wanted }) => kind === 'assigned' && !wanted);
  return (
    <div className="flex flex-col gap-3">
      {isOff && (
        <Notice title="New inspections reach you on the page alone">
          The mail that tells you of a new inspection, with its cautions, is switched off. The task
          is yours all the same: look at the list of inspections yourself, or switch the mail on.
        </Notice>
      )}
      <ul className="flex flex-col gap-2.5">
        {choices.map(({ kind, wanted }) => (
          <li key={kind}>
            <Checkbox
              label={mailKindWords[kind]}
              hint={hints[kind]}
              checked={wanted}
              onChange={({ target }) => onChoose(kind, target.checked)}
            />
          </li>
        ))}
      </ul>
    </div>
  );
}
