import { randomBytes } from 'node:crypto';
import type { DataSource } from 'typeorm';
import { Screening } from '#server/db/entities/screening.entity.ts';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import type { ScreeningResult } from '#shared/signal/screening-types.ts';
import { aScreeningResult } from './screening-result.ts';

export { aScreeningResult };

export function buildWaveform(
  dataSource: DataSource,
  at: { surveyId: number; measuringPointId: number; uploadedByUserId: number },
  overrides: Partial<Waveform> = {},
): Promise<Waveform> {
  return dataSource.getRepository(Waveform).save({
    ...at,
    contentHash: randomBytes(32).toString('hex'),
    channelIndex: 0,
    fileName: 'record.csv',
    fileBytes: 100_000,
    quantity: 'acceleration',
    unit: 'm/s²',
    sampleRateHz: 5120,
    sampleCount: 16_384,
    gapCount: 0,
    toldSpeedRpm: 1480,
    toldLineFrequencyHz: null,
    fullScale: null,
    takenAt: null,
    uploadedAt: new Date(),
    screeningState: 'done',
    screeningRun: 1,
    screeningAttempts: 1,
    screeningFailure: null,
    ...overrides,
  });
}

export async function buildScreening(
  dataSource: DataSource,
  waveform: Pick<Waveform, 'id'>,
  result: ScreeningResult = aScreeningResult(),
  overrides: Partial<Screening> = {},
): Promise<Screening> {
  return dataSource.getRepository(Screening).save({
    waveformId: waveform.id,
    run: 1,
    verdict: result.verdict,
    score: result.score,
    speedHz: result.speed.speedHz,
    overallMmPerSRms: result.overallVelocity?.mmPerSRms ?? null,
    methodVersion: result.methodVersion,
    // The driver serialises the column; the entity's type is deeply read-only.
    result: result as never,
    screenedAt: new Date(),
    decision: null,
    decisionReason: null,
    decidedByUserId: null,
    decidedAt: null,
    ...overrides,
  });
}
