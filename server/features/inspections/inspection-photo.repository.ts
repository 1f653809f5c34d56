import type { Db } from '#server/db/database.ts';
import { InspectionPhoto } from '#server/db/entities/inspection-photo.entity.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';

export type NewPhoto = Omit<InspectionPhoto, 'id' | 'inspection' | 'addedBy'>;

/** The photographs of inspections. */
export class InspectionPhotoRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** In the order in which they were added. */
  ofInspection(inspectionId: number): Promise<InspectionPhoto[]> {
    return this.db.find(InspectionPhoto, {
      where: { inspectionId },
      relations: { addedBy: true },
      order: { id: 'ASC' },
    });
  }

  find(inspectionId: number, id: number): Promise<InspectionPhoto | null> {
    return this.db.findOne(InspectionPhoto, { where: { id, inspectionId } });
  }

  /** Reads the inspection and lets nobody change it until the transaction ends. */
  lockInspection(id: number): Promise<Inspection | null> {
    return this.db.findOne(Inspection, { where: { id }, lock: { mode: 'pessimistic_write' } });
  }

  async insert(photo: NewPhoto): Promise<void> {
    await this.db.insert(InspectionPhoto, photo);
  }

  async remove(id: number): Promise<void> {
    await this.db.delete(InspectionPhoto, { id });
  }
}
