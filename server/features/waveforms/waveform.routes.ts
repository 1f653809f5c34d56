import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
import { z } from 'zod';
import { anyMember, only } from '#server/auth/access.ts';
import { handled, route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import { screeningResponse } from '#shared/contracts/screening.ts';
import {
  samplesPerPairHeader,
  samplesQuery,
  screenAgainRequest,
  uploadResponse,
  waveformListItem,
  waveformResponse,
} from '#shared/contracts/waveform.ts';
import { receiveUpload } from './receive-upload.ts';
import type { UploadService } from './upload.service.ts';
import { presentListItem, presentScreening, presentWaveform } from './waveform.presenter.ts';
import type { WaveformService } from './waveform.service.ts';

const waveformParams = z.object({ siteId: id, waveformId: id });
const screeningParams = z.object({ siteId: id, screeningId: id });

/** Recorded values never change under their id. */
const neverChanges = 'private, max-age=86400, immutable';

function sendBytes(res: Response, bytes: Uint8Array): typeof handled {
  res
    .set('Cache-Control', neverChanges)
    .type('application/octet-stream')
    .send(Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength));
  return handled;
}

/** Sending files into a survey. */
export const uploadRoutes = (
  uploads: UploadService,
  incoming: { directory: () => string; fileMaxBytes: number },
) => [
  route({
    method: 'post',
    path: '/api/sites/:siteId/surveys/:surveyId/waveforms',
    access: only('analyst', 'lead'),
    multipart: true,
    params: z.object({ siteId: id, surveyId: id }),
    response: uploadResponse,
    handle: async ({ principal, params, req, res }) => {
      const file = await receiveUpload(req, res, incoming.directory(), incoming.fileMaxBytes);
      const { alreadyThere, rows } = await uploads.take(principal, params.surveyId, file);
      return { alreadyThere, waveforms: rows.map(presentListItem) };
    },
  }),
];

/** Waveforms and their screenings. Binary answers are little-endian 32-bit floats. */
export const waveformRoutes = (waveforms: WaveformService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/waveforms/:waveformId',
    access: anyMember(),
    params: waveformParams,
    response: waveformResponse,
    handle: async ({ principal, params }) => {
      const { row, ...company } = await waveforms.one(principal, params.waveformId);
      return presentWaveform(principal, row, company);
    },
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/waveforms/:waveformId/file',
    access: anyMember(),
    params: waveformParams,
    response: 'binary',
    handle: async ({ principal, params, res }) => {
      const { path, fileName } = await waveforms.original(principal, params.waveformId);
      await new Promise<void>((resolve, reject) =>
        res.type('text/csv').download(path, fileName, { dotfiles: 'allow' }, (error) =>
          // A browser that leaves in the middle is no fault of ours.
          error && !res.headersSent ? reject(error) : resolve(),
        ),
      );
      return handled;
    },
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/waveforms/:waveformId/samples',
    access: anyMember(),
    params: waveformParams,
    query: samplesQuery,
    response: 'binary',
    handle: async ({ principal, params, query, res }) => {
      const samples = await waveforms.samples(principal, params.waveformId, query.maxPoints);
      res
        .set('Cache-Control', neverChanges)
        .set(samplesPerPairHeader, String(samples.samplesPerPair))
        .set('Content-Length', String(samples.byteCount))
        .type('application/octet-stream');
      await pipeline(samples.chunks, res);
      return handled;
    },
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/waveforms/:waveformId/screen-again',
    access: only('analyst', 'lead'),
    params: waveformParams,
    body: screenAgainRequest,
    response: waveformListItem,
    handle: async ({ principal, params, body }) =>
      presentListItem(await waveforms.screenAgain(principal, params.waveformId, body)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/screenings/:screeningId',
    access: anyMember(),
    params: screeningParams,
    response: screeningResponse,
    handle: async ({ principal, params }) => {
      const { screening, findingId } = await waveforms.screening(principal, params.screeningId);
      return presentScreening(screening, findingId);
    },
  }),
  route({
    method: 'get',
    // The first value is the step in Hz, the rest the lines: peak, in the recorded unit.
    path: '/api/sites/:siteId/screenings/:screeningId/spectrum',
    access: anyMember(),
    params: screeningParams,
    response: 'binary',
    handle: async ({ principal, params, res }) =>
      sendBytes(res, await waveforms.plot(principal, params.screeningId, 'spectrum')),
  }),
  route({
    method: 'get',
    // Velocity over one turn in equal steps, mm/s.
    path: '/api/sites/:siteId/screenings/:screeningId/averaged-revolution',
    access: anyMember(),
    params: screeningParams,
    response: 'binary',
    handle: async ({ principal, params, res }) =>
      sendBytes(res, await waveforms.plot(principal, params.screeningId, 'averaged-revolution')),
  }),
];
