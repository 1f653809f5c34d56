import type { QueryClient } from '@tanstack/react-query';
import type { RouteObject } from 'react-router-dom';
import { RouteErrorPage } from './error-pages.tsx';
import { lazyPage } from './lazy-page.ts';

type Load = Parameters<typeof lazyPage>[1];

/** The pages of a site by their address below `/sites/:siteId`. */
const pages: Readonly<Record<string, Load>> = {
  machines: async () => {
    const { machinesLoader, MachinesPage } = await import('./routes/machines.tsx');
    return { loader: machinesLoader, Component: MachinesPage };
  },
  'machines/new': async () => {
    const { machineEditLoader, MachineNewPage } = await import('./routes/machine-edit.tsx');
    return { loader: machineEditLoader, Component: MachineNewPage };
  },
  'machines/import': async () => {
    const { MachineImportPage } = await import('./routes/machine-import.tsx');
    return { Component: MachineImportPage };
  },
  'machines/import/:importId': async () => {
    const { importLoader, ImportPage } = await import('./routes/machine-import.tsx');
    return { loader: importLoader, Component: ImportPage };
  },
  'machines/:machineId': async () => {
    const { machineLoader, MachinePage } = await import('./routes/machine.tsx');
    return { loader: machineLoader, Component: MachinePage };
  },
  'machines/:machineId/positions/:positionId/seats/:seat': async () => {
    const { seatHistoryLoader, SeatHistoryPage } = await import('./routes/seat-history.tsx');
    return { loader: seatHistoryLoader, Component: SeatHistoryPage };
  },
  'machines/:machineId/edit': async () => {
    const { machineEditLoader, MachineEditPage } = await import('./routes/machine-edit.tsx');
    return { loader: machineEditLoader, Component: MachineEditPage };
  },
  'fit-workbench': async () => {
    const { FitWorkbenchPage } = await import('./routes/fit-workbench.tsx');
    return { Component: FitWorkbenchPage };
  },
  review: async () => {
    const { reviewLoader, ReviewPage } = await import('./routes/review.tsx');
    return { loader: reviewLoader, Component: ReviewPage };
  },
  surveys: async () => {
    const { surveysLoader, SurveysPage } = await import('./routes/surveys.tsx');
    return { loader: surveysLoader, Component: SurveysPage };
  },
  'surveys/new': async () => {
    const { surveyNewLoader, SurveyNewPage } = await import('./routes/survey-new.tsx');
    return { loader: surveyNewLoader, Component: SurveyNewPage };
  },
  'surveys/:surveyId': async () => {
    const { surveyLoader, SurveyPage } = await import('./routes/survey.tsx');
    return { loader: surveyLoader, Component: SurveyPage };
  },
  findings: async () => {
    const { findingsLoader, FindingsPage } = await import('./routes/findings.tsx');
    return { loader: findingsLoader, Component: FindingsPage };
  },
  'findings/:findingId': async () => {
    const { findingLoader, FindingPage } = await import('./routes/finding.tsx');
    return { loader: findingLoader, Component: FindingPage };
  },
  outcomes: async () => {
    const { outcomesLoader, OutcomesPage } = await import('./routes/outcomes.tsx');
    return { loader: outcomesLoader, Component: OutcomesPage };
  },
  limits: async () => {
    const { limitsLoader, LimitsPage } = await import('./routes/limits.tsx');
    return { loader: limitsLoader, Component: LimitsPage };
  },
  inspections: async () => {
    const { inspectionsLoader, InspectionsPage } = await import('./routes/inspections.tsx');
    return { loader: inspectionsLoader, Component: InspectionsPage };
  },
  'inspections/:inspectionId': async () => {
    const { inspectionLoader, InspectionPage } = await import('./routes/inspection.tsx');
    return { loader: inspectionLoader, Component: InspectionPage };
  },
  desk: async () => {
    const { deskLoader, DeskPage } = await import('./routes/desk.tsx');
    return { loader: deskLoader, Component: DeskPage };
  },
  webhook: async () => {
    const { webhookLoader, WebhookPage } = await import('./routes/webhook.tsx');
    return { loader: webhookLoader, Component: WebhookPage };
  },
  mails: async () => {
    const { siteMailsLoader, SiteMailsPage } = await import('./routes/mails.tsx');
    return { loader: siteMailsLoader, Component: SiteMailsPage };
  },
  routes: async () => {
    const { routesLoader, RoutesPage } = await import('./routes/routes.tsx');
    return { loader: routesLoader, Component: RoutesPage };
  },
  'routes/new': async () => {
    const { routeEditLoader, RouteNewPage } = await import('./routes/route-edit.tsx');
    return { loader: routeEditLoader, Component: RouteNewPage };
  },
  'routes/:routeId': async () => {
    const { routeLoader, RoutePage } = await import('./routes/route.tsx');
    return { loader: routeLoader, Component: RoutePage };
  },
  'routes/:routeId/edit': async () => {
    const { routeEditLoader, RouteEditPage } = await import('./routes/route-edit.tsx');
    return { loader: routeEditLoader, Component: RouteEditPage };
  },
};

export const sitePages = (queryClient: QueryClient): RouteObject[] =>
  Object.entries(pages).map(([path, load]) => ({
    path,
    lazy: lazyPage(queryClient, load),
    // A page that fails leaves the frame and its navigation standing.
    ErrorBoundary: RouteErrorPage,
  }));
