import { StateMark, type MarkShape } from '#src/components/state-mark.tsx';
import { ProgressBar } from '#src/components/progress-bar.tsx';
import { faultsOf, type EntryState, type UploadEntry } from '../upload-entry.ts';

const looks: Readonly<Record<EntryState, { shape: MarkShape; words: string }>> = {
  reading: { shape: 'box-empty', words: 'Reading its head…' },
  ready: { shape: 'box-empty', words: 'Ready to be sent' },
  waiting: { shape: 'box-empty', words: 'Waits its turn' },
  sending: { shape: 'box-quarter', words: 'Sending' },
  checking: { shape: 'box-half', words: 'The server reads it' },
  sent: { shape: 'box-check', words: 'In the survey' },
  there: { shape: 'box-check', words: 'Was in the survey already' },
  refused: { shape: 'box-struck', words: 'Not taken' },
  failed: { shape: 'box-struck', words: 'Not sent' },
};

/** How far a file has come, in a shape and words. */
export function EntryStateView({ entry }: { entry: UploadEntry }) {
  if (entry.state === 'sending') {
    return (
      <div className="w-48">
        <ProgressBar
          label={`Sending ${entry.file.name}`}
          value={entry.sentBytes}
          max={entry.file.size}
        />
      </div>
    );
  }
  const isUnreadable = entry.head !== null && entry.head.preview.fault !== null;
  const isOpen = entry.state === 'ready' && faultsOf(entry).length > 0;
  const { shape, words } = looks[entry.state];
  if (isUnreadable) return <StateMark shape="box-struck">Can’t be read</StateMark>;
  return <StateMark shape={shape}>{isOpen ? 'Something is missing' : words}</StateMark>;
}
