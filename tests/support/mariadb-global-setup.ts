import type { TestProject } from 'vitest/node';
import { startEphemeralMariadb } from '#server/cli/setup/ephemeral-mariadb.mjs';

export interface TestMariadb {
  socketPath: string;
  username: string;
  password: string;
  database: string;
}

declare module 'vitest' {
  export interface ProvidedContext {
    mariadb: TestMariadb;
  }
}

/** One MariaDB for all the files of a project; every vitest worker has a database of its own in it. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const { stop, ...mariadb } = await startEphemeralMariadb();
  project.provide('mariadb', mariadb);
  return stop;
}
