import { contentWidth, ink, lineHeight, margin, type Sheet, type TextStyle } from './sheet.ts';

export interface TableColumn<Row> {
  header: string;
  /** Share of the width. */
  share: number;
  value: (row: Row) => string;
  align?: 'left' | 'right';
  style?: (row: Row) => TextStyle;
}

const gap = 6;
const size = 7.5;

/** A table over as many pages as it takes, its header on each of them. */
export function drawTable<Row>(
  sheet: Sheet,
  columns: readonly TableColumn<Row>[],
  rows: readonly Row[],
): void {
  const shares = columns.reduce((sum, { share }) => sum + share, 0);
  const room = contentWidth - gap * (columns.length - 1);
  const widths = columns.map(({ share }) => (share / shares) * room);
  const xs = widths.map(
    (_, index) => margin + widths.slice(0, index).reduce((sum, width) => sum + width + gap, 0),
  );
  const header = () => {
    columns.forEach(({ header: text, align }, index) => {
      sheet.textAt(text, xs[index] ?? margin, sheet.y, widths[index] ?? 0, {
        size: 6.5,
        color: ink.faint,
        maxLines: 2,
        ...(align === undefined ? {} : { align }),
      });
    });
    sheet.y += 2 * lineHeight({ size: 6.5 }) + 1;
    sheet.rule(sheet.y);
    sheet.y += 2;
  };
  sheet.ensure(46);
  header();
  for (const row of rows) {
    const cells = columns.map((column, index) => {
      const style: TextStyle = {
        size,
        maxLines: 4,
        ...(column.align === undefined ? {} : { align: column.align }),
        ...column.style?.(row),
      };
      const text = column.value(row);
      return { text, style, height: sheet.heightOf(text, widths[index] ?? 0, style) };
    });
    const height = Math.max(...cells.map((cell) => cell.height)) + 3;
    if (sheet.ensure(height)) header();
    cells.forEach(({ text, style }, index) => {
      sheet.textAt(text, xs[index] ?? margin, sheet.y, widths[index] ?? 0, style);
    });
    sheet.y += height;
    sheet.rule(sheet.y - 1.5, ink.hairline);
  }
}
