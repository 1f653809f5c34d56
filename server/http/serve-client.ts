import { join } from 'node:path';
import express, { type Express } from 'express';

/** Serves the built client; every address that is not a file answers with the one page. */
export function serveClient(app: Express, directory: string): void {
  app.use(
    '/assets',
    express.static(join(directory, 'assets'), {
      immutable: true,
      maxAge: '1y',
      fallthrough: false,
    }),
  );
  app.use(express.static(directory, { index: false }));
  app.get('/{*rest}', (_req, res) => {
    res.set('Cache-Control', 'no-cache').sendFile(join(directory, 'index.html'));
  });
}
