import { registerKinds } from '#shared/contracts/register-import.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Panel } from '#src/components/panel.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useExport } from '../api/imports.ts';
import { kindWords } from './import-words.ts';

/** The register as files, one a kind. */
export function ExportPanel({ siteId }: { siteId: number }) {
  const save = useExport(siteId);
  return (
    <Panel title="Export">
      <div className="flex flex-col gap-3">
        <p className="max-w-prose text-sm text-ink-soft">
          One CSV file for each kind: UTF-8, commas, decimal points, dates as YYYY-MM-DD, units in
          the header. A text that a spreadsheet would take for a formula has an apostrophe in front;
          an import takes it away again.
        </p>
        <div className="flex flex-wrap gap-2">
          {registerKinds.map((kind) => (
            <Button
              key={kind}
              icon="download"
              busy={save.isPending && save.variables === kind}
              busyLabel="Loading…"
              onClick={() => save.mutate(kind)}
            >
              {kindWords[kind]}
            </Button>
          ))}
        </div>
        {save.isError && (
          <Notice loud title="The file could not be loaded.">
            {toApiError(save.error).message}
          </Notice>
        )}
      </div>
    </Panel>
  );
}
