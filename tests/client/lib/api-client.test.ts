import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { downloadFloat32, request, requestNothing, withQuery } from '#src/lib/api-client.ts';
import { ApiError } from '#src/lib/api-error.ts';

/** A server of a few answers; an address that is not among them fails the test. */
let answers: Record<string, (() => Response | Promise<Response>)[]> = {};
let asked: { address: string; init: RequestInit | undefined }[] = [];
const realFetch = globalThis.fetch;

function json(status: number, body: unknown): () => Response {
  return () => new Response(JSON.stringify(body), { status });
}

const refused = (status: number, code: string) =>
  json(status, { error: { code, message: `Refused: ${code}`, id: 'e-1' } });

beforeEach(() => {
  answers = {};
  asked = [];
  globalThis.fetch = async (input, init) => {
    const address = `${init?.method ?? 'GET'} ${String(input)}`;
    asked.push({ address, init });
    const answer = answers[address]?.shift();
    if (answer === undefined) throw new Error(`unknown request ${address}`);
    return answer();
  };
});
afterEach(() => {
  globalThis.fetch = realFetch;
});

const machine = z.object({ id: z.int(), tag: z.string() });

async function errorOf(promise: Promise<unknown>): Promise<ApiError> {
  const error: unknown = await promise.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (error instanceof ApiError) return error;
  throw new Error(`no ApiError but ${String(error)}`);
}

describe('a request', () => {
  it('reads the answer by its contract', async () => {
    answers['GET /api/machines/1'] = [json(200, { id: 1, tag: 'P-1', extra: true })];
    expect(await request('/api/machines/1', machine)).toEqual({ id: 1, tag: 'P-1' });
  });

  it('sends its body as JSON', async () => {
    answers['POST /api/machines'] = [json(201, { id: 2, tag: 'P-2' })];
    await request('/api/machines', machine, { method: 'POST', body: { tag: 'P-2' } });
    expect(asked[0]?.init?.body).toBe('{"tag":"P-2"}');
    expect(new Headers(asked[0]?.init?.headers).get('content-type')).toBe('application/json');
  });

  it('refuses an answer that the contract does not know', async () => {
    answers['GET /api/machines/1'] = [json(200, { id: 'one' })];
    expect((await errorOf(request('/api/machines/1', machine))).code).toBe('unreadable');
  });

  it('passes on the server’s words, fields and error id', async () => {
    answers['GET /api/machines/1'] = [
      json(422, {
        error: {
          code: 'validation',
          message: 'Mend the tag.',
          id: 'e-7',
          fields: [{ path: 'tag', message: 'Too long.' }],
        },
      }),
    ];
    const error = await errorOf(request('/api/machines/1', machine));
    expect(error).toMatchObject({ code: 'validation', message: 'Mend the tag.', id: 'e-7' });
    expect(error.fields).toEqual([{ path: 'tag', message: 'Too long.' }]);
  });

  it('says of a page that is no answer of ours what came', async () => {
    answers['GET /api/machines/1'] = [() => new Response('<h1>Bad gateway</h1>', { status: 502 })];
    const error = await errorOf(request('/api/machines/1', machine));
    expect(error.message).toBe('The server answered 502 without saying why.');
  });

  it('says that the server can’t be reached', async () => {
    answers['GET /api/machines/1'] = [() => Promise.reject(new TypeError('Failed to fetch'))];
    expect((await errorOf(request('/api/machines/1', machine))).code).toBe('unreachable');
  });

  it('leaves an aborted request an AbortError, which nobody is told of', async () => {
    const stop = new AbortController();
    answers['GET /api/machines/1'] = [
      () => {
        stop.abort();
        return Promise.reject(stop.signal.reason);
      },
    ];
    await expect(
      request('/api/machines/1', machine, { signal: stop.signal }),
    ).rejects.toMatchObject({ name: 'AbortError' });
  });
});

describe('an ended session', () => {
  it('is renewed once for all requests that met it, and they are sent again', async () => {
    const ended = refused(401, 'not_signed_in');
    answers['GET /api/machines/1'] = [ended, json(200, { id: 1, tag: 'P-1' })];
    answers['GET /api/machines/2'] = [ended, json(200, { id: 2, tag: 'P-2' })];
    answers['POST /api/session/refresh'] = [() => new Response(null, { status: 204 })];
    const both = await Promise.all([
      request('/api/machines/1', machine),
      request('/api/machines/2', machine),
    ]);
    expect(both.map((one) => one.tag)).toEqual(['P-1', 'P-2']);
    expect(asked.filter(({ address }) => address.includes('refresh'))).toHaveLength(1);
  });

  it('is told as such where it can’t be renewed', async () => {
    answers['GET /api/machines/1'] = [refused(401, 'not_signed_in')];
    answers['POST /api/session/refresh'] = [refused(401, 'not_signed_in')];
    expect((await errorOf(request('/api/machines/1', machine))).code).toBe('not_signed_in');
  });

  it('is not looked for when signing in is what failed', async () => {
    answers['POST /api/session'] = [refused(401, 'wrong_credentials')];
    const signIn = requestNothing('/api/session', { method: 'POST', body: {} });
    expect((await errorOf(signIn)).code).toBe('wrong_credentials');
    expect(asked).toHaveLength(1);
  });
});

describe('downloading samples', () => {
  it('reads 32-bit floats', async () => {
    const samples = Float32Array.from([1.5, -2, 0.25]);
    answers['GET /api/waveforms/3/samples?channel=0'] = [() => new Response(samples.buffer)];
    const read = await downloadFloat32('/api/waveforms/3/samples', { query: { channel: 0 } });
    expect([...read]).toEqual([1.5, -2, 0.25]);
  });

  it('refuses what arrived incomplete', async () => {
    answers['GET /api/waveforms/3/samples'] = [() => new Response(new Uint8Array(7))];
    const error = await errorOf(downloadFloat32('/api/waveforms/3/samples'));
    expect(error.message).toMatch(/incomplete/u);
  });
});

describe('withQuery', () => {
  it('writes what is set and leaves out what is not', () => {
    const query = { search: 'P 1', page: 2, active: false, state: undefined, sort: '', x: null };
    expect(withQuery('/api/findings', query)).toBe('/api/findings?search=P+1&page=2&active=false');
    expect(withQuery('/api/findings', {})).toBe('/api/findings');
  });
});
