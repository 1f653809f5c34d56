import { QueryFailedError } from 'typeorm';

/** MariaDB's number for a broken unique key; the words of the message differ between versions. */
const duplicateEntryErrno = 1062;

/** Whether a write failed because a unique key already holds the value. */
export function isDuplicateKey(error: unknown): boolean {
  return (
    error instanceof QueryFailedError &&
    (error.driverError as { errno?: number }).errno === duplicateEntryErrno
  );
}
