import type { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import type { Survey } from '#server/db/entities/survey.entity.ts';
import { pointLabel, type PointChoice } from '#shared/contracts/measuring-point.ts';
import type { SurveyCounts, SurveyListResponse, SurveyResponse } from '#shared/contracts/survey.ts';
import type { SurveyWhole } from './survey.service.ts';

export const presentSurveyItem = (
  survey: Survey,
  counts: SurveyCounts,
): SurveyListResponse['items'][number] => ({
  id: survey.id,
  routeId: survey.routeId,
  routeName: survey.route?.name ?? '',
  surveyedOn: survey.surveyedOn,
  createdByName: survey.createdBy?.name ?? '',
  counts,
});

function presentPoint(point: MeasuringPoint): PointChoice {
  const position = point.bearingPosition;
  const machine = position?.machine;
  if (position === undefined || machine === undefined) {
    throw new Error('A measuring point was read without its position and machine.');
  }
  return {
    id: point.id,
    label: pointLabel(machine.tag, position.code, point.direction),
    machineId: machine.id,
    machineTag: machine.tag,
    machineName: machine.name,
    positionCode: position.code,
    positionName: position.name,
    direction: point.direction,
    nominalSpeedRpm: machine.nominalSpeedRpm,
  };
}

export function presentSurvey(whole: SurveyWhole): SurveyResponse {
  const { survey, counts, points, waveforms, rejectedFiles } = whole;
  const measured = new Set(waveforms.map((waveform) => waveform.measuringPointId));
  return {
    ...presentSurveyItem(survey, counts),
    points: points.map(presentPoint),
    waveforms,
    missingPoints: points.filter((point) => !measured.has(point.id)).map(presentPoint),
    rejectedFiles: rejectedFiles.map((file) => ({
      id: file.id,
      fileName: file.fileName,
      errorCode: file.errorCode,
      errorLine: file.errorLine,
      errorMessage: file.errorMessage,
      rejectedAt: file.rejectedAt.toISOString(),
    })),
    can: { upload: true },
  };
}
