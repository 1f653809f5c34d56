import { describe, expect, it } from 'vitest';
import { ApiError } from '#src/lib/api-error.ts';
import { shouldRetry } from '#src/lib/query-client.ts';

const fault = (code: ApiError['code'], status: number) => new ApiError(code, '', { status });

describe('asking again', () => {
  it('is done for a server that is away or at fault, twice at most', () => {
    expect(shouldRetry(0, fault('unreachable', 0))).toBe(true);
    expect(shouldRetry(1, fault('internal', 500))).toBe(true);
    expect(shouldRetry(2, fault('unreachable', 0))).toBe(false);
  });

  it('is not done for what the server has decided', () => {
    expect(shouldRetry(0, fault('not_found', 404))).toBe(false);
    expect(shouldRetry(0, fault('not_signed_in', 401))).toBe(false);
    expect(shouldRetry(0, new Error('a fault of this program'))).toBe(false);
  });
});
