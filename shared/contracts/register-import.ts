import { z } from 'zod';
import { listResponse } from './list.ts';

/** What one file holds: the register is imported and exported one kind at a time. */
export const registerKinds = ['machines', 'positions', 'fit-records', 'points'] as const;
export const registerKind = z.enum(registerKinds);
export type RegisterKind = z.infer<typeof registerKind>;

/** What will become of a row, or has. */
export const rowFates = ['new', 'changed', 'same', 'wrong'] as const;
export const rowFate = z.enum(rowFates);
export type RowFate = z.infer<typeof rowFate>;

/**
 * `reading`: the dry run is under way; `ready`: every row has its fate and nothing is written;
 * `failed`: the dry run broke off; `applied` and `undone`: written, and taken back again.
 */
export const importStates = ['reading', 'ready', 'failed', 'applied', 'undone'] as const;
export const importState = z.enum(importStates);
export type ImportState = z.infer<typeof importState>;

export const importLimits = {
  fileMaxBytes: 16 * 1024 * 1024,
  rowsMax: 50_000,
} as const;

export const csvEncodings = ['UTF-8', 'UTF-16', 'Windows-1252'] as const;
export const csvSeparators = ['comma', 'semicolon', 'tab'] as const;
export type CsvEncoding = (typeof csvEncodings)[number];
export type CsvSeparator = (typeof csvSeparators)[number];

const rowCounts = z.object({
  new: z.int(),
  changed: z.int(),
  same: z.int(),
  wrong: z.int(),
});
export type RowCounts = z.infer<typeof rowCounts>;

export const registerImportResponse = z.object({
  id: z.int(),
  kind: registerKind,
  state: importState,
  fileName: z.string(),
  encoding: z.enum(csvEncodings),
  separator: z.enum(csvSeparators),
  /** Rows with content below the header. */
  rowCount: z.int(),
  /** How many of them have their fate. */
  rowsRead: z.int(),
  counts: rowCounts,
  /** Why the dry run broke off. */
  failure: z.string().nullable(),
  uploadedAt: z.string(),
  uploadedByName: z.string(),
  appliedAt: z.string().nullable(),
  appliedByName: z.string().nullable(),
  undoneAt: z.string().nullable(),
  undoneByName: z.string().nullable(),
  can: z.object({ apply: z.boolean(), undo: z.boolean() }),
});
export type RegisterImportResponse = z.infer<typeof registerImportResponse>;

export const importListQuery = z.object({
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(25),
});
export type ImportListQuery = z.infer<typeof importListQuery>;
export const importListResponse = listResponse(registerImportResponse);
export type ImportListResponse = z.infer<typeof importListResponse>;

export const importRowsQuery = importListQuery.extend({
  fate: rowFate.optional(),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
});
export type ImportRowsQuery = z.infer<typeof importRowsQuery>;

/** One fault of a row: the column's header, what is wrong with it and what to do. */
export const rowFault = z.object({
  column: z.string(),
  reason: z.string(),
  remedy: z.string(),
});
export type RowFault = z.infer<typeof rowFault>;

export const rowChange = z.object({ column: z.string(), before: z.string(), after: z.string() });
export type RowChange = z.infer<typeof rowChange>;

export const importRow = z.object({
  id: z.int(),
  /** As a spreadsheet counts: the header is row 1. */
  rowNumber: z.int(),
  fate: rowFate,
  /** What the row is about, e.g. P-101/M-DE. */
  label: z.string(),
  faults: z.array(rowFault),
  changes: z.array(rowChange),
});
export type ImportRow = z.infer<typeof importRow>;
export const importRowsResponse = listResponse(importRow);
export type ImportRowsResponse = z.infer<typeof importRowsResponse>;
