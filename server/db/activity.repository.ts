import type { Db } from './database.ts';
import { Activity } from './entities/activity.entity.ts';

export interface ActivityEntry {
  siteId: number | null;
  userId: number | null;
  /** What happened, object first: "machine.created". */
  action: string;
  objectType: string;
  objectId: number | null;
  details?: Record<string, unknown>;
}

/** Adds to the activity record, in the transaction of the change it tells of. */
export async function recordActivity(db: Db, entry: ActivityEntry, now = new Date()) {
  await db.insert(Activity, {
    ...entry,
    details: (entry.details ?? null) as never,
    happenedAt: now,
  });
}
