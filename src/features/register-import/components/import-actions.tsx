import { useState } from 'react';
import type { RegisterImportResponse } from '#shared/contracts/register-import.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useToast } from '#src/components/toast.tsx';
import { toApiError, type ApiError } from '#src/lib/api-error.ts';
import { useChangeImport } from '../api/imports.ts';

const rowsWord = (count: number) => (count === 1 ? '1 row' : `${count} rows`);

/** Writes what the dry run found, or takes it back after asking once more. */
export function ImportActions({ siteId, one }: { siteId: number; one: RegisterImportResponse }) {
  const apply = useChangeImport(siteId, one.id, 'apply');
  const undo = useChangeImport(siteId, one.id, 'undo');
  const notify = useToast();
  const [asking, setAsking] = useState(false);
  const written = one.counts.new + one.counts.changed;
  const failed = apply.isError ? apply.error : undo.isError ? undo.error : null;
  return (
    <div className="flex flex-col gap-3">
      <Standing one={one} />
      {one.can.apply && (
        <div>
          <Button
            variant="primary"
            busy={apply.isPending}
            busyLabel="Writing…"
            onClick={() =>
              apply.mutate(undefined, {
                onSuccess: () => notify({ text: `${rowsWord(written)} written to the register.` }),
              })
            }
          >
            Write {rowsWord(written)} to the register
          </Button>
        </div>
      )}
      {one.can.undo && (
        <div>
          <Button busy={undo.isPending} busyLabel="Undoing…" onClick={() => setAsking(true)}>
            Undo this import
          </Button>
        </div>
      )}
      {failed && <Failure failure={toApiError(failed)} />}
      <Dialog
        open={asking}
        onOpenChange={setAsking}
        title="Undo this import?"
        description={`${rowsWord(one.counts.new)} that the import added will be taken out of the register, ${rowsWord(one.counts.changed)} that it changed will be as before. If one of them has been changed or used since, nothing is undone and you are told which.`}
        actions={
          <>
            <Button
              variant="primary"
              onClick={() => {
                setAsking(false);
                undo.mutate(undefined, {
                  onSuccess: () => notify({ text: 'The register is as it was before the import.' }),
                });
              }}
            >
              Undo the import
            </Button>
            <Button onClick={() => setAsking(false)}>Keep it</Button>
          </>
        }
      />
    </div>
  );
}

/** Why there is nothing to press, where there is not. */
function Standing({ one }: { one: RegisterImportResponse }) {
  if (one.state === 'failed') {
    return (
      <Notice loud title="The dry run broke off.">
        {one.failure}
      </Notice>
    );
  }
  if (one.state !== 'ready' || one.can.apply) return null;
  if (one.counts.wrong === 0) {
    return <Notice title="Nothing to write: every row is the same as the register." />;
  }
  return (
    <Notice title={`${rowsWord(one.counts.wrong)} wrong: nothing can be written yet.`}>
      Correct the rows in the file and send it again. All rows are written together or none.
    </Notice>
  );
}

function Failure({ failure }: { failure: ApiError }) {
  return (
    <Notice loud title="Not done.">
      <p>{failure.message}</p>
      {failure.fields.length > 1 && (
        <ul className="list-disc pl-5">
          {failure.fields.map(({ message }) => (
            <li key={message}>{message}</li>
          ))}
        </ul>
      )}
    </Notice>
  );
}
