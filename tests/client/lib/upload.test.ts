import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { ApiError } from '#src/lib/api-error.ts';
import { upload } from '#src/lib/upload.ts';

/** A real server on loopback: jsdom's XMLHttpRequest talks to it as a browser's would. */
let server: Server;
let base = '';
const received: { path: string; bytes: number }[] = [];

beforeAll(async () => {
  server = createServer((req, res) => {
    let bytes = 0;
    req.on('data', (chunk: Buffer) => (bytes += chunk.length));
    req.on('end', () => {
      received.push({ path: req.url ?? '', bytes });
      res.setHeader('access-control-allow-origin', '*');
      res.setHeader('access-control-allow-headers', '*');
      if (req.url === '/too-large') {
        res.statusCode = 413;
        const error = { code: 'too_large', message: 'The file is too large.', id: 'e-3' };
        res.end(JSON.stringify({ error }));
      } else if (req.url === '/never') {
        // The test stops this one.
      } else {
        res.end(JSON.stringify({ bytes }));
      }
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
});
afterAll(() => {
  server.closeAllConnections();
  server.close();
});

const answer = z.object({ bytes: z.int() });

function aForm(): FormData {
  const form = new FormData();
  form.append('file', new File(['x'.repeat(5000)], 'p.csv'));
  return form;
}

describe('an upload', () => {
  it('tells its progress and reads the answer', async () => {
    const progress: [number, number][] = [];
    const result = await upload(`${base}/files`, aForm(), answer, {
      onProgress: (sent, total) => progress.push([sent, total]),
    });
    expect(result.bytes).toBeGreaterThan(5000);
    const last = progress[progress.length - 1];
    expect(last?.[0]).toBe(last?.[1]);
    expect(last?.[0]).toBeGreaterThan(5000);
  });

  it('passes on the server’s refusal', async () => {
    const refused = upload(`${base}/too-large`, aForm(), answer);
    await expect(refused).rejects.toMatchObject({
      name: 'ApiError',
      code: 'too_large',
      message: 'The file is too large.',
    });
  });

  it('can be stopped', async () => {
    const stop = new AbortController();
    const stopped = upload(`${base}/never`, aForm(), answer, { signal: stop.signal });
    setTimeout(() => stop.abort(), 30);
    await expect(stopped).rejects.toMatchObject({ name: 'AbortError' });
  });

  it('is not begun once stopped', async () => {
    const before = received.length;
    const signal = AbortSignal.abort();
    await expect(upload(`${base}/files`, aForm(), answer, { signal })).rejects.toMatchObject({
      name: 'AbortError',
    });
    expect(received.length).toBe(before);
  });

  it('says that the server can’t be reached', async () => {
    // Port 9 on loopback is closed here as everywhere; jsdom reports the refusal on its console.
    const error: unknown = await upload('http://127.0.0.1:9/', aForm(), answer).catch(
      (reason: unknown) => reason,
    );
    expect(error).toBeInstanceOf(ApiError);
    expect(error).toMatchObject({ code: 'unreachable' });
  });
});
