import { QueryFailedError } from 'typeorm';

/** MariaDB's numbers for a lock that was waited for too long, and for two that wait for each other. */
const lockErrnos = new Set([1205, 1213]);

/** Whether a write failed because somebody else was writing the same rows. */
export function isLockConflict(error: unknown): boolean {
  if (!(error instanceof QueryFailedError)) return false;
  const { errno } = error.driverError as { errno?: number };
  return errno !== undefined && lockErrnos.has(errno);
}
