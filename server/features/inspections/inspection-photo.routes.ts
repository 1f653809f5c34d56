import { z } from 'zod';
import { anyMember, only } from '#server/auth/access.ts';
import { receiveFile } from '#server/http/receive-file.ts';
import { handled, route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import {
  inspectionPhotoResponse,
  photoLimits,
  photoQuery,
} from '#shared/contracts/inspection-photo.ts';
import { presentPhoto } from './inspection-photo.presenter.ts';
import type { InspectionPhotoService } from './inspection-photo.service.ts';

const inspectionParams = z.object({ siteId: id, inspectionId: id });
const photoParams = z.object({ siteId: id, inspectionId: id, photoId: id });

/** Photographs of an inspection: sent by its owner, seen by whoever sees the inspection. */
export const inspectionPhotoRoutes = (
  photos: InspectionPhotoService,
  incomingDirectory: () => string,
) => [
  route({
    method: 'post',
    path: '/api/sites/:siteId/inspections/:inspectionId/photos',
    status: 201,
    access: only('owner'),
    multipart: true,
    params: inspectionParams,
    response: z.array(inspectionPhotoResponse),
    handle: async ({ principal, params, req, res }) => {
      await photos.mayAdd(principal, params.inspectionId);
      const file = await receiveFile(req, res, incomingDirectory(), photoLimits.fileMaxBytes, {
        tooLarge: 'Send a smaller copy of the picture.',
      });
      return (await photos.add(principal, params.inspectionId, file)).map(presentPhoto);
    },
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/inspections/:inspectionId/photos/:photoId',
    access: anyMember(),
    params: photoParams,
    query: photoQuery,
    response: 'binary',
    handle: async ({ principal, params, query, res }) => {
      const { inspectionId, photoId } = params;
      const bytes = await photos.picture(principal, inspectionId, photoId, query.size);
      res
        // Who may see it can change, so no cache may answer for the server longer than this.
        .set('Cache-Control', 'private, max-age=3600')
        .set('X-Content-Type-Options', 'nosniff')
        .set('Content-Security-Policy', "default-src 'none'; sandbox")
        .set('Content-Disposition', `inline; filename="photo-${photoId}.jpg"`)
        .type('image/jpeg')
        .send(bytes);
      return handled;
    },
  }),
  route({
    method: 'delete',
    path: '/api/sites/:siteId/inspections/:inspectionId/photos/:photoId',
    access: only('owner'),
    params: photoParams,
    response: null,
    handle: async ({ principal, params }) =>
      photos.remove(principal, params.inspectionId, params.photoId),
  }),
];
