import { readFile, rm } from 'node:fs/promises';
import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import type { RegisterImport } from '#server/db/entities/register-import.entity.ts';
import { isForeignKeyConflict } from '#server/db/foreign-key-conflict.ts';
import { isLockConflict } from '#server/db/lock-conflict.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type {
  ImportListQuery,
  ImportRowsQuery,
  RegisterKind,
} from '#shared/contracts/register-import.ts';
import { decodeCsv } from './decode-csv.ts';
import { DryRunStopped, runDry, type DryRun } from './dry-run.ts';
import { ImportRepository } from './import.repository.ts';
import { whyNotApplied, whyNotUndone } from './import-states.ts';
import type { RegisterChecks } from './judge-context.ts';
import { openTable } from './read-table.ts';
import { undoPlanned } from './undo-import.ts';
import { writePlanned } from './write-import.ts';

const brokenOff =
  'The dry run broke off when the server stopped. Nothing was written; send the file again.';
const failed =
  'The dry run broke off through a fault of the server. Nothing was written; send the file again, and tell your administrator if it stays.';

interface Dependencies {
  database: Database;
  checks: RegisterChecks;
  /** Told of what a dry run met that it should not have. */
  logError: (error: unknown, message: string) => void;
  now?: () => Date;
}

/** Register files: the dry run of one, writing what it planned, and taking that back. */
export class ImportService {
  private readonly deps: Dependencies;
  private readonly now: () => Date;
  /** Dry runs wait for each other: they share the processor with everybody's questions. */
  private running: Promise<void> = Promise.resolve();
  private stopping = false;

  constructor(dependencies: Dependencies) {
    this.deps = dependencies;
    this.now = dependencies.now ?? (() => new Date());
  }

  /** Dry runs that a process left behind are told to be over. */
  start(): Promise<void> {
    return new ImportRepository(this.deps.database.db).failUnfinished(brokenOff);
  }

  async stop(): Promise<void> {
    this.stopping = true;
    await this.running;
  }

  list(principal: SitePrincipal, query: ImportListQuery) {
    return new ImportRepository(this.deps.database.db).list(principal.siteId, query);
  }

  async one(principal: SitePrincipal, importId: number): Promise<RegisterImport> {
    const imports = new ImportRepository(this.deps.database.db);
    const found = await imports.find(principal.siteId, importId);
    if (found === null) throw notFound('import');
    return found;
  }

  async rows(principal: SitePrincipal, importId: number, query: ImportRowsQuery) {
    await this.one(principal, importId);
    return new ImportRepository(this.deps.database.db).rows(importId, query);
  }

  /** Takes a file that has arrived and begins its dry run; the answer doesn't wait for it. */
  async take(
    principal: SitePrincipal,
    kind: RegisterKind,
    file: { path: string; fileName: string },
  ): Promise<RegisterImport> {
    const bytes = await readFile(file.path).finally(() => rm(file.path, { force: true }));
    const { text, encoding } = decodeCsv(bytes);
    const table = await openTable(text, kind);
    const { siteId, userId } = principal;
    const uploadedAt = this.now();
    const importId = await new ImportRepository(this.deps.database.db).insert({
      siteId,
      kind,
      state: 'reading',
      fileName: file.fileName,
      encoding,
      separator: table.separator,
      rowCount: table.rowCount,
      uploadedByUserId: userId,
      uploadedAt,
    });
    const today = uploadedAt.toISOString().slice(0, 10);
    this.running = this.running.then(() => this.dryRun({ importId, siteId, kind, table, today }));
    return this.one(principal, importId);
  }

  private async dryRun(run: DryRun): Promise<void> {
    const { database, checks, logError } = this.deps;
    try {
      await runDry(database, checks, run, () => this.stopping);
    } catch (error) {
      const stopped = error instanceof DryRunStopped;
      if (!stopped) logError(error, 'a dry run broke off');
      await new ImportRepository(database.db)
        .update(run.importId, { state: 'failed', failure: stopped ? brokenOff : failed })
        .catch((second: unknown) => logError(second, 'a broken dry run could not be noted'));
    }
  }

  /** Writes all rows of a dry run or none. */
  async apply(principal: SitePrincipal, importId: number): Promise<RegisterImport> {
    const now = this.now();
    await this.change(principal, importId, whyNotApplied, async (db, found) => {
      await writePlanned(db, found, principal, now);
      await new ImportRepository(db).update(importId, {
        state: 'applied',
        appliedByUserId: principal.userId,
        appliedAt: now,
      });
      await recordActivity(db, { ...entryOf(principal, found), action: 'register.imported' }, now);
    });
    return this.one(principal, importId);
  }

  /** Takes back all that an import wrote, or nothing. */
  async undo(principal: SitePrincipal, importId: number): Promise<RegisterImport> {
    const now = this.now();
    await this.change(principal, importId, whyNotUndone, async (db, found) => {
      await undoPlanned(db, found);
      await new ImportRepository(db).update(importId, {
        state: 'undone',
        undoneByUserId: principal.userId,
        undoneAt: now,
      });
      await recordActivity(
        db,
        { ...entryOf(principal, found), action: 'register.import-undone' },
        now,
      );
    });
    return this.one(principal, importId);
  }

  private async change(
    principal: SitePrincipal,
    importId: number,
    whyNot: (found: RegisterImport) => string | null,
    work: (db: Database['db'], found: RegisterImport) => Promise<void>,
  ): Promise<void> {
    await this.deps.database
      .transaction(async (db) => {
        const found = await new ImportRepository(db).lock(principal.siteId, importId);
        if (found === null) throw notFound('import');
        const reason = whyNot(found);
        if (reason !== null) throw new AppError('wrong_state', reason);
        await work(db, found);
      })
      .catch((error: unknown) => {
        throw inWords(error);
      });
  }
}

function inWords(cause: unknown): unknown {
  if (isDuplicateKey(cause)) {
    return new AppError(
      'conflict',
      'Somebody else has added one of the new rows since the dry run. Nothing was written; send the file again to see which.',
      { cause },
    );
  }
  if (isForeignKeyConflict(cause)) {
    return new AppError(
      'conflict',
      'Somebody else began to use one of the rows, or took away what it belongs to, at this moment. Nothing was written; try again to see which.',
      { cause },
    );
  }
  if (isLockConflict(cause)) {
    return new AppError(
      'conflict',
      'Somebody else is changing the same rows at this moment. Nothing was written; try again.',
      { cause },
    );
  }
  return cause;
}

const entryOf = (principal: SitePrincipal, found: RegisterImport) => ({
  siteId: principal.siteId,
  userId: principal.userId,
  objectType: 'register-import',
  objectId: found.id,
  details: {
    kind: found.kind,
    fileName: found.fileName,
    new: found.newCount,
    changed: found.changedCount,
  },
});
