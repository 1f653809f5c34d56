import { get } from 'node:http';
import type { AddressInfo } from 'node:net';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import express from 'express';
import { pino } from 'pino';
import { describe, expect, it } from 'vitest';
import { errorAnswer } from '#server/http/error-answer.ts';

describe('a browser that leaves in the middle of a download', () => {
  it('is no failure of the server', async () => {
    const logged: string[] = [];
    const app = express();
    let ended: () => void = () => undefined;
    const over = new Promise<void>((resolve) => (ended = resolve));
    app.get('/endless', async (_req, res) => {
      const chunks = (function* () {
        for (;;) yield Buffer.alloc(65_536);
      })();
      await pipeline(Readable.from(chunks), res).finally(() => setImmediate(ended));
    });
    app.use(errorAnswer(pino({ level: 'debug' }, { write: (line) => void logged.push(line) })));
    const server = app.listen(0, '127.0.0.1');
    await new Promise((resolve) => server.once('listening', resolve));
    const { port } = server.address() as AddressInfo;
    const request = get({ host: '127.0.0.1', port, path: '/endless' }, (answer) =>
      answer.once('data', () => request.destroy()),
    );
    request.on('error', () => undefined);
    await over;
    server.close();
    expect(logged.join('')).toContain('the browser left');
    expect(logged.join('')).not.toContain('request failed');
  });
});
