import { Progress } from 'radix-ui';

/** How much of a known amount of work is done, as a bar and in words. */
export function ProgressBar({
  label,
  value,
  max,
  text,
}: {
  label: string;
  value: number;
  max: number;
  /** Said beside the bar; percent where absent. */
  text?: string;
}) {
  const share = max > 0 ? Math.min(1, Math.max(0, value / max)) : 0;
  const words = text ?? `${Math.floor(share * 100)} %`;
  return (
    <div className="flex items-center gap-3">
      <Progress.Root
        aria-label={label}
        value={Math.min(Math.max(value, 0), Math.max(max, 1))}
        max={Math.max(max, 1)}
        getValueLabel={() => words}
        className="h-2.5 grow border border-ink bg-sheet"
      >
        <Progress.Indicator
          className="h-full bg-ink transition-[width] duration-200"
          style={{ width: `${share * 100}%` }}
        />
      </Progress.Root>
      <span aria-hidden="true" className="figures min-w-12 text-right text-sm">
        {words}
      </span>
    </div>
  );
}
