import { useState } from 'react';
import {
  importLimits,
  registerKind,
  registerKinds,
  type RegisterImportResponse,
  type RegisterKind,
} from '#shared/contracts/register-import.ts';
import { FileDrop } from '#src/components/file-drop.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Panel } from '#src/components/panel.tsx';
import { RadioGroup } from '#src/components/radio-group.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useSendFile } from '../api/imports.ts';
import { kindWords } from './import-words.ts';

const matchedBy: Readonly<Record<RegisterKind, string>> = {
  machines: 'found by their tag',
  positions: 'found by machine tag and position code',
  'fit-records': 'found by seat and date; added, never changed',
  points: 'found by machine tag, position code and direction',
};

/** Chooses what a file holds and sends it into its dry run. */
export function SendFilePanel({
  siteId,
  onSent,
}: {
  siteId: number;
  onSent: (sent: RegisterImportResponse) => void;
}) {
  const [kind, setKind] = useState<RegisterKind>('machines');
  const [remark, setRemark] = useState<string | null>(null);
  const send = useSendFile(siteId);
  const take = (files: File[]) => {
    const [file] = files;
    setRemark(files.length > 1 ? 'One file at a time: none was sent.' : null);
    if (file !== undefined && files.length === 1)
      send.mutate({ kind, file }, { onSuccess: onSent });
  };
  const failure = send.isError ? toApiError(send.error) : null;
  return (
    <Panel title="Import">
      <div className="flex flex-col gap-4">
        <RadioGroup
          legend="The file holds"
          name="kind"
          value={kind}
          options={registerKinds.map((one) => ({
            value: one,
            label: kindWords[one],
            hint: matchedBy[one],
          }))}
          onChange={({ target }) => setKind(registerKind.parse(target.value))}
        />
        <FileDrop
          label={`${kindWords[kind]} file`}
          endings={['.csv', '.txt', '.tsv']}
          folders={false}
          disabled={send.isPending}
          hint={
            <>
              A CSV with the columns of an export; a column that is left out stays as it is. Commas,
              semicolons or tabs. At most {importLimits.fileMaxBytes / 1024 / 1024} MB and{' '}
              {importLimits.rowsMax.toLocaleString('en')} rows. First comes a dry run: nothing is
              written until you say so.
            </>
          }
          onFiles={take}
        />
        {send.isPending && <p role="status">Sending the file…</p>}
        {remark && <Notice loud>{remark}</Notice>}
        {failure && (
          <Notice loud title="The file was not taken.">
            {failure.fields.length > 1 ? (
              <ul className="list-disc pl-5">
                {failure.fields.map(({ message }) => (
                  <li key={message}>{message}</li>
                ))}
              </ul>
            ) : (
              failure.message
            )}
          </Notice>
        )}
      </div>
    </Panel>
  );
}
