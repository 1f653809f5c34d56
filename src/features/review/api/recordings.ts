import { queryOptions, type QueryClient } from '@tanstack/react-query';
import { screeningResponse } from '#shared/contracts/screening.ts';
import { waveformResponse } from '#shared/contracts/waveform.ts';
import type { Spectrum } from '#src/charts/spectrum-data.ts';
import { downloadFloat32, request } from '#src/lib/api-client.ts';

/** Samples and spectra: large, and the same for ever. */
const recordingsKey = (siteId: number) => ['sites', siteId, 'recordings'] as const;
export const isRecording = (queryKey: readonly unknown[]) => queryKey[2] === 'recordings';

export const screeningQuery = (siteId: number, screeningId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'review', 'screening', screeningId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/screenings/${screeningId}`, screeningResponse, { signal }),
  });

export const waveformQuery = (siteId: number, waveformId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'review', 'waveform', waveformId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/waveforms/${waveformId}`, waveformResponse, { signal }),
  });

export const samplesQuery = (siteId: number, waveformId: number) =>
  queryOptions({
    queryKey: [...recordingsKey(siteId), 'samples', waveformId],
    staleTime: Infinity,
    queryFn: ({ signal }) =>
      downloadFloat32(`/api/sites/${siteId}/waveforms/${waveformId}/samples`, { signal }),
  });

/** The first value is the step in Hz, the rest are the lines. */
export const spectrumQuery = (siteId: number, screeningId: number) =>
  queryOptions({
    queryKey: [...recordingsKey(siteId), 'spectrum', screeningId],
    staleTime: Infinity,
    queryFn: async ({ signal }): Promise<Spectrum> => {
      const path = `/api/sites/${siteId}/screenings/${screeningId}/spectrum`;
      const values = await downloadFloat32(path, { signal });
      return { stepHz: values[0] ?? 0, amplitude: values.subarray(1) };
    },
  });

export const averagedRevolutionQuery = (siteId: number, screeningId: number) =>
  queryOptions({
    queryKey: [...recordingsKey(siteId), 'averaged-revolution', screeningId],
    staleTime: Infinity,
    queryFn: ({ signal }) =>
      downloadFloat32(`/api/sites/${siteId}/screenings/${screeningId}/averaged-revolution`, {
        signal,
      }),
  });

/** Fetches what an item of the queue shows before it is gone to; what fails is asked for again then. */
export async function prefetchItem(
  client: QueryClient,
  siteId: number,
  item: { screeningId: number; waveformId: number },
): Promise<void> {
  await Promise.all([
    client.prefetchQuery(screeningQuery(siteId, item.screeningId)),
    client.prefetchQuery(waveformQuery(siteId, item.waveformId)),
    client.prefetchQuery(samplesQuery(siteId, item.waveformId)),
    client.prefetchQuery(spectrumQuery(siteId, item.screeningId)),
    client.prefetchQuery(averagedRevolutionQuery(siteId, item.screeningId)),
  ]);
  const waveform = client.getQueryData(waveformQuery(siteId, item.waveformId).queryKey);
  if (waveform === undefined) return;
  const { previous, alongside } = waveform;
  await Promise.all([
    ...(previous === null
      ? []
      : [
          client.prefetchQuery(waveformQuery(siteId, previous.waveformId)),
          client.prefetchQuery(spectrumQuery(siteId, previous.screeningId)),
        ]),
    ...alongside.map((other) => client.prefetchQuery(spectrumQuery(siteId, other.screeningId))),
  ]);
}
