import { z } from 'zod';
import { only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import {
  createSurveyRequest,
  surveyCounts,
  surveyListQuery,
  surveyListResponse,
  surveyResponse,
} from '#shared/contracts/survey.ts';
import { presentSurvey, presentSurveyItem } from './survey.presenter.ts';
import type { SurveyService } from './survey.service.ts';

const surveyParams = z.object({ siteId: id, surveyId: id });

/** Surveys and their progress. */
export const surveyRoutes = (surveys: SurveyService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/surveys',
    access: only('analyst', 'lead'),
    query: surveyListQuery,
    response: surveyListResponse,
    handle: async ({ principal, query }) => {
      const page = await surveys.list(principal, query);
      return {
        items: page.surveys.flatMap((survey) => {
          const counts = page.counts.get(survey.id);
          return counts === undefined ? [] : [presentSurveyItem(survey, counts)];
        }),
        total: page.total,
        page: query.page,
        pageSize: query.pageSize,
      };
    },
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/surveys',
    status: 201,
    access: only('analyst', 'lead'),
    body: createSurveyRequest,
    response: surveyResponse,
    handle: async ({ principal, body }) => presentSurvey(await surveys.create(principal, body)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/surveys/:surveyId',
    access: only('analyst', 'lead'),
    params: surveyParams,
    response: surveyResponse,
    handle: async ({ principal, params }) =>
      presentSurvey(await surveys.whole(principal, params.surveyId)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/surveys/:surveyId/progress',
    access: only('analyst', 'lead'),
    params: surveyParams,
    response: surveyCounts,
    handle: ({ principal, params }) => surveys.progress(principal, params.surveyId),
  }),
  route({
    method: 'delete',
    path: '/api/sites/:siteId/surveys/:surveyId/rejected-files/:rejectedFileId',
    access: only('analyst', 'lead'),
    params: surveyParams.extend({ rejectedFileId: id }),
    response: null,
    handle: ({ principal, params }) =>
      surveys.dismissRejectedFile(principal, params.surveyId, params.rejectedFileId),
  }),
];
