import type { ImportState, RegisterKind, RowFate } from '#shared/contracts/register-import.ts';
import type { MarkShape } from '#src/components/state-mark.tsx';

export const kindWords: Readonly<Record<RegisterKind, string>> = {
  machines: 'Machines',
  positions: 'Bearing positions',
  'fit-records': 'Fit records',
  points: 'Measuring points',
};

export const fateWords: Readonly<Record<RowFate, string>> = {
  new: 'New',
  changed: 'Changed',
  same: 'Same',
  wrong: 'Wrong',
};

export const fateShapes: Readonly<Record<RowFate, MarkShape>> = {
  new: 'box-dot',
  changed: 'box-diagonal',
  same: 'box-empty',
  wrong: 'box-struck',
};

export const stateWords: Readonly<Record<ImportState, string>> = {
  reading: 'Dry run under way',
  ready: 'Checked, nothing written',
  failed: 'Broken off',
  applied: 'Applied',
  undone: 'Undone',
};

export const stateShapes: Readonly<Record<ImportState, MarkShape>> = {
  reading: 'box-quarter',
  ready: 'box-half',
  failed: 'box-struck',
  applied: 'box-check',
  undone: 'box-empty',
};
