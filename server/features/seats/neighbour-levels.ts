import type { Screening } from '#server/db/entities/screening.entity.ts';
import { runLevelMmPerS } from './finding-signs.ts';

/** The newest survey among the screenings: levels are compared within one walk only. */
export function newestSurveyOf(screenings: readonly Screening[]): number | null {
  const newest = screenings.reduce<Screening | null>(
    (best, next) => (best === null || next.waveformId > best.waveformId ? next : best),
    null,
  );
  return newest?.waveform?.surveyId ?? null;
}

/** The strongest harmonic run of each position, mm/s rms; only what could be judged counts. */
export function levelsOf(screenings: readonly Screening[]): Map<number, number> {
  const levels = new Map<number, number>();
  for (const screening of screenings) {
    const positionId = screening.waveform?.measuringPoint?.bearingPositionId;
    if (positionId === undefined || screening.score === null) continue;
    levels.set(positionId, Math.max(levels.get(positionId) ?? 0, runLevelMmPerS(screening)));
  }
  return levels;
}
