import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState, type ReactNode } from 'react';
import type { ReviewDecision, ReviewQueueItem } from '#shared/contracts/review.ts';
import { Button } from '#src/components/button.tsx';
import { KeyHint } from '#src/components/key-hint.tsx';
import { prefetchItem } from '../api/recordings.ts';
import { DecisionBar } from './decision-bar.tsx';
import { Notice } from '#src/components/notice.tsx';
import { readPlotPlaces } from './plot-address.ts';
import type { PlotSettingsValue } from './plot-settings-value.ts';
import { QueueList } from './queue-list.tsx';
import { ReasonDialog } from './reason-dialog.tsx';
import { decisionWords } from './review-words.ts';
import { ScreeningView } from './screening-view.tsx';
import { Shortcuts, useShortcutsOn } from './shortcuts.tsx';
import { usePlotPlaces, type AddressChanges } from './use-plot-places.ts';
import { useReviewDecisions } from './use-review-decisions.ts';
import { useReviewKeys } from './use-review-keys.ts';

export interface ReviewDeskProps {
  siteId: number;
  items: readonly ReviewQueueItem[];
  /** The screening the address names; else the first of the queue is open. */
  screeningId: number | undefined;
  /** The address, which keeps zoom and cursor. */
  search: URLSearchParams;
  plotSettings: PlotSettingsValue;
  /** What else of the address was not understood, in sentences. */
  problems: readonly string[];
  /** Shown when nothing waits; the last decision stays beside it, to be undone. */
  empty: ReactNode;
  onSelect: (screeningId: number | undefined) => void;
  onPlotSettings: (changes: Partial<PlotSettingsValue>) => void;
  onAddress: (changes: AddressChanges) => void;
}

/** The queue on one side, the flag on the other; everything by keys as well. */
export function ReviewDesk(props: ReviewDeskProps) {
  const { siteId, items, search, plotSettings, onSelect, onPlotSettings } = props;
  const places = usePlotPlaces(search, props.onAddress);
  const problems = [...props.problems, ...readPlotPlaces(search).problems];
  const client = useQueryClient();
  const [asking, setAsking] = useState<'rejected' | 'retake' | null>(null);
  const [showsKeys, setShowsKeys] = useState(false);
  const [keysOn, setKeysOn] = useShortcutsOn();
  const screeningId = props.screeningId ?? items[0]?.screeningId;
  const place = items.findIndex((item) => item.screeningId === screeningId);
  const item = items[place];
  const next = items[place + 1];
  const decisions = useReviewDecisions(siteId, onSelect);

  const afterNext = items[place + 2];

  useEffect(() => {
    // One after the other: the flag that is gone to first is not to wait for the second's data.
    const prefetch = async () => {
      // Of the open flag as well: its plots' data is not to wait until its facts are there.
      if (item !== undefined) await prefetchItem(client, siteId, item);
      if (next !== undefined) await prefetchItem(client, siteId, next);
      if (afterNext !== undefined) await prefetchItem(client, siteId, afterNext);
    };
    void prefetch();
  }, [client, siteId, item, next, afterNext]);

  const isOpen = item !== undefined && item.decision === null;
  const go = (step: number) => {
    const target = items[place + step];
    if (target !== undefined) onSelect(target.screeningId);
  };
  const send = (decision: ReviewDecision, reason: string) => {
    if (item === undefined || decisions.busy) return;
    // The flag leaves the queue: what comes after it moves up, the last one gives way to the one before.
    const following = next ?? items[place - 1];
    decisions.decide(item, decision, reason, () => onSelect(following?.screeningId));
  };
  const choose = (decision: ReviewDecision) => {
    if (!isOpen) return;
    if (decision === 'accepted') send(decision, '');
    else setAsking(decision);
  };
  useReviewKeys(
    {
      j: () => go(1),
      k: () => go(-1),
      a: () => choose('accepted'),
      r: () => choose('rejected'),
      t: () => choose('retake'),
      u: decisions.undoLast,
      '?': () => setShowsKeys(true),
    },
    keysOn,
  );

  const lastDecision = (
    <div role="status" className="text-sm">
      {decisions.last !== null && (
        <p className="flex items-center justify-between gap-2 border-l border-rule pl-2">
          <span>{decisions.last.text}</span>
          <Button size="small" aria-keyshortcuts="u" onClick={decisions.undoLast}>
            Undo {keysOn && <KeyHint keys={['u']} />}
          </Button>
        </p>
      )}
    </div>
  );
  // The same component as before the last flag went, so that its undo is not lost with it.
  if (items.length === 0 && screeningId === undefined) {
    return (
      <div className="flex flex-col gap-4">
        <div className="max-w-xl">{lastDecision}</div>
        {props.empty}
      </div>
    );
  }
  return (
    <div className="grid items-start gap-4 xl:grid-cols-[17.5rem_minmax(0,1fr)]">
      <div className="flex flex-col gap-2">
        <QueueList
          items={items}
          selectedId={screeningId}
          onSelect={onSelect}
          onAim={(aimed) => void prefetchItem(client, siteId, aimed)}
        />
        {lastDecision}
        <Button size="small" variant="quiet" icon="help" onClick={() => setShowsKeys(true)}>
          Keys
        </Button>
      </div>
      {screeningId !== undefined && (
        <div className="flex min-w-0 flex-col gap-4">
          {problems.length > 0 && (
            <Notice title="A part of the address was not understood and is left out">
              {problems.join(' ')}
            </Notice>
          )}
          <ScreeningView
            siteId={siteId}
            screeningId={screeningId}
            waveformId={item?.waveformId}
            plotSettings={plotSettings}
            places={places}
            onPlotSettings={onPlotSettings}
            decision={
              isOpen ? (
                <DecisionBar busy={decisions.busy} keysOn={keysOn} onDecide={choose} />
              ) : item?.decision ? (
                <div className="flex flex-wrap items-center gap-3 text-sm">
                  <span>
                    {decisionWords[item.decision]} by {item.decidedByName}
                  </span>
                  <Button size="small" onClick={() => decisions.takeBack(item.screeningId)}>
                    Take back
                  </Button>
                </div>
              ) : null
            }
          />
        </div>
      )}
      {asking !== null && item !== undefined && (
        <ReasonDialog
          decision={asking}
          pointLabel={item.pointLabel}
          onClose={() => setAsking(null)}
          onDecide={(reason) => {
            setAsking(null);
            send(asking, reason);
          }}
        />
      )}
      {showsKeys && (
        <Shortcuts isOn={keysOn} onChoose={setKeysOn} onClose={() => setShowsKeys(false)} />
      )}
    </div>
  );
}
