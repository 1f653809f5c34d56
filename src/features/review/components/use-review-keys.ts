import { useEffect, useRef } from 'react';

export type ReviewKeys = Readonly<Record<string, () => void>>;

const typingElements = 'input, textarea, select, [contenteditable="true"], [role="dialog"]';

/** Whether a key belongs to what has the focus (a field, a dialog) and not to the page. */
function isTaken(event: KeyboardEvent): boolean {
  if (event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return true;
  const { target } = event;
  return target instanceof Element && target.closest(typingElements) !== null;
}

/** Single keys as shortcuts, outside inputs and dialogs and only while switched on (WCAG 2.1.4). */
export function useReviewKeys(keys: ReviewKeys, isOn: boolean): void {
  const latest = useRef(keys);
  useEffect(() => {
    latest.current = keys;
  }, [keys]);
  useEffect(() => {
    if (!isOn) return;
    const onKey = (event: KeyboardEvent) => {
      const act = latest.current[event.key];
      if (act === undefined || isTaken(event)) return;
      event.preventDefault();
      act();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [isOn]);
}
