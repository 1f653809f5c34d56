import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { z } from 'zod';

const port = z.coerce.number().int().min(0).max(65535);
const flag = z
  .enum(['0', '1', 'true', 'false'])
  .transform((value) => value === '1' || value === 'true');

/** The environment, one line a variable. Units are in the names of what comes out. */
const environmentSchema = z.object({
  DATABASE_URL: z.url({ protocol: /^(mysql|mariadb)$/ }),
  DATABASE_SOCKET: z.string().min(1).optional(),
  DATA_DIR: z.string().min(1).default('.data/files'),
  HOST: z.string().min(1).default('127.0.0.1'),
  PORT: port.default(4173),
  PUBLIC_URL: z.url().optional(),
  AUTH_SECRET: z.string().min(32),
  SMTP_URL: z.url({ protocol: /^smtps?$/ }).optional(),
  MAIL_FROM: z.string().min(3).default('Fretline <fretline@localhost>'),
  DEMO: flag.default(false),
  WEBHOOK_INNER_TARGETS: flag.optional(),
  LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).default('info'),
  SCREENING_WORKERS: z.coerce.number().int().min(1).max(64).default(2),
});

export interface Config {
  databaseUrl: string;
  databaseSocketPath: string | undefined;
  dataDirectory: string;
  host: string;
  port: number;
  /** Where people reach the product; links in e-mails begin with it. */
  publicUrl: string | undefined;
  authSecret: string;
  /** Absent: mail goes to the local fake mailbox. */
  smtpUrl: string | undefined;
  mailFrom: string;
  demo: boolean;
  /** Webhooks may lead into the server's own network, where a plant's systems often stand. */
  webhookInnerTargets: boolean;
  logLevel: 'silent' | 'error' | 'warn' | 'info' | 'debug';
  screeningWorkerCount: number;
  accessTokenLifeS: number;
  refreshTokenLifeS: number;
  uploadMaxBytes: number;
}

export class ConfigError extends Error {}

/**
 * Turns the environment into one frozen object.
 *
 * @throws {ConfigError} naming every faulty variable at once
 */
export function readConfig(environment: Record<string, string | undefined>): Config {
  const parsed = environmentSchema.safeParse(withSecretFiles(environment));
  if (!parsed.success) {
    const faults = parsed.error.issues.map(
      (issue) => `  ${issue.path.join('.') || 'environment'}: ${issue.message}`,
    );
    throw new ConfigError(`The configuration has faults:\n${faults.join('\n')}`);
  }
  const env = parsed.data;
  return Object.freeze({
    databaseUrl: env.DATABASE_URL,
    databaseSocketPath: env.DATABASE_SOCKET,
    dataDirectory: resolve(env.DATA_DIR),
    host: env.HOST,
    port: env.PORT,
    publicUrl: env.PUBLIC_URL?.replace(/\/+$/, ''),
    authSecret: env.AUTH_SECRET,
    smtpUrl: env.SMTP_URL,
    mailFrom: env.MAIL_FROM,
    demo: env.DEMO,
    webhookInnerTargets: env.WEBHOOK_INNER_TARGETS ?? env.DEMO,
    logLevel: env.LOG_LEVEL,
    screeningWorkerCount: env.SCREENING_WORKERS,
    accessTokenLifeS: 10 * 60,
    refreshTokenLifeS: 14 * 24 * 3600,
    uploadMaxBytes: 256 * 1024 * 1024,
  });
}

/** Secrets may come from a file: `NAME_FILE` holds the path of what `NAME` would hold. */
function withSecretFiles(environment: Record<string, string | undefined>) {
  const merged: Record<string, string | undefined> = { ...environment };
  for (const name of ['DATABASE_URL', 'AUTH_SECRET', 'SMTP_URL']) {
    const path = environment[`${name}_FILE`];
    if (merged[name] !== undefined || path === undefined) continue;
    try {
      merged[name] = readFileSync(path, 'utf8').trim();
    } catch (cause) {
      throw new ConfigError(`${name}_FILE names a file that can't be read: ${path}`, { cause });
    }
  }
  for (const [name, value] of Object.entries(merged)) if (value === '') merged[name] = undefined;
  return merged;
}
