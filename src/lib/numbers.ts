const minus = '−';

/** Rounded to `digits` decimals, with a real minus sign and no "-0". */
export function formatFixed(value: number, digits: number): string {
  const text = Math.abs(value).toFixed(digits);
  return value < 0 && Number(text) !== 0 ? minus + text : text;
}

/** As `formatFixed`, with the sign always written: fits and deviations read wrong without. */
export function formatSigned(value: number, digits: number): string {
  const text = formatFixed(value, digits);
  return Number(Math.abs(value).toFixed(digits)) === 0 || text.startsWith(minus)
    ? text
    : `+${text}`;
}

/** To `figures` significant figures, without exponent between 0.001 and a million. */
export function formatSignificant(value: number, figures = 3): string {
  if (value === 0) return '0';
  if (!Number.isFinite(value)) return '–';
  const rounded = Number(value.toPrecision(figures));
  const magnitude = Math.floor(Math.log10(Math.abs(rounded)));
  if (magnitude < -4 || magnitude > 6) {
    return rounded.toExponential(figures - 1).replaceAll('-', minus);
  }
  return formatFixed(rounded, Math.max(0, figures - 1 - magnitude));
}

/** "1.2 MB"; powers of 1000. */
export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${bytes} B`;
  const units = ['kB', 'MB', 'GB', 'TB'];
  let value = bytes / 1000;
  let unit = 0;
  while (value >= 999.5 && unit < units.length - 1) {
    value /= 1000;
    unit += 1;
  }
  return `${value < 9.95 ? value.toFixed(1) : value.toFixed(0)} ${units[unit]}`;
}

/**
 * Reads a number as people type it: decimal point or comma, a real minus sign, blanks around.
 *
 * @returns undefined for an empty field, NaN for text that is no number (zod then says so)
 */
export function parseDecimal(text: unknown): number | undefined {
  if (typeof text === 'number') return text;
  if (typeof text !== 'string' || text.trim() === '') return undefined;
  const plain = text.trim().replace(minus, '-').replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/iu.test(plain) ? Number(plain) : Number.NaN;
}

/** A value somebody entered, as they entered it: up to six significant figures, no added zeros. */
export function formatEntered(value: number): string {
  return formatFixed(Number(value.toPrecision(6)), decimalsOf(Number(value.toPrecision(6))));
}

function decimalsOf(value: number): number {
  const [, decimals = ''] = String(value).split('.');
  return /e/.test(decimals) ? 6 : decimals.length;
}
