import type { RegisterImport } from '#server/db/entities/register-import.entity.ts';

/** Why an import can't be written now; null where it can. */
export function whyNotApplied(found: RegisterImport): string | null {
  if (found.state === 'reading') return 'The dry run is still under way.';
  if (found.state !== 'ready') return `The import was ${wordOf[found.state]} already.`;
  if (found.wrongCount > 0) {
    return `${found.wrongCount} of the rows are wrong. Correct them in the file and send it again; nothing is written until every row is right.`;
  }
  if (found.newCount + found.changedCount === 0) {
    return 'There is nothing to write: every row is the same as the register.';
  }
  return null;
}

/** Why an import can't be taken back; null where that may be tried. */
export const whyNotUndone = (found: RegisterImport): string | null =>
  found.state === 'applied' ? null : 'Only an import that was applied can be undone.';

const wordOf = { ready: 'checked', failed: 'broken off', applied: 'applied', undone: 'undone' };
