import { CsvError, quoteFound } from './csv-error.ts';
import { maxSampleRateHz, maxSpeedRpm } from './csv-limits.ts';
import { commentKeys, type CommentKey, type WaveformComments } from './waveform-csv.ts';

type TextKey = 'asset' | 'point' | 'asset_kind';
type NumberKey = Exclude<CommentKey, TextKey | 'taken_at'>;

const numberKeys: Readonly<Record<NumberKey, { max: number; unit: string }>> = {
  speed_rpm: { max: maxSpeedRpm, unit: 'r/min' },
  sample_rate_hz: { max: maxSampleRateHz, unit: 'Hz' },
  full_scale: { max: 1e12, unit: 'the unit of the samples' },
  // Aircraft and ship supplies run at 400 Hz; converters are not meant by this key.
  line_frequency_hz: { max: 1000, unit: 'Hz' },
};

const longestText = 200;

/** Gathers the comment lines of one file and holds each against what was said before. */
export class CommentLines {
  private readonly found = new Map<CommentKey, { value: string | number; line: number }>();
  /** Comment lines taken, remarks without a key included. */
  count = 0;
  private readonly other: { key: string; value: string; line: number }[] = [];

  /**
   * Takes one comment line.
   *
   * @param text - the line from its `#` on, without its line end
   * @throws {CsvError} `bad-comment` where one of the eight keys has no valid value,
   *   `contradictory-comments` where the key was there before with another value
   */
  add(text: string, line: number): void {
    this.count += 1;
    // A spreadsheet pads comment lines to the width of the table.
    const content = text.slice(1).replace(/[,;\t ]+$/u, '');
    const colon = content.indexOf(':');
    if (colon < 0) return;
    const key = content.slice(0, colon).trim().toLowerCase();
    const value = content.slice(colon + 1).trim();
    if (!isCommentKey(key)) {
      this.other.push({ key: content.slice(0, colon).trim(), value, line });
      return;
    }
    const parsed = parseValue(key, value, line);
    const before = this.found.get(key);
    if (before === undefined) {
      this.found.set(key, { value: parsed, line });
    } else if (before.value !== parsed) {
      throw new CsvError(
        'contradictory-comments',
        line,
        `${key} is ${quoteFound(value)} here and ${quoteFound(String(before.value))} on line ` +
          `${before.line}; expected one value. Delete the wrong line.`,
      );
    }
  }

  /** @returns everything said; a key that wasn't there is absent */
  finish(): WaveformComments {
    const text = (key: TextKey | 'taken_at') => this.found.get(key)?.value as string | undefined;
    const number = (key: NumberKey) => this.found.get(key)?.value as number | undefined;
    const comments: WaveformComments = {
      asset: text('asset'),
      point: text('point'),
      takenAt: text('taken_at'),
      speedRpm: number('speed_rpm'),
      sampleRateHz: number('sample_rate_hz'),
      fullScale: number('full_scale'),
      lineFrequencyHz: number('line_frequency_hz'),
      assetKind: text('asset_kind'),
      other: this.other,
    };
    for (const key of Object.keys(comments) as (keyof WaveformComments)[]) {
      if (comments[key] === undefined) delete comments[key];
    }
    return comments;
  }

  /** Line on which a key was said, for errors found later; null where it wasn't. */
  lineOf(key: CommentKey): number | null {
    return this.found.get(key)?.line ?? null;
  }
}

function isCommentKey(key: string): key is CommentKey {
  return (commentKeys as readonly string[]).includes(key);
}

function parseValue(key: CommentKey, value: string, line: number): string | number {
  if (key === 'taken_at') return parseMoment(value, line);
  if (key === 'asset' || key === 'point' || key === 'asset_kind') {
    if (value === '' || value.length > longestText || /\p{Cc}/u.test(value)) {
      throw new CsvError(
        'bad-comment',
        line,
        `${key} is ${quoteFound(value)}; expected a text of 1 to ${longestText} characters. ` +
          'Fill it in or delete the line.',
      );
    }
    return value;
  }
  return parseNumber(key, value, line);
}

function parseNumber(key: NumberKey, value: string, line: number): number {
  const { max, unit } = numberKeys[key];
  // `1480,5` can only be a decimal comma; `1,480` could be 1480 as well, and is refused.
  const plain = /^[+-]?\d+,(?!\d{3}$)\d+$/u.test(value) ? value.replace(',', '.') : value;
  const number = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/iu.test(plain) ? Number(plain) : NaN;
  if (!(number > 0 && number <= max)) {
    throw new CsvError(
      'bad-comment',
      line,
      `${key} is ${quoteFound(value)}; expected a number in ${unit} above 0 and at most ${max}, ` +
        'with a decimal point and nothing behind it. Correct it or delete the line.',
    );
  }
  return number;
}

const momentPattern =
  /^(\d{4})-(\d{2})-(\d{2})(?:[T ](\d{2}):(\d{2})(?::(\d{2})(?:[.,]\d{1,9})?)?(Z|[+-]\d{2}(?::?\d{2})?)?)?$/u;

function parseMoment(value: string, line: number): string {
  const parts = momentPattern.exec(value);
  if (parts !== null) {
    const [year, month, day, hour, minute, second] = parts
      .slice(1, 7)
      .map((part) => Number(part ?? 0));
    const date = new Date(Date.UTC(year!, month! - 1, day!));
    const exists = date.getUTCMonth() === month! - 1 && date.getUTCDate() === day!;
    if (exists && year! >= 1900 && hour! < 24 && minute! < 60 && second! < 61) return value;
  }
  throw new CsvError(
    'bad-comment',
    line,
    `taken_at is ${quoteFound(value)}; expected a moment in ISO 8601, e.g. 2026-03-14T09:30:00Z. ` +
      'Correct it or delete the line.',
  );
}
