import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  surveyCounts,
  surveyListResponse,
  surveyResponse,
  type CreateSurveyRequest,
  type SurveyCounts,
  type SurveyListQuery,
} from '#shared/contracts/survey.ts';
import { waveformListItem, type ScreenAgainRequest } from '#shared/contracts/waveform.ts';
import { request, requestNothing } from '#src/lib/api-client.ts';

const surveysKey = (siteId: number) => ['sites', siteId, 'surveys'] as const;

export const surveyListQuery = (siteId: number, query: Partial<SurveyListQuery>) =>
  queryOptions({
    queryKey: [...surveysKey(siteId), 'list', query],
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/surveys`, surveyListResponse, { query, signal }),
  });

export const surveyQuery = (siteId: number, surveyId: number) =>
  queryOptions({
    queryKey: [...surveysKey(siteId), 'one', surveyId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/surveys/${surveyId}`, surveyResponse, { signal }),
  });

const pollMs = 1000;

export const isScreening = (counts: SurveyCounts) => counts.queuedCount + counts.runningCount > 0;

/** The counts alone, asked for each second while something runs. */
export const progressQuery = (siteId: number, surveyId: number) =>
  queryOptions({
    queryKey: [...surveysKey(siteId), 'progress', surveyId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/surveys/${surveyId}/progress`, surveyCounts, { signal }),
    refetchInterval: ({ state }) => (state.data && isScreening(state.data) ? pollMs : false),
  });

export function useCreateSurvey(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateSurveyRequest) =>
      request(`/api/sites/${siteId}/surveys`, surveyResponse, { method: 'POST', body }),
    // A refusal too: somebody else may have made the survey of that day meanwhile.
    onSettled: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}

export function useScreenAgain(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ waveformId, ...body }: ScreenAgainRequest & { waveformId: number }) =>
      request(`/api/sites/${siteId}/waveforms/${waveformId}/screen-again`, waveformListItem, {
        method: 'POST',
        body,
      }),
    onSettled: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}

export function useDismissRejectedFile(siteId: number, surveyId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (rejectedFileId: number) =>
      requestNothing(`/api/sites/${siteId}/surveys/${surveyId}/rejected-files/${rejectedFileId}`, {
        method: 'DELETE',
      }),
    onSettled: () => client.invalidateQueries({ queryKey: surveysKey(siteId) }),
  });
}

export const waveformFileAddress = (siteId: number, waveformId: number) =>
  `/api/sites/${siteId}/waveforms/${waveformId}/file`;
