import type { Logger } from 'pino';
import type { DataSource } from 'typeorm';
import { accessTokenReader } from './auth/access-token.ts';
import { AccountRepository } from './auth/account.repository.ts';
import { RefreshTokenRepository } from './auth/refresh-token.repository.ts';
import { sessionRoutes } from './auth/session.routes.ts';
import { SessionService } from './auth/session.service.ts';
import { composeNotices, type Background } from './compose-notices.ts';
import type { Config } from './config/config.ts';
import { Database } from './db/database.ts';
import { administrationRoutes } from './features/administration/administration.routes.ts';
import { AdministrationService } from './features/administration/administration.service.ts';
import { findingEvidence } from './features/findings/finding-evidence.ts';
import { moveFinding } from './features/findings/finding-progress.ts';
import { presentFinding, presentFindingItem } from './features/findings/finding.presenter.ts';
import { findingRoutes } from './features/findings/finding.routes.ts';
import { FindingService } from './features/findings/finding.service.ts';
import type { InspectionNeighbours } from './features/inspections/inspection-neighbours.ts';
import { inspectionPhotoRoutes } from './features/inspections/inspection-photo.routes.ts';
import { InspectionPhotoService } from './features/inspections/inspection-photo.service.ts';
import { presentInspection } from './features/inspections/inspection.presenter.ts';
import { inspectionRoutes } from './features/inspections/inspection.routes.ts';
import { InspectionService } from './features/inspections/inspection.service.ts';
import { limitsRoutes } from './features/limits/limits.routes.ts';
import { LimitsService } from './features/limits/limits.service.ts';
import { memberRoutes } from './features/members/members.routes.ts';
import { outcomesRoutes } from './features/outcomes/outcomes.routes.ts';
import { OutcomesService } from './features/outcomes/outcomes.service.ts';
import { paperRoutes } from './features/papers/papers.routes.ts';
import { PapersService } from './features/papers/papers.service.ts';
import { fitChecks } from './features/register/fit-checks.ts';
import { machineRoutes, positionRoutes } from './features/register/machine.routes.ts';
import { MachineService } from './features/register/machine.service.ts';
import { PositionService } from './features/register/position.service.ts';
import { routeRoutes } from './features/register/route.routes.ts';
import { presentFitRecord } from './features/register/register.presenter.ts';
import { RouteService } from './features/register/route.service.ts';
import { ExportService } from './features/register-import/export.service.ts';
import { ImportService } from './features/register-import/import.service.ts';
import { registerImportRoutes } from './features/register-import/register-import.routes.ts';
import { reviewRoutes } from './features/review/review.routes.ts';
import { ReviewService } from './features/review/review.service.ts';
import { bearingSizeOf } from './features/seats/position-fit.ts';
import { SeatHistoryService } from './features/seats/seat-history.service.ts';
import { seatRoutes } from './features/seats/seat.routes.ts';
import { SeatService } from './features/seats/seat.service.ts';
import { siteExportRoutes } from './features/site-exports/site-export.routes.ts';
import { SiteExportService } from './features/site-exports/site-export.service.ts';
import { presentSurvey } from './features/surveys/survey.presenter.ts';
import { surveyRoutes } from './features/surveys/survey.routes.ts';
import { SurveyService } from './features/surveys/survey.service.ts';
import { UploadService } from './features/waveforms/upload.service.ts';
import { presentListItem, presentScreening } from './features/waveforms/waveform.presenter.ts';
import { WaveformRepository } from './features/waveforms/waveform.repository.ts';
import { uploadRoutes, waveformRoutes } from './features/waveforms/waveform.routes.ts';
import { WaveformService } from './features/waveforms/waveform.service.ts';
import type { Route } from './http/route.ts';
import type { RouteContext } from './http/run-route.ts';
import { Mailer } from './mail/mailer.ts';
import { InProcessScreeningQueue, type ScreeningQueue } from './screening/screening-queue.ts';
import { WorkerPool } from './screening/worker-pool.ts';
import { FileStore } from './storage/file-store.ts';
import type { ProductResponse } from '#shared/contracts/session.ts';

export interface Product {
  routes: Route[];
  routeContext: RouteContext;
  /** The services themselves, for the demo loader, which does as a person would. */
  services: {
    administration: AdministrationService;
    machines: MachineService;
    positions: PositionService;
    routes: RouteService;
    review: ReviewService;
    findings: FindingService;
    inspections: InspectionService;
    surveys: SurveyService;
    uploads: UploadService;
  };
  files: FileStore;
  queue: ScreeningQueue;
  /** Starts what works in the background: screening, mail. */
  start: () => Promise<void>;
  /** Takes nothing new, finishes or hands back what runs. */
  stop: () => Promise<void>;
}

