import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { productResponse, type ProductResponse } from '#shared/contracts/session.ts';

export type DemoAccounts = ProductResponse['demoAccounts'];

const fileOf = (dataDirectory: string) => join(dataDirectory, 'demo-accounts.json');

/** The demo accounts with the passwords made for this installation; none before the demo is loaded. */
export function readDemoAccounts(dataDirectory: string): DemoAccounts {
  const path = fileOf(dataDirectory);
  if (!existsSync(path)) return [];
  return z
    .array(productResponse.shape.demoAccounts.element)
    .parse(JSON.parse(readFileSync(path, 'utf8')));
}

export function writeDemoAccounts(dataDirectory: string, accounts: DemoAccounts): void {
  mkdirSync(dataDirectory, { recursive: true, mode: 0o700 });
  writeFileSync(fileOf(dataDirectory), JSON.stringify(accounts, null, 2), { mode: 0o600 });
}
