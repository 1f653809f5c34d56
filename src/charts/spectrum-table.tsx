import { memo } from 'react';
import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';
import { ChartTable } from './chart-table.tsx';
import { orderName, type OrderMark } from './order-mark.ts';
import type { Spectrum, SpectrumMark } from './spectrum-data.ts';
import { highestLines } from './highest-lines.ts';

const linesMax = 25;

const belongsTo = {
  run: 'run of harmonics',
  fraction: 'fractions of the order',
  standing: 'no run',
  explained: 'something else',
} as const;

/** The spectrum for who does not see it: its marked orders, or its highest lines where none are. */
export const SpectrumTable = memo(function SpectrumTable({
  spectrum,
  marks,
  orders,
  speedHz,
  amplitudeLabel,
  levelOf,
}: {
  spectrum: Spectrum;
  marks: readonly SpectrumMark[];
  orders: readonly OrderMark[];
  speedHz: number | null;
  amplitudeLabel: string;
  /** Where the amplitudes are stated as levels, how. */
  levelOf: ((amplitude: number) => number) | null;
}) {
  const amplitudeText = (amplitude: number) =>
    levelOf === null ? formatSignificant(amplitude) : formatFixed(levelOf(amplitude), 1);
  const lineCount = spectrum.amplitude.length;
  if (marks.length > 0) {
    return (
      <ChartTable
        summary="Orders as a table"
        caption={`The ${marks.length} orders that stand out, of ${orders.length} looked at in ${lineCount} lines.`}
        columns={[
          { header: 'Order', align: 'end' },
          { header: 'Hz', align: 'end' },
          { header: amplitudeLabel, align: 'end' },
          { header: 'dB above floor', align: 'end' },
          { header: 'Belongs to' },
        ]}
        rows={marks.map((mark) => [
          orderName(mark.order),
          formatFixed(mark.frequencyHz, 2),
          amplitudeText(mark.amplitude),
          formatFixed(orders.find((known) => known.order === mark.order)?.prominenceDb ?? 0, 0),
          mark.explainedBy ?? belongsTo[mark.kind],
        ])}
      />
    );
  }
  const highest = highestLines(spectrum.amplitude, linesMax);
  return (
    <ChartTable
      summary="Highest lines as a table"
      caption={`The ${highest.length} highest of ${lineCount} lines.`}
      columns={[
        { header: 'Hz', align: 'end' },
        ...(speedHz === null ? [] : [{ header: 'Order', align: 'end' as const }]),
        { header: amplitudeLabel, align: 'end' },
      ]}
      rows={highest.map((line) => [
        formatFixed(line * spectrum.stepHz, 2),
        ...(speedHz === null ? [] : [formatFixed((line * spectrum.stepHz) / speedHz, 2)]),
        amplitudeText(spectrum.amplitude[line] ?? 0),
      ])}
    />
  );
});
