import type { WaveformChannel, WaveformCsv } from '#shared/signal/csv/waveform-csv.ts';
import type { ScreeningResult } from '#shared/signal/screening-types.ts';

/**
 * The line printed for one screened channel: the names of the command's interface, which scripts
 * rely on, filled from the method's result.
 */
export function screeningLine(
  file: string,
  csv: WaveformCsv,
  channel: WaveformChannel,
  result: ScreeningResult,
): object {
  return {
    file,
    channel: channel.name,
    channelIndex: csv.channels.indexOf(channel),
    verdict: result.verdict,
    score: result.score,
    kind: result.kind,
    speedHz: result.speed.speedHz,
    speedSource: result.speed.source,
    speedInterval: result.speed.intervalHz,
    speedAlternatives: result.speed.alternatives,
    orders: result.orders.map((line) => ({
      order: line.order,
      frequencyHz: line.frequencyHz,
      velocityRms: line.velocityMmPerSRms,
      prominenceDb: line.prominenceDb,
      pNoise: line.pNoise,
      explainedBy: line.explainedBy,
    })),
    harmonicRun: result.harmonicRun,
    truncation: {
      side: result.truncation.side,
      share: result.truncation.share,
      expectedShare: result.truncation.expectedShare,
      instrument: result.truncation.instrument,
    },
    overallVelocity: result.overallVelocity,
    quality: result.quality,
    evidence: result.evidence,
    lookAlikes: result.lookAlikes,
    quantity: result.quantity,
    unit: channel.unit,
    sampleRateHz: csv.sampleRateHz,
    sampleRateSource: csv.sampleRateSource,
    sampleCount: channel.samples.length,
    gapCount: channel.gapCount,
    revolutions: result.revolutions,
    methodVersion: result.methodVersion,
  };
}
