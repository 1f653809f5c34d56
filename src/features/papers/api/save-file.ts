import { useMutation } from '@tanstack/react-query';
import { downloadFile } from '#src/lib/api-client.ts';

export interface SavedFile {
  /** Address of the file below /api, with its query. */
  path: string;
  /** Name under which the browser saves it. */
  fileName: string;
}

const typeOf = (fileName: string) => (fileName.endsWith('.pdf') ? 'application/pdf' : 'text/csv');

/** Loads a file with the session of this page and hands it to the browser to be saved. */
export function useSaveFile() {
  return useMutation({
    mutationFn: async ({ path, fileName }: SavedFile) => {
      const file = await downloadFile(path, typeOf(fileName));
      const address = URL.createObjectURL(file);
      const link = document.createElement('a');
      link.href = address;
      link.download = fileName;
      link.click();
      URL.revokeObjectURL(address);
    },
  });
}
