import { existsSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { pino } from 'pino';
import { compose } from './compose.ts';
import { ConfigError, readConfig } from './config/config.ts';
import { readDemoAccounts } from './config/demo-accounts.ts';
import { readEnvironment } from './config/environment.ts';
import { createDataSource } from './db/data-source.ts';
import { runMigrations } from './db/run-migrations.ts';
import type { AdministrationService } from './features/administration/administration.service.ts';
import { createApp } from './http/create-app.ts';

const signInLimit = 20;

/** An empty installation without demo data needs somebody who can make the first site. */
async function tellFirstAdministrator(administration: AdministrationService): Promise<void> {
  const first = await administration.createFirstAdministrator();
  if (first === null) return;
  process.stdout.write(
    `First administrator: ${first.email}, password ${first.password} (shown this once)\n`,
  );
}

async function main(): Promise<void> {
  const environment = readEnvironment();
  const config = readConfig(environment.variables);
  const logger = pino({ level: config.logLevel });
  const dataSource = createDataSource({
    ...(config.databaseSocketPath === undefined ? {} : { socketPath: config.databaseSocketPath }),
    url: config.databaseUrl,
  });
  await dataSource.initialize();
  await runMigrations(dataSource);

  let publicUrl = config.publicUrl ?? `http://${config.host}:${config.port}`;
  const product = compose(config, dataSource, logger, {
    demoAccounts: config.demo ? readDemoAccounts(config.dataDirectory) : [],
    publicUrl: () => publicUrl,
  });
  if (!config.demo) await tellFirstAdministrator(product.services.administration);
  const clientDirectory = join(environment.projectDirectory, 'dist/client');
  const app = createApp({
    ...product.routeContext,
    routes: product.routes,
    logger,
    signInLimit,
    ...(existsSync(join(clientDirectory, 'index.html')) ? { clientDirectory } : {}),
  });
  const server = createServer(app);
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(config.port, config.host, resolve);
  });
  const { port } = server.address() as AddressInfo;
  if (config.publicUrl === undefined) publicUrl = `http://${config.host}:${port}`;
  await product.start();
  process.stdout.write(`listening on http://${config.host}:${port}\n`);

  let stopping = false;
  const stop = async () => {
    if (stopping) return;
    stopping = true;
    server.closeIdleConnections();
    const closed = new Promise((resolve) => server.close(resolve));
    // A browser's kept-alive connection must not hold up the end.
    setTimeout(() => server.closeAllConnections(), 1_000).unref();
    await closed;
    await product.stop();
    await dataSource.destroy();
    process.exit(0);
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
    process.on(signal, () => void stop());
  }
}

main().catch((error: unknown) => {
  if (error instanceof ConfigError) {
    process.stderr.write(`${error.message}\n`);
  } else if ((error as { code?: string }).code === 'EADDRINUSE') {
    process.stderr.write(
      'The port is taken by another program. Set PORT to a free one and start again.\n',
    );
  } else {
    process.stderr.write(
      `The server could not start: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
    );
  }
  process.exit(1);
});
