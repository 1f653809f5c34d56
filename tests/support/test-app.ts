import { tmpdir } from 'node:os';
import { pino } from 'pino';
import request, { type Test } from 'supertest';
import type { DataSource } from 'typeorm';
import { accessCookie, signAccessToken } from '#server/auth/access-token.ts';
import { compose } from '#server/compose.ts';
import { readConfig } from '#server/config/config.ts';
import { createApp } from '#server/http/create-app.ts';

export const testPublicUrl = 'https://fretline.example';
export const testAuthSecret = 'a secret of the tests, long enough to sign with';

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
type Caller = Record<Method, (path: string, body?: object) => Test>;

const apps = new WeakMap<DataSource, ReturnType<typeof wireTestApp>>();

/** The whole application over a test database, without its background work; one for each file of tests. */
export function buildTestApp(dataSource: DataSource, dataDirectory = tmpdir()) {
  const known = apps.get(dataSource) ?? wireTestApp(dataSource, dataDirectory);
  apps.set(dataSource, known);
  return known;
}

function wireTestApp(dataSource: DataSource, dataDirectory: string) {
  const config = readConfig({
    DATABASE_URL: 'mysql://unused@localhost/unused',
    DATA_DIR: dataDirectory,
    AUTH_SECRET: testAuthSecret,
    LOG_LEVEL: 'silent',
  });
  const logger = pino({ level: 'silent' });
  const product = compose(config, dataSource, logger, { publicUrl: () => testPublicUrl });
  const app = createApp({
    ...product.routeContext,
    routes: product.routes,
    logger,
    signInLimit: 1000,
  });
  const caller = (cookie: string | null): Caller => {
    const call =
      (method: Method) =>
      (path: string, body?: object): Test => {
        const asked = request(app)[method](path);
        if (cookie !== null) void asked.set('cookie', cookie);
        return body === undefined ? asked : asked.send(body);
      };
    return {
      get: call('get'),
      post: call('post'),
      put: call('put'),
      patch: call('patch'),
      delete: call('delete'),
    };
  };
  return {
    product,
    /** Calls as this person, who has signed in. */
    as: (user: { id: number }) =>
      caller(`${accessCookie}=${signAccessToken(user.id, testAuthSecret, 600)}`),
    signedOut: caller(null),
  };
}
