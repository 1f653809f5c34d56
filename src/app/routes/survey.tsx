import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { ButtonLink } from '#src/components/button-link.tsx';
import { Figure } from '#src/components/figure.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { pointChoicesQuery } from '#src/features/register/api/routes.ts';
import { SaveFileButton } from '#src/features/papers/components/save-file-button.tsx';
import { surveyQuery } from '#src/features/surveys/api/surveys.ts';
import { ScreeningProgress } from '#src/features/surveys/components/screening-progress.tsx';
import { MissingPoints, RejectedFiles } from '#src/features/surveys/components/survey-gaps.tsx';
import { SurveyStanding } from '#src/features/surveys/components/survey-standing.tsx';
import { SurveyTable } from '#src/features/surveys/components/survey-table.tsx';
import { UploadPanel } from '#src/features/upload/components/upload-panel.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { useSite } from '../site-context.ts';

export const surveyLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    const siteId = Number(params.siteId);
    await Promise.all([
      queryClient.ensureQueryData(surveyQuery(siteId, Number(params.surveyId))),
      queryClient.ensureQueryData(pointChoicesQuery(siteId)),
    ]);
    return null;
  };

export function SurveyPage() {
  const { siteId, session } = useSite();
  const surveyId = Number(useParams().surveyId);
  const { data: survey } = useSuspenseQuery(surveyQuery(siteId, surveyId));
  const { data: choices } = useSuspenseQuery(pointChoicesQuery(siteId));
  const routePointIds = useMemo(() => survey.points.map(({ id }) => id), [survey.points]);
  const { counts } = survey;
  const day = formatDay(survey.surveyedOn);
  return (
    <>
      <PageHeader
        title={`${survey.routeName}, ${day}`}
        crumbs={[{ label: 'Surveys', to: `/sites/${siteId}/surveys` }, { label: day }]}
        facts={[
          {
            label: 'Points measured',
            value: <Figure value={`${counts.measuredPointCount} of ${counts.pointCount}`} />,
          },
          { label: 'Waveforms', value: <Figure value={String(counts.waveformCount)} /> },
          { label: 'Verdicts', value: <SurveyStanding counts={counts} /> },
          { label: 'Made by', value: survey.createdByName },
        ]}
        actions={
          <>
            {counts.undecidedFlagCount > 0 && (
              <ButtonLink variant="primary" to={`/sites/${siteId}/review?surveyId=${surveyId}`}>
                Review {counts.undecidedFlagCount}
                {counts.undecidedFlagCount === 1 ? ' flag' : ' flags'}
              </ButtonLink>
            )}
            {counts.doneCount > 0 && (
              <SaveFileButton
                path={`/api/sites/${siteId}/exports/screenings?surveyId=${surveyId}`}
                fileName={`screenings-${survey.surveyedOn}.csv`}
              >
                Save as CSV
              </SaveFileButton>
            )}
            {counts.waveformCount > 0 && (
              <SaveFileButton
                path={`/api/sites/${siteId}/surveys/${surveyId}/paper.pdf`}
                fileName={`survey-${survey.surveyedOn}.pdf`}
              >
                Save as PDF
              </SaveFileButton>
            )}
          </>
        }
      />
      <div className="flex flex-col gap-5">
        <ScreeningProgress siteId={siteId} surveyId={surveyId} counts={counts} />
        {survey.can.upload && (
          <UploadPanel
            userId={session.userId}
            siteId={siteId}
            surveyId={surveyId}
            points={choices.points}
            routePointIds={routePointIds}
            isEmpty={counts.waveformCount === 0}
          />
        )}
        <RejectedFiles siteId={siteId} surveyId={surveyId} files={survey.rejectedFiles} />
        {counts.waveformCount > 0 && <MissingPoints points={survey.missingPoints} />}
        <SurveyTable siteId={siteId} survey={survey} />
      </div>
    </>
  );
}
