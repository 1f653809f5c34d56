import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import { diskFullInWords } from '#server/storage/disk-full.ts';
import type { FileStore } from '#server/storage/file-store.ts';
import { uploadLimits, type UploadMapping } from '#shared/contracts/waveform.ts';
import { quantityOfUnit } from '#shared/quantities/quantity.ts';
import type { ReceivedFile } from './receive-upload.ts';
import { WaveformRepository, type NewWaveform, type WaveformRow } from './waveform.repository.ts';

/** A channel as the reader gives it, in the recorded unit. */
interface ReadChannel {
  unit: NewWaveform['unit'] | null;
  samples: Float64Array<ArrayBuffer>;
  gapCount: number;
}
interface ReadFile {
  channels: ReadChannel[];
  sampleRateHz: number | null;
  speedRpm: number | null;
  comments: { takenAt?: string; fullScale?: number; lineFrequencyHz?: number };
}
type ReadFault = { code: string; line: number | null; message: string };

interface Dependencies {
  database: Database;
  files: FileStore;
  /** Reads a CSV in a worker thread. */
  readCsv: (
    path: string,
    options: { sampleRateHz?: number; speedRpm?: number; maxRows: number; maxChannels: number },
  ) => Promise<{ read: ReadFile } | { error: ReadFault }>;
  wakeQueue: () => void;
  now?: () => Date;
}

export interface UploadedFile {
  alreadyThere: boolean;
  rows: WaveformRow[];
}

/** Takes files into a survey. The same content twice is one waveform; a bad file leaves its reason. */
export class UploadService {
  private readonly deps: Dependencies;

  constructor(dependencies: Dependencies) {
    this.deps = dependencies;
  }

  async take(
    principal: SitePrincipal,
    surveyId: number,
    file: ReceivedFile,
  ): Promise<UploadedFile> {
    const { database, files } = this.deps;
    try {
      const waveforms = new WaveformRepository(database.db);
      const survey = await waveforms.survey(principal.siteId, surveyId);
      if (survey === null) throw notFound('survey');
      await this.checkPoints(waveforms, principal.siteId, file.mapping);
      const before = await waveforms.ofContent(surveyId, file.contentHash);
      const there = new Set(before.map(({ waveform }) => waveform.channelIndex));
      const missing = file.mapping.channels.filter(({ channelIndex }) => !there.has(channelIndex));
      if (missing.length === 0) return { alreadyThere: true, rows: before };
      if ((await waveforms.countOfSurvey(surveyId)) >= uploadLimits.filesPerSurveyMax) {
        throw new AppError(
          'too_large',
          `A survey takes at most ${uploadLimits.filesPerSurveyMax} waveforms; this one is full.`,
        );
      }
      const answer = await this.deps.readCsv(file.path, {
        maxRows: uploadLimits.rowsMax,
        maxChannels: uploadLimits.channelsMax,
        ...(file.mapping.sampleRateHz === undefined
          ? {}
          : { sampleRateHz: file.mapping.sampleRateHz }),
        ...(file.mapping.toldSpeedRpm === undefined ? {} : { speedRpm: file.mapping.toldSpeedRpm }),
      });
      if ('error' in answer) return await this.reject(surveyId, file, answer.error);
      const checked = this.check(missing, answer.read);
      if ('code' in checked) return await this.reject(surveyId, file, checked);
      return await this.keep(principal, surveyId, file, checked, answer.read);
    } catch (error) {
      throw diskFullInWords(error);
    } finally {
      await files.remove(file.path);
    }
  }

  private async checkPoints(
    waveforms: WaveformRepository,
    siteId: number,
    mapping: UploadMapping,
  ): Promise<void> {
    for (const [index, { measuringPointId }] of mapping.channels.entries()) {
      if ((await waveforms.point(siteId, measuringPointId)) !== null) continue;
      const message = 'This measuring point does not exist at this site.';
      throw new AppError('validation', message, {
        fields: [{ path: `mapping.channels.${index}.measuringPointId`, message }],
      });
    }
  }

