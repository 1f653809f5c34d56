import { useCallback, useState } from 'react';
import { emptyDraft, type ReportDraft } from './report-draft.ts';

const storageKey = (inspectionId: number) => `fretline-report-${inspectionId}`;

function remembered(inspectionId: number): ReportDraft {
  try {
    const stored: unknown = JSON.parse(localStorage.getItem(storageKey(inspectionId)) ?? 'null');
    return typeof stored === 'object' && stored !== null
      ? { ...emptyDraft, ...(stored as Partial<ReportDraft>) }
      : emptyDraft;
  } catch {
    return emptyDraft;
  }
}

/** A report's draft, written to the device with every change and forgotten once it was sent. */
export function useReportDraft(inspectionId: number) {
  const [draft, setDraft] = useState(() => remembered(inspectionId));
  const change = useCallback(
    (changes: Partial<ReportDraft>) =>
      setDraft((before) => {
        const after = { ...before, ...changes };
        try {
          localStorage.setItem(storageKey(inspectionId), JSON.stringify(after));
        } catch {
          // Storage can be full or switched off: the draft then lasts as long as the page.
        }
        return after;
      }),
    [inspectionId],
  );
  const forget = useCallback(() => {
    try {
      localStorage.removeItem(storageKey(inspectionId));
    } catch {
      // Nothing was stored then.
    }
  }, [inspectionId]);
  return { draft, change, forget };
}
