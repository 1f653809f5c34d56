import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decodeUtf8, encodeUtf8 } from '#shared/signal/csv/utf8.ts';

describe('UTF-8 by hand', () => {
  it('encodes and decodes every text as the platform does', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (text) => {
        const bytes = encodeUtf8(text);
        expect(bytes).toEqual(new TextEncoder().encode(text));
        const plain = new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes);
        expect(decodeUtf8(bytes, 0, bytes.length)).toBe(plain);
      }),
      { numRuns: 500, seed: 41 },
    );
  });

  it('takes the same bytes for UTF-8 as the platform does', () => {
    const strict = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });
    const expected = (bytes: Uint8Array) => {
      try {
        return strict.decode(bytes);
      } catch {
        return null;
      }
    };
    const byte = fc.constantFrom(
      0x41,
      0x7f,
      0x80,
      0x8f,
      0x90,
      0x9f,
      0xa0,
      0xbf,
      0xc0,
      0xc1,
      0xc2,
      0xdf,
      0xe0,
      0xe1,
      0xed,
      0xef,
      0xf0,
      0xf1,
      0xf4,
      0xf5,
      0xff,
    );
    fc.assert(
      fc.property(fc.array(byte, { minLength: 1, maxLength: 6 }), (values) => {
        const bytes = Uint8Array.from(values);
        expect(decodeUtf8(bytes, 0, bytes.length)).toBe(expected(bytes));
      }),
      { numRuns: 20_000, seed: 42 },
    );
  });
});
