import { rm } from 'node:fs/promises';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { z } from 'zod';
import { only } from '#server/auth/access.ts';
import { AppError } from '#server/http/app-error.ts';
import { receiveFile } from '#server/http/receive-file.ts';
import { handled, route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import {
  importLimits,
  importListQuery,
  importListResponse,
  importRowsQuery,
  importRowsResponse,
  registerImportResponse,
  registerKind,
  registerKinds,
} from '#shared/contracts/register-import.ts';
import type { ExportService } from './export.service.ts';
import type { ImportService } from './import.service.ts';
import { presentImport, presentRow } from './register-import.presenter.ts';

const importParams = z.object({ siteId: id, importId: id });

/** The register as files: out of the product, and into it by a dry run. */
export const registerImportRoutes = (
  imports: ImportService,
  exports: ExportService,
  incomingDirectory: () => string,
) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/register/exports/:kind',
    access: only('analyst', 'lead'),
    params: z.object({ siteId: id, kind: registerKind }),
    response: 'binary',
    handle: async ({ principal, params, res }) => {
      res.attachment(`${params.kind}.csv`).type('text/csv; charset=utf-8');
      await pipeline(Readable.from(exports.csv(principal, params.kind)), res);
      return handled;
    },
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/register/imports',
    access: only('lead'),
    query: importListQuery,
    response: importListResponse,
    handle: async ({ principal, query }) => {
      const { rows, total } = await imports.list(principal, query);
      return {
        items: rows.map(presentImport),
        total,
        page: query.page,
        pageSize: query.pageSize,
      };
    },
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/register/imports',
    status: 201,
    access: only('lead'),
    // Fields `kind`, one of the contract's, and `file`.
    multipart: true,
    response: registerImportResponse,
    handle: async ({ principal, req, res }) => {
      const file = await receiveFile(req, res, incomingDirectory(), importLimits.fileMaxBytes);
      const kind = registerKind.safeParse(file.fields.kind);
      if (!kind.success) {
        await rm(file.path, { force: true });
        const message = `Say what the file holds: ${registerKinds.join(', ')}.`;
        throw new AppError('validation', message, { fields: [{ path: 'kind', message }] });
      }
      return presentImport(await imports.take(principal, kind.data, file));
    },
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/register/imports/:importId',
    access: only('lead'),
    params: importParams,
    response: registerImportResponse,
    handle: async ({ principal, params }) =>
      presentImport(await imports.one(principal, params.importId)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/register/imports/:importId/rows',
    access: only('lead'),
    params: importParams,
    query: importRowsQuery,
    response: importRowsResponse,
    handle: async ({ principal, params, query }) => {
      const { rows, total } = await imports.rows(principal, params.importId, query);
      return { items: rows.map(presentRow), total, page: query.page, pageSize: query.pageSize };
    },
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/register/imports/:importId/apply',
    access: only('lead'),
    params: importParams,
    response: registerImportResponse,
    handle: async ({ principal, params }) =>
      presentImport(await imports.apply(principal, params.importId)),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/register/imports/:importId/undo',
    access: only('lead'),
    params: importParams,
    response: registerImportResponse,
    handle: async ({ principal, params }) =>
      presentImport(await imports.undo(principal, params.importId)),
  }),
];
