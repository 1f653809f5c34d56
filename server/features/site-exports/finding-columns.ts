import type { CsvColumn } from '#server/csv/csv-table.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { StateChange } from '#server/db/entities/state-change.entity.ts';
import type { FindingListItem } from '#shared/contracts/finding.ts';

export interface FindingRow {
  item: FindingListItem;
  /** Oldest first. */
  inspections: readonly Inspection[];
  lastChange: StateChange | null;
}

/** Every reference once, in the order they were given. */
export const workOrders = (inspections: readonly Inspection[]): string =>
  [...new Set(inspections.flatMap(({ workOrderReference }) => workOrderReference ?? []))].join(
    '; ',
  );

const newest = ({ inspections }: FindingRow) => inspections.at(-1);

export const findingColumns: readonly CsvColumn<FindingRow>[] = [
  { header: 'finding', value: ({ item }) => item.id },
  { header: 'state', value: ({ item }) => item.state },
  { header: 'machine tag', value: ({ item }) => item.machineTag },
  { header: 'machine name', value: ({ item }) => item.machineName },
  { header: 'position code', value: ({ item }) => item.positionCode },
  { header: 'position name', value: ({ item }) => item.positionName },
  { header: 'owner', value: ({ item }) => item.ownerName },
  { header: 'opened at (UTC)', value: ({ item }) => item.openedAt },
  { header: 'clearest verdict', value: ({ item }) => item.verdict },
  { header: 'score (0 to 1)', value: ({ item }) => item.score },
  { header: 'kind', value: ({ item }) => item.kind },
  { header: 'screenings (count)', value: ({ item }) => item.screeningCount },
  {
    header: 'last change at (UTC)',
    value: ({ lastChange }) => lastChange?.changedAt.toISOString() ?? null,
  },
  { header: 'last change by', value: ({ lastChange }) => lastChange?.changedBy?.name ?? null },
  { header: 'reason', value: ({ lastChange }) => lastChange?.reason ?? null },
  { header: 'inspections (count)', value: ({ inspections }) => inspections.length },
  { header: 'newest inspection', value: (row) => newest(row)?.id ?? null },
  { header: 'newest inspection state', value: (row) => newest(row)?.state ?? null },
  { header: 'newest inspection outcome', value: (row) => newest(row)?.report?.outcome ?? null },
  { header: 'work orders', value: ({ inspections }) => workOrders(inspections) },
];