/** Wires every service of the product; the only place that sees every feature. */
export function compose(
  config: Config,
  dataSource: DataSource,
  logger: Logger,
  options: {
    demoAccounts?: ProductResponse['demoAccounts'];
    publicUrl: () => string;
    /** The clock; the demo loader lives through the months before today. */
    now?: () => Date;
  },
): Product {
  const { now } = options;
  const database = new Database(dataSource);
  const mailer = new Mailer({ publicUrl: options.publicUrl, authSecret: config.authSecret });
  const accounts = new AccountRepository(dataSource);
  const sessions = new SessionService(
    accounts,
    new RefreshTokenRepository(dataSource),
    config.refreshTokenLifeS,
  );
  const administration = new AdministrationService(database);
  const machines = new MachineService(database, accounts);
  const positions = new PositionService(database, fitChecks, now);
  const walkRoutes = new RouteService(database);
  const seats = new SeatService(database);
  const assessSeats = seats.assess.bind(seats);
  const seatHistories = new SeatHistoryService(database, {
    seenPosition: seats.seenPosition.bind(seats),
    presentFitRecord,
  });
  const review = new ReviewService(database, findingEvidence, now);
  const findings = new FindingService(
    database,
    {
      assessSeats,
      inspectionsOf: (findingId) => inspections.ofFinding(findingId),
    },
    now,
  );
  const inspectionNeighbours: InspectionNeighbours = {
    findingBackground: findings.background.bind(findings),
    moveFinding,
    assessSeats,
    membersOf: (siteId) => accounts.membersOf(siteId),
    addMail: mailer.add.bind(mailer),
    publicUrl: options.publicUrl,
  };
  const inspections: InspectionService = new InspectionService(database, inspectionNeighbours, now);
  const notices = composeNotices({
    config,
    database,
    logger,
    accounts,
    mailer,
    inspectionNeighbours,
    publicUrl: options.publicUrl,
    now,
  });
  const files = new FileStore(config.dataDirectory);
  const workers = new WorkerPool(config.screeningWorkerCount);
  const queue = new InProcessScreeningQueue({ database, files, workers, logger, now });
  const wakeQueue = () => queue.wake();
  const uploads = new UploadService({
    database,
    files,
    readCsv: (path, readOptions) => workers.read(path, readOptions),
    wakeQueue,
    now,
  });
  const waveforms = new WaveformService(database, files, wakeQueue);
  const surveys = new SurveyService(
    database,
    {
      waveformsOf: async (surveyId) =>
        (await new WaveformRepository(database.db).ofSurvey(surveyId)).map(presentListItem),
    },
    now,
  );
  const imports = new ImportService({
    database,
    checks: fitChecks,
    logError: (err, message) => logger.error({ err }, message),
    now,
  });
  const siteExports = new SiteExportService(database, {
    findings: async (principal, query) =>
      (await findings.list(principal, query)).rows.map(({ finding, links, monitoring }) =>
        presentFindingItem(finding, links, monitoring),
      ),
    inspections: async (principal, query) => (await inspections.list(principal, query)).items,
    checkSurvey: surveys.progress.bind(surveys),
  });
  const papers = new PapersService(
    database,
    {
      finding: async (principal, findingId) =>
        presentFinding(principal, await findings.whole(principal, findingId)),
      inspection: async (principal, inspectionId) =>
        presentInspection(principal, await inspections.whole(principal, inspectionId)),
      survey: async (principal, surveyId) =>
        presentSurvey(await surveys.whole(principal, surveyId)),
      bearingWidthMm: (position) => bearingSizeOf(position).widthMm,
      screening: async (principal, screeningId) => {
        const { screening, findingId } = await waveforms.screening(principal, screeningId);
        return presentScreening(screening, findingId);
      },
      waveform: async (principal, waveformId) =>
        presentListItem((await waveforms.one(principal, waveformId)).row),
      plot: waveforms.plot.bind(waveforms),
      samples: async (principal, waveformId) =>
        (await waveforms.samples(principal, waveformId)).chunks,
    },
    now,
  );

  const routes = [
    ...sessionRoutes({ sessions, accounts, demoAccounts: options.demoAccounts ?? [], config }),
    ...administrationRoutes(administration),
    ...memberRoutes(accounts),
    ...machineRoutes(machines),
    ...positionRoutes(positions),
    ...routeRoutes(walkRoutes),
    ...registerImportRoutes(imports, new ExportService(database), () => files.incomingDirectory()),
    ...surveyRoutes(surveys),
    ...uploadRoutes(uploads, {
      directory: () => files.incomingDirectory(),
      fileMaxBytes: config.uploadMaxBytes,
    }),
    ...waveformRoutes(waveforms),
    ...seatRoutes(seats, seatHistories),
    ...reviewRoutes(review),
    ...findingRoutes(findings),
    ...inspectionRoutes(inspections),
    ...inspectionPhotoRoutes(new InspectionPhotoService(database, files, now), () =>
      files.incomingDirectory(),
    ),
    ...limitsRoutes(new LimitsService(database, now)),
    ...outcomesRoutes(new OutcomesService(database)),
    ...siteExportRoutes(siteExports),
    ...paperRoutes(papers),
    ...notices.routes,
  ];

  const userIdOf = accessTokenReader(config.authSecret);
  const background: Background[] = [];
  return {
    routes,
    services: {
      administration,
      machines,
      positions,
      routes: walkRoutes,
      review,
      findings,
      inspections,
      surveys,
      uploads,
    },
    files,
    queue,
    routeContext: {
      roleAt: (userId, siteId) => accounts.roleAt(userId, siteId),
      principalOf: async (req, res) => {
        const userId = await userIdOf(req, res);
        const user = userId === null ? null : await accounts.findById(userId);
        if (user === null) return null;
        return {
          userId: user.id,
          name: user.name,
          email: user.email,
          isAdministrator: user.isAdministrator,
        };
      },
    },
    start: async () => {
      await files.clearIncoming();
      await queue.start();
      background.push(queue);
      await imports.start();
      background.push(imports);
      background.push(...(await notices.start()));
    },
    stop: async () => {
      for (const service of background.reverse()) await service.stop();
    },
  };
}
