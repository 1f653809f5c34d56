import type { Db } from '#server/db/database.ts';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';

/** Reads a site's register a page of machines at a time. */
export class ExportRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** The next machines after a tag, in the order of their tags. */
  machines(siteId: number, afterTag: string | null, count: number): Promise<Machine[]> {
    const query = this.db
      .createQueryBuilder(Machine, 'machine')
      .leftJoinAndSelect('machine.owner', 'owner')
      .where('machine.site_id = :siteId', { siteId })
      .orderBy('machine.tag')
      .limit(count);
    if (afterTag !== null) query.andWhere('machine.tag > :afterTag', { afterTag });
    return query.getMany();
  }

  /** Their bearing positions along each train. */
  positions(machineIds: number[]): Promise<BearingPosition[]> {
    return this.db
      .createQueryBuilder(BearingPosition, 'position')
      .innerJoinAndSelect('position.machine', 'machine')
      .where('position.machine_id IN (:...machineIds)', { machineIds })
      .orderBy('machine.tag')
      .addOrderBy('position.sequence')
      .addOrderBy('position.code')
      .getMany();
  }

  /** The fit records of their seats, oldest first. */
  fitRecords(machineIds: number[]): Promise<FitRecord[]> {
    return this.db
      .createQueryBuilder(FitRecord, 'record')
      .innerJoinAndSelect('record.bearingPosition', 'position')
      .innerJoinAndSelect('position.machine', 'machine')
      .where('position.machine_id IN (:...machineIds)', { machineIds })
      .orderBy('machine.tag')
      .addOrderBy('position.sequence')
      .addOrderBy('position.code')
      .addOrderBy('record.recorded_on')
      .addOrderBy('record.id')
      .getMany();
  }

  points(machineIds: number[]): Promise<MeasuringPoint[]> {
    return this.db
      .createQueryBuilder(MeasuringPoint, 'point')
      .innerJoinAndSelect('point.bearingPosition', 'position')
      .innerJoinAndSelect('position.machine', 'machine')
      .where('position.machine_id IN (:...machineIds)', { machineIds })
      .orderBy('machine.tag')
      .addOrderBy('position.sequence')
      .addOrderBy('position.code')
      .addOrderBy('point.id')
      .getMany();
  }
}
