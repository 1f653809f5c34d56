import { describe, expect, it } from 'vitest';
import { piecesOf } from '#src/features/demo-mailbox/components/mail-reader.tsx';

describe('a mail of the demo mailbox', () => {
  it('lets its own links lead into the program and no others', () => {
    const text =
      'Open: http://127.0.0.1:4173/sites/1/inspections/5\nSee http://evil.example/x too.';
    expect(piecesOf(text, ['/sites/1/inspections/5'])).toEqual([
      { text: 'Open: ', to: null },
      { text: 'http://127.0.0.1:4173/sites/1/inspections/5', to: '/sites/1/inspections/5' },
      { text: '\nSee ', to: null },
      { text: 'http://evil.example/x', to: null },
      { text: ' too.', to: null },
    ]);
  });
});
