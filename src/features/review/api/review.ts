import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  decideResponse,
  reviewQueueResponse,
  type DecideRequest,
  type ReviewQueueQuery,
} from '#shared/contracts/review.ts';
import { waveformListItem, type ScreenAgainRequest } from '#shared/contracts/waveform.ts';
import { request, requestNothing } from '#src/lib/api-client.ts';
import { isRecording } from './recordings.ts';

export const reviewQueueQuery = (siteId: number, query: Partial<ReviewQueueQuery>) =>
  queryOptions({
    queryKey: ['sites', siteId, 'review', 'queue', query],
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/review-queue`, reviewQueueResponse, { query, signal }),
  });

/** What a decision can change is asked for again; samples and spectra never change. */
function useForgetAfterDecision(siteId: number) {
  const client = useQueryClient();
  return () =>
    client.invalidateQueries({
      queryKey: ['sites', siteId],
      predicate: ({ queryKey }) => !isRecording(queryKey),
    });
}

export function useDecide(siteId: number) {
  const forget = useForgetAfterDecision(siteId);
  return useMutation({
    mutationFn: ({ screeningId, ...body }: DecideRequest & { screeningId: number }) =>
      request(`/api/sites/${siteId}/screenings/${screeningId}/decision`, decideResponse, {
        method: 'POST',
        body,
      }),
    onSettled: forget,
  });
}

export function useUndoDecision(siteId: number) {
  const forget = useForgetAfterDecision(siteId);
  return useMutation({
    mutationFn: (screeningId: number) =>
      requestNothing(`/api/sites/${siteId}/screenings/${screeningId}/decision`, {
        method: 'DELETE',
      }),
    onSettled: forget,
  });
}

/** Screens a waveform again with corrected facts; the earlier screening is kept. */
export function useScreenAgain(siteId: number) {
  const forget = useForgetAfterDecision(siteId);
  return useMutation({
    mutationFn: ({ waveformId, ...body }: ScreenAgainRequest & { waveformId: number }) =>
      request(`/api/sites/${siteId}/waveforms/${waveformId}/screen-again`, waveformListItem, {
        method: 'POST',
        body,
      }),
    onSettled: forget,
  });
}
