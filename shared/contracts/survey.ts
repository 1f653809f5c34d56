import { z } from 'zod';
import { id, isoDate } from './fields.ts';
import { listQuery, listResponse } from './list.ts';
import { pointChoice } from './measuring-point.ts';
import { waveformListItem } from './waveform.ts';

export const createSurveyRequest = z.strictObject({ routeId: id, surveyedOn: isoDate });
export type CreateSurveyRequest = z.infer<typeof createSurveyRequest>;

export const surveyListQuery = listQuery(['surveyedOn', 'routeName']).extend({
  direction: z.enum(['asc', 'desc']).default('desc'),
  routeId: id.optional(),
});
export type SurveyListQuery = z.infer<typeof surveyListQuery>;

/** How far a survey is; every figure counts waveforms, except the points. */
export const surveyCounts = z.object({
  pointCount: z.int(),
  measuredPointCount: z.int(),
  waveformCount: z.int(),
  queuedCount: z.int(),
  runningCount: z.int(),
  doneCount: z.int(),
  failedCount: z.int(),
  rejectedFileCount: z.int(),
  noneCount: z.int(),
  suspectedCount: z.int(),
  likelyCount: z.int(),
  retakeCount: z.int(),
  undecidedFlagCount: z.int(),
});
export type SurveyCounts = z.infer<typeof surveyCounts>;

export const surveyListItem = z.object({
  id: z.int(),
  routeId: z.int(),
  routeName: z.string(),
  surveyedOn: z.string(),
  createdByName: z.string(),
  counts: surveyCounts,
});
export const surveyListResponse = listResponse(surveyListItem);
export type SurveyListResponse = z.infer<typeof surveyListResponse>;

export const rejectedFileResponse = z.object({
  id: z.int(),
  fileName: z.string(),
  errorCode: z.string(),
  errorLine: z.int().nullable(),
  errorMessage: z.string(),
  rejectedAt: z.string(),
});

export const surveyResponse = surveyListItem.extend({
  /** Every point of the route, in the order of the walk. */
  points: z.array(pointChoice),
  waveforms: z.array(waveformListItem),
  /** Points of the route for which this survey has no waveform, in the order of the walk. */
  missingPoints: z.array(pointChoice),
  rejectedFiles: z.array(rejectedFileResponse),
  can: z.object({ upload: z.boolean() }),
});
export type SurveyResponse = z.infer<typeof surveyResponse>;
