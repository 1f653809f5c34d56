import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isGapText, NumberScanner } from '#shared/signal/csv/number-scanner.ts';

/** What the scanner makes of a text that is one number; undefined where it is not taken whole. */
function scanned(text: string, mark: '.' | ',' = '.'): number | undefined {
  const scanner = new NumberScanner();
  scanner.mark = mark.charCodeAt(0);
  return scanner.scanText(text) ? scanner.value : undefined;
}

const digitText = (min: number, max: number) =>
  fc.stringMatching(new RegExp(`^[0-9]{${min},${max}}$`, 'u'));

/** Any number as people and programs write it, up to 45 digits. */
const numberText = fc
  .record({
    sign: fc.constantFrom('', '-', '+'),
    whole: digitText(0, 22),
    fraction: fc.option(digitText(0, 23)),
    exponent: fc.option(
      fc.tuple(fc.constantFrom('e', 'E', 'e+', 'e-', 'E-'), fc.integer({ min: 0, max: 340 })),
    ),
  })
  .filter(({ whole, fraction }) => whole.length + (fraction?.length ?? 0) > 0)
  .map(
    ({ sign, whole, fraction, exponent }) =>
      sign +
      whole +
      (fraction === null ? '' : `.${fraction}`) +
      (exponent === null ? '' : exponent[0] + String(exponent[1])),
  );

describe('NumberScanner', () => {
  it('reads every way of writing a number that a recorder uses', () => {
    const texts = ['0', '-0', '+0.5', '.5', '5.', '-.5e1', '1e-3', '1E+05', '007', '0.1', '1.e2'];
    for (const text of texts) expect(scanned(text), text).toBe(Number(text));
  });

  it('equals Number() bit for bit on any text of digits, mark and exponent', () => {
    fc.assert(
      fc.property(numberText, (text) => {
        expect(scanned(text)).toBe(Number(text));
      }),
      { numRuns: 20_000, seed: 11 },
    );
  });

  it('gives back every double that is printed in its shortest form', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        expect(scanned(String(value))).toBe(Number(String(value)));
      }),
      { numRuns: 20_000, seed: 12 },
    );
  });

  it('gives back doubles printed with 15 to 19 digits, as measurement programs print them', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e4, max: 1e4, noNaN: true }),
        fc.integer({ min: 14, max: 18 }),
        (value, digits) => {
          for (const text of [value.toExponential(digits), value.toFixed(digits)]) {
            expect(scanned(text)).toBe(Number(text));
          }
        },
      ),
      { numRuns: 20_000, seed: 13 },
    );
  });

  it('rounds numbers half way between two doubles, and just beside, as Number() does', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 2 ** 52, max: 2 ** 53 - 2 }),
        fc.integer({ min: -30, max: 4 }),
        fc.constantFrom('', '0000000001', '000000000000001'),
        (whole, power, beside) => {
          // whole + 0.5 lies half way between two neighbouring doubles; the power moves the point.
          for (const text of [`${whole}.5${beside}e${power}`, `${whole}.4999999999999e${power}`]) {
            expect(scanned(text)).toBe(Number(text));
          }
        },
      ),
      { numRuns: 5_000, seed: 14 },
    );
  });

  it('reads a decimal comma as it reads a point', () => {
    fc.assert(
      fc.property(numberText, (text) => {
        expect(scanned(text.replace('.', ','), ',')).toBe(Number(text));
      }),
      { numRuns: 2_000, seed: 15 },
    );
  });

  it('takes nothing that is no number', () => {
    for (const text of [
      '',
      '-',
      '.',
      '+.',
      'e5',
      '1e',
      '1e+',
      '0x10',
      '1_000',
      '1.2.3',
      '--1',
      '−1',
    ]) {
      expect(scanned(text), text).toBeUndefined();
    }
  });

  it('takes neither mark of a number with thousands', () => {
    expect(scanned('1,234.5', '.')).toBeUndefined();
    expect(scanned('1.234,5', ',')).toBeUndefined();
  });
});

describe('isGapText', () => {
  it('knows the ways of writing that there is no number', () => {
    for (const text of ['', 'NaN', 'nan', '-inf', 'Infinity', '+INF', '1.#QNAN', '-1.#IND00']) {
      expect(isGapText(text), text).toBe(true);
    }
  });

  it('takes no other word for a gap', () => {
    for (const text of ['0', 'na', 'null', 'nano', 'infinite', 'x']) {
      expect(isGapText(text), text).toBe(false);
    }
  });
});
