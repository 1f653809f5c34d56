export interface ChartTableColumn {
  header: string;
  align?: 'start' | 'end';
}

/** A chart's figures as a table, opened on demand; the summary says what was left out. */
export function ChartTable({
  summary,
  caption,
  columns,
  rows,
}: {
  /** On the opener, e.g. "Orders as a table". */
  summary: string;
  /** What the rows are and how many there would be. */
  caption: string;
  columns: readonly ChartTableColumn[];
  rows: readonly (readonly string[])[];
}) {
  return (
    <details className="text-sm">
      <summary className="ink-link w-fit cursor-pointer text-ink-soft">{summary}</summary>
      <div
        className="relative mt-2 max-h-80 overflow-auto"
        tabIndex={0}
        role="region"
        aria-label={summary}
      >
        <table className="border-separate border-spacing-0">
          <caption className="pb-1 text-left text-xs text-ink-faint">{caption}</caption>
          <thead>
            <tr>
              {columns.map((column) => (
                <th
                  key={column.header}
                  scope="col"
                  className={`lettering border-b border-ink px-2 py-0.5 ${column.align === 'end' ? 'text-right' : 'text-left'}`}
                >
                  {column.header}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => (
              <tr key={index}>
                {row.map((cell, cellIndex) => (
                  <td
                    key={cellIndex}
                    className={`border-b border-hairline px-2 py-0.5 ${columns[cellIndex]?.align === 'end' ? 'figures text-right' : ''}`}
                  >
                    {cell}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
