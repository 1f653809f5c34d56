import papa from 'papaparse';

const newline = '\r\n';

/** Spreadsheets take a file without it for the local eight-bit encoding. */
export const byteOrderMark = '\uFEFF';

/** Rows of finished cells as lines of a file: comma between cells, quotes where they are needed. */
export const csvText = (rows: string[][]): string => papa.unparse(rows, { newline }) + newline;
