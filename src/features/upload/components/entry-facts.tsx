import { quantityOfUnit } from '#shared/quantities/quantity.ts';
import { Figure } from '#src/components/figure.tsx';
import { formatBytes, formatEntered, formatSignificant } from '#src/lib/numbers.ts';
import type { UploadEntry } from '../upload-entry.ts';

/** What will be recorded of a file: quantity, unit, sampling rate, length and told speed. */
export function EntryFacts({ entry }: { entry: UploadEntry }) {
  const csv = entry.head?.preview.csv;
  if (!csv || !entry.head) return null;
  const units = [
    ...new Set(
      entry.channels
        .filter(({ taken }) => taken)
        .flatMap(({ unit, unitInFile }) => unit ?? unitInFile ?? []),
    ),
  ];
  const rateHz = entry.sampleRateHz ?? csv.sampleRateHz;
  const rows = entry.head.preview.estimatedRowCount;
  const lengthS = rateHz === null || rows === null ? null : rows / rateHz;
  const about = entry.head.isWhole ? '' : 'about ';
  const speedRpm = entry.toldSpeedRpm ?? csv.speedRpm;
  const facts: [string, string | null, string?][] = [
    [
      'Quantity',
      units.length === 0 ? null : units.map((unit) => quantityOfUnit[unit]).join(', '),
      units.join(', '),
    ],
    ['Sampling rate', rateHz === null ? null : formatEntered(rateHz), 'Hz'],
    ['Length', lengthS === null ? null : about + formatSignificant(lengthS, 3), 's'],
    ['Told speed', speedRpm === null ? null : formatEntered(speedRpm), 'r/min'],
    ['Size', formatBytes(entry.file.size)],
  ];
  return (
    <dl className="flex flex-wrap gap-x-4 gap-y-0.5 text-sm">
      {facts.map(([label, value, unit]) => (
        <div key={label} className="flex gap-1.5">
          <dt className="text-ink-faint">{label}</dt>
          <dd>
            <Figure value={value} unit={unit} />
          </dd>
        </div>
      ))}
    </dl>
  );
}
