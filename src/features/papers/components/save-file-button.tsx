import type { ReactNode } from 'react';
import { Button } from '#src/components/button.tsx';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useSaveFile, type SavedFile } from '../api/save-file.ts';

/** Saves one file; what goes wrong is told at the foot of the page. */
export function SaveFileButton({
  path,
  fileName,
  children,
}: SavedFile & {
  children: ReactNode;
}) {
  const save = useSaveFile();
  const notify = useToast();
  return (
    <Button
      icon="download"
      busy={save.isPending}
      busyLabel="Loading…"
      onClick={() =>
        save.mutate(
          { path, fileName },
          {
            onError: (error) =>
              notify({ text: `${fileName}: ${toApiError(error).message}`, failed: true }),
          },
        )
      }
    >
      {children}
    </Button>
  );
}
