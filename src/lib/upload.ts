import type { z } from 'zod';
import { ApiError } from './api-error.ts';
import { readError, unreachable } from './read-error.ts';
import { refreshSession } from './session-refresh.ts';

export interface UploadOptions {
  signal?: AbortSignal;
  /** Bytes of the whole body sent so far. `totalBytes` is a little more than the file. */
  onProgress?: (sentBytes: number, totalBytes: number) => void;
}

/**
 * Sends a form with files. `fetch` tells no upload progress, so this is the one XMLHttpRequest.
 *
 * @throws {ApiError} as `request`; a DOMException named AbortError where `signal` stopped it
 */
export async function upload<Schema extends z.ZodType>(
  path: string,
  form: FormData,
  response: Schema,
  options: UploadOptions = {},
): Promise<z.output<Schema>> {
  let answer = await post(path, form, options);
  if (answer.status === 401 && (await refreshSession())) answer = await post(path, form, options);
  if (answer.status < 200 || answer.status > 299) throw readError(answer.status, answer.text);
  const parsed = response.safeParse(JSON.parse(answer.text === '' ? 'null' : answer.text));
  if (parsed.success) return parsed.data;
  throw new ApiError('unreadable', 'The server’s answer could not be read. Reload the page.', {
    status: answer.status,
    cause: parsed.error,
  });
}

function post(
  path: string,
  form: FormData,
  { signal, onProgress }: UploadOptions,
): Promise<{ status: number; text: string }> {
  return new Promise((resolve, reject) => {
    const aborted = () => new DOMException('The upload was stopped.', 'AbortError');
    if (signal?.aborted) {
      reject(aborted());
      return;
    }
    const xhr = new XMLHttpRequest();
    const stop = () => xhr.abort();
    const settle = (done: () => void) => {
      signal?.removeEventListener('abort', stop);
      done();
    };
    signal?.addEventListener('abort', stop);
    xhr.open('POST', path);
    xhr.setRequestHeader('accept', 'application/json');
    if (onProgress) {
      xhr.upload.onprogress = (event) => onProgress(event.loaded, event.total);
    }
    xhr.onload = () => settle(() => resolve({ status: xhr.status, text: xhr.responseText }));
    xhr.onerror = () => settle(() => reject(unreachable()));
    xhr.ontimeout = () => settle(() => reject(unreachable()));
    xhr.onabort = () => settle(() => reject(aborted()));
    xhr.send(form);
  });
}
