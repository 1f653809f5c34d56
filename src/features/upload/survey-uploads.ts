import type { QueryClient } from '@tanstack/react-query';
import { useSyncExternalStore } from 'react';
import { uploadResponse } from '#shared/contracts/waveform.ts';
import { upload } from '#src/lib/upload.ts';
import { readHead } from './read-head.ts';
import { UploadList } from './upload-list.ts';

/** Hundreds of files a minute must not ask for the whole survey hundreds of times. */
const refreshMs = 1000;

const lists = new Map<string, UploadList>();

/**
 * The one list of files of a survey, for as long as the window is open. It is the person's own: who
 * signs in after another at the same window starts with an empty one.
 */
export function uploadListOf(
  client: QueryClient,
  userId: number,
  siteId: number,
  surveyId: number,
): UploadList {
  const key = `${userId}/${siteId}/${surveyId}`;
  const known = lists.get(key);
  if (known !== undefined) return known;
  const list = new UploadList({
    readHead,
    store: window.localStorage,
    send: (file, mapping, options) => {
      const form = new FormData();
      form.append('mapping', JSON.stringify(mapping));
      form.append('file', file, file.name);
      return upload(
        `/api/sites/${siteId}/surveys/${surveyId}/waveforms`,
        form,
        uploadResponse,
        options,
      );
    },
    onSettled: atMostEvery(refreshMs, () =>
      client.invalidateQueries({ queryKey: ['sites', siteId, 'surveys'] }),
    ),
  });
  lists.set(key, list);
  return list;
}

function atMostEvery(intervalMs: number, work: () => Promise<void>): () => void {
  let planned = false;
  return () => {
    if (planned) return;
    planned = true;
    setTimeout(() => {
      planned = false;
      void work();
    }, intervalMs);
  };
}

export const useUploadEntries = (list: UploadList) =>
  useSyncExternalStore(list.subscribe, list.snapshot);
