import type { SiteRole } from '#shared/contracts/session.ts';

export type Allowed = 'anyone' | 'signed in' | 'administrator' | readonly SiteRole[];

const all = ['analyst', 'lead', 'owner'] as const;
const work = ['analyst', 'lead'] as const;
const lead = ['lead'] as const;
const owner = ['owner'] as const;

/**
 * Who may call what, written down a second time: a route that isn't here, or that lets in somebody
 * else than stands here, fails the test.
 */
export const accessMatrix: Readonly<Record<string, Allowed>> = {
  'GET /api/product': 'anyone',
  'POST /api/session': 'anyone',
  'POST /api/session/refresh': 'anyone',
  'DELETE /api/session': 'anyone',
  'GET /api/session': 'signed in',
  'GET /api/demo/mails': 'anyone',
  'GET /api/administration/sites': 'administrator',
  'POST /api/administration/sites': 'administrator',
  'GET /api/administration/people': 'administrator',
  'POST /api/administration/people': 'administrator',
  'PUT /api/administration/people/:userId/memberships/:membershipSiteId': 'administrator',
  'GET /api/sites/:siteId/members': lead,
  'GET /api/sites/:siteId/machines': all,
  'POST /api/sites/:siteId/machines': lead,
  'GET /api/sites/:siteId/machines/:machineId': all,
  'PATCH /api/sites/:siteId/machines/:machineId': lead,
  'POST /api/sites/:siteId/machines/:machineId/positions': lead,
  'PATCH /api/sites/:siteId/positions/:positionId': lead,
  'POST /api/sites/:siteId/positions/:positionId/points': lead,
  'POST /api/sites/:siteId/positions/:positionId/fit-records': lead,
  'GET /api/sites/:siteId/positions/:positionId/seats': all,
  'GET /api/sites/:siteId/positions/:positionId/seats/:seat/history': all,
  'GET /api/sites/:siteId/register/exports/:kind': work,
  'GET /api/sites/:siteId/register/imports': lead,
  'POST /api/sites/:siteId/register/imports': lead,
  'GET /api/sites/:siteId/register/imports/:importId': lead,
  'GET /api/sites/:siteId/register/imports/:importId/rows': lead,
  'POST /api/sites/:siteId/register/imports/:importId/apply': lead,
  'POST /api/sites/:siteId/register/imports/:importId/undo': lead,
  'GET /api/sites/:siteId/points': work,
  'GET /api/sites/:siteId/routes': work,
  'POST /api/sites/:siteId/routes': lead,
  'GET /api/sites/:siteId/routes/:routeId': work,
  'PATCH /api/sites/:siteId/routes/:routeId': lead,
  'GET /api/sites/:siteId/surveys': work,
  'POST /api/sites/:siteId/surveys': work,
  'GET /api/sites/:siteId/surveys/:surveyId': work,
  'GET /api/sites/:siteId/surveys/:surveyId/progress': work,
  'POST /api/sites/:siteId/surveys/:surveyId/waveforms': work,
  'DELETE /api/sites/:siteId/surveys/:surveyId/rejected-files/:rejectedFileId': work,
  'GET /api/sites/:siteId/waveforms/:waveformId': all,
  'GET /api/sites/:siteId/waveforms/:waveformId/file': all,
  'GET /api/sites/:siteId/waveforms/:waveformId/samples': all,
  'POST /api/sites/:siteId/waveforms/:waveformId/screen-again': work,
  'GET /api/sites/:siteId/screenings/:screeningId': all,
  'GET /api/sites/:siteId/screenings/:screeningId/spectrum': all,
  'GET /api/sites/:siteId/screenings/:screeningId/averaged-revolution': all,
  'GET /api/sites/:siteId/review-queue': work,
  'POST /api/sites/:siteId/screenings/:screeningId/decision': work,
  'DELETE /api/sites/:siteId/screenings/:screeningId/decision': work,
  'GET /api/sites/:siteId/findings': all,
  'GET /api/sites/:siteId/findings/:findingId': all,
  'POST /api/sites/:siteId/findings/:findingId/decision': lead,
  'POST /api/sites/:siteId/findings/:findingId/inspections': lead,
  'GET /api/sites/:siteId/inspections': all,
  'GET /api/sites/:siteId/inspections/:inspectionId': all,
  'POST /api/sites/:siteId/inspections/:inspectionId/accept': owner,
  'POST /api/sites/:siteId/inspections/:inspectionId/report': owner,
  'POST /api/sites/:siteId/inspections/:inspectionId/close': lead,
  'POST /api/sites/:siteId/inspections/:inspectionId/cancel': lead,
};
