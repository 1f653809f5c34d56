import { CsvError } from './csv-error.ts';
import { maxLineBytes, maxPreambleBytes } from './csv-limits.ts';
import { endOfLine } from './line-end.ts';
import { decodeUtf8 } from './utf8.ts';

export interface Line {
  text: string;
  from: number;
  /** Index behind the line end. */
  next: number;
  number: number;
}

/** Walks the lines before the rows; lines end as `endOfLine` says. */
export class LineCursor {
  private at: number;
  private number = 0;

  constructor(
    private readonly bytes: Uint8Array,
    private readonly start: number,
    private readonly final: boolean,
  ) {
    this.at = start;
  }

  skip(lines: number): void {
    for (let i = 0; i < lines && this.at < this.bytes.length; i += 1) this.step();
  }

  /** @returns the next line; null at the end of the file */
  next(): Line | null {
    if (this.at >= this.bytes.length) return null;
    const from = this.at;
    const end = this.step();
    const text = decodeUtf8(this.bytes, from, end);
    if (text === null) {
      throw new CsvError(
        'not-utf-8',
        this.number,
        'The line holds bytes that are not UTF-8; expected UTF-8 text. Save the file as ' +
          '"CSV UTF-8" and send it again.',
      );
    }
    return { text, from, next: this.at, number: this.number };
  }

  /** @returns index of the line's end */
  private step(): number {
    const { bytes } = this;
    const from = this.at;
    let end = from;
    while (end < bytes.length && bytes[end] !== 10 && bytes[end] !== 13) end += 1;
    this.number += 1;
    if (end - from > maxLineBytes) {
      throw new CsvError(
        'line-too-long',
        this.number,
        `The line is longer than ${maxLineBytes} bytes; expected a comment, a header or a row of ` +
          'numbers. Export the samples one row a line.',
      );
    }
    const next = endOfLine(bytes, end, bytes.length, this.final);
    this.at = next < 0 ? bytes.length : next;
    if (this.at - this.start > maxPreambleBytes) {
      throw new CsvError(
        'too-many-comments',
        this.number,
        `More than ${maxPreambleBytes} bytes stand before the first row of numbers; expected a ` +
          'few comment lines and one header row. Shorten them.',
      );
    }
    return end;
  }
}
