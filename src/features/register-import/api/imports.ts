import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  importListResponse,
  importRowsResponse,
  registerImportResponse,
  type ImportListQuery,
  type ImportRowsQuery,
  type RegisterKind,
} from '#shared/contracts/register-import.ts';
import { downloadFile, request } from '#src/lib/api-client.ts';
import { upload } from '#src/lib/upload.ts';

const pollMs = 400;
const pathOf = (siteId: number) => `/api/sites/${siteId}/register`;
const keyOf = (siteId: number) => ['sites', siteId, 'register-imports'] as const;

export const importListQuery = (siteId: number, query: Partial<ImportListQuery>) =>
  queryOptions({
    queryKey: [...keyOf(siteId), 'list', query],
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) =>
      request(`${pathOf(siteId)}/imports`, importListResponse, { query, signal }),
  });

/** One import; asked again and again while its dry run goes on. */
export const importQuery = (siteId: number, importId: number) =>
  queryOptions({
    queryKey: [...keyOf(siteId), 'one', importId],
    queryFn: ({ signal }) =>
      request(`${pathOf(siteId)}/imports/${importId}`, registerImportResponse, { signal }),
    refetchInterval: ({ state }) => (state.data?.state === 'reading' ? pollMs : false),
  });

export const importRowsQuery = (
  siteId: number,
  importId: number,
  query: Partial<ImportRowsQuery>,
) =>
  queryOptions({
    queryKey: [...keyOf(siteId), 'rows', importId, query],
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) =>
      request(`${pathOf(siteId)}/imports/${importId}/rows`, importRowsResponse, { query, signal }),
  });

/** Sends a file; its dry run begins with that. */
export function useSendFile(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ kind, file }: { kind: RegisterKind; file: File }) => {
      const form = new FormData();
      form.append('kind', kind);
      form.append('file', file);
      return upload(`${pathOf(siteId)}/imports`, form, registerImportResponse);
    },
    onSuccess: () => client.invalidateQueries({ queryKey: keyOf(siteId) }),
  });
}

/** Writes what the dry run found, or takes it back; both change everything of the site. */
export function useChangeImport(siteId: number, importId: number, change: 'apply' | 'undo') {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () =>
      request(`${pathOf(siteId)}/imports/${importId}/${change}`, registerImportResponse, {
        method: 'POST',
      }),
    onSettled: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}

/** Loads a part of the register and hands it to the browser to be saved. */
export function useExport(siteId: number) {
  return useMutation({
    mutationFn: async (kind: RegisterKind) => {
      const file = await downloadFile(`${pathOf(siteId)}/exports/${kind}`, 'text/csv');
      const address = URL.createObjectURL(file);
      const link = document.createElement('a');
      link.href = address;
      link.download = `${kind}.csv`;
      link.click();
      URL.revokeObjectURL(address);
    },
  });
}
