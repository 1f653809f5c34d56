import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { join } from 'node:path';
import { z } from 'zod';
import { productResponse, type ProductResponse } from '#shared/contracts/session.ts';

/** What the process finds around itself. The only reader of process.env. */
export function readEnvironment(): {
  variables: Record<string, string | undefined>;
  projectDirectory: string;
  demoAccounts: ProductResponse['demoAccounts'];
} {
  const projectDirectory = fileURLToPath(new URL('../..', import.meta.url));
  return {
    variables: process.env,
    projectDirectory,
    demoAccounts: readDemoAccounts(process.env.DEMO_ACCOUNTS_FILE),
  };
}

/** The demo loader writes the accounts it made, with their passwords, beside the data. */
function readDemoAccounts(path: string | undefined): ProductResponse['demoAccounts'] {
  if (path === undefined || !existsSync(path)) return [];
  const accounts = z.array(productResponse.shape.demoAccounts.element);
  return accounts.parse(JSON.parse(readFileSync(join(path), 'utf8')));
}
