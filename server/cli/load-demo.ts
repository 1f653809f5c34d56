import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { pino } from 'pino';
import { compose } from '#server/compose.ts';
import { readConfig } from '#server/config/config.ts';
import { writeDemoAccounts } from '#server/config/demo-accounts.ts';
import { readEnvironment } from '#server/config/environment.ts';
import { createDataSource } from '#server/db/data-source.ts';
import { emptyTables } from '#server/db/empty-tables.ts';
import { runMigrations } from '#server/db/run-migrations.ts';
import { DemoClock } from './demo/demo-clock.ts';
import { loadPeople, loadRegister } from './demo/load-register.ts';
import { monitorFan, repairAgitator, reviewSurvey, verifyAgitator } from './demo/load-story.ts';
import { loadSurvey, waveformMakers } from './demo/load-surveys.ts';

/** Fills an empty database with the demo scenario; leaves any other as it is. */
async function loadDemo(): Promise<string> {
  const config = readConfig(readEnvironment().variables);
  const dataSource = createDataSource({
    url: config.databaseUrl,
    ...(config.databaseSocketPath === undefined ? {} : { socketPath: config.databaseSocketPath }),
  });
  await dataSource.initialize();
  await runMigrations(dataSource);
  const clock = new DemoClock();
  clock.set('2026-09-01T08:00:00Z');
  const product = compose(config, dataSource, pino({ level: 'error' }), {
    publicUrl: () => config.publicUrl ?? `http://${config.host}:${config.port}`,
    now: clock.now,
  });
  const { services, queue } = product;
  // Stands while the demo is being loaded: what a broken-off load left is taken out again.
  const unfinished = join(config.dataDirectory, 'demo-unfinished');
  try {
    if (existsSync(unfinished)) await emptyTables(dataSource);
    if (!(await services.administration.isEmpty())) return 'there already';
    mkdirSync(config.dataDirectory, { recursive: true, mode: 0o700 });
    writeFileSync(unfinished, '');
    const people = await loadPeople(services.administration);
    const { routeId } = await loadRegister(services, people);
    const analyst = people.principal('analyst');
    const lead = people.principal('lead');
    const owner = people.principal('waterOwner');
    const makers = waveformMakers();
    await queue.start();

    clock.set('2026-09-28T13:00:00Z');
    const first = await loadSurvey(product, makers, analyst, routeId, 0);
    clock.set('2026-09-29T07:30:00Z');
    await reviewSurvey(services, analyst, first);
    await repairAgitator(services, { lead, owner }, clock);

    clock.set('2026-10-26T13:00:00Z');
    const second = await loadSurvey(product, makers, analyst, routeId, 1);
    clock.set('2026-10-27T07:30:00Z');
    await reviewSurvey(services, analyst, second);
    await verifyAgitator(services, lead, clock);
    await monitorFan(services, lead, clock);

    // The flags of the last survey wait for whoever tries the demo.
    clock.set('2026-11-23T13:00:00Z');
    await loadSurvey(product, makers, analyst, routeId, 2);
    await makers.destroy();
    writeDemoAccounts(config.dataDirectory, people.accounts);
    rmSync(unfinished);
    return 'loaded';
  } finally {
    await queue.stop();
    await dataSource.destroy();
  }
}

loadDemo()
  .then((outcome) => process.stdout.write(`${outcome}\n`))
  .catch((error: unknown) => {
    process.stderr.write(
      `${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
    );
    process.exitCode = 1;
  });
