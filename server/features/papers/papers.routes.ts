import type { Response } from 'express';
import { z } from 'zod';
import { anyMember, only } from '#server/auth/access.ts';
import { handled, route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import type { Paper, PapersService } from './papers.service.ts';

function sendPaper(res: Response, { fileName, bytes }: Paper): typeof handled {
  res.attachment(fileName).type('application/pdf').set('Cache-Control', 'private, no-store');
  res.send(bytes);
  return handled;
}

/** Findings, inspections and surveys as PDF, for whoever may see them on the pages. */
export const paperRoutes = (papers: PapersService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/findings/:findingId/paper.pdf',
    access: anyMember(),
    params: z.object({ siteId: id, findingId: id }),
    response: 'binary',
    handle: async ({ principal, params, res }) =>
      sendPaper(res, await papers.finding(principal, params.findingId)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/inspections/:inspectionId/paper.pdf',
    access: anyMember(),
    params: z.object({ siteId: id, inspectionId: id }),
    response: 'binary',
    handle: async ({ principal, params, res }) =>
      sendPaper(res, await papers.inspection(principal, params.inspectionId)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/surveys/:surveyId/paper.pdf',
    access: only('analyst', 'lead'),
    params: z.object({ siteId: id, surveyId: id }),
    response: 'binary',
    handle: async ({ principal, params, res }) =>
      sendPaper(res, await papers.survey(principal, params.surveyId)),
  }),
];
