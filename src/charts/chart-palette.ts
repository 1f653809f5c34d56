import { useMemo, useSyncExternalStore } from 'react';

/** The colours a canvas needs, as the theme in force has them. */
export interface ChartPalette {
  ink: string;
  inkSoft: string;
  inkFaint: string;
  hairline: string;
  rule: string;
  sheet: string;
  evidence: string;
  evidenceWash: string;
  explained: string;
}

export const figuresFont = '12px "Sometype Mono Variable", "Fretline Signs", monospace';
export const textFont = '12px "Archivo Variable", "Fretline Signs", sans-serif';

/** A canvas does not follow CSS variables: charts are built anew when this value changes. */
export function useChartPalette(): ChartPalette {
  const theme = useSyncExternalStore(subscribe, themeInForce);
  return useMemo(() => readPalette(theme), [theme]);
}

function readPalette(_theme: string): ChartPalette {
  const style = getComputedStyle(document.documentElement);
  const tone = (name: string) => style.getPropertyValue(`--tone-${name}`).trim() || 'gray';
  return {
    ink: tone('ink'),
    inkSoft: tone('ink-soft'),
    inkFaint: tone('ink-faint'),
    hairline: tone('hairline'),
    rule: tone('rule'),
    sheet: tone('sheet'),
    evidence: tone('evidence'),
    evidenceWash: tone('evidence-wash'),
    explained: tone('explained'),
  };
}

function subscribe(listener: () => void): () => void {
  const observer = new MutationObserver(listener);
  observer.observe(document.documentElement, { attributeFilter: ['data-theme'] });
  return () => observer.disconnect();
}

function themeInForce(): string {
  return document.documentElement.dataset['theme'] ?? '';
}
