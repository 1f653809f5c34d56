import type { z } from 'zod';
import { ApiError } from './api-error.ts';
import { readError, unreachable } from './read-error.ts';
import { refreshSession } from './session-refresh.ts';

export type QueryValues = Readonly<Record<string, string | number | boolean | null | undefined>>;

interface RequestOptions {
  method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  query?: QueryValues;
  /** Sent as JSON. */
  body?: unknown;
  signal?: AbortSignal;
}

/** Addresses at which a 401 is an answer and not an ended session. */
const sessionPath = '/api/session';

/** Appends what is set of `query` to `path`. */
export function withQuery(path: string, query: QueryValues = {}): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value !== undefined && value !== null && value !== '') search.set(name, String(value));
  }
  const text = search.toString();
  return text === '' ? path : `${path}?${text}`;
}

/**
 * Asks the API and reads the answer by its contract.
 *
 * @throws {ApiError} refused, unreachable, or an answer the contract does not know
 */
export async function request<Schema extends z.ZodType>(
  path: string,
  response: Schema,
  options: RequestOptions = {},
): Promise<z.output<Schema>> {
  const answer = await send(path, options);
  const text = await answer.text().catch((cause: unknown) => {
    throw asRequestError(cause, options.signal);
  });
  const parsed = response.safeParse(text === '' ? undefined : safeJson(text));
  if (parsed.success) return parsed.data;
  throw new ApiError('unreadable', 'The server’s answer could not be read. Reload the page.', {
    status: answer.status,
    cause: parsed.error,
  });
}

/** As `request`, for answers without content. */
export async function requestNothing(path: string, options: RequestOptions = {}): Promise<void> {
  await send(path, options);
}

/** Loads a file, to be saved by the person who asked for it. */
export async function downloadFile(path: string, accept: string): Promise<Blob> {
  const answer = await send(path, {}, accept);
  return answer.blob().catch((cause: unknown) => {
    throw asRequestError(cause, undefined);
  });
}

/** Loads samples or spectrum lines: little-endian 32-bit floats, nothing else. */
export async function downloadFloat32(
  path: string,
  options: Pick<RequestOptions, 'query' | 'signal'> = {},
): Promise<Float32Array<ArrayBuffer>> {
  const answer = await send(path, options, 'application/octet-stream');
  const buffer = await answer.arrayBuffer().catch((cause: unknown) => {
    throw asRequestError(cause, options.signal);
  });
  if (buffer.byteLength % 4 !== 0) {
    throw new ApiError('unreadable', 'The samples arrived incomplete. Load them again.', {
      status: answer.status,
    });
  }
  return new Float32Array(buffer);
}

async function send(
  path: string,
  options: RequestOptions,
  accept = 'application/json',
): Promise<Response> {
  const answer = await attempt(path, options, accept);
  if (answer.ok) return answer;
  if (answer.status === 401 && path !== sessionPath && (await refreshSession())) {
    const again = await attempt(path, options, accept);
    if (again.ok) return again;
    throw readError(again.status, await again.text());
  }
  throw readError(answer.status, await answer.text());
}

async function attempt(path: string, options: RequestOptions, accept: string): Promise<Response> {
  const { method = 'GET', query, body, signal } = options;
  try {
    return await fetch(withQuery(path, query), {
      method,
      credentials: 'same-origin',
      headers: {
        accept,
        ...(body === undefined ? {} : { 'content-type': 'application/json' }),
      },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
      ...(signal ? { signal } : {}),
    });
  } catch (cause) {
    throw asRequestError(cause, signal);
  }
}

/** An aborted request stays an AbortError: nobody is to be told of it. */
function asRequestError(cause: unknown, signal: AbortSignal | undefined): unknown {
  return signal?.aborted ? cause : unreachable(cause);
}

function safeJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}
