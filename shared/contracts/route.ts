import { z } from 'zod';
import { id, line, numberBetween } from './fields.ts';
import { listQuery, listResponse } from './list.ts';
import { pointChoice } from './measuring-point.ts';

const routeFields = {
  name: line(120, 'a name'),
  /** What to record there; together they give the duration. */
  topFrequencyHz: numberBetween(10, 50_000, 'Hz').nullable(),
  lineCount: z.int().min(50).max(1_000_000).nullable(),
  /** In the order of the walk. */
  pointIds: z
    .array(id)
    .min(1, 'Choose at least one measuring point.')
    .max(2000)
    .refine((ids) => new Set(ids).size === ids.length, 'A measuring point is listed twice.'),
};

export const createRouteRequest = z.strictObject({
  ...routeFields,
  topFrequencyHz: routeFields.topFrequencyHz.default(null),
  lineCount: routeFields.lineCount.default(null),
});
export type CreateRouteRequest = z.infer<typeof createRouteRequest>;

export const updateRouteRequest = z
  .strictObject(routeFields)
  .partial()
  .extend({ version: z.int().min(1) });
export type UpdateRouteRequest = z.infer<typeof updateRouteRequest>;

export const routeListQuery = listQuery(['name', 'pointCount', 'lastSurveyedOn']);
export type RouteListQuery = z.infer<typeof routeListQuery>;
export const routeListItem = z.object({
  id: z.int(),
  name: z.string(),
  pointCount: z.int(),
  surveyCount: z.int(),
  lastSurveyedOn: z.string().nullable(),
});
export const routeListResponse = listResponse(routeListItem);
export type RouteListResponse = z.infer<typeof routeListResponse>;

export const routeResponse = z.object({
  id: z.int(),
  name: z.string(),
  topFrequencyHz: z.number().nullable(),
  lineCount: z.int().nullable(),
  version: z.int(),
  points: z.array(pointChoice),
  can: z.object({ edit: z.boolean(), startSurvey: z.boolean() }),
});
export type RouteResponse = z.infer<typeof routeResponse>;
