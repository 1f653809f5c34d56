import { rowSortingFeature, tableFeatures } from '@tanstack/react-table';
import type { ReactNode } from 'react';

export interface DataTableColumn<Row> {
  /** The server's name of the column, given back when it is sorted by. */
  id: string;
  header: string;
  cell: (row: Row) => ReactNode;
  sortable?: boolean;
  /** Figures stand at the end, so that their digits align. */
  align?: 'start' | 'end';
  /** CSS width, e.g. "9rem". */
  width?: string;
  /** The cell that names the row; usually the one that holds the row's link. */
  rowHeader?: boolean;
}

export const dataTableFeatures = tableFeatures({ rowSortingFeature });
export type DataTableFeatures = typeof dataTableFeatures;
