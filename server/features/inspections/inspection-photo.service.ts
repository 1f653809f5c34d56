import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database, Db } from '#server/db/database.ts';
import type { InspectionPhoto } from '#server/db/entities/inspection-photo.entity.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type { ReceivedFile } from '#server/http/receive-file.ts';
import type { FileStore } from '#server/storage/file-store.ts';
import { photoLimits, photoSizes, type PhotoSize } from '#shared/contracts/inspection-photo.ts';
import { InspectionPhotoRepository } from './inspection-photo.repository.ts';
import { isAssignee, maySeeInspection } from './inspection.policy.ts';
import { InspectionRepository } from './inspection.repository.ts';
import { recordInspectionActivity } from './move-inspection.ts';
import { readPhoto } from './read-photo.ts';

/** Photographs of an inspection: the owner adds and removes them until the report. */
export class InspectionPhotoService {
  private readonly database: Database;
  private readonly files: FileStore;
  private readonly now: () => Date;

  constructor(database: Database, files: FileStore, now: () => Date = () => new Date()) {
    this.database = database;
    this.files = files;
    this.now = now;
  }

  /** Refuses before a file is taken in what would be refused after. */
  async mayAdd(principal: SitePrincipal, inspectionId: number): Promise<void> {
    refuseDone(principal, await this.seen(principal, inspectionId));
  }

  /** Takes an arrived file in and removes it; the same picture sent twice is one. */
  async add(
    principal: SitePrincipal,
    inspectionId: number,
    file: ReceivedFile,
  ): Promise<InspectionPhoto[]> {
    try {
      const contentHash = await hashOf(file.path);
      const known = await this.list(inspectionId);
      if (known.some((photo) => photo.contentHash === contentHash)) return known;
      const photo = await readPhoto(file.path);
      const now = this.now();
      await this.change(principal, inspectionId, async (db) => {
        const repository = new InspectionPhotoRepository(db);
        const there = await repository.ofInspection(inspectionId);
        if (there.some((one) => one.contentHash === contentHash)) return;
        if (there.length >= photoLimits.maxPerInspection) {
          const message = `An inspection takes ${photoLimits.maxPerInspection} photographs. Remove one first.`;
          throw new AppError('validation', message, { fields: [{ path: 'file', message }] });
        }
        for (const size of photoSizes) {
          await this.files.write(
            this.files.photoPath(inspectionId, contentHash, size),
            photo[size],
          );
        }
        await repository.insert({
          inspectionId,
          contentHash,
          fileName: file.fileName,
          widthPx: photo.widthPx,
          heightPx: photo.heightPx,
          addedByUserId: principal.userId,
          addedAt: now,
        });
        const details = { fileName: file.fileName };
        await recordInspectionActivity(db, principal, inspectionId, 'photo-added', details, now);
      });
      return await this.list(inspectionId);
    } finally {
      await this.files.remove(file.path);
    }
  }

  async remove(principal: SitePrincipal, inspectionId: number, photoId: number): Promise<void> {
    await this.seen(principal, inspectionId);
    let removed: InspectionPhoto | null = null;
    await this.change(principal, inspectionId, async (db) => {
      const repository = new InspectionPhotoRepository(db);
      removed = await repository.find(inspectionId, photoId);
      if (removed === null) throw notFound('photograph');
      await repository.remove(photoId);
      const details = { fileName: removed.fileName };
      await recordInspectionActivity(
        db,
        principal,
        inspectionId,
        'photo-removed',
        details,
        this.now(),
      );
    });
    await this.removeFiles(inspectionId, removed);
  }

  /** The picture's bytes: always JPEG, whatever was sent. */
  async picture(
    principal: SitePrincipal,
    inspectionId: number,
    photoId: number,
    size: PhotoSize,
  ): Promise<Buffer> {
    await this.seen(principal, inspectionId);
    const photo = await new InspectionPhotoRepository(this.database.db).find(inspectionId, photoId);
    if (photo === null) throw notFound('photograph');
    const bytes = await this.files.readBytes(
      this.files.photoPath(inspectionId, photo.contentHash, size),
    );
    if (bytes === null) throw notFound('photograph');
    return bytes;
  }

  list(inspectionId: number): Promise<InspectionPhoto[]> {
    return new InspectionPhotoRepository(this.database.db).ofInspection(inspectionId);
  }

  /** A change while the inspection can't be reported, handed on or cancelled by somebody else. */
  private change(
    principal: SitePrincipal,
    inspectionId: number,
    work: (db: Db) => Promise<void>,
  ): Promise<void> {
    return this.database.transaction(async (db) => {
      const inspection = await new InspectionPhotoRepository(db).lockInspection(inspectionId);
      if (inspection === null) throw notFound('inspection');
      refuseDone(principal, inspection);
      await work(db);
    });
  }

  private async removeFiles(inspectionId: number, photo: InspectionPhoto | null): Promise<void> {
    if (photo === null) return;
    for (const size of photoSizes) {
      await this.files.remove(this.files.photoPath(inspectionId, photo.contentHash, size));
    }
  }

  private async seen({ siteId, ...principal }: SitePrincipal, inspectionId: number) {
    const repository = new InspectionRepository(this.database.db);
    const inspection = await repository.find(siteId, inspectionId);
    if (inspection === null || !maySeeInspection({ siteId, ...principal }, inspection)) {
      throw notFound('inspection');
    }
    return inspection;
  }
}

function refuseDone(principal: SitePrincipal, inspection: Inspection): void {
  if (!isAssignee(principal, inspection)) {
    throw new AppError('forbidden', 'This inspection is assigned to somebody else.');
  }
  if (inspection.state === 'accepted') return;
  throw new AppError(
    'wrong_state',
    inspection.state === 'assigned'
      ? 'Accept the inspection before adding photographs.'
      : `This inspection is ${inspection.state}: its photographs stay as they are.`,
  );
}

async function hashOf(path: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(path), hash);
  return hash.digest('hex');
}
