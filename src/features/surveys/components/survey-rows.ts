import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import type { SurveyResponse } from '#shared/contracts/survey.ts';
import type { WaveformListItem } from '#shared/contracts/waveform.ts';

/** A line of the survey's table: a waveform, or a point that has none. */
export interface SurveyRow {
  key: string;
  /** Place on the walk, from 1; null off the route. */
  place: number | null;
  pointLabel: string;
  point: PointChoice | null;
  waveform: WaveformListItem | null;
}

/** The points in the order of the walk with their waveforms; waveforms of other points come last. */
export function surveyRows({ points, waveforms }: SurveyResponse): SurveyRow[] {
  const ofPoint = new Map<number, WaveformListItem[]>();
  for (const waveform of waveforms) {
    const known = ofPoint.get(waveform.measuringPointId);
    if (known) known.push(waveform);
    else ofPoint.set(waveform.measuringPointId, [waveform]);
  }
  const rows = points.flatMap((point, index): SurveyRow[] => {
    const place = index + 1;
    const own = ofPoint.get(point.id) ?? [];
    ofPoint.delete(point.id);
    const common = { place, point, pointLabel: point.label };
    if (own.length === 0) return [{ ...common, key: `point-${point.id}`, waveform: null }];
    return own.map((waveform) => ({ ...common, key: `waveform-${waveform.id}`, waveform }));
  });
  const others = [...ofPoint.values()].flat().map((waveform) => ({
    key: `waveform-${waveform.id}`,
    place: null,
    point: null,
    pointLabel: waveform.pointLabel,
    waveform,
  }));
  return [...rows, ...others];
}
