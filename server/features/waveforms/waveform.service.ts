import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import type { Screening } from '#server/db/entities/screening.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type { FileStore } from '#server/storage/file-store.ts';
import { float32Samples, minMaxPairs } from '#server/storage/float32-samples.ts';
import type { ScreenAgainRequest } from '#shared/contracts/waveform.ts';
import { quantityOfUnit } from '#shared/quantities/quantity.ts';
import { placeOf } from './waveform.presenter.ts';
import { WaveformRepository, type WaveformRow } from './waveform.repository.ts';

/** Reading waveforms and screenings, and asking for another screening. */
export class WaveformService {
  private readonly database: Database;
  private readonly files: FileStore;
  private readonly wakeQueue: () => void;

  constructor(database: Database, files: FileStore, wakeQueue: () => void) {
    this.database = database;
    this.files = files;
    this.wakeQueue = wakeQueue;
  }

  async one(principal: SitePrincipal, id: number) {
    const repository = new WaveformRepository(this.database.db);
    const row = await this.seen(principal, id);
    const [previous, alongside] = await Promise.all([
      repository.previous(row.waveform),
      repository.alongside(row.waveform),
    ]);
    return { row, previous, alongside };
  }

  async screening(principal: SitePrincipal, id: number) {
    const screening = await this.seenScreening(principal, id);
    const findingId = await new WaveformRepository(this.database.db).findingOf(id);
    return { screening, findingId };
  }

  /** Path and name of the file as it was uploaded. */
  async original(principal: SitePrincipal, id: number) {
    const { waveform } = await this.seen(principal, id);
    return { path: this.files.originalPath(waveform.contentHash), fileName: waveform.fileName };
  }

  /** Samples in the recorded unit, as the contract sends them: all, or drawn together to pairs. */
  async samples(principal: SitePrincipal, id: number, maxPoints = Infinity) {
    const { waveform } = await this.seen(principal, id);
    const path = this.files.samplesPath(waveform.contentHash, waveform.channelIndex);
    const { sampleCount } = waveform;
    if (sampleCount <= maxPoints) {
      return { samplesPerPair: 0, byteCount: sampleCount * 4, chunks: float32Samples(path) };
    }
    const samplesPerPair = Math.ceil(sampleCount / Math.floor(maxPoints / 2));
    const pairCount = Math.ceil(sampleCount / samplesPerPair);
    return { samplesPerPair, byteCount: pairCount * 8, chunks: minMaxPairs(path, samplesPerPair) };
  }

  async plot(
    principal: SitePrincipal,
    screeningId: number,
    plot: 'spectrum' | 'averaged-revolution',
  ): Promise<Buffer> {
    const { waveformId, run } = await this.seenScreening(principal, screeningId);
    const bytes = await this.files.readBytes(this.files.plotPath(waveformId, run, plot));
    if (bytes === null) throw notFound(plot === 'spectrum' ? 'spectrum' : 'averaged revolution');
    return bytes;
  }

  /** Screens again with what was corrected; the screening before is kept with its run. */
  async screenAgain(
    principal: SitePrincipal,
    id: number,
    request: ScreenAgainRequest,
  ): Promise<WaveformRow> {
    const { waveform, screening } = await this.seen(principal, id);
    const { screeningState } = waveform;
    if (screeningState !== 'done' && screeningState !== 'failed') {
      throw new AppError(
        'wrong_state',
        'This waveform is being screened now. Wait for its result.',
      );
    }
    if (screening !== null && screening.decision !== null) {
      throw new AppError(
        'wrong_state',
        'This screening has been decided on. Undo the decision before it is screened again.',
      );
    }
    await this.database.transaction(async (db) => {
      const asked = await new WaveformRepository(db).requestRun(id, {
        ...(request.toldSpeedRpm === undefined ? {} : { toldSpeedRpm: request.toldSpeedRpm }),
        ...(request.unit === undefined
          ? {}
          : { unit: request.unit, quantity: quantityOfUnit[request.unit] }),
        // A failed run left no screening, so it is the same run again.
        ...(screening === null ? {} : { screeningRun: waveform.screeningRun + 1 }),
      });
      if (!asked) {
        throw new AppError('conflict', 'Somebody else has just asked for another screening.');
      }
      await recordActivity(db, {
        siteId: principal.siteId,
        userId: principal.userId,
        action: 'waveform.screened-again',
        objectType: 'waveform',
        objectId: id,
        details: { ...request },
      });
    });
    this.wakeQueue();
    return this.seen(principal, id);
  }

  private async seen(principal: SitePrincipal, id: number): Promise<WaveformRow> {
    const row = await new WaveformRepository(this.database.db).find(principal.siteId, id);
    if (row === null || !maySee(principal, placeOf(row).machine.ownerUserId)) {
      throw notFound('waveform');
    }
    return row;
  }

  private async seenScreening(principal: SitePrincipal, id: number): Promise<Screening> {
    const screening = await new WaveformRepository(this.database.db).screening(
      principal.siteId,
      id,
    );
    const machine = screening?.waveform?.measuringPoint?.bearingPosition?.machine;
    if (screening === null || !maySee(principal, machine?.ownerUserId ?? null)) {
      throw notFound('screening');
    }
    return screening;
  }
}

/** An asset owner sees what was measured on the machines they own. */
const maySee = (principal: SitePrincipal, ownerUserId: number | null) =>
  principal.role !== 'owner' || ownerUserId === principal.userId;
