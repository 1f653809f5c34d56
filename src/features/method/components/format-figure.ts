import type { Figure } from '#shared/signal/method-figures.ts';

/** Three figures, no powers of ten. */
const threeFigures = (value: number) =>
  value === 0
    ? '0'
    : value.toFixed(Math.max(0, Math.min(4, 2 - Math.floor(Math.log10(Math.abs(value))))));

export const formatPercent = (percent: number): string => `${threeFigures(percent)} %`;

export function formatFigure({ unit }: Figure, value: number | null): string {
  if (value === null) return 'not measured';
  if (unit === '%') return formatPercent(value);
  return unit === 'count' ? String(value) : threeFigures(value);
}
