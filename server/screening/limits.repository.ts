import { IsNull } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { LimitsChange } from '#server/db/entities/limits-change.entity.ts';
import { Site } from '#server/db/entities/site.entity.ts';
import type { MachineKind } from '#shared/contracts/machine.ts';
import { defaultLimits } from '#shared/signal/screen-waveform.ts';
import type { ScreeningLimits } from '#shared/signal/screening-types.ts';

/** The limits of the verdict alone; the others belong to the method. */
export type VerdictLimits = Pick<ScreeningLimits, 'suspectedScore' | 'likelyScore'>;

export const methodLimits: VerdictLimits = {
  suspectedScore: defaultLimits.suspectedScore,
  likelyScore: defaultLimits.likelyScore,
};

/** What a site has set for the verdict. */
export class LimitsRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** Limits in force for a kind of machine: its own, else the site's, else the method's. */
  async inForce(siteId: number, machineKind: MachineKind | null): Promise<VerdictLimits> {
    const own = machineKind === null ? null : await this.ownOf(siteId, machineKind);
    return own ?? (await this.ownOf(siteId, null)) ?? methodLimits;
  }

  /** What is set for this kind alone, or for the site where it is null; null where nothing is. */
  async ownOf(siteId: number, machineKind: MachineKind | null): Promise<VerdictLimits | null> {
    const newest = await this.db.findOne(LimitsChange, {
      where: { siteId, machineKind: machineKind ?? IsNull() },
      order: { id: 'DESC' },
    });
    const { suspectedScore = null, likelyScore = null } = newest ?? {};
    return suspectedScore === null || likelyScore === null ? null : { suspectedScore, likelyScore };
  }

  /** Every change, newest first. */
  history(siteId: number): Promise<LimitsChange[]> {
    return this.db.find(LimitsChange, {
      where: { siteId },
      relations: { changedBy: true },
      order: { id: 'DESC' },
    });
  }

  /** Holds the site's row: two changes of limits happen one after the other. */
  async lockSite(siteId: number): Promise<void> {
    await this.db.findOneOrFail(Site, {
      where: { id: siteId },
      lock: { mode: 'pessimistic_write' },
    });
  }

  async add(change: Omit<LimitsChange, 'id' | 'site' | 'changedBy'>): Promise<number> {
    const result = await this.db.insert(LimitsChange, change);
    return (result.identifiers[0] as { id: number }).id;
  }
}
