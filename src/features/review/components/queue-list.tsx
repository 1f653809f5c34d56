import { useEffect, useRef, type KeyboardEvent } from 'react';
import type { ReviewQueueItem } from '#shared/contracts/review.ts';
import { OrderStrip } from '#src/charts/order-strip.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatFixed } from '#src/lib/numbers.ts';
import { decisionWords } from './review-words.ts';

/** The queue, worst first. Arrow keys go through it while the focus is inside. */
export function QueueList({
  items,
  selectedId,
  onSelect,
  onAim,
}: {
  items: readonly ReviewQueueItem[];
  selectedId: number | undefined;
  onSelect: (screeningId: number) => void;
  /** The pointer has come to a flag, and may be about to choose it. */
  onAim: (item: ReviewQueueItem) => void;
}) {
  const list = useRef<HTMLOListElement>(null);
  useEffect(() => {
    list.current?.querySelector('[aria-current="true"]')?.scrollIntoView?.({ block: 'nearest' });
  }, [selectedId]);
  const onKeyDown = (event: KeyboardEvent) => {
    const step = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
    if (step === 0) return;
    event.preventDefault();
    const next = items[items.findIndex((item) => item.screeningId === selectedId) + step];
    if (next === undefined) return;
    onSelect(next.screeningId);
    list.current
      ?.querySelector<HTMLButtonElement>(`[data-screening="${next.screeningId}"]`)
      ?.focus();
  };
  return (
    <ol
      ref={list}
      aria-label="Queue"
      onKeyDown={onKeyDown}
      className="max-h-80 overflow-y-auto border border-hairline bg-sheet xl:max-h-[calc(100dvh-14rem)]"
    >
      {items.map((item) => (
        <QueueRow
          key={item.screeningId}
          item={item}
          isSelected={item.screeningId === selectedId}
          onSelect={onSelect}
          onAim={onAim}
        />
      ))}
    </ol>
  );
}

function QueueRow({
  item,
  isSelected,
  onSelect,
  onAim,
}: {
  item: ReviewQueueItem;
  isSelected: boolean;
  onSelect: (screeningId: number) => void;
  onAim: (item: ReviewQueueItem) => void;
}) {
  return (
    <li className="border-b border-hairline last:border-b-0">
      <button
        type="button"
        data-screening={item.screeningId}
        aria-current={isSelected ? 'true' : undefined}
        onPointerEnter={() => onAim(item)}
        onClick={() => onSelect(item.screeningId)}
        className={`flex w-full cursor-pointer flex-col gap-1 border-l-4 px-3 py-2 text-left hover:bg-well ${isSelected ? 'border-ink bg-well' : 'border-transparent'}`}
      >
        <span className="flex w-full items-baseline justify-between gap-2">
          <span className="figures text-sm font-medium">{item.pointLabel}</span>
          <span className="figures text-sm">
            {item.score === null ? '–' : formatFixed(item.score, 2)}
          </span>
        </span>
        <OrderStrip marks={item.orders} />
        <span className="flex w-full flex-wrap items-center justify-between gap-x-2">
          <VerdictMark verdict={item.verdict} />
          <span className="figures text-xs text-ink-faint">{formatDay(item.surveyedOn)}</span>
        </span>
        {item.decision !== null && (
          <span className="text-xs text-ink-soft">
            {decisionWords[item.decision]} by {item.decidedByName}
          </span>
        )}
      </button>
    </li>
  );
}