  /** What the reader could not know: the unit of each channel taken, and the sampling rate. */
  private check(
    wantedChannels: UploadMapping['channels'],
    read: ReadFile,
  ): CheckedFile | ReadFault {
    if (read.sampleRateHz === null) {
      return {
        code: 'sample-rate-missing',
        line: null,
        message:
          'Neither a time column nor a comment line tells the sampling rate: enter it, or add a line "# sample_rate_hz: N" to the file.',
      };
    }
    const channels: CheckedFile['channels'] = [];
    for (const wanted of wantedChannels) {
      const channel = read.channels[wanted.channelIndex];
      if (channel === undefined) {
        return {
          code: 'channel-missing',
          line: null,
          message: `The file has ${read.channels.length} waveform columns; column ${wanted.channelIndex + 1} was asked for.`,
        };
      }
      const unit = wanted.unit ?? channel.unit;
      if (unit === null) {
        return {
          code: 'unit-missing',
          line: null,
          message: `The header of waveform column ${wanted.channelIndex + 1} names no unit: choose it, or write it in brackets, e.g. "acceleration [g]".`,
        };
      }
      channels.push({ ...wanted, unit, samples: channel.samples, gapCount: channel.gapCount });
    }
    return { sampleRateHz: read.sampleRateHz, channels };
  }

  private async reject(surveyId: number, file: ReceivedFile, fault: ReadFault): Promise<never> {
    const { database, now = () => new Date() } = this.deps;
    await new WaveformRepository(database.db).reject({
      surveyId,
      fileName: file.fileName,
      contentHash: file.contentHash,
      errorCode: fault.code,
      errorLine: fault.line,
      errorMessage: fault.message,
      rejectedAt: now(),
    });
    const where = fault.line === null ? '' : `Line ${fault.line}: `;
    throw new AppError('unreadable_file', `${where}${fault.message}`, {
      fields: [{ path: 'file', message: `${where}${fault.message}` }],
    });
  }

  private async keep(
    principal: SitePrincipal,
    surveyId: number,
    file: ReceivedFile,
    { sampleRateHz, channels }: CheckedFile,
    read: ReadFile,
  ): Promise<UploadedFile> {
    const { database, files, wakeQueue, now = () => new Date() } = this.deps;
    const takenAt = file.mapping.takenAt ?? read.comments.takenAt;
    // Files first: a row without its samples could never be screened, samples without a row hurt nobody.
    for (const { channelIndex, samples } of channels) {
      await files.write(
        files.samplesPath(file.contentHash, channelIndex),
        new Uint8Array(samples.buffer, samples.byteOffset, samples.byteLength),
      );
    }
    await files.keepOriginal(file.path, file.contentHash);
    const uploadedAt = now();
    const rows: NewWaveform[] = channels.map((channel) => ({
      surveyId,
      measuringPointId: channel.measuringPointId,
      contentHash: file.contentHash,
      channelIndex: channel.channelIndex,
      fileName: file.fileName,
      fileBytes: file.fileBytes,
      quantity: quantityOfUnit[channel.unit],
      unit: channel.unit,
      sampleRateHz,
      sampleCount: channel.samples.length,
      gapCount: channel.gapCount,
      toldSpeedRpm: read.speedRpm,
      toldLineFrequencyHz: read.comments.lineFrequencyHz ?? null,
      fullScale: read.comments.fullScale ?? null,
      takenAt: momentOf(takenAt),
      uploadedAt,
      uploadedByUserId: principal.userId,
      screeningState: 'queued',
      screeningRun: 1,
      screeningAttempts: 0,
      screeningFailure: null,
    }));
    let alreadyThere = false;
    await database
      .transaction(async (db) => {
        const waveforms = new WaveformRepository(db);
        await waveforms.insert(rows);
        await waveforms.clearRejection(surveyId, file);
        await recordActivity(db, {
          siteId: principal.siteId,
          userId: principal.userId,
          action: 'waveform.uploaded',
          objectType: 'survey',
          objectId: surveyId,
          details: { fileName: file.fileName, contentHash: file.contentHash },
        });
      })
      .catch((error: unknown) => {
        // The same file sent twice at the same time: the other was faster, and it is one waveform.
        if (!isDuplicateKey(error)) throw error;
        alreadyThere = true;
      });
    wakeQueue();
    return {
      alreadyThere,
      rows: await new WaveformRepository(database.db).ofContent(surveyId, file.contentHash),
    };
  }
}

interface CheckedFile {
  sampleRateHz: number;
  channels: {
    channelIndex: number;
    measuringPointId: number;
    unit: NewWaveform['unit'];
    samples: Float64Array<ArrayBuffer>;
    gapCount: number;
  }[];
}

/** A moment without a zone is taken as UTC: the recorder's own zone is not known. */
function momentOf(text: string | undefined): Date | null {
  if (text === undefined) return null;
  const zoned = /(Z|[+-]\d\d:?\d\d)$/i.test(text) || !text.includes('T') ? text : `${text}Z`;
  const moment = new Date(zoned);
  return Number.isNaN(moment.getTime()) ? null : moment;
}
