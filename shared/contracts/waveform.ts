import { z } from 'zod';
import { quantities, units } from '../quantities/quantity.ts';
import { id, isoDateTime, numberBetween } from './fields.ts';
import { direction } from './measuring-point.ts';
import { verdicts } from '../signal/screening-types.ts';
import { orderCell } from './order-cells.ts';

/** Where the screening of a waveform stands. */
export const screeningStates = ['queued', 'running', 'done', 'failed'] as const;
export const screeningState = z.enum(screeningStates);
export type ScreeningState = z.infer<typeof screeningState>;

export const unit = z.enum(units);
export const quantity = z.enum(quantities);

/** Stated limits of an upload; the pages show them, the server enforces them. */
export const uploadLimits = {
  fileMaxBytes: 256 * 1024 * 1024,
  filesPerSurveyMax: 5000,
  rowsMax: 10_000_000,
  channelsMax: 16,
} as const;

/**
 * What a person has settled about one file before it is sent: sent as the JSON field `mapping` of
 * the multipart form, beside the one file field `file`. A value given here wins over the file's
 * own comment lines.
 */
export const uploadMapping = z.strictObject({
  /** One entry a channel to take; a channel without entry is left out. */
  channels: z
    .array(
      z.strictObject({
        channelIndex: z
          .int()
          .min(0)
          .max(uploadLimits.channelsMax - 1),
        measuringPointId: id,
        /** Needed where the header doesn't say. */
        unit: unit.optional(),
      }),
    )
    .min(1, 'Match the file to a measuring point.')
    .max(uploadLimits.channelsMax),
  sampleRateHz: numberBetween(1, 10_000_000, 'Hz').optional(),
  toldSpeedRpm: numberBetween(1, 200_000, 'r/min').optional(),
  takenAt: isoDateTime.optional(),
});
export type UploadMapping = z.infer<typeof uploadMapping>;

export const waveformListItem = z.object({
  id: z.int(),
  measuringPointId: z.int(),
  pointLabel: z.string(),
  fileName: z.string(),
  fileBytes: z.int(),
  contentHash: z.string(),
  channelIndex: z.int(),
  quantity,
  unit,
  sampleRateHz: z.number(),
  sampleCount: z.int(),
  gapCount: z.int(),
  durationS: z.number(),
  toldSpeedRpm: z.number().nullable(),
  takenAt: z.string().nullable(),
  screeningState,
  screeningFailure: z.string().nullable(),
  /** Latest screening, where there is one. */
  screeningId: z.int().nullable(),
  verdict: z.enum(verdicts).nullable(),
  score: z.number().nullable(),
  decision: z.string().nullable(),
  /** Speed of the position's shaft, as found by the latest screening. */
  speedRpm: z.number().nullable(),
  /** The order strip of the latest screening; empty before there is one. */
  orders: z.array(orderCell),
});
export type WaveformListItem = z.infer<typeof waveformListItem>;

/** Answer to an upload: the file's waveforms, and whether it had been sent before. */
export const uploadResponse = z.object({
  alreadyThere: z.boolean(),
  waveforms: z.array(waveformListItem),
});
export type UploadResponse = z.infer<typeof uploadResponse>;

export const waveformResponse = waveformListItem.extend({
  surveyId: z.int(),
  surveyedOn: z.string(),
  routeName: z.string(),
  machineId: z.int(),
  machineTag: z.string(),
  machineName: z.string(),
  positionCode: z.string(),
  positionName: z.string(),
  bearingPositionId: z.int(),
  direction,
  fullScale: z.number().nullable(),
  /** The same point in the survey before, for setting the two against each other. */
  previous: z
    .object({ waveformId: z.int(), screeningId: z.int(), surveyedOn: z.string() })
    .nullable(),
  /** The other directions of the position in the same survey, where they were screened. */
  alongside: z.array(
    z.object({
      waveformId: z.int(),
      screeningId: z.int(),
      direction,
      unit,
      /** Speed of the position's shaft as found there, Hz. */
      speedHz: z.number().nullable(),
    }),
  ),
  can: z.object({ decide: z.boolean(), screenAgain: z.boolean() }),
});
export type WaveformResponse = z.infer<typeof waveformResponse>;

/** Screens again: with another told speed or unit, or as it was (a failed screening). */
export const screenAgainRequest = z.strictObject({
  toldSpeedRpm: numberBetween(1, 200_000, 'r/min').nullable().optional(),
  unit: unit.optional(),
});
export type ScreenAgainRequest = z.infer<typeof screenAgainRequest>;

/**
 * GET …/waveforms/:id/samples answers little-endian 32-bit floats in the recorded unit, NaN for a
 * gap. Above `maxPoints` samples it answers pairs instead, the lowest and the highest of every so
 * many samples as the header says; the header says 0 where every sample is there.
 */
export const samplesQuery = z.object({
  maxPoints: z.coerce.number().int().min(2).max(20_000_000).optional(),
});
export const samplesPerPairHeader = 'x-samples-per-pair';
