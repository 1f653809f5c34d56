import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
import { z } from 'zod';
import { anyMember, only } from '#server/auth/access.ts';
import { handled, route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import { findingListQuery } from '#shared/contracts/finding.ts';
import { inspectionListQuery } from '#shared/contracts/inspection.ts';
import type { SiteExportService } from './site-export.service.ts';

async function sendCsv(res: Response, name: string, text: AsyncIterable<string>) {
  res.attachment(`${name}.csv`).type('text/csv; charset=utf-8');
  await pipeline(Readable.from(text), res);
  return handled;
}

/** The lists as files; each file holds what the list shows to who asks, with the same filters. */
export const siteExportRoutes = (exports: SiteExportService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/exports/findings',
    access: anyMember(),
    query: findingListQuery,
    response: 'binary',
    handle: ({ principal, query, res }) =>
      sendCsv(res, 'findings', exports.findings(principal, query)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/exports/inspections',
    access: anyMember(),
    query: inspectionListQuery,
    response: 'binary',
    handle: ({ principal, query, res }) =>
      sendCsv(res, 'inspections', exports.inspections(principal, query)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/exports/screenings',
    access: only('analyst', 'lead'),
    query: z.object({ surveyId: id.optional() }),
    response: 'binary',
    handle: async ({ principal, query, res }) =>
      sendCsv(res, 'screenings', await exports.screenings(principal, query.surveyId)),
  }),
];
