import { QueryFailedError } from 'typeorm';

/** MariaDB's numbers for taking out a row that others refer to, and for referring to one that is gone. */
const foreignKeyErrnos = new Set([1451, 1452]);

/** Whether a write failed because of a row in another table. */
export function isForeignKeyConflict(error: unknown): boolean {
  if (!(error instanceof QueryFailedError)) return false;
  const { errno } = error.driverError as { errno?: number };
  return errno !== undefined && foreignKeyErrnos.has(errno);
}
